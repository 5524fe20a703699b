import type { OverlapFilter, SearchQuery } from '../../shared/search.js'
import type { SearchPlace } from './search-cursor.js'
import { SqlValues } from './sql-values.js'

/**
 * How alike (pg_trgm's word_similarity, 0 to 1) a name must be to words that no name holds, and which share of the most alike
 * one's likeness it must reach. Our policy, tried on the seeded names.
 */
const LIKENESS = { found: 0.45, shareOfBest: 0.8 }
const FACET_VALUES_MAX = 300
/** A word of fewer letters cannot be looked up in a trigram index. */
const TRIGRAM_LETTERS = 3
/** Shorter words are no sign of a scientific name. */
const EPITHET_LETTERS = 4

interface Statement {
  text: string
  values: unknown[]
}

export interface SearchPlan {
  query: SearchQuery
  words: string[]
  /**
   * How pages meet the words: `rated` and `listed` hold them all (put in order by likeness, or as in the listing), `alike`
   * have names like them, `none` where there are no words.
   */
  meeting: 'none' | 'rated' | 'listed' | 'alike'
  /** An overlap filter that few pages meet: they are gathered first. Null where the listing is walked until enough fit. */
  gatheredBy: OverlapFilter | null
  /** Where the answer goes on, or null for its beginning. */
  after: SearchPlace | null
  /** Whether to count the total and the facets too. */
  withCounts: boolean
}

/** A statement that counts the pages that hold the words, up to `most`. */
export function writeHolders(words: string[], most: number): Statement {
  const sql = new SqlValues()
  const held = writeHeld(sql, words).join(' and ')
  const text = `select count(*)::int as holders from (select from species s where ${held} limit ${sql.add(most)}) s`
  return { text, values: sql.values }
}

/** A statement that counts, for each overlap filter, the ranges that meet it, up to `most`. */
export function writeOverlapping(overlaps: OverlapFilter[], most: number): Statement {
  const sql = new SqlValues()
  const limit = sql.add(most)
  const counts = overlaps.map(
    (overlap) => `(select count(*)::int from (${selectOverlapping(sql, overlap)} limit ${limit}) r)`,
  )
  return { text: `select array[${counts.join(', ')}]::int[] as ranges`, values: sql.values }
}

/** One statement for a page of answers and, where asked, the total and the facets. */
export function writeSearch(plan: SearchPlan): Statement {
  const { query, words, meeting, gatheredBy, withCounts } = plan
  const sql = new SqlValues()
  const isScored = meeting === 'rated' || meeting === 'alike'
  const hits = isScored ? [writeHits(sql, words, meeting)] : []
  const gathering = isScored ? null : gatheredBy
  if (gathering !== null) {
    const ranges = selectOverlapping(sql, gathering)
    hits.push(`hit as materialized (select distinct species_id as id from (${ranges}) r)`)
  }
  const fixed = writeFixedFilters(
    sql,
    query.overlaps.filter((overlap) => overlap !== gathering),
    query.invented,
  )
  if (meeting === 'listed') fixed.push(...writeHeld(sql, words))
  const facetFilters = writeFacetFilters(sql, query)
  const from = hits.length > 0 ? 'species s join hit on hit.id = s.id' : 'species s'
  const parts = [...hits, writePage(sql, plan, from, [...fixed, ...Object.values(facetFilters)])]
  if (withCounts) parts.push(writeBase(from, fixed, facetFilters))
  return {
    text: `with ${parts.join(',\n')}
      select (select coalesce(json_agg(json_build_object('item', ${ITEM}, 'place', ${PLACE}) order by page.number), '[]')
          from page join species s on s.id = page.id) as found,
        ${withCounts ? writeCounts(facetFilters) : 'null::json'} as counts`,
    values: sql.values,
  }
}

const ITEM = `json_build_object(
  'id', s.id, 'slug', s.slug, 'scientificName', s.scientific_name, 'commonNames', s.common_names, 'class', s.class,
  'order', s."order", 'family', s.family, 'conservation', s.conservation, 'isInvented', s.is_invented,
  'rangeCount', s.range_count, 'physiologyCount', s.physiology_count, 'uvZone', s.uv_zone,
  'evidenceKinds', s.evidence_kinds, 'revisionNumber', s.revision_number,
  'updatedAt', to_char(s.updated_at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"'),
  'matchedName', page.matched_name)`

const PLACE = `json_build_object(
  'tier', page.tier::text, 'likeness', page.likeness::text, 'hasRanges', s.range_count > 0,
  'scientificName', s.scientific_name, 'id', s.id,
  'updatedAtMicros', (extract(epoch from s.updated_at) * 1000000)::bigint::text)`

/** That a page holds the words: each begins a word of one of its names. */
function writeHeld(sql: SqlValues, words: string[]): string[] {
  // Words all too short for the trigram index: the first must begin a name, which another index answers.
  const [first = '', ...others] = words
  const isShort = words.every((word) => word.length < TRIGRAM_LETTERS)
  const held = (isShort ? others : words).map((word) => `s.search ~ ${sql.add(`\\m${word}`)}`)
  if (isShort) {
    const beginning = sql.add(`${first}%`)
    held.push(`s.id in (select f.species_id from species_name f where f.normalised_name like ${beginning})`)
  }
  return held
}

