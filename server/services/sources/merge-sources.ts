import type { EntityManager } from 'typeorm'
import { requireTransaction } from '../../transactions.js'

/** That the first source is the second one under another record. */
export interface SourceMerge {
  fromId: string
  intoId: string
}

// An heir is never itself merged, so that one step always finds it: whatever was merged into the source moves along, and where
// the named heir was merged, its own heir takes the place.
const MERGE_SOURCES = `
  with merge as (
    select given.from_id, coalesce(named.merged_into_id, named.id) as heir_id
    from jsonb_to_recordset($1::jsonb) as given (from_id uuid, into_id uuid)
    join source named on named.id = given.into_id
  )
  update source set merged_into_id = merge.heir_id
  from merge
  where (source.id = merge.from_id or source.merged_into_id = merge.from_id) and source.id <> merge.heir_id`

/**
 * Points sources at the ones that stand for them. Rows keep citing the id they cite; whoever reads takes the heir. Needs a
 * transaction. No two of the merges may touch the same source.
 */
export async function mergeSources(db: EntityManager, merges: readonly SourceMerge[]): Promise<void> {
  if (merges.length === 0) return
  requireTransaction(db, 'mergeSources')
  const given = merges.map(({ fromId, intoId }) => ({ from_id: fromId, into_id: intoId }))
  await db.query(MERGE_SOURCES, [JSON.stringify(given)])
}
