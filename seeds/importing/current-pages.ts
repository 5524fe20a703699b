import type { EntityManager } from 'typeorm'
import { pageItemSchema, type PageItem } from '../../shared/revisions.js'
import { ROW_MAPPINGS } from '../../server/entities/row-mappings.js'

/** A page as it stands, with its whole content. */
export interface CurrentPage {
  speciesId: string
  revisionId: string
  items: PageItem[]
}

/** Which page bears a name. */
interface NamedPage {
  speciesId: string
  name: string
  isScientific: boolean
}

/**
 * The ids of the pages of real species that bear these names, by name: as the page's own name before as a synonym, and
 * as a synonym only where one page alone has it.
 */
export async function findPagesByName(
  db: EntityManager,
  names: readonly string[],
): Promise<Map<string, string>> {
  const rows: NamedPage[] = await db.query(
    `select species_name.species_id as "speciesId", species_name.name, species_name.kind = 'scientific' as "isScientific"
     from species_name join species on species.id = species_name.species_id and not species.is_invented
     where species_name.kind in ('scientific', 'synonym') and species_name.name = any($1)`,
    [names],
  )
  const pages = new Map<string, string>()
  for (const row of rows.filter(({ isScientific }) => isScientific)) pages.set(row.name, row.speciesId)
  const pagesOfSynonym = new Map<string, string[]>()
  for (const { name, speciesId } of rows.filter(({ name }) => !pages.has(name))) {
    pagesOfSynonym.set(name, [...(pagesOfSynonym.get(name) ?? []), speciesId])
  }
  for (const [name, [first, ...more]] of pagesOfSynonym) {
    if (first !== undefined && more.length === 0) pages.set(name, first)
  }
  return pages
}

/** The ids of the pages that hold items of a dataset: its record set, or evidence from its own source. */
export async function findPagesOfDataset(
  db: EntityManager,
  datasetId: string,
  ownSourceId: string | null,
): Promise<Set<string>> {
  const rows: { id: string }[] = await db.query(
    `select species.id from species
     join revision_item item on item.revision_id = species.current_revision_id and item.kind = 'physiology'
     join physiology_row on physiology_row.hash = item.row_hash and physiology_row.dataset_id = $1
     union
     select species.id from species
     join revision_item item on item.revision_id = species.current_revision_id and item.kind = 'evidence'
     join evidence_row on evidence_row.hash = item.row_hash and evidence_row.source_id = $2`,
    [datasetId, ownSourceId],
  )
  return new Set(rows.map(({ id }) => id))
}

const states = Object.entries(ROW_MAPPINGS).map(([kind, mapping]) => ({
  kind,
  table: mapping.table,
  json: mapping.toJson(`${kind}_state`),
}))

const CURRENT_PAGES = `
  select species.id as "speciesId", species.current_revision_id as "revisionId",
    json_agg(
      json_build_object('itemId', item.item_id, 'parentItemId', item.parent_item_id, 'kind', item.kind,
        'row', case item.kind ${states.map(({ kind, json }) => `when '${kind}' then ${json}`).join(' ')} end)
      order by item.ordinal
    ) as items
  from species
  join revision_item item on item.revision_id = species.current_revision_id
  ${states
    .map(
      ({ kind, table }) =>
        `left join ${table} ${kind}_state on item.kind = '${kind}' and ${kind}_state.hash = item.row_hash`,
    )
    .join(' ')}
  where species.id = any($1)
  group by species.id`

/** Reads the current content of many pages in one trip. */
export async function readCurrentPages(
  db: EntityManager,
  speciesIds: readonly string[],
): Promise<Map<string, CurrentPage>> {
  const rows: { speciesId: string; revisionId: string; items: unknown[] }[] = await db.query(CURRENT_PAGES, [
    speciesIds,
  ])
  return new Map(
    rows.map(({ speciesId, revisionId, items }) => [
      speciesId,
      { speciesId, revisionId, items: items.map((item) => pageItemSchema.parse(item)) },
    ]),
  )
}
