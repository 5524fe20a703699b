import compression from 'compression'
import express from 'express'
import type { Express, RequestHandler } from 'express'
import type { DataSource } from 'typeorm'
import type { Config } from './config.js'
import type { Log } from './log.js'
import { errorHandler, refuseUnknownAddress, toAppError } from './middleware/error-handler.js'
import { requestLog } from './middleware/request-log.js'
import { requireSameOrigin } from './middleware/same-origin.js'
import { securityHeaders } from './middleware/security-headers.js'
import { keepCountsByEpoch } from './render/epoch-counts.js'
import type { PageRenderer } from './render/page-renderer.js'
import type { SiteEpoch } from './render/site-epoch.js'
import { api } from './routes/api.js'
import { health } from './routes/health.js'
import { servePages } from './routes/pages.js'
import { preferences } from './routes/preferences.js'
import { createReader } from './routes/read.js'
import type { Reader } from './routes/read.js'
import { listReads } from './routes/reads.js'
import { sitemap } from './routes/sitemap.js'

export interface AppParts {
  /** Connected. */
  dataSource: DataSource
  config: Config
  log: Log
  renderer: PageRenderer
  epoch: SiteEpoch
}

/** The whole server as a handler of requests. It does not listen, and what it keeps it keeps for itself. */
export function createApp({ dataSource, config, log, renderer, epoch }: AppParts): Express {
  const app = express()
  app.disable('x-powered-by')
  app.set('trust proxy', config.trustedProxies)
  const reads = listReads(keepCountsByEpoch(epoch))
  const reader = createReader(reads)
  const origin = config.publicUrl

  app.use(requestLog(log, config.trustedProxies > 0), ...securityHeaders(config))
  app.use(health(dataSource))
  app.use('/api/v1', api(dataSource, config, reads))
  app.use(requireSameOrigin(origin))
  app.use(sitemap(dataSource, origin))
  app.use(preferences(origin))
  app.use('/api', refuseUnknownAddress)
  app.use(serveFiles(renderer, config))
  app.use(servePages({ renderer, epoch, origin, read: readForPages(reader, dataSource, log) }))
  app.use(refuseUnknownAddress)
  app.use(errorHandler(log))
  return app
}

/** Reads for a page, which shows what went wrong instead of failing: so a fault of ours is logged here. */
function readForPages(
  reader: Reader,
  dataSource: DataSource,
  log: Log,
): (apiPath: string) => Promise<unknown> {
  return async (apiPath) => {
    try {
      return await reader(dataSource.manager, apiPath)
    } catch (error) {
      const known = toAppError(error)
      if (known === null || known.status >= 500)
        log.error({ err: error }, 'A page could not read what it shows.')
      throw known ?? error
    }
  }
}

/** The client's files. Built ones have a dot in their last name and no page has, so a page never waits for a look at the disk. */
function serveFiles(renderer: PageRenderer, config: Config): RequestHandler[] {
  if (config.environment === 'development') return [renderer.files]
  const compress = compression()
  const onlyFiles =
    (handler: RequestHandler): RequestHandler =>
    (request, response, next) => {
      if (/\.[^/]*$/.test(request.path)) handler(request, response, next)
      else next()
    }
  return [onlyFiles(compress), onlyFiles(renderer.files), onlyFiles(refuseUnknownAddress)]
}
