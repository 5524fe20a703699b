import { randomUUID } from 'node:crypto'
import type { DataSource } from 'typeorm'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import type { PageItem } from '../../../shared/revisions.js'
import { speciesPageSchema } from '../../../shared/species.js'
import { createDataSource } from '../../../server/data-source.js'
import { findSpeciesPage, findSpeciesPageJson } from '../../../server/queries/species.js'
import { mergeSources } from '../../../server/services/sources/merge-sources.js'
import { createTestDatabase, type TestDatabase } from '../../helpers/database.js'
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
} from '../../helpers/page-items.js'
import { countStatements } from '../../helpers/statements.js'

let database: TestDatabase
let dataSource: DataSource

beforeAll(async () => {
  database = await createTestDatabase()
  dataSource = await createDataSource(database.url).initialize()
  await addDatasetVersion(dataSource.manager, 'test-set', '2.1')
})

afterAll(async () => {
  await dataSource.destroy()
  await database.drop()
})

describe('a species page', () => {
  test('has the form of its schema, with every kind of item', async () => {
    const sourceId = await addSource(dataSource)
    const range = makeRangeItem()
    const { item, recordSet } = makeDatasetItem('test-set', [makeRecord({ sourceId }), makeRecord()])
    const image = {
      itemId: randomUUID(),
      parentItemId: null,
      kind: 'image' as const,
      row: {
        mediaId: randomUUID(),
        alternativeText: 'A lizard',
        caption: null,
        licence: 'CC0',
        credit: 'Nobody',
      },
    }
    const items: PageItem[] = [
      makeNameItem(),
      makeClassificationItem(),
      range,
      makeEvidenceItem(range.itemId, sourceId),
      item,
      makeProseItem('Text.'),
      image,
    ]
    const datasetVersionId = await addDatasetVersion(dataSource.manager, 'test-set', '2.1')
    const { slug } = await publish(dataSource, items, {
      recordSets: [recordSet],
      broughtBy: { form: 'dataset', datasetVersionId },
    })
    const page = await findSpeciesPage(dataSource.manager, slug, null)
    expect(speciesPageSchema.parse(page)).toEqual(page)
    expect(page?.revision.broughtBy).toEqual({
      form: 'dataset',
      datasetId: 'test-set',
      title: 'Dataset test-set',
      version: '2.1',
    })
    expect(page?.physiology[0]?.dataset).toMatchObject({ id: 'test-set', version: '2.1', licence: 'CC0 1.0' })
    expect(page?.images).toEqual([{ itemId: image.itemId, row: image.row }])
  })

  test('with nothing but a name has the form of its schema too', async () => {
    const { slug } = await publish(dataSource, [makeNameItem()])
    const page = await findSpeciesPage(dataSource.manager, slug, null)
    expect(speciesPageSchema.parse(page)).toMatchObject({ classification: null, ranges: [], sources: {} })
  })

  test('keeps ranges, their evidence and names in the order they were published in', async () => {
    const sourceId = await addSource(dataSource)
    const ranges = (['night', 'any', 'day'] as const).map((period) => makeRangeItem({ period }))
    const evidence = ranges.flatMap((range) =>
      ['c', 'a', 'b'].map((locator) => makeEvidenceItem(range.itemId, sourceId, { locator })),
    )
    const { slug } = await publish(dataSource, [...ranges, ...evidence, makeNameItem()])
    const page = await findSpeciesPage(dataSource.manager, slug, null)
    expect(page?.ranges.map(({ row }) => row.period)).toEqual(['night', 'any', 'day'])
    for (const range of page?.ranges ?? []) {
      expect(range.evidence.map(({ row }) => row.locator)).toEqual(['c', 'a', 'b'])
    }
  })

  test('shows at most five marks of a longer history, newest first', async () => {
    const name = makeNameItem()
    let last = await publish(dataSource, [name])
    for (let number = 2; number <= 7; number += 1) {
      const part = {
        species: { id: last.speciesId },
        baseRevisionId: last.revisionId,
        summary: `Number ${number}`,
      }
      last = await publish(dataSource, [name], part)
    }
    const page = await findSpeciesPage(dataSource.manager, last.slug, 3)
    expect(page?.history.map(({ number }) => number)).toEqual([7, 6, 5, 4, 3])
    expect(page?.revision).toMatchObject({ number: 3, summary: 'Number 3' })
    expect(page?.currentRevisionNumber).toBe(7)
  })

  test('reads the same from its rows as from what was written when it was published', async () => {
    const sourceId = await addSource(dataSource)
    const range = makeRangeItem()
    const { item, recordSet } = makeDatasetItem('test-set', [makeRecord({ sourceId })])
    const items = [
      makeNameItem(),
      range,
      makeEvidenceItem(range.itemId, sourceId),
      item,
      makeProseItem('Text.'),
    ]
    const { slug, speciesId } = await publish(dataSource, items, { recordSets: [recordSet] })
    const written = await findSpeciesPage(dataSource.manager, slug, null)
    expect(await findSpeciesPage(dataSource.manager, slug, 1)).toEqual(written)
    await dataSource.query('delete from current_page where species_id = $1', [speciesId])
    expect(await findSpeciesPage(dataSource.manager, slug, null)).toEqual(written)
    expect(written?.ranges[0]?.evidence).toHaveLength(1)
  })

  test('that does not exist is null, as is a revision that does not exist', async () => {
    const { slug } = await publish(dataSource, [makeNameItem()])
    expect(await findSpeciesPage(dataSource.manager, 'no-such-page', null)).toBeNull()
    expect(await findSpeciesPage(dataSource.manager, slug, 2)).toBeNull()
    expect(await findSpeciesPage(dataSource.manager, slug, 0)).toBeNull()
  })

  test('is read in one statement, also inside a transaction that sees its own publishing', async () => {
    const { slug } = await publish(dataSource, [makeNameItem(), makeRangeItem()])
    await dataSource.transaction(async (db) => {
      if (db.queryRunner === undefined) throw new Error('A transaction has a query runner')
      const counter = countStatements(db.queryRunner)
      expect(await findSpeciesPageJson(db, slug, null)).toContain(slug)
      expect(counter.count()).toBe(1)
      counter.restore()
    })
  })
})

