import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { pageRequestAnswerSchema } from '../../../shared/page-requests.js'
import { PAGE_REQUEST_LIMIT } from '../../../server/routes/page-requests.js'
import { startTestApp } from '../../helpers/test-app.js'
import type { TestApp } from '../../helpers/test-app.js'

let test: TestApp
beforeAll(async () => {
  test = await startTestApp({ trustedProxies: 1 })
})
afterAll(() => test.stop())

const post = (body: object, address = '192.0.2.1') =>
  request(test.app).post('/api/v1/page-requests').set('X-Forwarded-For', address).send(body)

describe('POST /api/v1/page-requests', () => {
  it('counts how often a page was asked for, however the name is written', async () => {
    await post({ name: 'Python regius' }).expect(200, { name: 'Python regius', times: 1 })
    const answer = await post({ name: '  PYTHON   régius ' }).expect(200)
    expect(pageRequestAnswerSchema.parse(answer.body)).toEqual({ name: 'Python regius', times: 2 })
  })

  it.each([
    {},
    { name: '' },
    { name: '   ' },
    { name: '123' },
    { name: 'x'.repeat(201) },
    { name: 'a', more: 1 },
    { name: 'a\0b' },
  ])('refuses %j and counts nothing', async (body) => {
    const answer = await post(body, '192.0.2.2').expect(400)
    expect(answer.body).toMatchObject({ code: 'invalid-input' })
    expect(answer.body.errors).toHaveLength(1)
  })

  it('is refused when a page of another site sends it', async () => {
    await post({ name: 'Python regius' }).set('Origin', 'https://elsewhere.example').expect(403)
  })

  it('is refused when one address asks too often', async () => {
    for (let count = 0; count < PAGE_REQUEST_LIMIT.requests; count++) {
      await post({ name: 'Boa inventa' }, '192.0.2.3').expect(200)
    }
    const refused = await post({ name: 'Boa inventa' }, '192.0.2.3').expect(429)
    expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0)
  })
})
