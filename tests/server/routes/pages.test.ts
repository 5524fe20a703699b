import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest'
import { findTrueAddress } from '../../../server/routes/pages.js'
import type { PublishedRevision } from '../../../server/services/revisions/publish-revision.js'
import { makeClassificationItem, makeNameItem, publish } from '../../helpers/page-items.js'
import { startTestApp, TEST_ORIGIN } from '../../helpers/test-app.js'
import type { TestApp } from '../../helpers/test-app.js'

let test: TestApp
let published: PublishedRevision
const name = makeNameItem({ name: 'Lacerta inventa' })

beforeAll(async () => {
  test = await startTestApp()
  published = await publish(test.dataSource, [name, makeClassificationItem()])
})
afterAll(() => test.stop())

const get = (path: string) => request(test.app).get(path).set('Accept', 'text/html')

/** The epoch travels from the database by a connection of its own. */
async function epochAfter(act: () => Promise<void>): Promise<void> {
  const before = test.epoch.current()
  await act()
  await vi.waitUntil(() => test.epoch.current() !== null && test.epoch.current() !== before, {
    timeout: 10_000,
    interval: 5,
  })
}

describe('GET a page', () => {
  it('is rendered once and then taken from the cache', async () => {
    const before = test.renders()
    const first = await get('/species/lacerta-inventa')
      .expect(200)
      .expect('Content-Type', 'text/html; charset=utf-8')
    const second = await get('/species/lacerta-inventa').expect(200)
    expect(first.text).toContain('<title>Lacerta inventa</title>')
    expect(first.text).toContain(TEST_ORIGIN)
    expect(second.text).toBe(first.text)
    expect(test.renders()).toBe(before + 1)
  })

  it('is rendered in the preferences that the cookies name, each kept apart', async () => {
    const usual = await get('/species/lacerta-inventa')
    const other = await get('/species/lacerta-inventa').set(
      'Cookie',
      'mg_unit=F; mg_length=in; mg_theme=dark',
    )
    expect(usual.text).toContain('degC cm system')
    expect(other.text).toContain('degF in dark')
    expect(other.headers.etag).not.toBe(usual.headers.etag)
    expect(other.headers.vary).toBe('Accept-Encoding, Cookie')
    expect((await get('/species/lacerta-inventa')).text).toBe(usual.text)
  })

  it('sets no cookie and may be kept only with asking', async () => {
    const { headers } = await get('/species/lacerta-inventa')
    expect(headers).not.toHaveProperty('set-cookie')
    expect(headers['cache-control']).toBe('no-cache')
  })

  it('is not sent again to who has it', async () => {
    const { headers } = await get('/species/lacerta-inventa').set('Accept-Encoding', 'br')
    expect(headers.etag).toMatch(/^"[\w-]+-br"$/)
    const again = () => get('/species/lacerta-inventa').set('Accept-Encoding', 'br')
    await again().set('If-None-Match', `"other", W/${headers.etag}`).expect(304).expect('ETag', headers.etag!)
    await again().set('If-None-Match', '"other"').expect(200)
  })

  it('is sent compressed where that is understood', async () => {
    const plain = await get('/species/lacerta-inventa').set('Accept-Encoding', 'identity')
    expect(plain.headers).not.toHaveProperty('content-encoding')
    // The test client undoes the encoding it was told of, so the text is right only if both are.
    for (const [accepted, encoding] of Object.entries({ 'gzip;q=0.5, br': 'br', gzip: 'gzip' })) {
      const answer = await get('/species/lacerta-inventa').set('Accept-Encoding', accepted)
      expect(answer.headers['content-encoding']).toBe(encoding)
      expect(answer.text).toBe(plain.text)
    }
  })

  it('changes as soon as something is published', async () => {
    await get('/species/lacerta-inventa').expect(200)
    await epochAfter(async () => {
      const renamed = { ...name, row: { ...name.row, name: 'Lacerta mutata' } }
      published = await publish(test.dataSource, [renamed, makeClassificationItem()], {
        species: { id: published.speciesId },
        baseRevisionId: published.revisionId,
      })
    })
    const answer = await get('/species/lacerta-inventa').expect(200)
    expect(answer.text).toContain('<title>Lacerta mutata</title>')
  })

  it('is made anew for each reader while the epoch is not known', async () => {
    await get('/about')
    await test.dataSource.query(
      `select pg_terminate_backend(pid) from pg_stat_activity
        where application_name = 'mossgauge epoch' and datname = current_database()`,
    )
    await vi.waitUntil(() => test.epoch.current() === null, { interval: 1 })
    const before = test.renders()
    await Promise.all([get('/about').expect(200), get('/about').expect(200)])
    expect(test.renders()).toBe(before + 2)
    await vi.waitUntil(() => test.epoch.current() !== null, { timeout: 10_000 })
  })

  it('takes no place in the cache with a parameter nobody knows, nor with a very long address', async () => {
    const before = test.renders()
    for (const path of ['/about?utm_source=x', `/sources?q=${'x'.repeat(600)}`]) {
      await get(path).expect(200)
      await get(path).expect(200)
    }
    expect(test.renders()).toBe(before + 4)
    await get('/species?q=frog').expect(200)
    await get('/species?q=frog').expect(200)
    expect(test.renders()).toBe(before + 5)
  })

  it('that does not exist answers 404, and is not kept', async () => {
    const before = test.renders()
    await get('/species/no-such-page').expect(404)
    await get('/species/no-such-page').expect(404)
    expect(test.renders()).toBe(before + 2)
  })

  it('that asks for what cannot be answers with the status of the refusal', async () => {
    await get('/species?limit=1000').expect(400)
    await get('/species/lacerta-inventa?revision=0').expect(400)
  })

  it('that fails is answered with a page that gives a number to report', async () => {
    test.logged.length = 0
    const answer = await get('/broken')
      .expect(500)
      .expect('Content-Type', /^text\/html/)
    expect(answer.text).toContain(String(answer.headers['x-request-id']))
    expect(answer.text).not.toContain('The renderer failed.')
    expect(test.logged.join('')).toContain('The renderer failed.')
    const problem = await request(test.app).get('/broken').expect(500)
    expect(problem.body).toMatchObject({ code: 'internal', status: 500 })
  })

  it('answers HEAD without a body', async () => {
    const { headers, text } = await request(test.app).head('/about').expect(200)
    expect(Number(headers['content-length'])).toBeGreaterThan(0)
    expect(text).toBeUndefined()
  })

  it('does not answer what would change something', async () => {
    await request(test.app).post('/about').expect(404)
    await request(test.app).post('/about').set('Origin', 'https://elsewhere.example').expect(403)
  })
})

