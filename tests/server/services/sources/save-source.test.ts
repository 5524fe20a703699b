import type { DataSource } from 'typeorm'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { createDataSource } from '../../../../server/data-source.js'
import { InvalidInput } from '../../../../server/errors.js'
import { findSourcePage } from '../../../../server/queries/sources.js'
import { findSiteEpoch } from '../../../../server/services/site-epoch.js'
import { mergeSources } from '../../../../server/services/sources/merge-sources.js'
import {
  saveSource,
  saveSources,
  type SaveSourceInput,
} from '../../../../server/services/sources/save-source.js'
import { createTestDatabase, type TestDatabase } from '../../../helpers/database.js'
import { addSource, PUBLISHED_AT } from '../../../helpers/page-items.js'

let database: TestDatabase
let dataSource: DataSource

beforeAll(async () => {
  database = await createTestDatabase()
  dataSource = await createDataSource(database.url).initialize()
})

afterAll(async () => {
  await dataSource.destroy()
  await database.drop()
})

let lastNumber = 0
/** A DOI and a full reference that no other test uses. */
function makeKeys() {
  lastNumber += 1
  return {
    doi: `10.5555/test.${lastNumber}`,
    reference: `Tester, T. (2001) Study number ${lastNumber}. Journal 3: 1-9.`,
  }
}

function makeInput(part: Partial<SaveSourceInput>): SaveSourceInput {
  return {
    doi: null,
    kind: 'article',
    terms: null,
    csl: { type: 'article-journal', title: 'On tests' },
    reference: null,
    asPrinted: null,
    isInvented: true,
    broughtBy: { form: 'demonstration' },
    publishedAt: PUBLISHED_AT,
    ...part,
  }
}

describe('two citations are one source', () => {
  test('where their DOIs agree but for case and resolver address', async () => {
    const { doi } = makeKeys()
    const id = await addSource(dataSource, { doi })
    expect(await addSource(dataSource, { doi: doi.toUpperCase() })).toBe(id)
    expect(await addSource(dataSource, { doi: `https://doi.org/${doi}`, reference: 'Other words.' })).toBe(id)
  })

  test('where their full references agree but for case, accents, punctuation and spaces', async () => {
    const id = await addSource(dataSource, {
      reference: 'Müller, A. & Peña, B. (1998). Heat  in lizards, J. Therm. 4–9',
    })
    const other = 'MULLER A & Pena B 1998 Heat in lizards. J Therm 4-9.'
    expect(await addSource(dataSource, { reference: other })).toBe(id)
  })

  test('where one has a DOI, the other has none, and the references agree', async () => {
    const first = makeKeys()
    const withDoi = await addSource(dataSource, first)
    expect(await addSource(dataSource, { reference: first.reference })).toBe(withDoi)
    const second = makeKeys()
    const withoutDoi = await addSource(dataSource, { reference: second.reference })
    expect(await addSource(dataSource, second)).toBe(withoutDoi)
    expect(await addSource(dataSource, { doi: second.doi })).toBe(withoutDoi)
    const page = await findSourcePage(dataSource.manager, withoutDoi, null)
    expect(page?.source.doi).toBe(second.doi)
  })

  test('where one is found by DOI and the other by reference: the two known sources are merged', async () => {
    const { doi, reference } = makeKeys()
    const byReference = await addSource(dataSource, { reference })
    const byDoi = await addSource(dataSource, { doi })
    expect(byReference).not.toBe(byDoi)
    expect(await addSource(dataSource, { doi, reference })).toBe(byDoi)
    expect(await addSource(dataSource, { reference })).toBe(byDoi)
    expect((await findSourcePage(dataSource.manager, byReference, null))?.source.id).toBe(byDoi)
  })

  test('within one batch as between two', async () => {
    const one = makeKeys()
    const two = makeKeys()
    const inputs = [
      one,
      { reference: one.reference },
      two,
      { doi: one.doi },
      { doi: two.doi, reference: null },
    ]
    const saved = await dataSource.transaction((db) =>
      saveSources(
        db,
        inputs.map((keys) => makeInput(keys)),
      ),
    )
    const [a, b, c, d, e] = saved.map(({ id }) => id)
    expect([b, d]).toEqual([a, a])
    expect(e).toBe(c)
    expect(a).not.toBe(c)
  })

  test('where two importers bring it at the same moment', async () => {
    const keys = makeKeys()
    const [first, second] = await Promise.all([addSource(dataSource, keys), addSource(dataSource, keys)])
    expect(first).toBe(second)
  })
})

