/** The slug of a scientific name: lower case, no accents, words joined by hyphens ("Pogona vitticeps" is `pogona-vitticeps`). */
export function toSlug(scientificName: string): string {
  return scientificName
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '')
}
