import { randomUUID } from 'node:crypto'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { problemSchema } from '../../../shared/errors.js'
import {
  attributionsSchema,
  homeAnswerSchema,
  revisionListSchema,
  sourceListSchema,
  sourcePageSchema,
} from '../../../shared/home.js'
import { recordListSchema } from '../../../shared/physiology-records.js'
import { searchAnswerSchema } from '../../../shared/search.js'
import { speciesPageSchema } from '../../../shared/species.js'
import {
  addDatasetVersion,
  addSource,
  makeClassificationItem,
  makeDatasetItem,
  makeEvidenceItem,
  makeNameItem,
  makeRangeItem,
  makeRecord,
  publish,
} from '../../helpers/page-items.js'
import { startTestApp } from '../../helpers/test-app.js'
import type { TestApp } from '../../helpers/test-app.js'

let test: TestApp
let sourceId: string
let recordsItemId: string

beforeAll(async () => {
  test = await startTestApp()
  const { dataSource } = test
  sourceId = await addSource(dataSource)
  await addDatasetVersion(dataSource.manager, 'records')
  const { item, recordSet } = makeDatasetItem('records', [makeRecord({ sourceId }), makeRecord()])
  recordsItemId = item.itemId
  const range = makeRangeItem()
  const items = [
    makeNameItem({ name: 'Lacerta inventa' }),
    makeClassificationItem(),
    range,
    makeEvidenceItem(range.itemId, sourceId),
    item,
  ]
  const first = await publish(dataSource, items, { recordSets: [recordSet] })
  await publish(dataSource, items.slice(0, 4), {
    species: { id: first.speciesId },
    baseRevisionId: first.revisionId,
    summary: 'Without the records.',
  })
})
afterAll(() => test.stop())

const get = (path: string) => request(test.app).get(`/api/v1${path}`)

async function expectProblem(path: string, status: number, code: string) {
  const answer = await get(path)
    .expect(status)
    .expect('Content-Type', /^application\/problem\+json/)
  const problem = problemSchema.parse(answer.body)
  expect(problem).toMatchObject({ status, code, type: `/problems/${code}` })
  expect(problem.requestId).toBe(answer.headers['x-request-id'])
  expect(answer.headers['cache-control']).toBe('no-store')
  return problem
}

describe('GET /api/v1/home', () => {
  it('gives the counts', async () => {
    const answer = homeAnswerSchema.parse((await get('/home').expect(200)).body)
    expect(answer).toMatchObject({ inventedSpecies: 1, realSpecies: 0 })
  })

  it('refuses a parameter it does not know', async () => {
    const { errors } = await expectProblem('/home?colour=green', 400, 'invalid-input')
    expect(errors).toEqual([{ path: 'colour', message: 'This is not known here.' }])
  })
})

describe('GET /api/v1/species', () => {
  it('gives a page of species with facets', async () => {
    const answer = searchAnswerSchema.parse((await get('/species?q=inventa').expect(200)).body)
    expect(answer.items.map((item) => item.scientificName)).toEqual(['Lacerta inventa'])
    expect(answer).toMatchObject({ total: 1, nextCursor: null, engine: 'postgresql' })
  })

  it.each([
    ['colour', '?colour=green'],
    ['limit', '?limit=1000'],
    ['overlap', '?overlap=temperature.roof.day.1_2'],
    ['cursor', '?cursor=nonsense'],
    ['cursor', `?cursor=${Buffer.from('["x",{"id":1}]').toString('base64url')}`],
    ['class', '?class=%00'],
    ['q', '?q=a&q=b'],
  ])('refuses a wrong %s (%s)', async (path, query) => {
    const { errors } = await expectProblem(`/species${query}`, 400, 'invalid-input')
    expect(errors?.map((error) => error.path)).toEqual([path])
  })
})

describe('GET /api/v1/species/:slug', () => {
  it('gives the current revision, and a former one by its number', async () => {
    const current = speciesPageSchema.parse((await get('/species/lacerta-inventa').expect(200)).body)
    expect(current).toMatchObject({ currentRevisionNumber: 2, revision: { number: 2 }, physiology: [] })
    const former = speciesPageSchema.parse(
      (await get('/species/lacerta-inventa?revision=1').expect(200)).body,
    )
    expect(former).toMatchObject({ currentRevisionNumber: 2, revision: { number: 1 } })
    expect(former.physiology).toHaveLength(1)
  })

  it('is not sent again to who has it', async () => {
    const first = await get('/species/lacerta-inventa').expect(200)
    expect(first.headers['cache-control']).toBe('no-cache')
    await get('/species/lacerta-inventa').set('If-None-Match', String(first.headers.etag)).expect(304, '')
    await get('/species/lacerta-inventa?revision=1')
      .set('If-None-Match', String(first.headers.etag))
      .expect(200)
  })

  it.each([
    '?revision=0',
    '?revision=-1',
    '?revision=1.5',
    '?revision=x',
    '?revision=9999999999',
    '?version=1',
  ])('refuses %s', async (query) => {
    await expectProblem(`/species/lacerta-inventa${query}`, 400, 'invalid-input')
  })

  it.each([
    '/species/no-such-page',
    '/species/lacerta-inventa?revision=3',
    '/species/%00',
    '/species/Ä',
    `/species/${'a'.repeat(300)}`,
  ])('does not find %s', async (path) => {
    await expectProblem(encodeURI(decodeURI(path)).replace('%2500', '%00'), 404, 'not-found')
  })

  it('refuses an address with a wrong percent sign', async () => {
    await expectProblem('/species/%E0%A4%A', 400, 'invalid-input')
  })
})

