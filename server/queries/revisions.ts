import type { EntityManager } from 'typeorm'
import { z } from 'zod'
import type { RevisionList } from '../../shared/home.js'
import { queryPrepared } from '../prepared.js'
import { toPageRef, toRevisionMark } from './json-fragments.js'
import { readPlaceCursor, writePlaceCursor } from './place-cursor.js'

const REVISIONS_PAGE_SIZE = 50

const placeSchema = z.tuple([z.int().positive()])

// Read from the index on (page, number), so a page with a long history opens as fast as one with a short.
const FIND_REVISIONS = {
  name: 'find-revisions',
  text: `
    select json_build_object(
      'species', json_build_object(${toPageRef('species')}),
      'items', coalesce((
        select json_agg(${toRevisionMark('listed')} order by listed.number desc)
        from (
          select * from revision
          where revision.species_id = species.id and revision.number < coalesce($2, 2147483647)
          order by revision.number desc limit ${REVISIONS_PAGE_SIZE + 1}
        ) listed
      ), '[]')
    ) as answer
    from species_slug join species on species.id = species_slug.species_id
    where species_slug.slug = $1`,
}

/** A page's revisions, newest first; null where there is no such page. Throws InvalidInput for a cursor of another list. */
export async function findRevisions(
  db: EntityManager,
  slug: string,
  cursor: string | null,
): Promise<RevisionList | null> {
  const before = cursor === null ? null : readPlaceCursor(placeSchema, cursor)[0]
  const [found] = await queryPrepared<{ answer: Pick<RevisionList, 'species' | 'items'> }>(
    db,
    FIND_REVISIONS,
    [slug, before],
  )
  if (found === undefined) return null
  const { species, items } = found.answer
  const shown = items.slice(0, REVISIONS_PAGE_SIZE)
  const last = shown.at(-1)
  const hasMore = items.length > shown.length && last !== undefined
  return { species, items: shown, nextCursor: hasMore ? writePlaceCursor([last.number]) : null }
}
