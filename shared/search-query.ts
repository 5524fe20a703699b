import type { ZodError } from 'zod'
import { evidenceKindSchema } from './evidence.js'
import { parameterSchema, periodSchema, positionSchema } from './ranges.js'
import { SEARCH_PAGE_SIZE, searchQuerySchema, searchSortSchema } from './search.js'
import type { OverlapFilter, SearchQuery } from './search.js'

/** What a search asks when nothing is chosen. */
export const EMPTY_SEARCH: SearchQuery = {
  q: '',
  class: [],
  order: [],
  family: [],
  conservation: [],
  uvZone: [],
  evidenceKind: [],
  hasRanges: null,
  invented: null,
  overlaps: [],
  sort: 'best',
  cursor: null,
  limit: SEARCH_PAGE_SIZE,
}

/** The query parameters of a search, in the order in which an address names them. */
export const SEARCH_PARAMETERS = [
  'q',
  'class',
  'order',
  'family',
  'conservation',
  'uvZone',
  'evidenceKind',
  'hasRanges',
  'invented',
  'overlap',
  'sort',
  'cursor',
  'limit',
] as const
type SearchParameter = (typeof SEARCH_PARAMETERS)[number]

const REPEATABLE: ReadonlySet<string> = new Set<SearchParameter>([
  'class',
  'order',
  'family',
  'conservation',
  'uvZone',
  'evidenceKind',
  'overlap',
])

/** How often one parameter may be repeated. */
export const SEARCH_REPEATS_MAX = 40

const FLAG_WORDS = { yes: true, no: false } as const
const DECIMAL = /^-?\d{1,6}(\.\d{1,6})?$/

export interface SearchQueryError {
  path: string
  message: string
}

export type ParsedSearchQuery = { ok: true; query: SearchQuery } | { ok: false; errors: SearchQueryError[] }

/**
 * Writes an overlap filter as `<parameter>.<position>.<period>.<low>_<high>`, an open side left empty, numbers in the
 * parameter's canonical unit: `temperature.basking-surface.day.35_40`, `temperature.warm-hide.night._22`.
 */
export function writeOverlap({ parameter, position, period, low, high }: OverlapFilter): string {
  return `${parameter}.${position}.${period}.${writeNumber(low)}_${writeNumber(high)}`
}

/** Reads what `writeOverlap` writes. Gives a sentence that says what is wrong otherwise. */
export function readOverlap(text: string): OverlapFilter | string {
  const match = /^([a-z-]+)\.([a-z-]+)\.([a-z-]+)\.([^_]*)_([^_]*)$/.exec(text)
  if (match === null) return 'An overlap is written parameter.position.period.low_high.'
  const [, parameterText, positionText, periodText, lowText = '', highText = ''] = match
  const parameter = parameterSchema.safeParse(parameterText)
  if (!parameter.success) return 'The overlap names a parameter that does not exist.'
  const position = positionSchema.safeParse(positionText)
  if (!position.success) return 'The overlap names a position that does not exist.'
  const period = periodSchema.safeParse(periodText)
  if (!period.success) return 'The overlap names a period that does not exist.'
  if ([lowText, highText].some((side) => side !== '' && !DECIMAL.test(side))) {
    return 'The sides of an overlap are decimal numbers.'
  }
  const low = lowText === '' ? null : Number(lowText)
  const high = highText === '' ? null : Number(highText)
  if (low === null && high === null) return 'An overlap needs a low or a high side.'
  if (low !== null && high !== null && low > high) return 'The low side of an overlap is above its high side.'
  return { parameter: parameter.data, position: position.data, period: period.data, low, high }
}

/** Query parameters by name, as routers hand them over: one value, several, or none. */
export type QueryParameters = Readonly<
  Record<string, string | null | undefined | readonly (string | null | undefined)[]>
>

/** The search as query parameters, in a fixed order, with everything left out that is as in `EMPTY_SEARCH`. */
export function writeSearchQuery(query: SearchQuery): Record<string, string | string[]> {
  const written: Record<string, string | string[]> = {}
  const lists = {
    class: query.class,
    order: query.order,
    family: query.family,
    conservation: query.conservation,
    uvZone: query.uvZone.map(String),
    evidenceKind: query.evidenceKind,
  }
  if (query.q.trim() !== '') written.q = query.q.trim()
  for (const [name, values] of Object.entries(lists)) if (values.length > 0) written[name] = values
  if (query.hasRanges !== null) written.hasRanges = query.hasRanges ? 'yes' : 'no'
  if (query.invented !== null) written.invented = query.invented ? 'yes' : 'no'
  if (query.overlaps.length > 0) written.overlap = query.overlaps.map(writeOverlap)
  if (query.sort !== EMPTY_SEARCH.sort) written.sort = query.sort
  if (query.cursor !== null) written.cursor = query.cursor
  if (query.limit !== EMPTY_SEARCH.limit) written.limit = String(query.limit)
  return written
}