describe('GET /api/v1/species/:slug/revisions', () => {
  it('gives the revisions, newest first', async () => {
    const answer = revisionListSchema.parse(
      (await get('/species/lacerta-inventa/revisions').expect(200)).body,
    )
    expect(answer.items.map((mark) => mark.number)).toEqual([2, 1])
  })

  it('refuses a cursor that is none, and does not find an unknown page', async () => {
    await expectProblem('/species/lacerta-inventa/revisions?cursor=nonsense', 400, 'invalid-input')
    await expectProblem('/species/no-such-page/revisions', 404, 'not-found')
  })
})

describe('GET /api/v1/species/:slug/physiology/:itemId/records', () => {
  const path = (query = '') =>
    `/species/lacerta-inventa/physiology/${recordsItemId}/records?revision=1${query}`

  it('gives the records, all or those of a source', async () => {
    const all = recordListSchema.parse((await get(path()).expect(200)).body)
    expect(all.total).toBe(2)
    const some = recordListSchema.parse((await get(path(`&source=${sourceId}`)).expect(200)).body)
    expect(some.total).toBe(1)
  })

  it('refuses a quantity that does not exist', async () => {
    const { errors } = await expectProblem(path('&quantity=weight'), 400, 'invalid-input')
    expect(errors?.[0]?.path).toBe('quantity')
  })

  it('does not find an item the revision does not hold', async () => {
    await expectProblem(`/species/lacerta-inventa/physiology/${recordsItemId}/records`, 404, 'not-found')
    await expectProblem('/species/lacerta-inventa/physiology/no-id/records', 404, 'not-found')
  })
})

describe('GET /api/v1/sources', () => {
  it('gives the sources, all or those with some words', async () => {
    const all = sourceListSchema.parse((await get('/sources').expect(200)).body)
    expect(all.items.map(({ source }) => source.id)).toEqual([sourceId])
    const none = sourceListSchema.parse((await get('/sources?q=somebodyelse').expect(200)).body)
    expect(none.total).toBe(0)
  })

  it('refuses a cursor that is none', async () => {
    await expectProblem('/sources?cursor=nonsense', 400, 'invalid-input')
  })
})

describe('GET /api/v1/sources/:id', () => {
  it('gives the source with the pages that cite it', async () => {
    const answer = sourcePageSchema.parse((await get(`/sources/${sourceId}`).expect(200)).body)
    expect(answer.citedBy.map((page) => page.slug)).toEqual(['lacerta-inventa'])
  })

  it('does not find an unknown source, or what is no id', async () => {
    await expectProblem(`/sources/${randomUUID()}`, 404, 'not-found')
    await expectProblem('/sources/none', 404, 'not-found')
  })
})

describe('GET /api/v1/attributions', () => {
  it('gives the datasets', async () => {
    const answer = attributionsSchema.parse((await get('/attributions').expect(200)).body)
    expect(answer.datasets.map(({ dataset }) => dataset.id)).toEqual(['records'])
  })
})

describe('an address of the API that does not exist', () => {
  it.each(['/nothing', '/species/lacerta-inventa/', '/Home', ''])(
    'is a problem document (%s)',
    async (path) => {
      await expectProblem(path, 404, 'not-found')
    },
  )

  it('is one for other methods and versions too', async () => {
    await request(test.app)
      .delete('/api/v1/home')
      .expect(404)
      .expect('Content-Type', /problem\+json/)
    await request(test.app)
      .get('/api/v2/home')
      .set('Accept', 'text/html')
      .expect(404)
      .expect('Content-Type', /problem\+json/)
  })
})

describe('every answer', () => {
  it('carries the headers that protect the reader', async () => {
    const { headers } = await get('/home')
    expect(headers['content-security-policy']).toContain("script-src 'self';")
    expect(headers['content-security-policy']).toContain("frame-ancestors 'none'")
    expect(headers['content-security-policy']).not.toContain('unsafe-eval')
    expect(headers['x-content-type-options']).toBe('nosniff')
    expect(headers['x-request-id']).toMatch(/^[\w-]{36}$/)
    expect(headers).not.toHaveProperty('x-powered-by')
    expect(headers).not.toHaveProperty('strict-transport-security')
  })

  it('is compressed where that is understood', async () => {
    const { headers } = await get('/species/lacerta-inventa').set('Accept-Encoding', 'gzip')
    expect(headers['content-encoding']).toBe('gzip')
    expect(headers.vary).toContain('Accept-Encoding')
  })

  it('is logged without address, query or headers', async () => {
    test.logged.length = 0
    await get('/species?q=secretword')
      .set('User-Agent', 'secretagent')
      .set('X-Request-Id', 'chosen-by-client')
    const lines = test.logged.join('')
    expect(lines).toContain('"path":"/api/v1/species"')
    expect(lines).toContain('"status":200')
    expect(lines).not.toMatch(/secretword|secretagent|127\.0\.0\.1|chosen-by-client/)
  })
})
