import { randomUUID } from 'node:crypto'
import { Client, type PoolClient } from 'pg'
import type { DataSource } from 'typeorm'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import type { PageItem } from '../../../../shared/revisions.js'
import { createDataSource } from '../../../../server/data-source.js'
import { Conflict, InvalidInput, NotFound } from '../../../../server/errors.js'
import { findSpeciesPage } from '../../../../server/queries/species.js'
import { publishRevision, type PublishInput } from '../../../../server/services/revisions/publish-revision.js'
import { findSiteEpoch } from '../../../../server/services/site-epoch.js'
import { createTestDatabase, type TestDatabase } from '../../../helpers/database.js'
import { countStatements } from '../../../helpers/statements.js'
import {
  addDatasetVersion,
  addSource,
  makeClassificationItem,
  makeDatasetItem,
  makeEvidenceItem,
  makeName,
  makeNameItem,
  makeProseItem,
  makeRangeItem,
  makeRecord,
  publish,
  PUBLISHED_AT,
} from '../../../helpers/page-items.js'

let database: TestDatabase
let dataSource: DataSource
let sourceId: string

beforeAll(async () => {
  database = await createTestDatabase()
  dataSource = await createDataSource(database.url).initialize()
  sourceId = await addSource(dataSource)
  await addDatasetVersion(dataSource.manager, 'test-set')
})

afterAll(async () => {
  await dataSource.destroy()
  await database.drop()
})

async function countRows(table: string): Promise<number> {
  const [row]: { count: number }[] = await dataSource.query(`select count(*)::int as count from ${table}`)
  return row?.count ?? -1
}

/** A page with one item of nearly every kind. */
function makePage() {
  const range = makeRangeItem()
  const { item, recordSet } = makeDatasetItem('test-set', [makeRecord({ sourceId })])
  const items: PageItem[] = [
    makeNameItem(),
    makeNameItem({ kind: 'common', name: 'test lizard', language: 'en' }),
    makeClassificationItem(),
    range,
    makeEvidenceItem(range.itemId, sourceId),
    item,
    makeProseItem(`Warm, says [@${sourceId}, p. 3].`),
  ]
  return { items, recordSets: [recordSet], range }
}

describe('publishing a new page', () => {
  test('gives a page that reads back as it was published, under the slug of its name', async () => {
    const { items, recordSets } = makePage()
    const name = makeName()
    items[0] = makeNameItem({ name })
    const published = await publish(dataSource, items, { recordSets, summary: 'The first words.' })
    expect(published).toMatchObject({ number: 1, slug: name.toLowerCase().replace(' ', '-') })

    const page = await findSpeciesPage(dataSource.manager, published.slug, null)
    expect(page?.species).toEqual({
      id: published.speciesId,
      slug: published.slug,
      scientificName: name,
      isInvented: true,
    })
    expect(page?.revision).toEqual({
      id: published.revisionId,
      number: 1,
      publishedAt: '2026-03-01T10:20:30.456Z',
      summary: 'The first words.',
      broughtBy: { form: 'demonstration' },
    })
    const [scientific, common, classification, range, evidence, physiology, prose] = items
    expect(page?.names).toEqual(
      [scientific, common].map((item) => ({ itemId: item?.itemId, row: item?.row })),
    )
    expect(page?.classification).toEqual({ itemId: classification?.itemId, row: classification?.row })
    expect(page?.ranges).toEqual([
      {
        itemId: range?.itemId,
        row: range?.row,
        evidence: [{ itemId: evidence?.itemId, row: evidence?.row }],
      },
    ])
    expect(page?.physiology[0]).toMatchObject({ itemId: physiology?.itemId, row: physiology?.row })
    expect(page?.physiology[0]?.studies).toHaveLength(1)
    expect(page?.prose).toEqual([{ itemId: prose?.itemId, row: prose?.row }])
    expect(Object.keys(page?.sources ?? {})).toEqual([sourceId])
  })

  test('is refused where another page has the name', async () => {
    const name = makeName()
    await publish(dataSource, [makeNameItem({ name })])
    const again = publish(dataSource, [makeNameItem({ name: name.toUpperCase() })])
    await expect(again).rejects.toThrow(Conflict)
  })

  test('needs a transaction', async () => {
    const outside = publishRevision(dataSource.manager, {} as PublishInput)
    await expect(outside).rejects.toThrow('publishRevision needs a transaction')
  })
})

