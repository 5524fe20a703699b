/** Letters that do not fall apart into a base letter and a mark; the database's unaccent writes them so too. */
const WHOLE_LETTERS: Readonly<Record<string, string>> = {
  ß: 'ss',
  æ: 'ae',
  œ: 'oe',
  ø: 'o',
  đ: 'd',
  ð: 'd',
  þ: 'th',
  ł: 'l',
  ı: 'i',
}
const WORDS_MAX = 8

/** The words of a search, in lower case and without diacritics or punctuation; further ones than eight are dropped. */
export function toSearchWords(text: string): string[] {
  const plain = text
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[ßæœøđðþłı]/g, (letter) => WHOLE_LETTERS[letter] ?? letter)
  return (plain.match(/[\p{L}\p{N}]+/gu) ?? []).slice(0, WORDS_MAX)
}
