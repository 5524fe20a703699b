import type { RequestHandler } from 'express'
import helmet from 'helmet'
import type { Config } from '../config.js'

const TWO_YEARS_IN_SECONDS = 63_072_000

/**
 * The headers every answer carries. No script but our own files; inline styles are allowed because the component
 * library writes them. Transport security and upgrades only where the public address is https.
 */
export function securityHeaders(config: Pick<Config, 'environment' | 'publicUrl'>): RequestHandler[] {
  const isSecure = config.publicUrl.startsWith('https:')
  return [
    helmet({
      contentSecurityPolicy: {
        useDefaults: false,
        directives: {
          defaultSrc: ["'none'"],
          scriptSrc: ["'self'"],
          styleSrc: ["'self'", "'unsafe-inline'"],
          imgSrc: ["'self'", 'data:'],
          fontSrc: ["'self'"],
          // In development Vite's client keeps a web socket to reload what changed.
          connectSrc: config.environment === 'development' ? ["'self'", 'ws:'] : ["'self'"],
          workerSrc: ["'self'"],
          manifestSrc: ["'self'"],
          formAction: ["'self'"],
          baseUri: ["'none'"],
          objectSrc: ["'none'"],
          frameAncestors: ["'none'"],
          ...(isSecure && { upgradeInsecureRequests: [] }),
        },
      },
      frameguard: { action: 'deny' },
      strictTransportSecurity: isSecure && { maxAge: TWO_YEARS_IN_SECONDS, includeSubDomains: false },
      referrerPolicy: { policy: 'strict-origin-when-cross-origin' },
    }),
    (_request, response, next) => {
      response.setHeader('Permissions-Policy', 'camera=(), geolocation=(), microphone=()')
      next()
    },
  ]
}
