import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import {
  addDatasetVersion,
  addSource,
  makeClassificationItem,
  makeNameItem,
  publish,
} from '../../helpers/page-items.js'
import { startTestApp, TEST_ORIGIN } from '../../helpers/test-app.js'
import type { TestApp } from '../../helpers/test-app.js'

let test: TestApp
let sourceId: string
beforeAll(async () => {
  test = await startTestApp()
  const { dataSource } = test
  const datasetVersionId = await addDatasetVersion(dataSource.manager, 'names')
  await publish(dataSource, [makeNameItem({ name: 'Lacerta inventa' }), makeClassificationItem()])
  await publish(dataSource, [makeNameItem({ name: 'Rana temporaria' }), makeClassificationItem()], {
    species: { isInvented: false },
    broughtBy: { form: 'dataset', datasetVersionId },
  })
  sourceId = await addSource(dataSource, {
    isInvented: false,
    broughtBy: { form: 'dataset', datasetVersionId },
  })
})
afterAll(() => test.stop())

const get = (path: string) => request(test.app).get(path)
const addresses = (xml: string) => [...xml.matchAll(/<loc>(.*?)<\/loc>/g)].map(([, address]) => address)

describe('GET /sitemap.xml', () => {
  it('names parts that together hold every page of a real species and every source', async () => {
    const index = await get('/sitemap.xml')
      .expect(200)
      .expect('Content-Type', /^application\/xml/)
    const parts = addresses(index.text)
    expect(parts).toEqual(
      ['pages', 'species-1', 'sources-1'].map((part) => `${TEST_ORIGIN}/sitemaps/${part}.xml`),
    )
    const held: (string | undefined)[] = []
    for (const part of parts) {
      const answer = await get(part!.slice(TEST_ORIGIN.length)).expect(200)
      held.push(...addresses(answer.text))
    }
    expect(held).toContain(`${TEST_ORIGIN}/`)
    expect(held.filter((address) => /\/s(pecies|ources)\//.test(address!))).toEqual([
      `${TEST_ORIGIN}/species/rana-temporaria`,
      `${TEST_ORIGIN}/sources/${sourceId}`,
    ])
  })
})

describe('GET /sitemaps/:part.xml', () => {
  it('says when a page was changed', async () => {
    const answer = await get('/sitemaps/species-1.xml').expect(200)
    expect(answer.text).toContain('<lastmod>2026-03-01T10:20:30Z</lastmod>')
  })

  it.each(['species-2', 'species-0', 'species-x', 'animals-1', 'sources-99999'])(
    'does not find %s',
    async (part) => {
      await get(`/sitemaps/${part}.xml`).expect(404)
    },
  )
})

describe('GET /robots.txt', () => {
  it('names the sitemap', async () => {
    const answer = await get('/robots.txt')
      .expect(200)
      .expect('Content-Type', /^text\/plain/)
    expect(answer.text).toContain(`Sitemap: ${TEST_ORIGIN}/sitemap.xml\n`)
  })
})
