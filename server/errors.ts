import type { Problem } from '../shared/errors.js'

/** One field of the input that was refused, by its dotted path. */
export interface FieldError {
  path: string
  message: string
}

/** An outcome the reader can be told: its message is a plain sentence, its code is stable. */
export class AppError extends Error {
  constructor(
    readonly code: string,
    readonly status: number,
    readonly title: string,
    message: string,
    readonly errors?: FieldError[],
    options?: ErrorOptions,
  ) {
    super(message, options)
    this.name = new.target.name
  }

  /** The problem document (RFC 9457) that says this error. */
  toProblem(): Problem {
    return {
      type: `/problems/${this.code}`,
      title: this.title,
      status: this.status,
      detail: this.message,
      code: this.code,
      ...(this.errors && { errors: this.errors }),
    }
  }
}

export class InvalidInput extends AppError {
  constructor(message: string, errors?: FieldError[]) {
    super('invalid-input', 400, 'The input cannot be used', message, errors)
  }
}

export class Forbidden extends AppError {
  constructor(message: string) {
    super('forbidden', 403, 'Not allowed', message)
  }
}

export class NotFound extends AppError {
  constructor(message: string) {
    super('not-found', 404, 'Not found', message)
  }
}

export class Conflict extends AppError {
  constructor(message: string, errors?: FieldError[]) {
    super('conflict', 409, 'Something changed in the meantime', message, errors)
  }
}

export class TooLarge extends AppError {
  constructor(message: string) {
    super('too-large', 413, 'Too large', message)
  }
}

export class UnsupportedContent extends AppError {
  constructor(message: string) {
    super('unsupported-content', 415, 'This kind of content is not understood', message)
  }
}

export class TooMany extends AppError {
  constructor(
    message: string,
    readonly retryAfterSeconds: number,
  ) {
    super('too-many', 429, 'Too many requests', message)
  }
}

export class Unavailable extends AppError {
  constructor(message: string, options?: ErrorOptions) {
    super('unavailable', 503, 'Not available at the moment', message, undefined, options)
  }
}
