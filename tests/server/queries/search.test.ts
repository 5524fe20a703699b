import type { DataSource } from 'typeorm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createDataSource } from '../../../server/data-source.js'
import { searchSpecies } from '../../../server/queries/search.js'
import { EMPTY_SEARCH } from '../../../shared/search-query.js'
import { searchAnswerSchema } from '../../../shared/search.js'
import type { SearchAnswer, SearchQuery } from '../../../shared/search.js'
import { createTestDatabase } from '../../helpers/database.js'
import type { TestDatabase } from '../../helpers/database.js'
import {
  addDatasetVersion,
  addSource,
  makeClassificationItem,
  makeEvidenceItem,
  makeNameItem,
  makeRangeItem,
  publish,
} from '../../helpers/page-items.js'

/** Names as AmphibiaWeb and the Reptile Database list them, from the project's own seed. */
const NAMES: { name: string; synonyms?: string[]; common?: string[]; class?: string; family?: string }[] = [
  { name: 'Pogona vitticeps', synonyms: ['Amphibolurus vitticeps'], common: ['Central bearded dragon'] },
  { name: 'Pogona barbata', common: ['Eastern bearded dragon'] },
  { name: 'Basiliscus vittatus', common: ['Brown basilisk'] },
  { name: 'Pseudotrapelus sinaitus', common: ['Sinai agama'] },
  { name: 'Eublepharis macularius', common: ['Leopard gecko'], family: 'Eublepharidae' },
  { name: 'Phelsuma guentheri', common: ["Günther's day gecko"], family: 'Gekkonidae' },
  { name: 'Iguana iguana', common: ['Green iguana'], family: 'Iguanidae' },
  { name: 'Tiliqua rugosa', synonyms: ['Trachydosaurus rugosus'], common: ['Shingleback'] },
  {
    name: 'Ranoidea caerulea',
    synonyms: ['Litoria caerulea'],
    common: ['Green Tree Frog'],
    class: 'Amphibia',
  },
  {
    name: 'Dryophytes cinereus',
    synonyms: ['Hyla cinerea'],
    common: ['American Green Treefrog'],
    class: 'Amphibia',
  },
  { name: 'Rhinella marina', synonyms: ['Bufo marinus'], common: ['Cane Toad'], class: 'Amphibia' },
  { name: 'Bufo bufo', common: ['Common Toad'], class: 'Amphibia' },
  { name: 'Xenopus laevis', common: ['African Clawed Frog'], class: 'Amphibia' },
]

let database: TestDatabase
let dataSource: DataSource

beforeAll(async () => {
  database = await createTestDatabase()
  dataSource = await createDataSource(database.url).initialize()
  const datasetVersionId = await addDatasetVersion(dataSource.manager, 'names')
  for (const {
    name,
    synonyms = [],
    common = [],
    class: taxonClass = 'Reptilia',
    family = 'Testidae',
  } of NAMES) {
    const items = [
      makeNameItem({ name }),
      ...synonyms.map((synonym) => makeNameItem({ kind: 'synonym', name: synonym })),
      ...common.map((word) => makeNameItem({ kind: 'common', name: word, language: 'en' })),
      makeClassificationItem({ class: taxonClass, order: null, family }),
    ]
    await publish(dataSource, items, {
      species: { isInvented: false },
      broughtBy: { form: 'dataset', datasetVersionId },
    })
  }
  // One invented page with ranges, so that listings have something to put first.
  const sourceId = await addSource(dataSource)
  const ranges = [
    makeRangeItem(),
    makeRangeItem({
      parameter: 'uv-index',
      typedUnit: 'uvi',
      low: 3,
      high: 5,
      uvMeaning: 'typical',
      uvZone: 3,
    }),
  ]
  await publish(dataSource, [
    makeNameItem({ name: 'Zzyzxus inventus' }),
    makeNameItem({ kind: 'common', name: 'Invented toad', language: 'en' }),
    makeClassificationItem({
      class: 'Amphibia',
      order: 'Inventa',
      family: 'Inventidae',
      conservation: 'Least Concern',
    }),
    ...ranges,
    makeEvidenceItem(ranges[0]!.itemId, sourceId),
    makeEvidenceItem(ranges[1]!.itemId, sourceId, {
      kind: 'keepers-report',
      printed: { low: '3', high: '5', mean: null, sd: null, unit: 'uvi' },
      low: 3,
      high: 5,
    }),
  ])
})
afterAll(async () => {
  await dataSource.destroy()
  await database.drop()
})

