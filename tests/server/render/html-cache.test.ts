import { brotliDecompressSync, gunzipSync } from 'node:zlib'
import { describe, expect, it } from 'vitest'
import { CachedPage, HtmlCache } from '../../../server/render/html-cache.js'

const page = (html: string) => new CachedPage(200, html)
const keep = (made: CachedPage) => () => Promise.resolve({ page: made, keep: true })

describe('CachedPage', () => {
  it('gives the same page in every encoding, each under a tag of its own', async () => {
    const made = page('<p>é</p>'.repeat(500))
    expect((await made.bytes('identity')).toString()).toBe('<p>é</p>'.repeat(500))
    expect(gunzipSync(await made.bytes('gzip')).toString()).toBe('<p>é</p>'.repeat(500))
    expect(brotliDecompressSync(await made.bytes('br')).toString()).toBe('<p>é</p>'.repeat(500))
    const tags = (['identity', 'gzip', 'br'] as const).map((encoding) => made.etag(encoding))
    expect(new Set(tags).size).toBe(3)
    expect(page('<p>é</p>'.repeat(500)).etag('br')).toBe(made.etag('br'))
    expect(page('<p>e</p>'.repeat(500)).etag('br')).not.toBe(made.etag('br'))
  })
})

describe('HtmlCache', () => {
  it('finds what it made, in its epoch only', async () => {
    const cache = new HtmlCache(100_000)
    const made = page('one')
    expect(await cache.make('7', 'a', keep(made))).toBe(made)
    expect(cache.find('7', 'a')).toBe(made)
    expect(cache.find('8', 'a')).toBeNull()
    expect(cache.find('7', 'b')).toBeNull()
  })

  it('forgets everything of an earlier epoch when a later one begins', async () => {
    const cache = new HtmlCache(100_000)
    await cache.make('7', 'a', keep(page('one')))
    await cache.make('8', 'b', keep(page('two')))
    expect(cache.find('7', 'a')).toBeNull()
    expect(cache.find('8', 'a')).toBeNull()
  })

  it('does not let a page that was begun in an earlier epoch push out a later one', async () => {
    const cache = new HtmlCache(100_000)
    const later = page('later')
    await cache.make('10', 'a', keep(later))
    await cache.make('9', 'a', keep(page('earlier')))
    expect(cache.find('10', 'a')).toBe(later)
  })

  it('does not keep what is not to be kept, nor what failed', async () => {
    const cache = new HtmlCache(100_000)
    await cache.make('7', 'a', () => Promise.resolve({ page: page('one'), keep: false }))
    expect(cache.find('7', 'a')).toBeNull()
    await expect(cache.make('7', 'a', () => Promise.reject(new Error('broken')))).rejects.toThrow('broken')
    const made = page('two')
    expect(await cache.make('7', 'a', keep(made))).toBe(made)
  })

  it('makes a page once for all who ask for it together', async () => {
    const cache = new HtmlCache(100_000)
    let times = 0
    const make = () => {
      times += 1
      return Promise.resolve({ page: page('one'), keep: true })
    }
    await Promise.all(Array.from({ length: 20 }, () => cache.make('7', 'a', make)))
    expect(times).toBe(1)
  })

  it('drops the least recently used pages when it grows too heavy', async () => {
    const heavy = () => page('x'.repeat(1000))
    const cache = new HtmlCache(heavy().weight * 3)
    for (const key of ['a', 'b', 'c']) await cache.make('7', key, keep(heavy()))
    expect(cache.find('7', 'a')).not.toBeNull()
    await cache.make('7', 'd', keep(heavy()))
    expect(['a', 'b', 'c', 'd'].map((key) => cache.find('7', key) !== null)).toEqual([
      true,
      false,
      true,
      true,
    ])
  })

  it('keeps no page that alone is too heavy, and none of the others goes for it', async () => {
    const cache = new HtmlCache(5000)
    await cache.make('7', 'a', keep(page('small')))
    await cache.make('7', 'b', keep(page('x'.repeat(10_000))))
    expect(cache.find('7', 'a')).not.toBeNull()
    expect(cache.find('7', 'b')).toBeNull()
  })
})
