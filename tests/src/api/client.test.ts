import { afterEach, describe, expect, it, vi } from 'vitest'
import { ApiError, toApiError } from '../../../src/api/api-error.js'
import { getJson, postJson } from '../../../src/api/client.js'

afterEach(() => vi.unstubAllGlobals())

function answerWith(body: string, status: number): void {
  vi.stubGlobal('fetch', () => Promise.resolve(new Response(body, { status })))
}

async function catchError(promise: Promise<unknown>): Promise<ApiError> {
  const thrown: unknown = await promise.then(
    () => null,
    (error: unknown) => error,
  )
  expect(thrown).toBeInstanceOf(ApiError)
  return thrown as ApiError
}

describe('reading from the API', () => {
  it('gives the answer below /api/v1', async () => {
    const asked: string[] = []
    vi.stubGlobal('fetch', (path: string) => {
      asked.push(path)
      return Promise.resolve(Response.json({ total: 3 }))
    })
    expect(await getJson('/species?q=boa')).toEqual({ total: 3 })
    expect(asked).toEqual(['/api/v1/species?q=boa'])
  })

  it('turns a problem document into an error with its words and fields', async () => {
    answerWith(
      JSON.stringify({
        type: '/problems/invalid-input',
        title: 'The input cannot be used',
        status: 400,
        detail: 'One field is wrong.',
        code: 'invalid-input',
        errors: [{ path: 'name', message: 'Say which species.' }],
      }),
      400,
    )
    const error = await catchError(postJson('/page-requests', {}))
    expect(error).toMatchObject({ status: 400, code: 'invalid-input', message: 'One field is wrong.' })
    expect(error.errors).toEqual([{ path: 'name', message: 'Say which species.' }])
  })

  it('says so when something other than our server answers', async () => {
    answerWith('<h1>Bad gateway</h1>', 502)
    expect(await catchError(getJson('/home'))).toMatchObject({ status: 502, code: 'unknown' })
  })

  it('says so when nobody answers', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('Failed to fetch')))
    expect(await catchError(getJson('/home'))).toMatchObject({ status: 0, code: 'offline' })
  })
})

describe('an error from elsewhere', () => {
  it('keeps status and code of the server’s own errors and hides the words of any other', () => {
    const own = Object.assign(new Error('There is no such page.'), { status: 404, code: 'not-found' })
    expect(toApiError(own)).toMatchObject({
      status: 404,
      code: 'not-found',
      message: 'There is no such page.',
    })
    const strange = toApiError(new Error('connect ECONNREFUSED 10.0.0.1:5432'))
    expect(strange.status).toBe(500)
    expect(strange.message).not.toContain('10.0.0.1')
  })
})
