import type { Request, RequestHandler } from 'express'
import { Forbidden } from '../errors.js'

const SAFE_METHODS: ReadonlySet<string> = new Set(['GET', 'HEAD', 'OPTIONS'])

/**
 * Refuses an unsafe request that a page of another origin sent: by its `Origin`, else by its `Sec-Fetch-Site`. A browser
 * always sends one of the two; a program without a browser sends neither and carries no reader's cookie, so it may pass.
 */
export function requireSameOrigin(publicUrl: string): RequestHandler {
  return (request, _response, next) => {
    if (!SAFE_METHODS.has(request.method) && !isSameOrigin(request, publicUrl)) {
      throw new Forbidden('This request came from a page of another site, so it was not carried out.')
    }
    next()
  }
}

function isSameOrigin(request: Request, publicUrl: string): boolean {
  const origin = request.get('origin')
  if (origin !== undefined) return origin === publicUrl || origin === `${request.protocol}://${request.host}`
  const site = request.get('sec-fetch-site')
  return site === undefined || site === 'same-origin' || site === 'none'
}
