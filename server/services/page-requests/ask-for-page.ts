import type { EntityManager } from 'typeorm'
import { InvalidInput } from '../../errors.js'

const NAME_LENGTH_MAX = 200

const COUNT_REQUEST = `
  insert into page_request (normalised_name, name, times, first_asked_at, last_asked_at)
  values (normalise_name($1), btrim($1), 1, $2, $2)
  on conflict (normalised_name) do update set times = page_request.times + 1, last_asked_at = excluded.last_asked_at
  returning name, times`

/** Counts one more wish for a page that does not exist, whatever its spelling's case and accents. Throws InvalidInput for no name. */
export async function askForPage(
  db: EntityManager,
  name: string,
  askedAt: Date,
): Promise<{ name: string; times: number }> {
  const isName = /\p{L}/u.test(name) && !name.includes('\0') && name.length <= NAME_LENGTH_MAX
  if (!isName) {
    throw new InvalidInput('Say which species the page is wanted for.', [
      { path: 'name', message: `A name of at most ${NAME_LENGTH_MAX} characters.` },
    ])
  }
  const rows: { name: string; times: number }[] = await db.query(COUNT_REQUEST, [name, askedAt])
  const [request] = rows
  if (request === undefined) throw new Error('The request was not counted')
  return request
}
