import compression from 'compression'
import { Router } from 'express'
import type { Response } from 'express'
import type { DataSource } from 'typeorm'
import { NotFound } from '../errors.js'
import { countSitemapEntries, findSourceEntries, findSpeciesEntries } from '../queries/sitemap.js'
import type { SitemapEntry } from '../queries/sitemap.js'
import { escapeHtml } from '../render/escape.js'

/** The sitemap protocol allows 50,000 (https://www.sitemaps.org/protocol.html); smaller files load sooner. */
export const SITEMAP_PART_SIZE = 10_000
const NAMESPACE = 'http://www.sitemaps.org/schemas/sitemap/0.9'
const FIXED_PATHS = [
  '/',
  '/species',
  '/check',
  '/sources',
  '/about',
  '/method',
  '/attributions',
  '/terms',
  '/privacy',
]

/** `/sitemap.xml`, which names the parts, the parts themselves, and `/robots.txt`, which names the sitemap. */
export function sitemap(dataSource: DataSource, origin: string): Router {
  const router = Router()
  const db = dataSource.manager
  router.get('/robots.txt', (_request, response) => {
    // Each combination of filters is an address of its own: a crawler would never come to an end.
    response
      .type('text/plain')
      .send(
        `User-agent: *\nDisallow: /api/\nDisallow: /species?\nDisallow: /sources?\nSitemap: ${origin}/sitemap.xml\n`,
      )
  })
  router.get('/sitemap.xml', async (_request, response) => {
    const counts = await countSitemapEntries(db)
    const parts = (kind: 'species' | 'sources') =>
      Array.from(
        { length: Math.ceil(counts[kind] / SITEMAP_PART_SIZE) },
        (_, index) => `${kind}-${index + 1}`,
      )
    const names = ['pages', ...parts('species'), ...parts('sources')]
    const entries = names.map(
      (name) => `<sitemap><loc>${escapeHtml(origin)}/sitemaps/${name}.xml</loc></sitemap>`,
    )
    send(response, `<sitemapindex xmlns="${NAMESPACE}">\n${entries.join('\n')}\n</sitemapindex>`)
  })
  router.get('/sitemaps/pages.xml', (_request, response) => {
    sendEntries(
      response,
      FIXED_PATHS.map((path) => ({ path, changedAt: null })),
    )
  })
  router.get('/sitemaps/:part.xml', compression(), async (request, response) => {
    const [, kind, number] = /^(species|sources)-([1-9]\d{0,4})$/.exec(String(request.params.part)) ?? []
    const find = kind === 'species' ? findSpeciesEntries : findSourceEntries
    const entries =
      number === undefined ? [] : await find(db, SITEMAP_PART_SIZE, (Number(number) - 1) * SITEMAP_PART_SIZE)
    if (entries.length === 0) throw new NotFound('There is no such part of the sitemap.')
    sendEntries(response, entries)
  })
  return router

  function sendEntries(response: Response, entries: SitemapEntry[]): void {
    const lines = entries.map(({ path, changedAt }) => {
      const changed = changedAt === null ? '' : `<lastmod>${changedAt}</lastmod>`
      return `<url><loc>${escapeHtml(origin + path)}</loc>${changed}</url>`
    })
    send(response, `<urlset xmlns="${NAMESPACE}">\n${lines.join('\n')}\n</urlset>`)
  }
}

function send(response: Response, body: string): void {
  response.setHeader('Cache-Control', 'public, max-age=3600')
  response.type('application/xml').send(`<?xml version="1.0" encoding="UTF-8"?>\n${body}\n`)
}