describe('the sources of a page', () => {
  test('are all that evidence, records, statements and prose cite, and no other', async () => {
    const [ofEvidence, ofRecord, ofProse, ofNone] = [
      await addSource(dataSource),
      await addSource(dataSource),
      await addSource(dataSource),
      await addSource(dataSource),
    ]
    const range = makeRangeItem()
    const { item, recordSet } = makeDatasetItem('test-set', [makeRecord({ sourceId: ofRecord })])
    const { slug } = await publish(
      dataSource,
      [
        makeNameItem(),
        range,
        makeEvidenceItem(range.itemId, ofEvidence),
        item,
        makeProseItem(`[@${ofProse}]`),
      ],
      { recordSets: [recordSet] },
    )
    const page = await findSpeciesPage(dataSource.manager, slug, null)
    expect(Object.keys(page?.sources ?? {}).sort()).toEqual([ofEvidence, ofRecord, ofProse].sort())
    expect(Object.keys(page?.sources ?? {})).not.toContain(ofNone)
  })

  test('that were merged are their heir, under the id that is cited', async () => {
    const cited = await addSource(dataSource, { csl: { type: 'book', title: 'Typed twice' } })
    const heir = await addSource(dataSource, { csl: { type: 'book', title: 'Typed well' } })
    const range = makeRangeItem()
    const { slug } = await publish(dataSource, [makeNameItem(), range, makeEvidenceItem(range.itemId, cited)])
    await dataSource.transaction((db) => mergeSources(db, [{ fromId: cited, intoId: heir }]))
    const page = await findSpeciesPage(dataSource.manager, slug, null)
    expect(page?.ranges[0]?.evidence[0]?.row.sourceId).toBe(cited)
    expect(Object.keys(page?.sources ?? {})).toEqual([cited])
    expect(page?.sources[cited]).toMatchObject({ id: heir, csl: { title: 'Typed well' } })
  })
})
