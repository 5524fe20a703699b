import compression from 'compression'
import { Router } from 'express'
import type { DataSource } from 'typeorm'
import type { Config } from '../config.js'
import { refuseUnknownAddress } from '../middleware/error-handler.js'
import { requireSameOrigin } from '../middleware/same-origin.js'
import { checks } from './checks.js'
import { pageRequests } from './page-requests.js'
import type { RawQuery, Read } from './read.js'

/** The public API: every read of the list, and the few things a visitor may send. */
export function api(dataSource: DataSource, config: Config, reads: readonly Read[]): Router {
  const router = Router({ caseSensitive: true, strict: true })
  router.use(compression(), requireSameOrigin(config.publicUrl))
  for (const read of reads) {
    router.get(read.path, async (request, response) => {
      const text = await read.answer(dataSource.manager, request.params, request.query as RawQuery)
      // May be kept, but is asked about each time: its tag is made of its content.
      response.setHeader('Cache-Control', 'no-cache')
      response.type('json').send(text)
    })
  }
  router.use('/checks', checks(dataSource))
  router.use('/page-requests', pageRequests(dataSource))
  router.use(refuseUnknownAddress)
  return router
}
