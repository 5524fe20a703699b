import type { Request, RequestHandler, Response } from 'express'
import { SEARCH_PARAMETERS } from '../../shared/search-query.js'
import { CachedPage, HtmlCache } from '../render/html-cache.js'
import type { Encoding } from '../render/html-cache.js'
import type { PageRenderer } from '../render/page-renderer.js'
import { readPreferences } from '../render/preferences.js'
import type { SiteEpoch } from '../render/site-epoch.js'

/** How much the cached pages of one process may weigh together. */
const CACHE_BYTES_MAX = 64_000_000
/** A longer address is one of a kind, so its page is not kept. */
const CACHED_ADDRESS_LENGTH_MAX = 500
/** Parameters that pages know; an address with any other is not worth a place in the cache. */
const KNOWN_PARAMETERS: ReadonlySet<string> = new Set<string>([
  ...SEARCH_PARAMETERS,
  'stage',
  'season',
  'lights',
])

export interface Pages {
  renderer: PageRenderer
  epoch: SiteEpoch
  origin: string
  /** Answers a read by its path below /api/v1. */
  read: (apiPath: string) => Promise<unknown>
}

/**
 * Answers with pages rendered on the server. They are the same for everybody with the same preferences, so they are kept
 * until anything is published; browsers ask each time whether theirs is still right.
 */
export function servePages({ renderer, epoch, origin, read }: Pages): RequestHandler {
  const cache = new HtmlCache(CACHE_BYTES_MAX)
  return async (request, response, next) => {
    // A request line may also hold a whole address or an asterisk; neither is a page's.
    const isForPage =
      request.originalUrl.startsWith('/') && (request.method === 'GET' || request.method === 'HEAD')
    if (!isForPage) {
      next()
      return
    }
    const moved = findTrueAddress(request.originalUrl)
    if (moved !== null) {
      response.redirect(308, moved)
      return
    }
    const url = request.originalUrl
    const preferences = readPreferences(request.headers.cookie)
    const make = async () => {
      const { status, location, html, cacheable } = await renderer.render(url, { read, preferences, origin })
      return { page: new CachedPage(status, html, location), keep: cacheable && status === 200 }
    }
    const known = epoch.current()
    if (known === null || !isWorthKeeping(url)) {
      await send(request, response, (await make()).page)
      return
    }
    const { temperatureUnit, lengthUnit, theme } = preferences
    const key = `${renderer.buildId} ${temperatureUnit} ${lengthUnit} ${theme} ${url}`
    const kept = cache.find(known, key)
    await send(request, response, kept ?? (await cache.make(known, key, make)))
  }
}

/** The one address of a page that was asked for with a slash at the end or capitals in its slug; null where it is right. */
export function findTrueAddress(url: string): string | null {
  const start = url.indexOf('?')
  const path = start === -1 ? url : url.slice(0, start)
  const search = start === -1 ? '' : url.slice(start)
  // Several slashes or backslashes at the start would make the new address one of another host.
  let right = path.replace(/[/\\]{2,}/g, '/').replace(/(?!^)\/+$/, '')
  const [, species, slug = '', rest = ''] = /^(\/species\/)([^/]+)(.*)$/.exec(right) ?? []
  if (species !== undefined && /[A-Z]/.test(slug.replace(/%[0-9A-Fa-f]{2}/g, ''))) {
    right = species + slug.toLowerCase() + rest
  }
  return right === path ? null : right + search
}

function isWorthKeeping(url: string): boolean {
  if (url.length > CACHED_ADDRESS_LENGTH_MAX) return false
  const start = url.indexOf('?')
  if (start === -1) return true
  return [...new URLSearchParams(url.slice(start)).keys()].every((name) => KNOWN_PARAMETERS.has(name))
}

async function send(request: Request, response: Response, page: CachedPage): Promise<void> {
  if (page.location !== null) {
    response.redirect(page.status, page.location)
    return
  }
  const encoding = chooseEncoding(request)
  const etag = page.etag(encoding)
  response.setHeader('Cache-Control', 'no-cache')
  response.setHeader('Vary', 'Accept-Encoding, Cookie')
  response.setHeader('ETag', etag)
  if (page.status === 200 && names(request.headers['if-none-match'], etag)) {
    response.statusCode = 304
    response.end()
    return
  }
  const held = page.bytes(encoding)
  const bytes = held instanceof Buffer ? held : await held
  response.statusCode = page.status
  response.setHeader('Content-Type', 'text/html; charset=utf-8')
  if (encoding !== 'identity') response.setHeader('Content-Encoding', encoding)
  response.setHeader('Content-Length', bytes.length)
  response.end(request.method === 'HEAD' ? undefined : bytes)
}

function chooseEncoding(request: Request): Encoding {
  if (request.headers['accept-encoding'] === undefined) return 'identity'
  const chosen = request.acceptsEncodings(['br', 'gzip', 'identity'])
  return chosen === 'br' || chosen === 'gzip' ? chosen : 'identity'
}

/** Whether an If-None-Match header names the tag (weak comparison, RFC 9110 section 13.1.2). */
function names(header: string | undefined, etag: string): boolean {
  if (header === undefined) return false
  return header === '*' || header.split(',').some((tag) => tag.trim().replace(/^W\//, '') === etag)
}
