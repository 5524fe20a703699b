import { randomUUID } from 'node:crypto'
import type { IncomingMessage, ServerResponse } from 'node:http'
import { pinoHttp } from 'pino-http'
import type { HttpLogger } from 'pino-http'
import type { Log } from '../log.js'

const REQUEST_ID = /^[\w-]{8,64}$/

/**
 * Gives every request an id (its own, or the one a trusted proxy gave it), answers with it in `X-Request-Id`, and logs
 * one line when it ends. A line holds no address, no header and no query string: they can tell who asked.
 */
export function requestLog(log: Log, trustsProxy: boolean): HttpLogger {
  return pinoHttp({
    logger: log,
    genReqId(request: IncomingMessage, response: ServerResponse) {
      const given = trustsProxy ? request.headers['x-request-id'] : undefined
      const id = typeof given === 'string' && REQUEST_ID.test(given) ? given : randomUUID()
      response.setHeader('X-Request-Id', id)
      return id
    },
    serializers: {
      req: (request: { id: unknown; method: string; url: string }) => ({
        id: request.id,
        method: request.method,
        path: request.url.split('?', 1)[0],
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
    // The error handler logs what went wrong, with its cause; this line only says how the request ended.
    customLogLevel: (_request, response) => (response.statusCode >= 500 ? 'error' : 'info'),
    customErrorObject: (_request, _response, _error, loggable: Record<string, unknown>) => ({
      req: loggable.req,
      res: loggable.res,
      responseTime: loggable.responseTime,
    }),
  })
}
