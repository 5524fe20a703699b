import type { EntityManager } from 'typeorm'

export interface SitemapEntry {
  /** Below the origin, with its slash. */
  path: string
  /** ISO 8601, or null where the page has no date of its own. */
  changedAt: string | null
}

/** How many pages of real species and of sources there are; invented species are no matter for search engines. */
export async function countSitemapEntries(db: EntityManager): Promise<{ species: number; sources: number }> {
  const [counts] = await db.query<{ species: number; sources: number }[]>(
    `select (select count(*)::int from species where not is_invented) as species,
      (select count(*)::int from source where merged_into_id is null and not is_invented) as sources`,
  )
  return counts ?? { species: 0, sources: 0 }
}

/** One part of the species pages, by slug. */
export async function findSpeciesEntries(
  db: EntityManager,
  limit: number,
  offset: number,
): Promise<SitemapEntry[]> {
  return db.query<SitemapEntry[]>(
    `select '/species/' || slug as path, to_char(updated_at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS"Z"') as "changedAt"
      from species where not is_invented order by slug limit $1 offset $2`,
    [limit, offset],
  )
}

/** One part of the source pages, by id. */
export async function findSourceEntries(
  db: EntityManager,
  limit: number,
  offset: number,
): Promise<SitemapEntry[]> {
  return db.query<SitemapEntry[]>(
    `select '/sources/' || id as path, null as "changedAt"
      from source where merged_into_id is null and not is_invented order by id limit $1 offset $2`,
    [limit, offset],
  )
}
