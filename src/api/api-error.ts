/** One thing wrong with what was sent, by the path of its field. */
export interface FieldError {
  path: string
  message: string
}

/** What the API refused or failed at, in words fit for the reader. Status 0: the server was not reached. */
export class ApiError extends Error {
  readonly status: number
  readonly code: string
  readonly errors: FieldError[]

  constructor(status: number, code: string, message: string, errors: FieldError[] = []) {
    super(message)
    this.name = 'ApiError'
    this.status = status
    this.code = code
    this.errors = errors
  }
}

/** Any thrown thing as an `ApiError`; the server's own errors carry status, code and message too. */
export function toApiError(thrown: unknown): ApiError {
  if (thrown instanceof ApiError) return thrown
  if (thrown instanceof Error && 'status' in thrown && typeof thrown.status === 'number') {
    const code = 'code' in thrown && typeof thrown.code === 'string' ? thrown.code : 'unknown'
    return new ApiError(thrown.status, code, thrown.message)
  }
  return new ApiError(500, 'internal', 'Something went wrong on our side.')
}
