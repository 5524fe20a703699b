import type { ItemKind } from '../../shared/revisions.js'
import { ROW_MAPPINGS } from './row-mappings.js'

/** SQL that reads the items of one kind, `item`, of a revision with their rows, `stored`. */
function itemsOf(kind: ItemKind, revisionId: string): string {
  return `revision_item item join ${ROW_MAPPINGS[kind].table} stored on stored.hash = item.row_hash
    where item.revision_id = ${revisionId} and item.kind = '${kind}'`
}

function listItems(kind: ItemKind, revisionId: string): string {
  const row = ROW_MAPPINGS[kind].toJson('stored')
  return `coalesce((
    select json_agg(json_build_object('itemId', item.item_id, 'row', ${row}) order by item.ordinal)
    from ${itemsOf(kind, revisionId)}
  ), '[]')`
}

function listRanges(revisionId: string): string {
  // Evidence is gathered once and kept: as a plain part of the join it was gathered anew for each range.
  return `coalesce((
    with evidence as materialized (
      select item.parent_item_id, json_agg(
        json_build_object('itemId', item.item_id, 'row', ${ROW_MAPPINGS.evidence.toJson('stored')}) order by item.ordinal
      ) as list
      from ${itemsOf('evidence', revisionId)} group by item.parent_item_id
    )
    select json_agg(json_build_object(
      'itemId', cited.item_id,
      'row', cited.content,
      'evidence', coalesce(evidence.list, '[]')
    ) order by cited.ordinal)
    from (
      select item.item_id, item.ordinal, ${ROW_MAPPINGS.range.toJson('stored')} as content
      from ${itemsOf('range', revisionId)}
    ) cited left join evidence on evidence.parent_item_id = cited.item_id
  ), '[]')`
}

/**
 * SQL expressions for what the items of a revision say, by the column of `current_page` they stand in; `revisionId` is the SQL of
 * the revision's id. They rest on immutable rows alone, so what they give for a revision never changes.
 */
export function toPageJson(revisionId: string): Readonly<Record<string, string>> {
  return {
    names: listItems('name', revisionId),
    classification: `(
      select json_build_object('itemId', item.item_id, 'row', ${ROW_MAPPINGS.classification.toJson('stored')})
      from ${itemsOf('classification', revisionId)}
    )`,
    ranges: listRanges(revisionId),
    prose: listItems('prose', revisionId),
    images: listItems('image', revisionId),
    source_ids: `array(
      select stored.source_id from ${itemsOf('evidence', revisionId)}
      union
      select stored.source_id from ${itemsOf('physiology', revisionId)} and stored.form = 'cited'
      union
      select unnest(record_set.source_ids)
      from record_set where record_set.hash in (
        select stored.record_set_hash from ${itemsOf('physiology', revisionId)}
      )
      union
      select unnest(stored.source_ids) from ${itemsOf('prose', revisionId)}
    )`,
  }
}