/** The first name that holds one of the words, unless the scientific name does. */
function writeHolderName(sql: SqlValues, words: string[]): string {
  return `(select case when n.kind <> 'scientific' then n.name end from species_name n
    where n.species_id = s.id and n.normalised_name ~ ${sql.add(`\\m(${words.join('|')})`)}
    order by n.kind = 'scientific' desc, n.ordinal limit 1)`
}

/**
 * The pages that meet the words, each with its best name. `tier` says coarsely how well (a name that is exactly the words,
 * one that begins with them in their order, then likeness in tenths), `likeness` finely.
 */
function writeHits(sql: SqlValues, words: string[], meeting: 'rated' | 'alike'): string {
  const asked = sql.add(words.join(' '))
  const beginning = sql.add(`^${words.join('\\w*\\W+')}`)
  const epithet = meeting === 'alike' ? writeEpithet(words) : null
  const keepsEpithet =
    epithet === null ? 'false' : `n.kind <> 'common' and n.normalised_name ~ ${sql.add(epithet)}`
  const rated = `n.species_id as id, n.kind, n.name, n.ordinal,
    case when n.normalised_name = ${asked} then 2
      when ${words.length > 1} and n.normalised_name ~ ${beginning} then 1
      when ${keepsEpithet} then 1 else 0 end as place,
    round(word_similarity(${asked}, n.normalised_name)::numeric, 4) as word_likeness,
    round(similarity(${asked}, n.normalised_name)::numeric, 4) as likeness`
  const names =
    meeting === 'rated'
      ? `species s join species_name n on n.species_id = s.id where ${writeHeld(sql, words).join(' and ')}`
      : `(select * from find_similar_names(${asked}, ${sql.add(LIKENESS.found)})
          union select n.* from species_name n where ${keepsEpithet}) n`
  const near =
    meeting === 'rated'
      ? 'true'
      : `(place > 0 or word_likeness >= ${sql.add(LIKENESS.shareOfBest)} * (select max(word_likeness) from named))`
  return `named as materialized (select ${rated} from ${names}), hit as materialized (
    select distinct on (id) id, place + round(word_likeness, 1) as tier, likeness,
      case when kind <> 'scientific' then name end as matched_name
    from named where ${near}
    order by id, place desc, round(word_likeness, 1) desc, likeness desc, kind = 'scientific' desc, ordinal
  )`
}

/**
 * What a scientific name ends with that moved to another genus: the epithet stays, at most with another ending for the new
 * genus's gender (International Code of Zoological Nomenclature, articles 31.2 and 34.2; from memory). Null for other words.
 */
function writeEpithet(words: string[]): string | null {
  const [genus = '', epithet = '', ...more] = words
  if (more.length > 0 || genus.length < EPITHET_LETTERS || epithet.length < EPITHET_LETTERS) return null
  const stem = /^(.{4,}?)(us|um|a|is|e)$/.exec(epithet)?.[1] ?? epithet
  return `\\W${stem}(us|um|a|is|e)?$`
}

/** The filters that are no facets: real or invented, and overlaps of ranges, by the index on current ranges. */
function writeFixedFilters(sql: SqlValues, overlaps: OverlapFilter[], invented: boolean | null): string[] {
  const filters = overlaps.map((overlap) => writeOverlapFilter(sql, overlap))
  if (invented !== null) filters.push(`s.is_invented = ${sql.add(invented)}`)
  return filters
}

/**
 * A page overlaps where a range that answers for this position and period has a value in common with [low, high], ends
 * included. The projection holds a row for every question a range answers, so one look into its index is enough.
 */
function writeOverlapFilter(sql: SqlValues, overlap: OverlapFilter): string {
  return `s.id in (${selectOverlapping(sql, overlap)})`
}

function selectOverlapping(
  sql: SqlValues,
  { parameter, position, period, low, high }: OverlapFilter,
): string {
  return `select r.species_id from current_range r
    where r.parameter = ${sql.add(parameter)} and r.position = ${sql.add(position)} and r.period = ${sql.add(period)}
      and r.span && numrange(${sql.add(low)}::numeric, ${sql.add(high)}::numeric, '[]')`
}

const FACETS = {
  class: 's.class',
  order: 's."order"',
  family: 's.family',
  conservation: 's.conservation',
  uvZone: 's.uv_zone',
  evidenceKind: 's.evidence_kinds',
  hasRanges: 's.range_count > 0',
} as const
type Facet = keyof typeof FACETS

/** The choice made in each facet as a condition; a facet without one has no entry. */
function writeFacetFilters(sql: SqlValues, query: SearchQuery): Partial<Record<Facet, string>> {
  const filters: Partial<Record<Facet, string>> = {}
  for (const facet of ['class', 'order', 'family', 'conservation'] as const) {
    if (query[facet].length > 0) filters[facet] = `${FACETS[facet]} = any (${sql.add(query[facet])}::text[])`
  }
  if (query.uvZone.length > 0) filters.uvZone = `s.uv_zone = any (${sql.add(query.uvZone)}::smallint[])`
  if (query.evidenceKind.length > 0) {
    filters.evidenceKind = `s.evidence_kinds && ${sql.add(query.evidenceKind)}::text[]`
  }
  if (query.hasRanges !== null) filters.hasRanges = `(s.range_count > 0) = ${sql.add(query.hasRanges)}`
  return filters
}

