import { randomUUID } from 'node:crypto'
import type { DataSource } from 'typeorm'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import {
  homeAnswerSchema,
  revisionListSchema,
  sourceListSchema,
  sourcePageSchema,
} from '../../../shared/home.js'
import { recordListSchema } from '../../../shared/physiology-records.js'
import { createDataSource } from '../../../server/data-source.js'
import { InvalidInput } from '../../../server/errors.js'
import { findHome } from '../../../server/queries/home.js'
import { findPhysiologyRecords } from '../../../server/queries/physiology.js'
import { findRevisions } from '../../../server/queries/revisions.js'
import { findSourcePage, findSources } from '../../../server/queries/sources.js'
import { mergeSources } from '../../../server/services/sources/merge-sources.js'
import { createTestDatabase, type TestDatabase } from '../../helpers/database.js'
import {
  addDatasetVersion,
  addSource,
  makeDatasetItem,
  makeEvidenceItem,
  makeNameItem,
  makeRangeItem,
  makeRecord,
  publish,
  PUBLISHED_AT,
} from '../../helpers/page-items.js'

let database: TestDatabase
let dataSource: DataSource

beforeAll(async () => {
  database = await createTestDatabase()
  dataSource = await createDataSource(database.url).initialize()
  await addDatasetVersion(dataSource.manager, 'test-set')
})

afterAll(async () => {
  await dataSource.destroy()
  await database.drop()
})

/** Follows a list to its end and gives the length of each page and all items. */
async function readAll<Item>(
  read: (cursor: string | null) => Promise<{ items: Item[]; nextCursor: string | null }>,
): Promise<{ lengths: number[]; items: Item[] }> {
  const lengths: number[] = []
  const items: Item[] = []
  let cursor: string | null = null
  do {
    const page = await read(cursor)
    lengths.push(page.items.length)
    items.push(...page.items)
    cursor = page.nextCursor
  } while (cursor !== null)
  return { lengths, items }
}

function required<T>(value: T | null): T {
  if (value === null) throw new Error('Nothing was found')
  return value
}

describe('the revisions of a page', () => {
  let slug: string
  let speciesId: string

  beforeAll(async () => {
    const published = await publish(dataSource, [makeNameItem()], { summary: 'Number 1' })
    slug = published.slug
    speciesId = published.speciesId
    // A long history, written without its content: the list reads the revisions alone.
    await dataSource.query(
      `insert into revision (species_id, number, published_at, summary, brought_by)
       select $1, n, $2, 'Number ' || n, 'demonstration' from generate_series(2, 5000) n`,
      [speciesId, PUBLISHED_AT],
    )
    const owner = await createDataSource(database.ownerUrl).initialize()
    await owner.query('analyze revision')
    await owner.destroy()
  })

  test('come newest first, fifty at a time, to the very first', async () => {
    const first = required(await findRevisions(dataSource.manager, slug, null))
    expect(revisionListSchema.parse(first)).toEqual(first)
    expect(first.species.slug).toBe(slug)
    const { lengths, items } = await readAll(async (cursor) =>
      required(await findRevisions(dataSource.manager, slug, cursor)),
    )
    expect(lengths).toEqual(Array.from({ length: 100 }, () => 50))
    expect(items.map(({ number }) => number)).toEqual(
      Array.from({ length: 5000 }, (_, index) => 5000 - index),
    )
  })

  test('are read from an index, a page of fifty out of five thousand', async () => {
    const plan: { 'QUERY PLAN': string }[] = await dataSource.query(
      `explain select * from revision where species_id = $1 and number < 2147483647 order by number desc limit 51`,
      [speciesId],
    )
    const text = plan.map((line) => line['QUERY PLAN']).join('\n')
    expect(text).toContain('Index Scan Backward using revision_species_id_number_key')
    expect(text).not.toContain('Sort')
  })

  test('of no page are null, and a foreign cursor is refused', async () => {
    expect(await findRevisions(dataSource.manager, 'no-such-page', null)).toBeNull()
    for (const cursor of [
      '',
      'x',
      Buffer.from('["a"]').toString('base64url'),
      Buffer.from('[0]').toString('base64url'),
    ]) {
      await expect(findRevisions(dataSource.manager, slug, cursor)).rejects.toThrow(InvalidInput)
    }
  })
})

