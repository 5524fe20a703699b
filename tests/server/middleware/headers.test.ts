import { Writable } from 'node:stream'
import express from 'express'
import request from 'supertest'
import { describe, expect, it } from 'vitest'
import type { Config } from '../../../server/config.js'
import { createLog } from '../../../server/log.js'
import { requestLog } from '../../../server/middleware/request-log.js'
import { securityHeaders } from '../../../server/middleware/security-headers.js'

async function headersFor(part: Partial<Config>): Promise<Record<string, string>> {
  const config = { environment: 'production' as const, publicUrl: 'http://127.0.0.1:8080', ...part }
  const app = express().use(...securityHeaders(config), (_request, response) => void response.send('done'))
  return (await request(app).get('/').expect(200)).headers
}

describe('securityHeaders', () => {
  it('let nothing run that is not a file of ours, and let no other site frame or feed a page', async () => {
    const headers = await headersFor({})
    const policy = Object.fromEntries(
      headers['content-security-policy']!.split(';').map((directive) => {
        const [name, ...values] = directive.trim().split(' ')
        return [name, values.join(' ')]
      }),
    )
    expect(policy).toMatchObject({
      'default-src': "'none'",
      'script-src': "'self'",
      'connect-src': "'self'",
      'form-action': "'self'",
      'base-uri': "'none'",
      'frame-ancestors': "'none'",
    })
    expect(policy).not.toHaveProperty('upgrade-insecure-requests')
    expect(headers).toMatchObject({ 'x-content-type-options': 'nosniff', 'x-frame-options': 'DENY' })
  })

  it('ask for https only where the site is reached by https', async () => {
    expect(await headersFor({})).not.toHaveProperty('strict-transport-security')
    const secure = await headersFor({ publicUrl: 'https://example.org' })
    expect(secure['strict-transport-security']).toMatch(/^max-age=\d{8}$/)
    expect(secure['content-security-policy']).toContain('upgrade-insecure-requests')
  })

  it('let a page under development hear of changes', async () => {
    expect((await headersFor({ environment: 'development' }))['content-security-policy']).toContain(
      "connect-src 'self' ws:",
    )
  })
})

describe('requestLog', () => {
  const ask = async (trustsProxy: boolean, id: string) => {
    const log = createLog({ logLevel: 'info' }, new Writable({ write: (_chunk, _encoding, done) => done() }))
    const app = express().use(
      requestLog(log, trustsProxy),
      (_request, response) => void response.send('done'),
    )
    return (await request(app).get('/').set('X-Request-Id', id)).headers['x-request-id']
  }

  it('takes the id of a request from a trusted proxy only, and only a plain one', async () => {
    expect(await ask(true, 'proxy-id-0001')).toBe('proxy-id-0001')
    expect(await ask(false, 'proxy-id-0001')).not.toBe('proxy-id-0001')
    expect(await ask(true, 'with space and "quotes"')).toMatch(/^[\w-]{36}$/)
  })
})