const search = async (part: Partial<SearchQuery>): Promise<SearchAnswer> =>
  searchAnswerSchema.parse(await searchSpecies(dataSource.manager, { ...EMPTY_SEARCH, ...part }))
const found = (answer: SearchAnswer) => answer.items.map((item) => item.scientificName)
const counts = (facet: { value: string; count: number }[]) =>
  Object.fromEntries(facet.map(({ value, count }) => [value, count]))

describe('searchSpecies by name', () => {
  it.each([
    ['the name', 'Pogona vitticeps', 'Pogona vitticeps', null],
    ['a misspelt name', 'pogona viticeps', 'Pogona vitticeps', null],
    ['one misspelt word', 'viticeps', 'Pogona vitticeps', null],
    ['swapped letters', 'eubelpharis', 'Eublepharis macularius', null],
    ['a doubled letter', 'iguanna', 'Iguana iguana', null],
    ['a missing letter', 'xenpus laevis', 'Xenopus laevis', null],
    ['an old combination', 'Amphibolurus vitticeps', 'Pogona vitticeps', 'Amphibolurus vitticeps'],
    ['another', 'hyla cinerea', 'Dryophytes cinereus', 'Hyla cinerea'],
    ['an old genus alone', 'trachydosaurus', 'Tiliqua rugosa', 'Trachydosaurus rugosus'],
    ['a combination nobody listed', 'Laemanctus vitticeps', 'Pogona vitticeps', null],
    ['one with the ending of another gender', 'Osteopilus caeruleus', 'Ranoidea caerulea', null],
    ['a misspelt old combination', 'bufo marinis', 'Rhinella marina', 'Bufo marinus'],
    ['a common name', 'leopard gecko', 'Eublepharis macularius', 'Leopard gecko'],
    ['a misspelt common name', 'lepard geko', 'Eublepharis macularius', 'Leopard gecko'],
    ['a common name in parts', 'tree fro', 'Ranoidea caerulea', 'Green Tree Frog'],
    ['a genus initial', 'p. vitt', 'Pogona vitticeps', null],
    ['a genus initial without a stop', 'B marinus', 'Rhinella marina', 'Bufo marinus'],
    ['a genus initial and a typo', 'E. maculerius', 'Eublepharis macularius', null],
    ['another order of words', 'vitticeps pogona', 'Pogona vitticeps', null],
    [
      'a common name in another order',
      'dragon, bearded, eastern',
      'Pogona barbata',
      'Eastern bearded dragon',
    ],
    ['no diacritics', 'gunther', 'Phelsuma guentheri', "Günther's day gecko"],
    ['other diacritics', 'pögonâ vittíceps', 'Pogona vitticeps', null],
    ['capitals and white space', '  POGONA   Vitticeps ', 'Pogona vitticeps', null],
    ['words of two names', 'bearded vitticeps', 'Pogona vitticeps', null],
    ['a name that other names begin with', 'bufo bufo', 'Bufo bufo', null],
    ['one letter', 'x', 'Xenopus laevis', null],
    ['two letters', 'bu bu', 'Bufo bufo', null],
  ])('finds a species first by %s: %s', async (_what, q, scientificName, matchedName) => {
    const answer = await search({ q })
    expect(answer.items[0]).toMatchObject({ scientificName, matchedName })
    expect(answer.nearest).toEqual([])
  })

  it('puts equally good matches with ranges first', async () => {
    expect(found(await search({ q: 'toad' }))[0]).toBe('Zzyzxus inventus')
  })

  it('finds nothing by words like no name, and offers the nearest names', async () => {
    const answer = await search({ q: 'vittaturanosaurus' })
    expect(answer).toMatchObject({ items: [], total: 0, nextCursor: null })
    expect(answer.nearest[0]?.scientificName).toBe('Basiliscus vittatus')
    expect((await search({ q: 'qqqqqq' })).nearest).toEqual([])
  })

  it('takes words for words, whatever they are', async () => {
    for (const q of [
      '%',
      '_',
      "'",
      '\\',
      '\\m',
      '(',
      '[a',
      'a|b',
      '.*',
      'p%',
      "x'; drop table species; --",
      '🦎',
      '\u202e',
      'ß',
    ]) {
      const answer = await search({ q })
      expect(answer.engine).toBe('postgresql')
    }
    expect((await search({ q: '.*' })).total).toBe(NAMES.length + 1)
    expect(found(await search({ q: 'bearded|dragon' }))).toEqual(found(await search({ q: 'bearded dragon' })))
  })
})