describe('the records behind a dataset item', () => {
  test('are those of the study line that was opened, in the order of the dataset, with their sources', async () => {
    const sourceId = await addSource(dataSource)
    const heir = await addSource(dataSource)
    const records = Array.from({ length: 130 }, (_, index) =>
      makeRecord({
        recordId: `r${index}`,
        quantity: index < 120 ? 'critical-thermal-maximum' : 'lethal-maximum',
        lethalPercent: index < 120 ? null : index < 125 ? 50 : 100,
        lifeStage: index % 2 === 0 ? 'adult' : 'unspecified',
        sourceId: index % 3 === 0 ? sourceId : null,
        sourceAsPrinted: index % 3 === 1 ? 'Nobody 1999' : 'Somebody 2000',
      }),
    )
    const { item, recordSet } = makeDatasetItem('test-set', records)
    const { slug } = await publish(dataSource, [makeNameItem(), item], { recordSets: [recordSet] })
    await dataSource.transaction((db) => mergeSources(db, [{ fromId: sourceId, intoId: heir }]))
    const read = async (filter: Parameters<typeof findPhysiologyRecords>[3], cursor: string | null = null) =>
      required(await findPhysiologyRecords(dataSource.manager, slug, item.itemId, filter, cursor))

    const first = await read({})
    expect(recordListSchema.parse(first)).toEqual(first)
    expect(first.total).toBe(130)
    expect(first.sources[sourceId]?.id).toBe(heir)
    const all = await readAll((cursor) => read({}, cursor))
    expect(all.lengths).toEqual([50, 50, 30])
    expect(all.items).toEqual(records)

    const names = async (filter: Parameters<typeof findPhysiologyRecords>[3]) =>
      (await readAll((cursor) => read(filter, cursor))).items.map(({ recordId }) => recordId)
    const expected = (keep: (index: number) => boolean) =>
      records.map(({ recordId }) => recordId).filter((_, index) => keep(index))
    expect(await names({ quantity: 'lethal-maximum' })).toEqual(expected((index) => index >= 120))
    expect(await names({ lethalPercent: 50 })).toEqual(expected((index) => index >= 120 && index < 125))
    expect(await names({ lifeStage: 'adult' })).toEqual(expected((index) => index % 2 === 0))
    expect(await names({ source: sourceId })).toEqual(expected((index) => index % 3 === 0))
    expect(await names({ source: 'Nobody 1999' })).toEqual(expected((index) => index % 3 === 1))
    expect(await names({ level: 'summary' })).toEqual([])
  })

  test('of an old revision stay what they were', async () => {
    const old = makeDatasetItem('test-set', [makeRecord({ recordId: 'old' })])
    const fresh = makeDatasetItem('test-set', [makeRecord({ recordId: 'new' })])
    const name = makeNameItem()
    const { itemId } = old.item
    const first = await publish(dataSource, [name, old.item], { recordSets: [old.recordSet] })
    await publish(dataSource, [name, { ...fresh.item, itemId }], {
      recordSets: [fresh.recordSet],
      species: { id: first.speciesId },
      baseRevisionId: first.revisionId,
    })
    const read = async (revision: number | null) =>
      required(await findPhysiologyRecords(dataSource.manager, first.slug, itemId, {}, null, revision))
        .items[0]?.recordId
    expect(await read(null)).toBe('new')
    expect(await read(1)).toBe('old')
  })

  test('of an item that is none of a dataset are null', async () => {
    const range = makeRangeItem()
    const { slug } = await publish(dataSource, [makeNameItem(), range])
    expect(await findPhysiologyRecords(dataSource.manager, slug, range.itemId, {}, null)).toBeNull()
    expect(await findPhysiologyRecords(dataSource.manager, slug, randomUUID(), {}, null)).toBeNull()
    expect(await findPhysiologyRecords(dataSource.manager, 'no-such-page', range.itemId, {}, null)).toBeNull()
  })
})

describe('the page of a source', () => {
  test('lists the pages that cite it or what was merged into it, once each and by name, fifty at a time', async () => {
    const heir = await addSource(dataSource)
    const merged = await addSource(dataSource)
    const names: string[] = []
    for (let index = 0; index < 55; index += 1) {
      const [day, night] = [makeRangeItem(), makeRangeItem({ period: 'night' })]
      const name = makeNameItem()
      names.push(name.row.name)
      await publish(dataSource, [
        name,
        day,
        night,
        makeEvidenceItem(day.itemId, heir),
        makeEvidenceItem(night.itemId, merged),
      ])
    }
    await dataSource.transaction((db) => mergeSources(db, [{ fromId: merged, intoId: heir }]))
    const first = required(await findSourcePage(dataSource.manager, merged, null))
    expect(sourcePageSchema.parse(first)).toEqual(first)
    expect(first).toMatchObject({ source: { id: heir }, citedByTotal: 55 })
    const all = await readAll(async (cursor) => {
      const page = required(await findSourcePage(dataSource.manager, heir, cursor))
      return { items: page.citedBy, nextCursor: page.nextCursor }
    })
    expect(all.lengths).toEqual([50, 5])
    expect(all.items.map(({ scientificName }) => scientificName)).toEqual(names.toSorted())
    expect(all.items[0]).toMatchObject({ ranges: 2, physiology: 0, isInvented: true })
  })

  test('that nobody cites lists none, and one that does not exist is null', async () => {
    const id = await addSource(dataSource)
    expect(await findSourcePage(dataSource.manager, id, null)).toMatchObject({
      citedBy: [],
      nextCursor: null,
    })
    expect(await findSourcePage(dataSource.manager, randomUUID(), null)).toBeNull()
  })
})

