import type { Problem } from '../../shared/errors.js'
import { ApiError } from './api-error.js'

const API_BASE = '/api/v1'

function isProblem(body: unknown): body is Problem {
  return typeof body === 'object' && body !== null && 'code' in body && 'title' in body
}

async function toError(response: Response): Promise<ApiError> {
  const body: unknown = await response.json().catch(() => null)
  if (isProblem(body)) return new ApiError(response.status, body.code, body.detail ?? body.title, body.errors)
  return new ApiError(response.status, 'unknown', `The server answered with status ${response.status}.`)
}

async function request(path: string, init: RequestInit): Promise<unknown> {
  let response: Response
  try {
    response = await fetch(API_BASE + path, init)
  } catch (thrown) {
    if (thrown instanceof DOMException && thrown.name === 'AbortError') throw thrown
    throw new ApiError(0, 'offline', 'The server could not be reached. Check the connection and try again.')
  }
  if (!response.ok) throw await toError(response)
  if (response.status === 204) return null
  return await response.json()
}

/** Gives the answer of `GET /api/v1<path>`. Throws `ApiError`, or an `AbortError` when `signal` fires. */
export async function getJson(path: string, signal?: AbortSignal): Promise<unknown> {
  return await request(path, { headers: { accept: 'application/json' }, signal })
}

/** Sends `body` as JSON to `POST /api/v1<path>` and gives the answer, null for an empty one. Throws `ApiError`. */
export async function postJson(path: string, body: unknown): Promise<unknown> {
  return await request(path, {
    method: 'POST',
    headers: { accept: 'application/json', 'content-type': 'application/json' },
    body: JSON.stringify(body),
  })
}
