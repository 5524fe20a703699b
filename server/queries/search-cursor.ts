import { createHash } from 'node:crypto'
import { z } from 'zod'
import type { SearchQuery } from '../../shared/search.js'
import { InvalidInput } from '../errors.js'

/** Where the last row of a page of answers stands in the order of its search. */
export const searchPlaceSchema = z.strictObject({
  /** How well the words are met, as decimal text: first coarsely, then finely. Both 0 where there are no words. */
  tier: z.string().regex(/^\d{1,3}(\.\d{1,6})?$/),
  likeness: z.string().regex(/^\d(\.\d{1,6})?$/),
  hasRanges: z.boolean(),
  scientificName: z.string().max(300),
  /** Microseconds since 1970, as text. */
  updatedAtMicros: z.string().regex(/^\d{1,18}$/),
  id: z.uuid(),
})
export type SearchPlace = z.infer<typeof searchPlaceSchema>

const cursorSchema = z.tuple([z.string(), searchPlaceSchema])

/** A place as opaque text that only the same search accepts. */
export function writeSearchCursor(query: SearchQuery, place: SearchPlace): string {
  return Buffer.from(JSON.stringify([digest(query), place])).toString('base64url')
}

/** The place a cursor names. Throws InvalidInput for anything that is no cursor of this search. */
export function readSearchCursor(query: SearchQuery, cursor: string): SearchPlace {
  const [owner, place] = parse(cursor)
  if (owner !== digest(query)) throw refuse('This cursor belongs to another search.')
  return place
}

function parse(cursor: string): z.infer<typeof cursorSchema> {
  try {
    return cursorSchema.parse(JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8')))
  } catch {
    throw refuse('This is not a cursor that the search gave.')
  }
}

function refuse(message: string): InvalidInput {
  return new InvalidInput(message, [{ path: 'cursor', message }])
}

function digest(query: SearchQuery): string {
  const asked = JSON.stringify({ ...query, cursor: null, limit: 0 })
  return createHash('sha256').update(asked).digest('base64url').slice(0, 12)
}
