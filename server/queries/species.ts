import type { EntityManager } from 'typeorm'
import type { SpeciesPage } from '../../shared/species.js'
import { ROW_MAPPINGS } from '../entities/row-mappings.js'
import { queryPrepared } from '../prepared.js'
import { toDatasetBrief, toPageRef, toRevisionMark, toSourcesById } from './json-fragments.js'

/** How many marks of the revision line a page shows. */
const HISTORY_LENGTH = 5

/** An SQL expression: the items of one kind in order, each with its id, its row and what else is said of it. */
function listItems(kind: 'name' | 'prose' | 'image'): string {
  const { table, toJson } = ROW_MAPPINGS[kind]
  return `coalesce((
    select json_agg(json_build_object('itemId', item.item_id, 'row', ${toJson('stored')}) order by item.ordinal)
    from item join ${table} stored on stored.hash = item.row_hash where item.kind = '${kind}'
  ), '[]')`
}

const CLASSIFICATION = `(
  select json_build_object('itemId', item.item_id, 'row', ${ROW_MAPPINGS.classification.toJson('stored')})
  from item join classification_row stored on stored.hash = item.row_hash where item.kind = 'classification'
)`

const EVIDENCE_BY_RANGE = `
  select item.parent_item_id, json_agg(
    json_build_object('itemId', item.item_id, 'row', ${ROW_MAPPINGS.evidence.toJson('stored')}) order by item.ordinal
  ) as list
  from item join evidence_row stored on stored.hash = item.row_hash
  where item.kind = 'evidence' group by item.parent_item_id`

const RANGES = `coalesce((
  select json_agg(json_build_object(
    'itemId', item.item_id,
    'row', ${ROW_MAPPINGS.range.toJson('stored')},
    'evidence', coalesce(evidence.list, '[]')
  ) order by item.ordinal)
  from item
  join range_row stored on stored.hash = item.row_hash
  left join evidence on evidence.parent_item_id = item.item_id
  where item.kind = 'range'
), '[]')`

const PHYSIOLOGY = `coalesce((
  select json_agg(json_build_object(
    'itemId', item.item_id,
    'row', ${ROW_MAPPINGS.physiology.toJson('stored')},
    'dataset', case when record_set.hash is not null then ${toDatasetBrief('dataset', 'version')} end,
    'studies', coalesce(record_set.studies, '[]')
  ) order by item.ordinal)
  from item
  join physiology_row stored on stored.hash = item.row_hash
  left join record_set on record_set.hash = stored.record_set_hash
  left join dataset on dataset.id = record_set.dataset_id
  left join dataset_version version on version.id = record_set.dataset_version_id
  where item.kind = 'physiology'
), '[]')`

const CITED_SOURCES = `
  select stored.source_id as id from item join evidence_row stored on stored.hash = item.row_hash where item.kind = 'evidence'
  union
  select unnest(coalesce(record_set.source_ids, array[stored.source_id]))
  from item join physiology_row stored on stored.hash = item.row_hash
  left join record_set on record_set.hash = stored.record_set_hash
  where item.kind = 'physiology'
  union
  select unnest(stored.source_ids) from item join prose_row stored on stored.hash = item.row_hash where item.kind = 'prose'`

const HISTORY = `(
  select json_agg(${toRevisionMark('recent')} order by recent.number desc)
  from (
    select * from revision where revision.species_id = page.id order by number desc limit ${HISTORY_LENGTH}
  ) recent
)`

// One trip, and PostgreSQL writes the JSON. Evidence is gathered once and kept: as a part of the join it was gathered anew for
// each range.
const FIND_SPECIES_PAGE = {
  name: 'find-species-page',
  text: `
    with page as materialized (
      select species.*, revision.id as revision_id
      from species_slug
      join species on species.id = species_slug.species_id
      join revision on revision.species_id = species.id and revision.number = coalesce($2, species.revision_number)
      where species_slug.slug = $1
    ), item as materialized (
      select revision_item.* from page join revision_item on revision_item.revision_id = page.revision_id
    ), evidence as materialized (${EVIDENCE_BY_RANGE})
    select json_build_object(
      'species', json_build_object('id', page.id, ${toPageRef('page')}),
      'revision', (select ${toRevisionMark('shown')} from revision shown where shown.id = page.revision_id),
      'currentRevisionNumber', page.revision_number,
      'names', ${listItems('name')},
      'classification', ${CLASSIFICATION},
      'ranges', ${RANGES},
      'physiology', ${PHYSIOLOGY},
      'prose', ${listItems('prose')},
      'images', ${listItems('image')},
      'sources', ${toSourcesById(CITED_SOURCES)},
      'history', ${HISTORY}
    )::text as body
    from page`,
}

/**
 * One revision of a species page (the current one without a number) as the JSON text of a `SpeciesPage`, to be sent as it is;
 * null where there is no such page or revision. An old slug leads to the page too: its `species.slug` then differs.
 */
export async function findSpeciesPageJson(
  db: EntityManager,
  slug: string,
  revisionNumber: number | null,
): Promise<string | null> {
  const [page] = await queryPrepared<{ body: string }>(db, FIND_SPECIES_PAGE, [slug, revisionNumber])
  return page?.body ?? null
}

/** The same as an object. */
export async function findSpeciesPage(
  db: EntityManager,
  slug: string,
  revisionNumber: number | null,
): Promise<SpeciesPage | null> {
  const body = await findSpeciesPageJson(db, slug, revisionNumber)
  return body === null ? null : (JSON.parse(body) as SpeciesPage)
}
