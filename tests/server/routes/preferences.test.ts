import express from 'express'
import request from 'supertest'
import { describe, expect, it } from 'vitest'
import { preferences, toOwnPath } from '../../../server/routes/preferences.js'

const ORIGIN = 'http://127.0.0.1:8080'
const app = express().use(preferences(ORIGIN))

/** The Set-Cookie lines of an answer. */
function cookiesOf(answer: request.Response): string[] {
  return [answer.headers['set-cookie'] ?? []].flat()
}

describe('GET /preferences', () => {
  it('keeps what was chosen in cookies that scripts can read, and goes back', async () => {
    const answer = await request(app)
      .get('/preferences')
      .query({ unit: 'F', back: '/species?q=boa' })
      .expect(303)
    expect(answer.headers.location).toBe('/species?q=boa')
    expect(cookiesOf(answer)).toHaveLength(1)
    expect(cookiesOf(answer)[0]).toMatch(/^mg_unit=F; Max-Age=31536000; Path=\/; .*SameSite=Lax$/)
    expect(answer.headers['cache-control']).toBe('no-store')
  })

  it('sets length and theme together', async () => {
    const answer = await request(app).get('/preferences').query({ length: 'in', theme: 'dark', back: '/' })
    expect(cookiesOf(answer).map((cookie) => cookie.split(';')[0])).toEqual(['mg_length=in', 'mg_theme=dark'])
  })

  it('keeps its cookies to https where the site is on it', async () => {
    const secure = express().use(preferences('https://moss.example'))
    const answer = await request(secure).get('/preferences?unit=C')
    expect(cookiesOf(answer)[0]).toContain('; Secure')
  })
})

describe('the way back', () => {
  it.each([
    'https://elsewhere.example/',
    '//elsewhere.example',
    '/\\elsewhere.example',
    'species',
    '',
    undefined,
    '/..//x',
  ])('leads to the first page for %j', (back) => {
    expect(toOwnPath(back, ORIGIN)).toBe('/')
  })

  it('keeps a path of this site with its query', () => {
    expect(toOwnPath('/species/a-b?stage=adult#x', ORIGIN)).toBe('/species/a-b?stage=adult')
  })
})
