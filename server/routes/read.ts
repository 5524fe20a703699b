import type { EntityManager } from 'typeorm'
import { z } from 'zod'
import { InvalidInput, NotFound } from '../errors.js'

/** Query parameters as they arrive: one text, or several where a name is repeated. */
export type RawQuery = Readonly<Record<string, string | string[] | undefined>>

/** One address of the read API, answered alike over HTTP and for a page that the server renders. */
export interface Read {
  /** Below /api/v1, with `:name` for each parameter. */
  path: string
  /** The answer as JSON text. Throws `AppError` or `ZodError`. */
  answer(db: EntityManager, params: Readonly<Record<string, unknown>>, query: RawQuery): Promise<string>
}

interface ReadDefinition<P, Q> {
  path: string
  params: z.ZodType<P>
  query: z.ZodType<Q>
  /** Gives a value, JSON text that is sent as it is, or null where there is nothing at the address. */
  read(db: EntityManager, input: { params: P; query: Q }): Promise<JsonText | object | null>
}

/** JSON that the database wrote, to be sent as it is. */
export class JsonText {
  constructor(readonly text: string) {}
}

/** No parameters: any that is given is refused. */
export const noParameters = z.strictObject({})

/**
 * Makes a read of its definition. Parameters of the path that do not fit name nothing, so they are not found; query
 * parameters that do not fit, unknown ones included, are refused.
 */
export function defineRead<P, Q>(definition: ReadDefinition<P, Q>): Read {
  const missing = () => new NotFound('There is nothing at this address.')
  return {
    path: definition.path,
    async answer(db, rawParams, rawQuery) {
      refuseZeroBytes(rawQuery)
      const params = definition.params.safeParse(rawParams)
      if (!params.success) throw missing()
      const answer = await definition.read(db, {
        params: params.data,
        query: definition.query.parse(rawQuery),
      })
      if (answer === null) throw missing()
      return answer instanceof JsonText ? answer.text : JSON.stringify(answer)
    },
  }
}

/** PostgreSQL has no zero byte in its texts, so nothing can be asked with one. */
function refuseZeroBytes(query: RawQuery): void {
  for (const [path, value] of Object.entries(query)) {
    if ([value].flat().some((text) => text?.includes('\0'))) {
      throw new InvalidInput(`Please look at: ${path}.`, [
        { path, message: 'A zero byte cannot be asked for.' },
      ])
    }
  }
}

/** Answers the read at an address below /api/v1. */
export type Reader = (db: EntityManager, apiPath: string) => Promise<unknown>

/** Gives what finds the read of an address below /api/v1 and answers it as the value its JSON text stands for. */
export function createReader(reads: readonly Read[]): Reader {
  const routes = reads.map((read) => ({ read, parts: read.path.split('/') }))
  return async (db, apiPath) => {
    const { pathname, searchParams } = new URL(`http://localhost${apiPath}`)
    const asked = pathname.split('/').map(decodeURIComponent)
    for (const { read, parts } of routes) {
      const params = matchParts(parts, asked)
      if (params !== null)
        return JSON.parse(await read.answer(db, params, toRawQuery(searchParams))) as unknown
    }
    throw new NotFound('There is nothing at this address.')
  }
}

function matchParts(parts: readonly string[], asked: readonly string[]): Record<string, string> | null {
  if (parts.length !== asked.length) return null
  const params: Record<string, string> = {}
  for (const [index, part] of parts.entries()) {
    const given = asked[index] ?? ''
    if (part.startsWith(':')) params[part.slice(1)] = given
    else if (part !== given) return null
  }
  return params
}

/** The parameters by name; one that is given several times as a list. */
export function toRawQuery(parameters: URLSearchParams): RawQuery {
  const query: Record<string, string | string[]> = Object.create(null) as Record<string, string | string[]>
  for (const name of new Set(parameters.keys())) {
    const values = parameters.getAll(name)
    query[name] = values.length === 1 ? (values[0] ?? '') : values
  }
  return query
}
