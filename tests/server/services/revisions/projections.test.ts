import fc from 'fast-check'
import type { DataSource } from 'typeorm'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { selectRanges, type Asked } from '../../../../shared/checker/selection.js'
import {
  lifeStageSchema,
  periodSchema,
  positionSchema,
  seasonSchema,
  type Position,
} from '../../../../shared/ranges.js'
import type { PageItem } from '../../../../shared/revisions.js'
import { createDataSource } from '../../../../server/data-source.js'
import { rebuildProjections } from '../../../../server/services/revisions/projections.js'
import { createTestDatabase, type TestDatabase } from '../../../helpers/database.js'
import {
  addDatasetVersion,
  addSource,
  makeClassificationItem,
  makeDatasetItem,
  makeEvidenceItem,
  makeNameItem,
  makeProseItem,
  makeRangeItem,
  makeRecord,
  publish,
  type ItemOf,
} from '../../../helpers/page-items.js'

let database: TestDatabase
let dataSource: DataSource
let guideline: string
let study: string

beforeAll(async () => {
  database = await createTestDatabase()
  dataSource = await createDataSource(database.url).initialize()
  guideline = await addSource(dataSource)
  study = await addSource(dataSource)
  await addDatasetVersion(dataSource.manager, 'test-set')
})

afterAll(async () => {
  await dataSource.destroy()
  await database.drop()
})

async function readProjections(): Promise<Record<string, unknown[]>> {
  const tables = [
    'species',
    'species_slug',
    'species_name',
    'current_page',
    'current_range',
    'current_citation',
  ]
  const rows = await Promise.all(
    tables.map((table) => dataSource.query(`select * from ${table} row order by row::text`)),
  )
  return Object.fromEntries(tables.map((table, index) => [table, rows[index]]))
}

async function readSpecies(speciesId: string): Promise<Record<string, unknown>> {
  const [row] = await dataSource.query('select * from species where id = $1', [speciesId])
  return row
}

async function publishFullPage() {
  const day = makeRangeItem({ note: 'day' })
  const night = makeRangeItem({ period: 'night', low: 18, high: 22 })
  const uv = makeRangeItem({
    parameter: 'uv-index',
    typedUnit: 'uvi',
    low: 1,
    high: 3,
    uvMeaning: 'typical',
    uvZone: 3,
  })
  const { item, recordSet } = makeDatasetItem('test-set', [
    makeRecord({ sourceId: study }),
    makeRecord({ sourceId: study, meanC: 40 }),
    makeRecord({ sourceId: null, quantity: 'field-body-temperature' }),
    makeRecord({ sourceId: study, quantity: 'optimum-temperature' }),
  ])
  const items: PageItem[] = [
    makeNameItem(),
    makeNameItem({ kind: 'synonym', name: 'Lacerta  Éxempla' }),
    makeNameItem({ kind: 'common', name: 'second lizard' }),
    makeNameItem({ kind: 'common', name: 'a lizard' }),
    makeClassificationItem({ conservation: 'Least Concern' }),
    day,
    night,
    uv,
    makeEvidenceItem(day.itemId, guideline),
    makeEvidenceItem(day.itemId, guideline, { locator: 'p. 13' }),
    makeEvidenceItem(night.itemId, study, { kind: 'field-site' }),
    item,
    makeProseItem(`Read [@${guideline}].`),
  ]
  return publish(dataSource, items, { recordSets: [recordSet] })
}

