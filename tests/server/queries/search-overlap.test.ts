import type { DataSource } from 'typeorm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createDataSource } from '../../../server/data-source.js'
import { writeSearch } from '../../../server/queries/search-statement.js'
import { GATHERED_MAX, searchSpecies } from '../../../server/queries/search.js'
import { selectRanges } from '../../../shared/checker/selection.js'
import type { Parameter, Period, Position } from '../../../shared/ranges.js'
import { EMPTY_SEARCH } from '../../../shared/search-query.js'
import type { OverlapFilter } from '../../../shared/search.js'
import { createTestDatabase } from '../../helpers/database.js'
import type { TestDatabase } from '../../helpers/database.js'
import { makeClassificationItem, makeNameItem, makeRangeItem, publish } from '../../helpers/page-items.js'
import type { ItemOf } from '../../helpers/page-items.js'

type RangeContent = ItemOf<'range'>['row']

const POSITIONS: Position[] = ['basking-surface', 'warm-end-air', 'cool-hide', 'water', 'whole-enclosure']
const PERIODS: Period[] = ['day', 'night', 'any']
const PARAMETERS: Parameter[] = ['temperature', 'relative-humidity']

let database: TestDatabase
let dataSource: DataSource
const pages = new Map<string, RangeContent[]>()

/** Numbers in [0, 1) that are the same at each run (a linear congruential generator, Numerical Recipes' constants). */
function makeNumbers(seed: number): () => number {
  let state = seed
  return () => {
    state = (state * 1_664_525 + 1_013_904_223) % 2 ** 32
    return state / 2 ** 32
  }
}

beforeAll(async () => {
  database = await createTestDatabase()
  dataSource = await createDataSource(database.url).initialize()
  const next = makeNumbers(20_260_301)
  const pick = <T>(list: readonly T[]): T => list[Math.floor(next() * list.length)]!
  for (let count = 0; count < 40; count++) {
    const byKey = new Map<string, ItemOf<'range'>>()
    const rows = Math.floor(next() * 7)
    for (let row = 0; row < rows; row++) {
      const low = next() < 0.2 ? null : Math.round(next() * 60) / 2
      const high = next() < 0.2 ? null : (low ?? 10) + Math.round(next() * 20) / 2
      const parameter = pick(PARAMETERS)
      const part = {
        parameter,
        typedUnit: parameter === 'temperature' ? ('degC' as const) : ('percentRh' as const),
        position: pick(POSITIONS),
        period: pick(PERIODS),
        lifeStage: pick(['any', 'juvenile'] as const),
        low,
        high,
        upperLimit: low === null && high === null ? 50 : null,
      }
      byKey.set(`${part.parameter} ${part.position} ${part.period} ${part.lifeStage}`, makeRangeItem(part))
    }
    const name = makeNameItem()
    const ranges = [...byKey.values()]
    await publish(dataSource, [name, makeClassificationItem(), ...ranges])
    pages.set(
      name.row.name,
      ranges.map((range) => range.row),
    )
  }
})
afterAll(async () => {
  await dataSource.destroy()
  await database.drop()
})

/** Which ranges of a page some question about this position and period is judged by, as the checker selects them. */
function answering(ranges: RangeContent[], { parameter, position, period }: OverlapFilter): RangeContent[] {
  const periods = period === 'any' ? (['day', 'night'] as const) : [period]
  const questions = periods.flatMap((asked) =>
    (['juvenile', 'adult'] as const).map((lifeStage) => ({
      parameter,
      position,
      period: asked,
      season: 'active' as const,
      lifeStage,
      uvMeaning: null,
    })),
  )
  const rows = ranges.map((row) => ({ row }))
  return questions.flatMap((asked) => selectRanges(rows, asked).judged.map(({ row }) => row))
}

function overlaps(range: RangeContent, { low, high }: OverlapFilter): boolean {
  if (range.low === null && range.high === null) return false
  return (range.low ?? -Infinity) <= (high ?? Infinity) && (range.high ?? Infinity) >= (low ?? -Infinity)
}

const search = async (filters: OverlapFilter[]) => {
  const answer = await searchSpecies(dataSource.manager, { ...EMPTY_SEARCH, overlaps: filters, limit: 100 })
  expect(answer.total).toBe(answer.items.length)
  return answer.items.map((item) => item.scientificName).sort()
}

const expected = (filters: OverlapFilter[]) =>
  [...pages]
    .filter(([, ranges]) =>
      filters.every((filter) => answering(ranges, filter).some((range) => overlaps(range, filter))),
    )
    .map(([name]) => name)
    .sort()

