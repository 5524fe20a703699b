import type { ErrorRequestHandler, Request } from 'express'
import { z } from 'zod'
import {
  AppError,
  Conflict,
  InvalidInput,
  NotFound,
  TooLarge,
  Unavailable,
  UnsupportedContent,
} from '../errors.js'
import type { Log } from '../log.js'
import { writeErrorPage } from '../render/error-page.js'

const UNIQUE_VIOLATION = '23505'
/** Connection failures of Node and of PostgreSQL (class 08, 57P: https://www.postgresql.org/docs/15/errcodes-appendix.html). */
const DATABASE_AWAY = /^(ECONNREFUSED|ECONNRESET|EPIPE|ENOENT|ETIMEDOUT|08\w{3}|57P0[123]|53300)$/

/** Answers every error: as a problem document (RFC 9457), or as a page where a browser asked for one. */
export function errorHandler(log: Log): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    const known = toAppError(error)
    const requestId = String(response.getHeader('X-Request-Id'))
    if (known === null) log.error({ err: error, requestId }, 'A request failed.')
    else if (known.status >= 500) log.error({ err: error, requestId }, known.message)
    if (response.headersSent) {
      next(error)
      return
    }
    const answer =
      known ??
      new AppError('internal', 500, 'Something failed here', 'Something failed here. It has been logged.')
    const problem = { ...answer.toProblem(), requestId }
    response.status(answer.status).setHeader('Cache-Control', 'no-store')
    if (wantsPage(request)) {
      response.type('html').send(writeErrorPage(problem))
    } else {
      response.type('application/problem+json').send(JSON.stringify(problem))
    }
  }
}

/** What an error means to the reader, or null where it is a fault of ours. */
export function toAppError(error: unknown): AppError | null {
  if (error instanceof AppError) return error
  if (error instanceof z.ZodError) return toInvalidInput(error)
  if (error instanceof URIError) return new InvalidInput('The address holds a wrong percent sign.')
  const { type, code } = readTags(error)
  switch (type) {
    case 'entity.too.large':
      return new TooLarge('The body is too long.')
    case 'entity.parse.failed':
      return new InvalidInput('The body is not JSON.')
    case 'encoding.unsupported':
    case 'charset.unsupported':
      return new UnsupportedContent('The body is encoded in a way that is not understood.')
    case 'request.aborted':
    case 'request.size.invalid':
      return new InvalidInput('The body ended before it was whole.')
    default:
  }
  if (code === UNIQUE_VIOLATION) return new Conflict('Somebody else saved the same thing first.')
  if (code !== null && DATABASE_AWAY.test(code)) {
    return new Unavailable('The database does not answer at the moment. Please try again in a minute.')
  }
  return null
}

/** A refusal of a schema, with the path of each field and a sentence about it. */
export function toInvalidInput(error: z.ZodError): InvalidInput {
  const errors = error.issues.flatMap((issue) =>
    issue.code === 'unrecognized_keys'
      ? issue.keys.map((key) => ({
          path: [...issue.path, key].join('.'),
          message: 'This is not known here.',
        }))
      : [{ path: issue.path.join('.'), message: issue.message }],
  )
  const paths = [...new Set(errors.map(({ path }) => path).filter((path) => path !== ''))]
  return new InvalidInput(
    paths.length === 0
      ? 'The input is not of the expected form.'
      : `Please look at: ${paths.slice(0, 5).join(', ')}.`,
    errors,
  )
}

/** The answer to an address that does not exist. */
export function refuseUnknownAddress(request: Request): never {
  throw new NotFound(`There is nothing at ${request.path}.`)
}

function wantsPage(request: Request): boolean {
  return !request.path.startsWith('/api/') && request.accepts(['json', 'html']) === 'html'
}

/** The `type` of a body parser's error and the `code` of a system or database error, which TypeORM wraps. */
function readTags(error: unknown): { type: string | null; code: string | null } {
  if (typeof error !== 'object' || error === null) return { type: null, code: null }
  const inner = 'driverError' in error && typeof error.driverError === 'object' ? error.driverError : error
  const code = inner !== null && 'code' in inner && typeof inner.code === 'string' ? inner.code : null
  return { type: 'type' in error && typeof error.type === 'string' ? error.type : null, code }
}