describe('searchSpecies by filters', () => {
  it('counts each facet with its own choice left open and the others kept', async () => {
    const { facets, total } = await search({ class: ['Amphibia'], hasRanges: false })
    expect(total).toBe(5)
    expect(counts(facets.class)).toEqual({ Amphibia: 5, Reptilia: 8 })
    expect(counts(facets.hasRanges)).toEqual({ no: 5, yes: 1 })
    expect(counts(facets.family)).toEqual({ Testidae: 5 })
  })

  it('counts what the words leave', async () => {
    const { facets, total } = await search({ q: 'toad' })
    expect(total).toBe(3)
    expect(counts(facets.hasRanges)).toEqual({ no: 2, yes: 1 })
    expect(counts(facets.uvZone)).toEqual({ 3: 1 })
    expect(counts(facets.evidenceKind)).toEqual({ guideline: 1, 'keepers-report': 1 })
    expect(counts(facets.conservation)).toEqual({ 'Least Concern': 1 })
    expect(counts(facets.order)).toEqual({ Inventa: 1 })
  })

  it.each<[string, Partial<SearchQuery>, number]>([
    ['nothing', {}, 14],
    ['two families', { family: ['Iguanidae', 'Gekkonidae'] }, 2],
    ['an order', { order: ['Inventa'] }, 1],
    ['a conservation category', { conservation: ['Least Concern'] }, 1],
    ['a zone', { uvZone: [2, 3] }, 1],
    ['a zone nothing is in', { uvZone: [4] }, 0],
    ['kinds of evidence', { evidenceKind: ['keepers-report', 'review'] }, 1],
    ['having ranges', { hasRanges: true }, 1],
    ['being invented', { invented: true }, 1],
    ['being real', { invented: false }, 13],
    ['words and a filter', { q: 'pogona', class: ['Reptilia'] }, 2],
    ['words and a filter that exclude each other', { q: 'pogona', class: ['Amphibia'] }, 0],
  ])('filters by %s', async (_what, part, total) => {
    const answer = await search(part)
    expect(answer.total).toBe(total)
    expect(answer.items).toHaveLength(total)
  })

  it('puts pages with ranges first, then goes by name', async () => {
    expect(found(await search({ limit: 3 }))).toEqual([
      'Zzyzxus inventus',
      'Basiliscus vittatus',
      'Bufo bufo',
    ])
    expect(found(await search({ sort: 'name', limit: 2 }))).toEqual(['Basiliscus vittatus', 'Bufo bufo'])
  })
})

describe('the cursor of searchSpecies', () => {
  it.each<[string, Partial<SearchQuery>]>([
    ['everything', {}],
    ['everything by name', { sort: 'name' }],
    ['everything by date', { sort: 'newest' }],
    ['words', { q: 'p' }],
    ['words with a likeness', { q: 'toad' }],
    ['words that are only alike', { q: 'pogonna' }],
    ['words by name', { q: 'a', sort: 'name' }],
    ['a filter', { class: ['Reptilia'], hasRanges: false }],
  ])('walks %s exactly once, in order', async (_what, part) => {
    const whole = await search({ ...part, limit: 100 })
    expect(whole.items.length).toBeGreaterThan(1)
    const walked: string[] = []
    let cursor: string | null = null
    do {
      const page: SearchAnswer = await search({ ...part, cursor, limit: 2 })
      expect(page.total).toBe(whole.total)
      walked.push(...found(page))
      cursor = page.nextCursor
    } while (cursor !== null)
    expect(walked).toEqual(found(whole))
  })

  it('goes on where it was when a page appears meanwhile', async () => {
    const first = await search({ sort: 'name', limit: 3 })
    await publish(dataSource, [
      makeNameItem({ name: 'Aaa prior' }),
      makeClassificationItem({ class: 'Insecta' }),
    ])
    const second = await search({ sort: 'name', limit: 3, cursor: first.nextCursor })
    expect(found(first)).not.toContain(found(second)[0])
    expect(found(second)[0]).toBe('Eublepharis macularius')
  })

  it('is refused by another search', async () => {
    const { nextCursor } = await search({ sort: 'name', limit: 3 })
    await expect(search({ sort: 'newest', limit: 3, cursor: nextCursor })).rejects.toMatchObject({
      status: 400,
      errors: [{ path: 'cursor', message: 'This cursor belongs to another search.' }],
    })
    await expect(search({ q: 'toad', sort: 'name', cursor: nextCursor })).rejects.toMatchObject({
      status: 400,
    })
  })
})