describe('the projections of a page', () => {
  test('sum up its current revision', async () => {
    const { speciesId } = await publishFullPage()
    expect(await readSpecies(speciesId)).toMatchObject({
      common_names: ['second lizard', 'a lizard'],
      class: 'Reptilia',
      order: 'Squamata',
      family: 'Testidae',
      conservation: 'Least Concern',
      range_count: 3,
      physiology_count: 4,
      uv_zone: 3,
      evidence_kinds: ['field-body-temperature', 'field-site', 'guideline', 'tolerance-limit'],
      revision_number: 1,
    })
    const citations = await dataSource.query(
      'select source_id, ranges, physiology from current_citation where species_id = $1 order by ranges, physiology',
      [speciesId],
    )
    expect(citations).toHaveLength(2)
    expect(citations).toContainEqual({ source_id: guideline, ranges: 1, physiology: 0 })
    expect(citations).toContainEqual({ source_id: study, ranges: 1, physiology: 3 })
  })

  test('hold names without case, accents and doubled spaces for the search', async () => {
    const { speciesId } = await publishFullPage()
    const names: { normalised_name: string }[] = await dataSource.query(
      `select normalised_name from species_name where species_id = $1 and kind = 'synonym'`,
      [speciesId],
    )
    expect(names).toEqual([{ normalised_name: 'lacerta exempla' }])
  })

  test('follow the next revision, and forget what it no longer has', async () => {
    const name = makeNameItem()
    const range = makeRangeItem({ uvZone: 2 })
    const first = await publish(dataSource, [
      name,
      makeClassificationItem(),
      range,
      makeEvidenceItem(range.itemId, study),
    ])
    await publish(dataSource, [name], { species: { id: first.speciesId }, baseRevisionId: first.revisionId })
    expect(await readSpecies(first.speciesId)).toMatchObject({
      class: '',
      range_count: 0,
      uv_zone: null,
      evidence_kinds: [],
      revision_number: 2,
    })
    for (const table of ['current_range', 'current_citation']) {
      expect(
        await dataSource.query(`select * from ${table} where species_id = $1`, [first.speciesId]),
      ).toEqual([])
    }
  })

  test('are the same when they are all rebuilt from the revisions', async () => {
    const first = await publishFullPage()
    await publishFullPage()
    await publish(dataSource, [makeNameItem(), makeRangeItem({ position: 'whole-enclosure', period: 'any' })])
    const name = makeNameItem()
    const other = await publish(dataSource, [name, makeRangeItem()])
    await publish(dataSource, [name], { species: { id: other.speciesId }, baseRevisionId: other.revisionId })
    const published = await readProjections()

    const owner = await createDataSource(database.ownerUrl).initialize()
    await owner.query(
      'delete from species_name; delete from current_page; delete from current_range; delete from current_citation',
    )
    await owner.query(`update species set scientific_name = 'x', common_names = '{}', class = '', range_count = 9,
      evidence_kinds = '{}', search = '', uv_zone = 1, physiology_count = 0`)
    await owner.destroy()
    await dataSource.transaction(rebuildProjections)
    expect(await readProjections()).toEqual(published)
    expect((await readSpecies(first.speciesId))['range_count']).toBe(3)
  })
})

