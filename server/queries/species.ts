import type { EntityManager } from 'typeorm'
import type { SpeciesPage } from '../../shared/species.js'
import { toPageJson } from '../entities/page-json.js'
import { ROW_MAPPINGS } from '../entities/row-mappings.js'
import { queryPrepared } from '../prepared.js'
import { toDatasetBrief, toPageRef, toRevisionMark, toSourcesById } from './json-fragments.js'

/** How many marks of the revision line a page shows. */
const HISTORY_LENGTH = 5

const PHYSIOLOGY = `coalesce((
  select json_agg(json_build_object(
    'itemId', item.item_id,
    'row', ${ROW_MAPPINGS.physiology.toJson('stored')},
    'dataset', case when record_set.hash is not null then ${toDatasetBrief('dataset', 'version')} end,
    'studies', coalesce(record_set.studies, '[]')
  ) order by item.ordinal)
  from revision_item item
  join physiology_row stored on stored.hash = item.row_hash
  left join record_set on record_set.hash = stored.record_set_hash
  left join dataset on dataset.id = record_set.dataset_id
  left join dataset_version version on version.id = record_set.dataset_version_id
  where item.revision_id = shown.id and item.kind = 'physiology'
), '[]')`

const HISTORY = `(
  select json_agg(${toRevisionMark('recent')})
  from (
    select * from revision where revision.species_id = page.id order by number desc limit ${HISTORY_LENGTH}
  ) recent
)`

/** An SQL expression: a page, `page`, at one of its revisions, `shown`, with what the revision's items say, `content`. */
const SPECIES_PAGE = `json_build_object(
  'species', json_build_object('id', page.id, ${toPageRef('page')}),
  'revision', ${toRevisionMark('shown')},
  'currentRevisionNumber', page.revision_number,
  'names', content.names,
  'classification', content.classification,
  'ranges', content.ranges,
  'physiology', ${PHYSIOLOGY},
  'prose', content.prose,
  'images', content.images,
  'sources', ${toSourcesById('content.source_ids')},
  'history', ${HISTORY}
)::text`

// One trip, and PostgreSQL writes the JSON, most of it when the page was published.
const FIND_CURRENT_PAGE = {
  name: 'find-current-page',
  text: `
    select ${SPECIES_PAGE} as body
    from species_slug
    join species page on page.id = species_slug.species_id
    join current_page content on content.species_id = page.id
    join revision shown on shown.id = content.revision_id
    where species_slug.slug = $1`,
}

const FIND_PAGE_AT_REVISION = {
  name: 'find-page-at-revision',
  text: `
    select ${SPECIES_PAGE} as body
    from species_slug
    join species page on page.id = species_slug.species_id
    join revision shown on shown.species_id = page.id and shown.number = coalesce($2, page.revision_number)
    cross join lateral (
      select ${Object.entries(toPageJson('shown.id'))
        .map(([column, json]) => `${json} as ${column}`)
        .join(', ')}
      offset 0
    ) content
    where species_slug.slug = $1`,
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
  if (revisionNumber === null) {
    const [current] = await queryPrepared<{ body: string }>(db, FIND_CURRENT_PAGE, [slug])
    if (current !== undefined) return current.body
  }
  const [page] = await queryPrepared<{ body: string }>(db, FIND_PAGE_AT_REVISION, [slug, revisionNumber])
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
