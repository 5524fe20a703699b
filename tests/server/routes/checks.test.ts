import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { checkResultSchema } from '../../../shared/checker/check.js'
import { checkReadings } from '../../../shared/checker/check-readings.js'
import { JSON_BODY_BYTES_MAX } from '../../../server/middleware/json-body.js'
import { findSpeciesPage } from '../../../server/queries/species.js'
import { CHECK_LIMIT } from '../../../server/routes/checks.js'
import { makeCheckInput, makeReading } from '../../helpers/check-page.js'
import {
  addSource,
  makeClassificationItem,
  makeEvidenceItem,
  makeNameItem,
  makeRangeItem,
  publish,
} from '../../helpers/page-items.js'
import { startTestApp, TEST_ORIGIN } from '../../helpers/test-app.js'
import type { TestApp } from '../../helpers/test-app.js'

let test: TestApp
const hot = makeReading({ position: 'basking-surface', values: [52] })
const input = makeCheckInput([hot], { slug: 'lacerta-inventa' })

beforeAll(async () => {
  test = await startTestApp({ trustedProxies: 1 })
  const { dataSource } = test
  const sourceId = await addSource(dataSource)
  const items = (high: number) => {
    const range = makeRangeItem({ low: 35, high, upperLimit: high + 5 })
    return [name, makeClassificationItem(), range, makeEvidenceItem(range.itemId, sourceId)]
  }
  const name = makeNameItem({ name: 'Lacerta inventa' })
  const first = await publish(dataSource, items(40))
  await publish(dataSource, items(60), { species: { id: first.speciesId }, baseRevisionId: first.revisionId })
})
afterAll(() => test.stop())

const post = (body: object | string, address = '192.0.2.1') =>
  request(test.app)
    .post('/api/v1/checks')
    .set('X-Forwarded-For', address)
    .set('Content-Type', 'application/json')
    .send(body)

describe('POST /api/v1/checks', () => {
  it('answers as the function that the page itself runs', async () => {
    const page = await findSpeciesPage(test.dataSource.manager, 'lacerta-inventa', null)
    const answer = await post(input).expect(200)
    expect(answer.body).toEqual(JSON.parse(JSON.stringify(checkReadings(page!, input))))
    expect(checkResultSchema.parse(answer.body).verdicts[0]?.standing).toBe('inside')
    expect(answer.headers['cache-control']).toBe('no-store')
  })

  it('judges by the revision it is asked for', async () => {
    const answer = checkResultSchema.parse((await post({ ...input, revision: 1 }).expect(200)).body)
    expect(answer.verdicts[0]?.standing).toBe('past')
    expect(answer.revision).toMatchObject({ number: 1, currentNumber: 2 })
  })

  it('names each field it refuses', async () => {
    const body = { ...input, season: 'spring', readings: [{ ...hot, unit: 'K' }], colour: 'green' }
    const answer = await post(body)
      .expect(400)
      .expect('Content-Type', /^application\/problem\+json/)
    const paths = (answer.body.errors as { path: string }[]).map(({ path }) => path)
    expect(paths.sort()).toEqual(['colour', 'readings.0.unit', 'season'])
  })

  it('refuses what is not JSON, what is too long, and what does not say it is JSON', async () => {
    await post('{"slug":').expect(400)
    await post({ ...input, slug: 'x'.repeat(JSON_BODY_BYTES_MAX) }).expect(413)
    await post('slug=x').set('Content-Type', 'application/x-www-form-urlencoded').expect(415)
    await request(test.app).post('/api/v1/checks').set('X-Forwarded-For', '192.0.2.1').expect(415)
  })

  it('does not find an unknown page or revision', async () => {
    await post({ ...input, slug: 'no-such-page' }).expect(404)
    await post({ ...input, slug: 'a\0b' }).expect(404)
    await post({ ...input, revision: 3 }).expect(404)
    await post({ ...input, revision: Number.MAX_SAFE_INTEGER }).expect(404)
  })

  it('is refused when a page of another site sends it', async () => {
    await post(input).set('Origin', 'https://elsewhere.example').expect(403)
    await post(input).set('Origin', 'null').expect(403)
    await post(input).set('Sec-Fetch-Site', 'cross-site').expect(403)
    await post(input).set('Sec-Fetch-Site', 'same-site').expect(403)
    await post(input).set('Origin', TEST_ORIGIN).expect(200)
    await post(input).set('Sec-Fetch-Site', 'same-origin').expect(200)
  })

  it('is refused when one address asks too often', async () => {
    const statuses: number[] = []
    for (let count = 0; count <= CHECK_LIMIT.requests; count++) {
      statuses.push((await post('{}', '192.0.2.99')).status)
    }
    expect(statuses.slice(0, -1).every((status) => status === 400)).toBe(true)
    expect(statuses.at(-1)).toBe(429)
    await post(input, '192.0.2.100').expect(200)
  })
})