describe('current ranges', () => {
  const seasons = seasonSchema.exclude(['any']).options
  const lifeStages = lifeStageSchema.exclude(['any']).options
  const positions: Position[] = ['warm-end-air', 'cool-hide', 'basking-surface', 'water', 'whole-enclosure']

  /** By the checker's own rule: the ranges that answer a position and period for some season and life stage. */
  function chooseByChecker(
    ranges: ItemOf<'range'>[],
    position: Position,
    periods: ('day' | 'night')[],
  ): Set<string> {
    const questions: Asked[] = periods.flatMap((period) =>
      seasons.flatMap((season) =>
        lifeStages.map((lifeStage) => ({
          parameter: 'temperature' as const,
          position,
          period,
          season,
          lifeStage,
          uvMeaning: null,
        })),
      ),
    )
    return new Set(
      questions.flatMap((asked) => selectRanges(ranges, asked).judged.map(({ itemId }) => itemId)),
    )
  }

  const keysArbitrary = fc.record({
    position: fc.constantFrom(...positions),
    period: fc.constantFrom(...periodSchema.options),
    season: fc.constantFrom('active' as const, 'brumation' as const, 'any' as const),
    lifeStage: fc.constantFrom('egg' as const, 'juvenile' as const, 'adult' as const, 'any' as const),
  })

  test('answer each question of position and period with every range the checker would judge by', async () => {
    await fc.assert(
      fc.asyncProperty(
        fc.uniqueArray(keysArbitrary, { selector: (keys) => JSON.stringify(keys), maxLength: 12 }),
        async (keys) => {
          const ranges = keys.map((part) => makeRangeItem(part))
          const { speciesId } = await publish(dataSource, [makeNameItem(), ...ranges])
          const answers: { position: Position; period: string; item_id: string }[] = await dataSource.query(
            'select position, period, item_id from current_range where species_id = $1',
            [speciesId],
          )
          for (const position of positionSchema.options) {
            for (const [period, periods] of [
              ['day', ['day']],
              ['night', ['night']],
              ['any', ['day', 'night']],
            ] as const) {
              const answering = answers.filter((row) => row.position === position && row.period === period)
              const chosen = chooseByChecker(ranges, position, [...periods])
              const found = new Set(answering.map((row) => row.item_id))
              // A range that several others hide only together may stand here too; one that answers is never missing.
              expect([...chosen].filter((id) => !found.has(id))).toEqual([])
            }
          }
        },
      ),
      { numRuns: 60 },
    )
  })

  test('leave out a range that another hides wherever it could answer', async () => {
    const anyPeriod = makeRangeItem({ position: 'warm-end-air', period: 'any' })
    const day = makeRangeItem({ position: 'warm-end-air', period: 'day' })
    const whole = makeRangeItem({ position: 'whole-enclosure', period: 'any' })
    const { speciesId } = await publish(dataSource, [makeNameItem(), anyPeriod, day, whole])
    const answers = await dataSource.query(
      `select period, item_id from current_range where species_id = $1 and position = 'warm-end-air' order by period, item_id`,
      [speciesId],
    )
    const both = [anyPeriod.itemId, day.itemId].sort()
    expect(answers).toEqual([
      ...both.map((itemId) => ({ period: 'any', item_id: itemId })),
      { period: 'day', item_id: day.itemId },
      { period: 'night', item_id: anyPeriod.itemId },
    ])
  })

  test('touch where one ends on the very number another begins with, in any unit it was typed in', async () => {
    const eightyFahrenheit = (80 - 32) / 1.8
    const { speciesId } = await publish(dataSource, [
      makeNameItem(),
      makeRangeItem({ low: eightyFahrenheit, high: null }),
    ])
    const met = await dataSource.query(
      `select distinct species_id from current_range where species_id = $1 and span && numrange(null, $2::numeric, '[]')`,
      [speciesId, String(eightyFahrenheit)],
    )
    expect(met).toHaveLength(1)
  })

  test('with limits alone have no span, so that no overlap is claimed', async () => {
    const { speciesId } = await publish(dataSource, [
      makeNameItem(),
      makeRangeItem({ low: null, high: null, upperLimit: 45 }),
    ])
    const spans = await dataSource.query('select distinct span from current_range where species_id = $1', [
      speciesId,
    ])
    expect(spans).toEqual([{ span: null }])
  })

  test('are found by overlap through the index on their keys and span, among 100,000', async () => {
    const owner = await createDataSource(database.ownerUrl).initialize()
    // Filling a table is faster without its index; the same one is made again after.
    const [index] = await owner.query(
      `select pg_get_indexdef('current_range_span_idx'::regclass) as definition`,
    )
    await owner.query('drop index current_range_span_idx')
    await owner.query(`
      with page as (
        insert into species (slug, is_invented, revision_number, updated_at, scientific_name, common_names, class, range_count,
          physiology_count, evidence_kinds, search)
        select 'many-' || n, true, 1, now(), 'Many ' || n, '{}', '', 1, 0, '{}', '' from generate_series(1, 10000) n
        returning id
      )
      insert into current_range (species_id, item_id, position, period, parameter, stated_position, stated_period, season,
        life_stage, low, high, span)
      select page.id, gen_random_uuid(), place.name, 'day', 'temperature', place.name, 'day', 'any', 'any', low, low + 3,
        numrange(low::numeric, low::numeric + 3, '[]')
      from page
      cross join unnest(array['basking-surface', 'basking-air', 'warm-end-air', 'warm-hide', 'cool-end-air', 'cool-hide',
        'humid-hide', 'shade', 'substrate', 'water']) place (name)
      cross join lateral (select 15 + random() * 30 as low where page.id is not null) spot`)
    await owner.query(index.definition)
    await owner.query('analyze current_range')
    await owner.destroy()
    const [{ count }] = await dataSource.query('select count(*)::int as count from current_range')
    expect(count).toBeGreaterThanOrEqual(100_000)
    const plan: { 'QUERY PLAN': string }[] = await dataSource.query(`
      explain select distinct species_id from current_range
      where parameter = 'temperature' and position = 'basking-surface' and period = 'day'
        and span && numrange(39.9, 40.1, '[]')`)
    const text = plan.map((line) => line['QUERY PLAN']).join('\n')
    expect(text).toContain('current_range_span_idx')
    expect(text).not.toContain('Seq Scan')
  }, 240_000)
})