describe('publishing on a page', () => {
  test('shares the rows that did not change and keeps the old revision as it was', async () => {
    const { items, recordSets, range } = makePage()
    const first = await publish(dataSource, items, { recordSets })
    const before = await countRows('range_row')
    const evidenceBefore = await countRows('evidence_row')
    const wider = { ...range, row: { ...range.row, high: 42 } }
    const second = await publish(
      dataSource,
      items.map((item) => (item === range ? wider : item)),
      { species: { id: first.speciesId }, baseRevisionId: first.revisionId },
    )
    expect(second).toMatchObject({ number: 2, speciesId: first.speciesId })
    expect(await countRows('range_row')).toBe(before + 1)
    expect(await countRows('evidence_row')).toBe(evidenceBefore)

    const now = await findSpeciesPage(dataSource.manager, first.slug, null)
    const then = await findSpeciesPage(dataSource.manager, first.slug, 1)
    expect(now?.ranges[0]).toMatchObject({ itemId: range.itemId, row: { high: 42 } })
    expect(then?.ranges[0]).toMatchObject({ itemId: range.itemId, row: { high: 40 } })
    expect(then?.currentRevisionNumber).toBe(2)
    expect(now?.history.map((mark) => mark.number)).toEqual([2, 1])
  })

  test('moves the slug with the name, and the old slug still leads to the page', async () => {
    const name = makeNameItem()
    const first = await publish(dataSource, [name])
    const renamed = { ...name, row: { ...name.row, name: makeName() } }
    const second = await publish(dataSource, [renamed], {
      species: { id: first.speciesId },
      baseRevisionId: first.revisionId,
    })
    expect(second.slug).not.toBe(first.slug)
    const byOldSlug = await findSpeciesPage(dataSource.manager, first.slug, null)
    expect(byOldSlug?.species).toMatchObject({ slug: second.slug, scientificName: renamed.row.name })
    await expect(publish(dataSource, [makeNameItem({ name: name.row.name })])).rejects.toThrow(Conflict)
  })

  test('is refused where the base is no longer current, and where the page does not exist', async () => {
    const name = makeNameItem()
    const first = await publish(dataSource, [name])
    const onFirst = { species: { id: first.speciesId }, baseRevisionId: first.revisionId }
    await publish(dataSource, [name], onFirst)
    await expect(publish(dataSource, [name], onFirst)).rejects.toThrow(Conflict)
    await expect(publish(dataSource, [name], { species: { id: first.speciesId } })).rejects.toThrow(Conflict)
    await expect(publish(dataSource, [name], { species: { id: randomUUID() } })).rejects.toThrow(NotFound)
  })

  test('by two at once publishes one and refuses the other', async () => {
    const name = makeNameItem()
    const first = await publish(dataSource, [name])
    const attempts = await Promise.allSettled(
      ['one', 'other'].map((summary) =>
        publish(dataSource, [name], {
          species: { id: first.speciesId },
          baseRevisionId: first.revisionId,
          summary,
        }),
      ),
    )
    expect(attempts.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected'])
    const refused = attempts.find((attempt) => attempt.status === 'rejected')
    expect(refused?.reason).toBeInstanceOf(Conflict)
    const page = await findSpeciesPage(dataSource.manager, first.slug, null)
    expect(page?.currentRevisionNumber).toBe(2)
  })

  test('of one new name by two at once makes one page', async () => {
    const name = makeName()
    const attempts = await Promise.allSettled([1, 2].map(() => publish(dataSource, [makeNameItem({ name })])))
    expect(attempts.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected'])
  })
})

describe('an interrupted publishing', () => {
  const tables = [
    'species',
    'species_slug',
    'revision',
    'revision_item',
    'range_row',
    'evidence_row',
    'name_row',
  ]
  const later = [
    'record_set',
    'physiology_record',
    'species_name',
    'current_range',
    'current_citation',
    'site_epoch',
  ]

  async function readEverything(): Promise<string> {
    const counts = await Promise.all([...tables, ...later].map(countRows))
    return JSON.stringify([counts, await findSiteEpoch(dataSource.manager)])
  }

  /** Ends a connection from the database's side, as a crash of the server or of the database does. */
  async function endConnection(client: PoolClient): Promise<void> {
    const { processID } = client as unknown as { processID: number }
    await dataSource.query('select pg_terminate_backend($1, 5000)', [processID])
  }

  /** Publishes a page over a connection that breaks after some statements; says whether it broke. */
  async function publishUntil(statements: number): Promise<boolean> {
    const page = makePage()
    const run = dataSource.createQueryRunner()
    await run.startTransaction()
    const cut = countStatements(run, async (count, client) => {
      if (count === statements) await endConnection(client)
    })
    const attempt = publishRevision(run.manager, {
      species: { isInvented: true },
      baseRevisionId: null,
      items: page.items,
      recordSets: page.recordSets,
      summary: 'Perhaps cut off.',
      broughtBy: { form: 'demonstration' },
      publishedAt: PUBLISHED_AT,
    })
    const isBroken = await attempt
      .then(() => run.commitTransaction())
      .then(
        () => false,
        () => true,
      )
    cut.restore()
    await run.release()
    return isBroken
  }

  test('leaves nothing behind, whichever statement was the last', async () => {
    const before = await readEverything()
    let statements = 1
    while (await publishUntil(statements)) {
      expect(await readEverything()).toBe(before)
      statements += 1
    }
    expect(statements).toBeGreaterThan(5)
    expect(await readEverything()).not.toBe(before)
  })
})

describe('the cost of publishing', () => {
  async function countPublishing(ranges: number, revisions: number): Promise<number> {
    const items: PageItem[] = [makeNameItem(), makeClassificationItem()]
    for (let index = 0; index < ranges; index += 1) {
      const range = makeRangeItem({
        note: `range ${index}`,
        parameter: 'temperature',
        low: index,
        high: index + 1,
      })
      range.row.position = index % 2 === 0 ? 'warm-end-air' : 'cool-end-air'
      range.row.lifeStage = ['egg', 'larva', 'juvenile', 'adult', 'any'][index % 5] as 'egg'
      range.row.season = ['active', 'brumation', 'aestivation', 'any'][Math.floor(index / 10)] as 'active'
      items.push(range, makeEvidenceItem(range.itemId, sourceId, { note: `for range ${index}` }))
    }
    const { item, recordSet } = makeDatasetItem('test-set', [makeRecord({ sourceId })])
    items.push(item)
    let last = await publish(dataSource, items, { recordSets: [recordSet] })
    for (let index = 1; index < revisions; index += 1) {
      last = await publish(dataSource, items, {
        species: { id: last.speciesId },
        baseRevisionId: last.revisionId,
      })
    }
    return dataSource.transaction(async (db) => {
      if (db.queryRunner === undefined) throw new Error('A transaction has a query runner')
      const counter = countStatements(db.queryRunner)
      const changed = items.map((old) =>
        old.kind === 'range' ? { ...old, row: { ...old.row, note: 'changed' } } : old,
      )
      const fresh = makeDatasetItem('test-set', [makeRecord(), makeRecord()])
      await publishRevision(db, {
        species: { id: last.speciesId },
        baseRevisionId: last.revisionId,
        items: [
          ...changed.filter((kept) => kept.kind !== 'physiology'),
          { ...fresh.item, itemId: item.itemId },
        ],
        recordSets: [fresh.recordSet],
        summary: 'Forty ranges change.',
        broughtBy: { form: 'demonstration' },
        publishedAt: PUBLISHED_AT,
      })
      counter.restore()
      return counter.count()
    })
  }

  test('is at most 12 statements for a page of 40 ranges, however many ranges or revisions there are', async () => {
    const forty = await countPublishing(40, 1)
    expect(forty).toBeLessThanOrEqual(12)
    expect(await countPublishing(1, 1)).toBe(forty)
    expect(await countPublishing(40, 20)).toBe(forty)
  })
})

describe('content that contradicts itself', () => {
  const range = makeRangeItem()
  const name = makeNameItem()
  const stranger = randomUUID()

  async function findErrors(items: unknown[], part: Partial<PublishInput> = {}): Promise<string[]> {
    const error: unknown = await publish(dataSource, items as PageItem[], part).catch(
      (reason: unknown) => reason,
    )
    expect(error).toBeInstanceOf(InvalidInput)
    return (error as InvalidInput).errors?.map(({ path }) => path) ?? []
  }

  test.each<[string, unknown[], string[]]>([
    ['no scientific name', [makeNameItem({ kind: 'common' })], ['items']],
    ['two scientific names', [makeNameItem(), makeNameItem()], ['items']],
    ['two classifications', [name, makeClassificationItem(), makeClassificationItem()], ['items']],
    ['two ranges with the same keys', [name, range, makeRangeItem({ low: 1 })], ['items.2.row']],
    ['a low end above the high end', [name, makeRangeItem({ low: 41 })], ['items.1.row.low']],
    ['evidence without a range', [name, makeEvidenceItem(stranger, stranger)], ['items.1.parentItemId']],
    ['evidence under a name', [name, makeEvidenceItem(name.itemId, stranger)], ['items.1.parentItemId']],
    [
      'a range under a range',
      [name, range, { ...makeRangeItem({ period: 'night' }), parentItemId: range.itemId }],
      ['items.2.parentItemId'],
    ],
    [
      'one item twice',
      [name, range, { ...range, row: { ...range.row, period: 'night' } }],
      ['items.2.itemId'],
    ],
    ['a field that no row has', [name, { ...range, row: { ...range.row, colour: 'red' } }], ['items.1.row']],
    ['a word for a number', [name, { ...range, row: { ...range.row, low: '35' } }], ['items.1.row.low']],
    ['a zone outside 1 to 4', [name, { ...range, row: { ...range.row, uvZone: 7 } }], ['items.1.row.uvZone']],
    ['text that cannot be stored', [name, makeRangeItem({ note: 'a\0b' })], ['items']],
    ['half a surrogate pair', [name, makeRangeItem({ note: 'a\ud800b' })], ['items']],
    ['a name without letters', [makeNameItem({ name: '???' })], ['items']],
  ])('is refused: %s', async (_, items, paths) => {
    expect(await findErrors(items)).toEqual(paths)
  })

  test('is refused where it names sources, record sets or datasets that do not exist', async () => {
    const known = makeDatasetItem('test-set', [makeRecord()])
    const unknownSet = makeDatasetItem('test-set', [makeRecord()])
    const unknownDataset = makeDatasetItem('no-such-set', [makeRecord()])
    expect(await findErrors([name, range, makeEvidenceItem(range.itemId, stranger)])).toEqual(['items'])
    expect(await findErrors([name, makeProseItem(`So says [@${stranger}].`)])).toEqual(['items'])
    expect(await findErrors([name, unknownSet.item], { recordSets: [known.recordSet] })).toEqual([
      'recordSets',
    ])
    expect(await findErrors([name, unknownDataset.item], { recordSets: [unknownDataset.recordSet] })).toEqual(
      ['recordSets'],
    )
    const renamed = { ...known.recordSet, hash: 'a'.repeat(64) }
    expect(await findErrors([name], { recordSets: [renamed] })).toEqual(['recordSets.0.hash'])
    expect(await findErrors([makeNameItem()], { summary: '  ' })).toEqual(['summary'])
    expect(await findErrors([makeNameItem()], { summary: 'a\0b' })).toEqual(['summary'])
  })

  test("is refused where an item is another page's, or was of another kind", async () => {
    const other = makeRangeItem()
    const first = await publish(dataSource, [makeNameItem(), other])
    expect(await findErrors([makeNameItem(), other])).toEqual(['items'])
    const prose = { ...makeProseItem('Text.'), itemId: other.itemId }
    const part = { species: { id: first.speciesId }, baseRevisionId: first.revisionId }
    expect(await findErrors([makeNameItem(), prose], part)).toEqual(['items'])
  })

  test('tells a typical UV range from a maximum one of the same keys', async () => {
    const keys = { parameter: 'uv-index', typedUnit: 'uvi', low: 1, high: 3 } as const
    const published = await publish(dataSource, [
      makeNameItem(),
      makeRangeItem({ ...keys, uvMeaning: 'typical' }),
      makeRangeItem({ ...keys, uvMeaning: 'maximum' }),
    ])
    expect(published.number).toBe(1)
  })
})

describe('the epoch of the public pages', () => {
  test('moves once with each publishing transaction, and every listening server hears it', async () => {
    const listener = new Client({ connectionString: database.url })
    await listener.connect()
    const heard: string[] = []
    listener.on('notification', ({ payload }) => heard.push(payload ?? ''))
    await listener.query('listen site_epoch')
    const before = BigInt(await findSiteEpoch(dataSource.manager))
    await dataSource.transaction(async (db) => {
      for (const items of [[makeNameItem()], [makeNameItem()]]) {
        await publishRevision(db, {
          species: { isInvented: true },
          baseRevisionId: null,
          items,
          recordSets: [],
          summary: 'One of two.',
          broughtBy: { form: 'demonstration' },
          publishedAt: PUBLISHED_AT,
        })
      }
    })
    const after = await findSiteEpoch(dataSource.manager)
    expect(after).toBe(String(before + 1n))
    // The server sends what was notified before it answers the next statement.
    await listener.query('select 1')
    expect(heard).toEqual([after])
    await listener.end()
  })

  test('lets two publish at once, so that no long import holds up another page', async () => {
    const run = dataSource.createQueryRunner()
    await run.startTransaction()
    const input = {
      species: { isInvented: true },
      baseRevisionId: null,
      recordSets: [],
      summary: 'Of a long import.',
      broughtBy: { form: 'demonstration' as const },
      publishedAt: PUBLISHED_AT,
    }
    await publishRevision(run.manager, { ...input, items: [makeNameItem()] })
    const before = BigInt(await findSiteEpoch(dataSource.manager))
    const meanwhile = await publish(dataSource, [makeNameItem()])
    expect(meanwhile.number).toBe(1)
    await publishRevision(run.manager, { ...input, items: [makeNameItem()] })
    await run.commitTransaction()
    await run.release()
    expect(await findSiteEpoch(dataSource.manager)).toBe(String(before + 2n))
  })
})
