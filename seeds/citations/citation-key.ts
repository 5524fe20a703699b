/** What an author-year key names: one author, two, or the first of several ("et al."). */
export interface CitationKey {
  families: string[]
  isAbbreviated: boolean
  year: number
}

const keyPattern =
  /^(?<first>\p{L}[\p{L}'’. -]*?)(?:(?: (?:&|and) )(?<second>\p{L}[\p{L}'’. -]*?)|(?<others> et al\.?))? (?<year>\d{4})$/u

/**
 * Reads "Berkhouse & Fries 1995" or "Hertz et al 1983". Null for anything else: a year with a letter ("2008a") says
 * that its dataset knows several such studies, and "in", "unpubl" or a second year name more than one work.
 */
export function parseCitationKey(printed: string): CitationKey | null {
  const groups = keyPattern.exec(printed.trim())?.groups
  if (!groups?.first || !groups.year || / (?:in|unpubl|data)\b/.test(printed)) return null
  return {
    families: groups.second ? [groups.first, groups.second] : [groups.first],
    isAbbreviated: groups.others !== undefined,
    year: Number(groups.year),
  }
}

/** A family name without case, accents, spaces and marks, so that "Gvoždík" and "Gvozdik" are one. */
export function foldName(name: string): string {
  return name
    .normalize('NFKD')
    .replace(/[^\p{L}]/gu, '')
    .toLowerCase()
}
