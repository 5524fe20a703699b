import { json } from 'express'
import type { RequestHandler } from 'express'
import { UnsupportedContent } from '../errors.js'

/** The longest JSON body that is read, in bytes. */
export const JSON_BODY_BYTES_MAX = 100_000

/** Reads a JSON body; a body of any other kind is refused rather than passed on as empty. */
export function jsonBody(): RequestHandler {
  const read = json({ limit: JSON_BODY_BYTES_MAX })
  return (request, response, next) => {
    if (typeof request.is('application/json') !== 'string') {
      throw new UnsupportedContent('The body must be JSON, with the content type application/json.')
    }
    read(request, response, next)
  }
}
