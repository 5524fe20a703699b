import type { EntityManager } from 'typeorm'
import type { OverlapFilter, SearchAnswer, SearchQuery } from '../../shared/search.js'
import type { SpeciesListItem } from '../../shared/species.js'
import { readSearchCursor, writeSearchCursor } from './search-cursor.js'
import type { SearchPlace } from './search-cursor.js'
import { writeHolders, writeOverlapping, writeSearch } from './search-statement.js'
import { toSearchWords } from './search-words.js'

/** How alike a name must be to the words to be offered when nothing was found (see `LIKENESS`); our policy. */
const OFFERED_LIKENESS = 0.25
const NEAREST_MAX = 5
/** Past so many hits the order is that of the listing: nobody reads on to see the likest one first. */
const RATED_MAX = 1000
/**
 * Up to so many ranges that meet a filter, their pages are gathered by the index on current ranges and put in order; past so
 * many, a walk of the listing soon meets enough of them. Either way the work does not grow with the number of pages.
 */
export const GATHERED_MAX = 1000

export type SearchCounts = Pick<SearchAnswer, 'facets' | 'total'>

/** Keeps the counts of a search, which do not depend on its page or order, for as long as nothing is published. */
export interface CountStore {
  find(key: string): SearchCounts | null
  keep(key: string, counts: SearchCounts): void
}

interface FoundRow {
  item: SpeciesListItem
  place: SearchPlace
}

/**
 * Finds species pages by name and by filters. Words are met by the beginnings of words, in any order and across the names of
 * a page; where no page has them all, by names that look alike. Throws InvalidInput for a cursor of another search.
 */
export async function searchSpecies(
  db: EntityManager,
  query: SearchQuery,
  countStore: CountStore | null = null,
): Promise<SearchAnswer> {
  const words = toSearchWords(query.q)
  const after = query.cursor === null ? null : readSearchCursor(query, query.cursor)
  const key = JSON.stringify({ ...query, q: words, sort: null, cursor: null, limit: null })
  const known = countStore?.find(key) ?? null
  const meeting = words.length === 0 ? 'none' : await chooseMeeting(db, words)
  const gatheredBy = await chooseGathering(db, query.overlaps)
  const statement = writeSearch({ query, words, meeting, gatheredBy, after, withCounts: known === null })
  const [answer] = await db.query<{ found: FoundRow[]; counts: SearchCounts | null }[]>(
    statement.text,
    statement.values,
  )
  const counts = known ?? answer?.counts
  if (answer === undefined || counts == null) throw new Error('The search gave no answer.')
  if (known === null) countStore?.keep(key, counts)

  const shown = answer.found.slice(0, query.limit)
  const last = shown.at(-1)
  const hasMore = answer.found.length > query.limit
  return {
    items: shown.map(({ item }) => item),
    total: counts.total,
    nextCursor: hasMore && last !== undefined ? writeSearchCursor(query, last.place) : null,
    facets: counts.facets,
    nearest: counts.total === 0 && words.length > 0 ? await findNearest(db, words) : [],
    engine: 'postgresql',
  }
}

/** How the words are to be met: by the pages that hold them, rated or as listed, or, where none does, by likeness. */
async function chooseMeeting(db: EntityManager, words: string[]): Promise<'alike' | 'rated' | 'listed'> {
  const { text, values } = writeHolders(words, RATED_MAX + 1)
  const [row] = await db.query<{ holders: number }[]>(text, values)
  const holders = row?.holders ?? 0
  if (holders === 0) return 'alike'
  return holders <= RATED_MAX ? 'rated' : 'listed'
}

/** The overlap filter that the fewest ranges meet, if they are few. The database cannot tell: it reckons with an average filter. */
async function chooseGathering(db: EntityManager, overlaps: OverlapFilter[]): Promise<OverlapFilter | null> {
  if (overlaps.length === 0) return null
  const { text, values } = writeOverlapping(overlaps, GATHERED_MAX + 1)
  const [row] = await db.query<{ ranges: number[] }[]>(text, values)
  const counts = row?.ranges ?? []
  const fewest = Math.min(...counts)
  return fewest <= GATHERED_MAX ? (overlaps[counts.indexOf(fewest)] ?? null) : null
}

/** Names near to some words, the nearest first, one for each page. */
async function findNearest(db: EntityManager, words: string[]): Promise<SearchAnswer['nearest']> {
  return db.query<SearchAnswer['nearest']>(
    `select slug, scientific_name as "scientificName", name from (
       select distinct on (s.id) s.slug, s.scientific_name, n.name,
         word_similarity($1, n.normalised_name) as likeness, similarity($1, n.normalised_name) as sameness
       from find_similar_names($1, $2) n join species s on s.id = n.species_id
       order by s.id, likeness desc, sameness desc, n.ordinal
     ) near order by likeness desc, sameness desc, scientific_name limit $3`,
    [words.join(' '), OFFERED_LIKENESS, NEAREST_MAX],
  )
}