describe('two citations are different sources', () => {
  test('where their DOIs differ, even with the same words', async () => {
    const first = makeKeys()
    const second = makeKeys()
    const id = await addSource(dataSource, first)
    const other = await addSource(dataSource, { doi: second.doi, reference: first.reference })
    expect(other).not.toBe(id)
    expect(await addSource(dataSource, { doi: second.doi })).toBe(other)
    expect(await addSource(dataSource, { reference: first.reference })).toBe(id)
  })

  test('where neither has a DOI or a full reference', async () => {
    const author = { asPrinted: 'Brattstrom 1968' }
    expect(await addSource(dataSource, author)).not.toBe(await addSource(dataSource, author))
  })
})

describe('a saved source', () => {
  test('has a first revision with its CSL fields, kept as they came', async () => {
    const csl = {
      type: 'book',
      title: 'Tests',
      author: [{ literal: 'A Society' }],
      'x-extra': { kept: [1, 2] },
    }
    const id = await addSource(dataSource, {
      csl,
      kind: 'book',
      terms: 'Free to cite',
      asPrinted: 'A Society: Tests.',
    })
    const page = await findSourcePage(dataSource.manager, id, null)
    expect(page?.source).toEqual({
      id,
      kind: 'book',
      doi: null,
      csl,
      asPrinted: 'A Society: Tests.',
      isInvented: true,
    })
    const revisions = await dataSource.query(
      'select number, brought_by, published_at from source_revision where source_id = $1',
      [id],
    )
    expect(revisions).toEqual([{ number: 1, brought_by: 'demonstration', published_at: PUBLISHED_AT }])
  })

  test('stays as it is when it is saved again, and then moves no epoch', async () => {
    const keys = makeKeys()
    const id = await addSource(dataSource, { ...keys, kind: 'thesis' })
    const epoch = await findSiteEpoch(dataSource.manager)
    await addSource(dataSource, { ...keys, kind: 'book' })
    expect((await findSourcePage(dataSource.manager, id, null))?.source.kind).toBe('thesis')
    expect(await findSiteEpoch(dataSource.manager)).toBe(epoch)
  })

  test('is refused with a path where its form is wrong or its text cannot be stored', async () => {
    const noType = makeInput({ csl: {} as SaveSourceInput['csl'] })
    const broken = makeInput({ asPrinted: 'a\0b' })
    const attempts = [noType, broken].map((input) => dataSource.transaction((db) => saveSource(db, input)))
    const [first, second] = await Promise.allSettled(attempts)
    expect(first).toMatchObject({ reason: { errors: [{ path: '0.csl.type' }] } })
    expect(second).toMatchObject({ reason: expect.any(InvalidInput) as unknown })
  })

  test('needs a transaction', async () => {
    await expect(saveSource(dataSource.manager, makeInput({}))).rejects.toThrow('needs a transaction')
  })
})

describe('merged sources', () => {
  test('lead to one heir however long the chain, and the epoch moves', async () => {
    const [a, b, c] = [await addSource(dataSource), await addSource(dataSource), await addSource(dataSource)]
    const epoch = await findSiteEpoch(dataSource.manager)
    await dataSource.transaction((db) => mergeSources(db, [{ fromId: a, intoId: b }]))
    await dataSource.transaction((db) => mergeSources(db, [{ fromId: b, intoId: c }]))
    for (const id of [a, b, c]) {
      expect((await findSourcePage(dataSource.manager, id, null))?.source.id).toBe(c)
    }
    expect(BigInt(await findSiteEpoch(dataSource.manager))).toBeGreaterThan(BigInt(epoch))
  })

  test('never lead in a circle', async () => {
    const [a, b] = [await addSource(dataSource), await addSource(dataSource)]
    await dataSource.transaction((db) => mergeSources(db, [{ fromId: a, intoId: b }]))
    await dataSource.transaction((db) => mergeSources(db, [{ fromId: b, intoId: a }]))
    expect((await findSourcePage(dataSource.manager, a, null))?.source.id).toBe(b)
    expect((await findSourcePage(dataSource.manager, b, null))?.source.id).toBe(b)
  })
})