describe('the list of sources', () => {
  const byTitle = (title: string) => ({
    csl: { type: 'book', title, author: [{ family: 'Zzlistér' }], issued: { 'date-parts': [[1977]] } },
  })

  test('finds those whose authors, year or title hold every word, in order, without the merged', async () => {
    const b = await addSource(dataSource, byTitle('Bells of heat'))
    const a = await addSource(dataSource, byTitle('Ants of heat'))
    const gone = await addSource(dataSource, byTitle('Ants of heat, again'))
    await dataSource.transaction((db) => mergeSources(db, [{ fromId: gone, intoId: a }]))
    const range = makeRangeItem()
    await publish(dataSource, [makeNameItem(), range, makeEvidenceItem(range.itemId, gone)])
    const ids = async (text: string) =>
      (await findSources(dataSource.manager, text, null)).items.map(({ source }) => source.id)
    expect(await ids('zzlister')).toEqual([a, b])
    expect(await ids('HEAT Zzlistér 1977 ants')).toEqual([a])
    expect(await ids('zzlister 1978')).toEqual([])
    const found = await findSources(dataSource.manager, 'zzlister', null)
    expect(sourceListSchema.parse(found)).toEqual(found)
    expect(found.items.map(({ pages }) => pages)).toEqual([1, 0])
    expect(found.total).toBe(2)
  })

  test('finds the one that has a DOI', async () => {
    const id = await addSource(dataSource, { doi: '10.5555/Listed.1' })
    const found = await findSources(dataSource.manager, 'https://doi.org/10.5555/LISTED.1', null)
    expect(found.items.map(({ source }) => source.id)).toEqual([id])
  })

  test.each(['%', '_', '\\', "'", '\0', '   '])('takes %j for no word at all', async (text) => {
    const everything = await findSources(dataSource.manager, '', null)
    expect((await findSources(dataSource.manager, text, null)).total).toBe(everything.total)
  })

  test('comes fifty at a time, each source once', async () => {
    for (let index = 0; index < 60; index += 1) await addSource(dataSource, byTitle(`Pagewise ${index % 7}`))
    const { lengths, items } = await readAll((cursor) => findSources(dataSource.manager, 'pagewise', cursor))
    expect(lengths).toEqual([50, 10])
    expect(new Set(items.map(({ source }) => source.id)).size).toBe(60)
  })

  test('looks words up in an index, among ten thousand', async () => {
    const owner = await createDataSource(database.ownerUrl).initialize()
    await owner.query(`insert into source (kind, is_invented, listing)
      select 'article', true, 'somebody ' || n || ' on ' || md5(n::text) from generate_series(1, 10000) n`)
    await owner.query('vacuum analyze source')
    const plan: { 'QUERY PLAN': string }[] = await owner.query(
      `explain select * from source where merged_into_id is null and listing like '%somebody 777 on%'`,
    )
    await owner.destroy()
    expect(plan.map((line) => line['QUERY PLAN']).join('\n')).toContain('source_listing_words_idx')
  })
})

describe('the home page', () => {
  test('counts real and invented species apart and names what was published last and what wants ranges', async () => {
    const before = await findHome(dataSource.manager)
    const sourceId = await addSource(dataSource, { isInvented: false })
    const set = makeDatasetItem(
      'test-set',
      Array.from({ length: 900 }, () => makeRecord({ sourceId })),
    )
    const wanting = await publish(dataSource, [makeNameItem(), set.item], {
      recordSets: [set.recordSet],
      species: { isInvented: false },
    })
    await publish(dataSource, [makeNameItem(), makeRangeItem()], { species: { isInvented: false } })
    const later = new Date('2026-06-01T00:00:00Z')
    const recent = await publish(dataSource, [makeNameItem(), makeRangeItem()], { publishedAt: later })
    const home = await findHome(dataSource.manager)
    expect(homeAnswerSchema.parse(home)).toEqual(home)
    expect(home).toMatchObject({
      realSpecies: before.realSpecies + 2,
      inventedSpecies: before.inventedSpecies + 1,
      withRanges: before.withRanges + 1,
      records: before.records + 900,
      sources: before.sources + 1,
    })
    expect(home.recent[0]).toMatchObject({
      slug: recent.slug,
      isInvented: true,
      revision: { number: 1, publishedAt: later.toISOString() },
    })
    expect(home.recent).toHaveLength(8)
    expect(home.wanting).toEqual([
      {
        slug: wanting.slug,
        scientificName: expect.any(String) as string,
        isInvented: false,
        physiologyCount: 900,
      },
    ])
  })
})
