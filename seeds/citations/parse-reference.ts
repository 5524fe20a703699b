import type { CslItem, SourceKind } from '../../shared/sources.js'
import { parseCitationKey, type CitationKey } from './citation-key.js'

/** A reference as far as its pattern says for certain what each part is. */
export interface ParsedReference {
  kind: SourceKind
  csl: CslItem
  /** The whole reference in words where a part of it could not be told apart; null when the fields hold all of it. */
  asPrinted: string | null
}

type Author = NonNullable<CslItem['author']>[number]

/**
 * The parts of a reference printed as "Author, A.; Author, B. (2019) Title. Journal 82(3) pp. 43-51", the form
 * the datasets use. The end of a title and the start of a journal look alike when either holds a full stop, so such
 * a reference keeps only its authors and year as fields and is shown as printed.
 */
export function parseReference(printed: string): ParsedReference {
  const text = printed.replace(/\s+/g, ' ').trim()
  const head = /^(?<authors>.+?) \((?<year>\d{4})\) (?<rest>.+)$/.exec(text)?.groups
  if (!head?.authors || !head.year || !head.rest) {
    return { kind: 'other', csl: { type: 'document' }, asPrinted: printed }
  }
  const issued = { 'date-parts': [[Number(head.year)]] }
  // "Branco and Malvin 1996 (1996) Title": a citation key in the place of the authors, and nothing after the title.
  if (head.authors.endsWith(` ${head.year}`)) {
    const key = parseCitationKey(head.authors)
    return key
      ? {
          kind: 'other',
          csl: { type: 'document', title: head.rest, author: toAuthors(key), issued },
          asPrinted: null,
        }
      : { kind: 'other', csl: { type: 'document', title: head.rest, issued }, asPrinted: printed }
  }
  const author = parseAuthors(head.authors)
  if (author === null) return { kind: 'other', csl: { type: 'document', issued }, asPrinted: printed }
  const known = { author, issued }

  const parts = head.rest.split(/(?<!\bpp)\. /)
  const [title, publication] = parts
  if (parts.length !== 2 || !title || !publication) {
    return { kind: 'other', csl: { type: 'document', ...known }, asPrinted: printed }
  }
  const place = parsePublication(publication, author.length)
  if (!place) return { kind: 'other', csl: { type: 'document', ...known }, asPrinted: printed }
  return {
    kind: place.kind,
    csl: { ...place.csl, title, ...known },
    asPrinted: null,
  }
}

/** Author names of "Family, Given; Family, Given et al."; null where the place holds something else. */
function parseAuthors(printed: string): Author[] | null {
  const abbreviated = / et al\.?$/.test(printed)
  const names = mendSplitNames(printed.replace(/ et al\.?$/, '')).split('; ')
  if (names.some((name) => /[[\]\d]/.test(name))) return null
  const authors = names.map((name): Author => {
    const comma = name.indexOf(', ')
    return comma < 0
      ? { literal: name.trim() }
      : { family: name.slice(0, comma).trim(), given: name.slice(comma + 2).trim() }
  })
  return abbreviated ? [...authors, { literal: 'others' }] : authors
}

/**
 * One dataset made its author lists by splitting at "and", also inside a name: "Sealander" became "Seal; er". No
 * author's name starts in lower case and ends at once in a comma, or is empty, so these can be put together again.
 */
function mendSplitNames(authors: string): string {
  return authors.replace(/([A-Za-z]); ([a-z]*, )/g, '$1and$2')
}

function toAuthors({ families, isAbbreviated }: CitationKey): Author[] {
  const authors: Author[] = families.map((family) => ({ family }))
  return isAbbreviated ? [...authors, { literal: 'others' }] : authors
}

function parsePublication(printed: string, authorCount: number): { kind: SourceKind; csl: CslItem } | null {
  const numbered = /^(?<container>\D.*?) (?<volume>\d+)(?:\((?<issue>[^)]+)\))?(?: pp\. (?<page>\S+))?$/.exec(
    printed,
  )?.groups
  if (numbered?.container && !/ pp\.$/.test(numbered.container)) {
    return {
      kind: 'article',
      csl: {
        type: 'article-journal',
        'container-title': numbered.container,
        volume: numbered.volume,
        ...(numbered.issue !== undefined && { issue: numbered.issue }),
        ...(numbered.page !== undefined && { page: numbered.page }),
      },
    }
  }
  const thesis = /^(?<publisher>\D*?)(?: pp\. (?<pages>\d+))?$/.exec(printed)?.groups
  if (thesis?.publisher && authorCount === 1 && /\bUniversi/.test(thesis.publisher)) {
    return {
      kind: 'thesis',
      csl: {
        type: 'thesis',
        publisher: thesis.publisher,
        ...(thesis.pages !== undefined && { 'number-of-pages': thesis.pages }),
      },
    }
  }
  return null
}
