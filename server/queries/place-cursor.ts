import { z } from 'zod'
import { InvalidInput } from '../errors.js'
import { isStorable } from '../storable.js'

/** A place in a list as opaque text. */
export function writePlaceCursor(place: readonly (string | number)[]): string {
  return Buffer.from(JSON.stringify(place)).toString('base64url')
}

/** The place a cursor names, checked against the list's own form of it. Throws InvalidInput for anything else. */
export function readPlaceCursor<T>(schema: z.ZodType<T>, cursor: string): T {
  try {
    const storable = z.unknown().refine(isStorable)
    return storable.pipe(schema).parse(JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8')))
  } catch {
    const message = 'This is not a cursor that this list gave.'
    throw new InvalidInput(message, [{ path: 'cursor', message }])
  }
}
