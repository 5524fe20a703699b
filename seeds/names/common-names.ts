/** One common name taken out of a list of them. */
export interface CommonName {
  name: string
  /** BCP 47; null when the list does not say. */
  language: string | null
  /** The subspecies the list gives the name to, as printed; null for the whole species. */
  subspecies: string | null
}

/** Languages that the lists name in words, as BCP 47 tags (IANA language subtag registry). */
const languageTags = new Map([
  ['afrikaans', 'af'],
  ['chinese', 'zh'],
  ['dutch', 'nl'],
  ['english', 'en'],
  ['french', 'fr'],
  ['german', 'de'],
  ['japanese', 'ja'],
  ['portuguese', 'pt'],
  ['spanish', 'es'],
  ['sranan', 'srn'],
  ['xhosa', 'xh'],
  ['zulu', 'zu'],
])

/** A name of a subspecies, abbreviated or not: "A. g. dorsalis", "Anaxyrus boreas boreas". */
const subspeciesPattern = /^[A-Z][a-z]*\.? [a-z]+\.? [a-z]+$/

/**
 * Takes a printed list of common names apart: "Green Toad, Eastern Green Toad (<i>B. d. debilis</i>)". Markup goes; a
 * hint in brackets tells the language or the subspecies; a name that stands twice is kept once.
 */
export function splitCommonNames(printed: string): CommonName[] {
  const plain = printed
    .replace(/<[^>]*>/g, '')
    .replace(/\bSubspecies:/g, '')
    .replace(/\s+/g, ' ')
  const seen = new Set<string>()
  const names: CommonName[] = []
  for (const part of splitOutsideBrackets(plain)) {
    const { words, language, subspecies } = readHint(part)
    for (const word of words.split(/ or (?=[A-Z])/)) {
      const name = word.trim()
      if (name === '' || seen.has(name.toLowerCase())) continue
      seen.add(name.toLowerCase())
      names.push({ name, language, subspecies })
    }
  }
  return names
}

function splitOutsideBrackets(text: string): string[] {
  return text.split(/[,;](?![^()]*\))/)
}

function readHint(part: string): { words: string; language: string | null; subspecies: string | null } {
  const text = part.trim()
  const bracketed = /^\(([^()]*)\)$/.exec(text)
  if (bracketed?.[1] !== undefined) return { words: bracketed[1], language: null, subspecies: null }
  const hinted = /^(?<words>[^()]+?) ?\((?<hint>[^()]*)\)$/.exec(text)?.groups
  if (!hinted?.words || hinted.hint === undefined) return { words: text, language: null, subspecies: null }
  const hint = hinted.hint.trim()
  const language = languageTags.get(hint.toLowerCase())
  if (language) return { words: hinted.words, language, subspecies: null }
  if (subspeciesPattern.test(hint)) return { words: hinted.words, language: null, subspecies: hint }
  // What the brackets say is not known to this list, so the name stays as it was printed.
  return { words: text, language: null, subspecies: null }
}
