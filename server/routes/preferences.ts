import { Router } from 'express'
import type { CookieOptions } from 'express'
import { z } from 'zod'

const YEAR_MS = 365 * 24 * 60 * 60 * 1000

const preferencesQuery = z.object({
  unit: z.enum(['C', 'F']).optional(),
  length: z.enum(['cm', 'in']).optional(),
  theme: z.enum(['light', 'dark', 'system']).optional(),
  back: z.string().max(2000).optional(),
})

/** Where to go back to: the path and query of an address of this site, the first page for anything else. */
export function toOwnPath(back: string | undefined, origin: string): string {
  if (back === undefined || !back.startsWith('/')) return '/'
  if (!URL.canParse(back, origin)) return '/'
  const address = new URL(back, origin)
  // A path of slashes alone at its start would name another host once it is sent as a location.
  if (address.origin !== new URL(origin).origin || address.pathname.startsWith('//')) return '/'
  return address.pathname + address.search
}

/** `GET /preferences`: what the switches of the header do for a reader without script. Sets the cookies, goes back. */
export function preferences(origin: string): Router {
  const router = Router()
  router.get('/preferences', (request, response) => {
    const { unit, length, theme, back } = preferencesQuery.parse(request.query)
    const options: CookieOptions = {
      path: '/',
      maxAge: YEAR_MS,
      sameSite: 'lax',
      secure: origin.startsWith('https:'),
    }
    if (unit !== undefined) response.cookie('mg_unit', unit, options)
    if (length !== undefined) response.cookie('mg_length', length, options)
    if (theme !== undefined) response.cookie('mg_theme', theme, options)
    response.setHeader('Cache-Control', 'no-store')
    response.redirect(303, toOwnPath(back, origin))
  })
  return router
}