/** The pages of one answer in order, one more than shown so that it is known whether others follow. */
function writePage(sql: SqlValues, plan: SearchPlan, from: string, filters: string[]): string {
  const { query, meeting, after } = plan
  const isScored = meeting === 'rated' || meeting === 'alike'
  const limit = sql.add(query.limit + 1)
  const matched = meeting === 'listed' ? writeHolderName(sql, plan.words) : 'null::text'
  const columns = isScored
    ? 's.id, hit.tier, hit.likeness, hit.matched_name'
    : `s.id, 0 as tier, 0 as likeness, ${matched} as matched_name`
  const select = (conditions: string[], order: string, walk = 0) => `
    select ${columns}, ${walk * 1000} + row_number() over (order by ${order}) as number
    from ${from} where ${['true', ...filters, ...conditions].join(' and ')} order by ${order} limit ${limit}`
  const byName = 's.scientific_name, s.id'
  const afterName = (place: SearchPlace) =>
    `(${byName}) > (${sql.add(place.scientificName)}, ${sql.add(place.id)}::uuid)`

  if (query.sort === 'name') return `page as (${select(after === null ? [] : [afterName(after)], byName)})`
  if (query.sort === 'newest') {
    const conditions: string[] = []
    if (after !== null) {
      const moment = `timestamptz 'epoch' + ${sql.add(after.updatedAtMicros)}::bigint * interval '1 microsecond'`
      const later = `s.id > ${sql.add(after.id)}::uuid`
      conditions.push(`s.updated_at <= ${moment} and (s.updated_at < ${moment} or ${later})`)
    }
    return `page as (${select(conditions, 's.updated_at desc, s.id')})`
  }
  if (isScored) {
    const order = '-hit.tier, (s.range_count = 0), -hit.likeness, s.scientific_name, s.id'
    const conditions: string[] = []
    if (after !== null) {
      conditions.push(`(${order}) > (-${sql.add(after.tier)}::numeric, ${sql.add(!after.hasRanges)}::boolean,
        -${sql.add(after.likeness)}::numeric, ${sql.add(after.scientificName)}, ${sql.add(after.id)}::uuid)`)
    }
    return `page as (${select(conditions, order)})`
  }
  // Two walks of the listing index, pages with ranges first: a single one could not begin in the middle.
  const half = (hasRanges: boolean) => [
    `(s.range_count > 0) = ${hasRanges}`,
    ...(after?.hasRanges === hasRanges ? [afterName(after)] : []),
  ]
  const walks: string[] = []
  if (after?.hasRanges !== false) walks.push(`(${select(half(true), byName, 0)})`)
  // A page without ranges overlaps nothing.
  if (query.overlaps.length === 0) walks.push(`(${select(half(false), byName, 1)})`)
  if (walks.length === 0) walks.push(`(${select(['false'], byName)})`)
  return `page as (select * from (${walks.join(' union all ')}) walk order by number limit ${limit})`
}

/** How many pages there are of each combination of values, with which facets' choices each combination meets. */
function writeBase(from: string, fixed: string[], filters: Partial<Record<Facet, string>>): string {
  const values = Object.entries(FACETS).map(([facet, column]) => `${column} as "${facet}"`)
  const met = Object.entries(filters).map(([facet, condition]) => `${condition} as "meets_${facet}"`)
  const columns = [...values, ...met]
  return `base as materialized (
    select ${columns.join(', ')}, count(*)::int as pages
    from ${from} where ${['true', ...fixed].join(' and ')} group by ${columns.map((_, index) => index + 1).join(', ')}
  )`
}

/** The total, and the values of each facet with their counts, the most frequent first. */
function writeCounts(filters: Partial<Record<Facet, string>>): string {
  const meets = (own: Facet | null) =>
    Object.keys(filters).flatMap((facet) => (facet === own ? [] : [`coalesce("meets_${facet}", false)`]))
  const facets = (Object.keys(FACETS) as Facet[]).map((facet) => {
    const value =
      facet === 'evidenceKind'
        ? 'unnest("evidenceKind")'
        : facet === 'hasRanges'
          ? `case when "hasRanges" then 'yes' else 'no' end`
          : `"${facet}"::text`
    return `'${facet}', (
      select coalesce(json_agg(json_build_object('value', value, 'count', count)), '[]') from (
        select value, sum(pages)::int as count
        from (select ${value} as value, pages from base where ${['true', ...meets(facet)].join(' and ')}) valued
        where value is not null group by value order by count desc, value limit ${FACET_VALUES_MAX}
      ) counted)`
  })
  return `json_build_object(
    'total', (select coalesce(sum(pages), 0)::int from base where ${['true', ...meets(null)].join(' and ')}),
    'facets', json_build_object(${facets.join(', ')}))`
}