describe('GET a file', () => {
  it('never comes to the pages', async () => {
    const before = test.renders()
    await get('/assets/app.js').expect(200)
    await get('/assets/none.js').expect(404)
    await get('/.env').expect(404)
    await get('/%2e%2e/package.json').expect(404)
    expect(test.renders()).toBe(before)
  })
})

describe('GET a page under an address that is not its own', () => {
  it.each([
    ['/species/', '/species'],
    ['/species/Lacerta-Inventa?stage=adult', '/species/lacerta-inventa?stage=adult'],
    ['/species/Lacerta-inventa/revisions/', '/species/lacerta-inventa/revisions'],
    ['//species//x', '/species/x'],
  ])('sends the reader from %s to %s', async (from, to) => {
    await get(from).expect(308).expect('Location', to)
  })

  it.each([
    ['/', null],
    ['/species/a-b?q=A/?', null],
    ['/species/$&A', '/species/$&a'],
    ['/species/peCies/', '/species/pecies'],
    ['/species/%C3%A4', null],
    ['//elsewhere.example/', '/elsewhere.example'],
    ['/\\elsewhere.example/', '/elsewhere.example'],
    ['/\\/elsewhere.example', '/elsewhere.example'],
    ['///', '/'],
  ])('never makes another host of %s', (from, to) => {
    expect(findTrueAddress(from)).toBe(to)
  })
})