describe('an overlap filter', () => {
  const spans: [number | null, number | null][] = [
    [10, 15],
    [15, 15],
    [null, 8],
    [28.5, null],
  ]
  for (const parameter of PARAMETERS) {
    for (const position of POSITIONS) {
      for (const period of PERIODS) {
        it(`finds the pages whose ranges overlap: ${parameter} at ${position}, ${period}`, async () => {
          for (const [low, high] of spans) {
            const filters = [{ parameter, position, period, low, high }]
            expect(await search(filters)).toEqual(expected(filters))
          }
        })
      }
    }
  }

  it('holds together with another one', async () => {
    const filters: OverlapFilter[] = [
      { parameter: 'temperature', position: 'warm-end-air', period: 'any', low: 5, high: 25 },
      { parameter: 'relative-humidity', position: 'cool-hide', period: 'any', low: 5, high: 30 },
    ]
    expect(expected(filters).length).toBeGreaterThan(0)
    expect(await search(filters)).toEqual(expected(filters))
  })

  it('counts an end that only touches as an overlap', async () => {
    const name = makeNameItem()
    const range = makeRangeItem({ position: 'humid-hide', low: 21.1, high: 26.7 })
    await publish(dataSource, [name, makeClassificationItem(), range])
    const at = async (low: number, high: number) =>
      (
        await search([{ parameter: 'temperature', position: 'humid-hide', period: 'day', low, high }])
      ).includes(name.row.name)
    expect(await at(26.7, 30)).toBe(true)
    expect(await at(10, 21.1)).toBe(true)
    expect(await at(26.71, 30)).toBe(false)
  })
})

describe('the statement of a search', () => {
  it('looks overlaps up in the index on current ranges and never reads all of them', async () => {
    const owner = await createDataSource(database.ownerUrl).initialize()
    await owner.query(`
      insert into species (id, slug, is_invented, revision_number, updated_at, scientific_name, common_names, class,
        range_count, physiology_count, evidence_kinds, search)
      select gen_random_uuid(), 'bulk-' || i, true, 1, now(), 'Bulkus numero' || i, '{}', 'Reptilia', i % 2, 0, '{}', 'bulkus'
      from generate_series(1, 20000) i;
      insert into current_range (species_id, item_id, position, period, parameter, stated_position, stated_period, season,
        life_stage, low, high, span)
      select id, gen_random_uuid(), position, period, 'temperature', position, period, 'any', 'any', 20, 30,
        numrange(low, low + 4, '[]')
      from (select id, (substr(slug, 6)::int % 400) / 10.0 as low from species where slug like 'bulk-%' and range_count > 0) bulk,
        (values ('basking-surface'), ('cool-hide')) p (position), (values ('day'), ('night')) q (period);
      analyze species; analyze current_range;
    `)
    const few: OverlapFilter = {
      parameter: 'temperature',
      position: 'cool-hide',
      period: 'night',
      low: 43,
      high: null,
    }
    const many: OverlapFilter = { ...few, low: 0 }
    const explain = async (overlap: OverlapFilter, gathers: boolean, withCounts: boolean) => {
      const query = { ...EMPTY_SEARCH, overlaps: [overlap] }
      const gatheredBy = gathers ? overlap : null
      const { text, values } = writeSearch({
        query,
        words: [],
        meeting: 'none',
        gatheredBy,
        after: null,
        withCounts,
      })
      const plan = await owner.query<{ 'QUERY PLAN': string }[]>(`explain ${text}`, values)
      return plan.map((row) => row['QUERY PLAN']).join('\n')
    }
    // Where few pages overlap, the index finds them and nothing else is read.
    for (const withCounts of [true, false]) {
      const gathered = await explain(few, true, withCounts)
      expect(gathered).toContain('current_range_span_idx')
      expect(gathered).not.toMatch(/Seq Scan on current_range/)
      expect(gathered).not.toContain('species_listing_idx')
    }
    // Where nearly every page overlaps, the first twenty of the listing are looked at one by one.
    const walked = await explain(many, false, false)
    expect(walked).toMatch(/current_range_(span|species)_idx/)
    expect(walked).not.toMatch(/Seq Scan on current_range/)

    const find = async (overlap: OverlapFilter, gathers: boolean) => {
      const query = { ...EMPTY_SEARCH, overlaps: [overlap] }
      const gatheredBy = gathers ? overlap : null
      const plan = { query, words: [], meeting: 'none' as const, gatheredBy, after: null, withCounts: true }
      const { text, values } = writeSearch(plan)
      const [answer] = await owner.query<{ found: unknown[]; counts: { total: number } }[]>(text, values)
      return answer!
    }
    const gathered = await find(few, true)
    expect(gathered.found).toHaveLength(EMPTY_SEARCH.limit + 1)
    expect(gathered).toEqual(await find(few, false))
    expect(gathered.counts.total).toBeLessThan(GATHERED_MAX)
    const all = await searchSpecies(owner.manager, { ...EMPTY_SEARCH, overlaps: [many] })
    expect(all.total).toBeGreaterThan(GATHERED_MAX)
    expect(all.items).toHaveLength(EMPTY_SEARCH.limit)
    await owner.destroy()
  })
})