/** The search as the end of an address: empty, or a question mark and the parameters of `writeSearchQuery`. */
export function writeSearchString(query: SearchQuery): string {
  const pairs = Object.entries(writeSearchQuery(query)).flatMap(([name, values]) =>
    [values].flat().map((value) => `${name}=${encodeURIComponent(value)}`),
  )
  return pairs.length === 0 ? '' : `?${pairs.join('&')}`
}

/**
 * Reads a search from query parameters. Unknown parameters, repeated single ones and values outside the schema are
 * errors by path; a parameter given empty counts as not given, and a value given twice counts once.
 */
export function parseSearchQuery(parameters: QueryParameters): ParsedSearchQuery {
  const errors: SearchQueryError[] = []
  const known: ReadonlySet<string> = new Set(SEARCH_PARAMETERS)
  const given = new Map<string, string[]>()
  for (const [name, raw] of Object.entries(parameters)) {
    const values = [raw].flat().flatMap((value) => (value == null || value.trim() === '' ? [] : [value]))
    given.set(name, [...new Set(values)])
    if (!known.has(name)) errors.push({ path: name, message: 'There is no such parameter.' })
    else if (!REPEATABLE.has(name) && values.length > 1) {
      errors.push({ path: name, message: 'This parameter can be given once only.' })
    } else if (values.length > SEARCH_REPEATS_MAX) {
      errors.push({ path: name, message: `This parameter can be given ${SEARCH_REPEATS_MAX} times at most.` })
    }
  }

  const all = (name: SearchParameter): string[] => given.get(name) ?? []
  const one = (name: SearchParameter): string | null => all(name)[0] ?? null
  const flag = (name: SearchParameter): boolean | null => {
    const word = one(name)
    if (word === null) return null
    if (word === 'yes' || word === 'no') return FLAG_WORDS[word]
    errors.push({ path: name, message: 'This is yes or no.' })
    return null
  }
  const overlaps: OverlapFilter[] = []
  for (const text of all('overlap')) {
    const overlap = readOverlap(text)
    if (typeof overlap === 'string') errors.push({ path: 'overlap', message: overlap })
    else overlaps.push(overlap)
  }
  const hasRanges = flag('hasRanges')
  const invented = flag('invented')
  const limit = one('limit')
  if (limit !== null && !/^\d{1,4}$/.test(limit)) {
    errors.push({ path: 'limit', message: 'This is a whole number.' })
  }
  const zones = all('uvZone')
  if (zones.some((zone) => !/^[1-4]$/.test(zone))) {
    errors.push({ path: 'uvZone', message: 'A zone is 1, 2, 3 or 4.' })
  }
  const kinds = all('evidenceKind')
  if (kinds.some((kind) => !evidenceKindSchema.safeParse(kind).success)) {
    errors.push({ path: 'evidenceKind', message: 'There is no such kind of evidence.' })
  }
  const sort = one('sort')
  if (sort !== null && !searchSortSchema.safeParse(sort).success) {
    errors.push({ path: 'sort', message: `The order is one of ${searchSortSchema.options.join(', ')}.` })
  }
  if (errors.length > 0) return { ok: false, errors }

  const parsed = searchQuerySchema.safeParse({
    q: (one('q') ?? '').trim().replace(/\s+/g, ' '),
    class: all('class'),
    order: all('order'),
    family: all('family'),
    conservation: all('conservation'),
    uvZone: zones.map(Number),
    evidenceKind: kinds,
    hasRanges,
    invented,
    overlaps,
    sort: sort ?? EMPTY_SEARCH.sort,
    cursor: one('cursor'),
    limit: limit === null ? EMPTY_SEARCH.limit : Number(limit),
  })
  if (!parsed.success) return { ok: false, errors: toErrors(parsed.error) }
  return { ok: true, query: parsed.data }
}

function toErrors(error: ZodError): SearchQueryError[] {
  return error.issues.map((issue) => ({
    path: issue.path[0] === 'overlaps' ? 'overlap' : String(issue.path[0] ?? ''),
    message: issue.message,
  }))
}

/** At most six decimals, so that a bound converted from another unit stays readable. */
function writeNumber(value: number | null): string {
  return value === null ? '' : String(Math.round(value * 1e6) / 1e6 + 0)
}
