import type { CslItem, SourceBrief } from './sources.js'

type CslName = NonNullable<CslItem['author']>[number]

const AS_PRINTED_SHORT_LENGTH = 48

/** A reference taken apart, so that a page can set the container in italics and link the address. */
export interface ReferenceParts {
  /** "Huey, R. B. & Pianka, E. R. (1977)", or null when neither author nor year is known. */
  lead: string | null
  title: string | null
  /** The journal or book it stands in, or who published it. */
  container: string | null
  /** Volume and pages: "58: 1066–1075". */
  detail: string | null
  doi: string | null
  /** An http address to follow: the DOI's where there is one. */
  url: string | null
  /** The reference in words where its fields could not be read; then every other part but the address is null. */
  asPrinted: string | null
}

function surname(name: CslName): string | null {
  return name.family ?? name.literal ?? name.given ?? null
}

function fullName(name: CslName): string | null {
  if (name.family !== undefined && name.given !== undefined) return `${name.family}, ${name.given}`
  return surname(name)
}

/** The year a source was issued, or null. */
export function findYear(csl: CslItem): number | null {
  return csl.issued?.['date-parts']?.[0]?.[0] ?? null
}

function clip(text: string, length: number): string {
  if (text.length <= length) return text
  const head = text.slice(0, length)
  const space = head.lastIndexOf(' ')
  return `${(space > length / 2 ? head.slice(0, space) : head).replace(/[\s,;:.(]+$/, '')} …`
}

/**
 * The short form a sentence cites by: "Huey & Pianka 1977", "Licht et al. 1966"; the start of the title or of the
 * printed reference where no author is known.
 */
export function toShortCitation(source: Pick<SourceBrief, 'csl' | 'asPrinted'>): string {
  const { csl, asPrinted } = source
  const names = (csl.author ?? []).map(surname).filter((name) => name !== null)
  const year = findYear(csl)
  const [first, second] = names
  if (first === undefined) {
    const words = asPrinted ?? csl.title ?? 'Source without a title'
    return [clip(words, AS_PRINTED_SHORT_LENGTH), asPrinted === null ? year : null].filter(Boolean).join(' ')
  }
  const who = second === undefined ? first : names.length === 2 ? `${first} & ${second}` : `${first} et al.`
  return [who, year].filter(Boolean).join(' ')
}

/** The address of a DOI at its resolver, or null when the text is no DOI. */
export function toDoiUrl(doi: string | null | undefined): string | null {
  if (doi === null || doi === undefined || !/^10\.\d{4,9}\/\S+$/.test(doi)) return null
  return `https://doi.org/${encodeURI(doi).replaceAll('#', '%23').replaceAll('?', '%3F')}`
}

/** The text as an address that may be followed (http or https), or null. */
export function toSafeUrl(text: string | null | undefined): string | null {
  if (text === null || text === undefined) return null
  return /^https?:\/\/[^\s"'<>]+$/i.test(text) ? text : null
}

function listNames(names: readonly CslName[]): string {
  const full = names.map(fullName).filter((name) => name !== null)
  const last = full.at(-1)
  if (full.length <= 1 || last === undefined) return full.join('')
  return `${full.slice(0, -1).join('; ')} & ${last}`
}

/** Takes a source's reference apart, from its CSL-JSON fields or, where they say too little, from its printed words. */
export function toReferenceParts(source: Pick<SourceBrief, 'csl' | 'asPrinted' | 'doi'>): ReferenceParts {
  const { csl, asPrinted } = source
  const doi = source.doi ?? csl.DOI ?? null
  const url = toDoiUrl(doi) ?? toSafeUrl(csl.URL)
  const empty = { lead: null, title: null, container: null, detail: null, doi, url, asPrinted: null }
  if (csl.title === undefined) {
    const words = asPrinted ?? toShortCitation(source)
    return { ...empty, asPrinted: words }
  }
  const year = findYear(csl)
  const names = listNames(csl.author ?? [])
  const lead = [names, year === null ? '' : `(${year})`].filter(Boolean).join(' ')
  const pages = csl.page?.replaceAll('-', '–')
  const detail = [csl.volume, pages].filter(Boolean).join(': ')
  return {
    ...empty,
    lead: lead === '' ? null : lead,
    title: csl.title,
    container: csl['container-title'] ?? (typeof csl.publisher === 'string' ? csl.publisher : null),
    detail: detail === '' ? null : detail,
  }
}

function endSentence(text: string): string {
  return /[.?!…]$/.test(text) ? text : `${text}.`
}

/** The whole reference in words: "Huey, R. B. & Pianka, E. R. (1977) Title. Journal 58: 1066–1075. doi:10.…". */
export function toFullReference(source: Pick<SourceBrief, 'csl' | 'asPrinted' | 'doi'>): string {
  const parts = toReferenceParts(source)
  const place = [parts.container, parts.detail].filter(Boolean).join(' ')
  const address = parts.doi !== null ? `doi:${parts.doi}` : parts.url
  const opening = [parts.lead, parts.title ?? parts.asPrinted].filter(Boolean).join(' ')
  return [endSentence(opening), place === '' ? null : endSentence(place), address].filter(Boolean).join(' ')
}

/** How to cite one revision of a page, with its permanent address. */
export function toRevisionCitation(page: {
  scientificName: string
  number: number
  publishedOn: string
  address: string
}): string {
  return `Mossgauge. ${page.scientificName}, revision ${page.number}, published ${page.publishedOn}. ${page.address}`
}
