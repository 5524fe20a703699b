import type { EntityManager } from 'typeorm'
import { findCitedSources } from '../../../shared/prose-citations.js'
import type { ItemKind, PageItem } from '../../../shared/revisions.js'
import { summariseStudies } from '../../../shared/study-lines.js'
import { hashContent } from '../../content-hash.js'
import { RECORD_MAPPING, ROW_MAPPINGS } from '../../entities/row-mappings.js'
import { queryPrepared } from '../../prepared.js'
import type { RecordSetInput } from './page-content.js'

function listColumns(columns: ReadonlyMap<string, string>): { names: string; types: string } {
  const entries = [...columns]
  return {
    names: entries.map(([name]) => name).join(', '),
    types: entries.map(([name, type]) => `${name} ${type}`).join(', '),
  }
}

/** Columns that are read from a row's content once and kept beside it. */
const DERIVED_COLUMNS: Partial<Record<ItemKind, ReadonlyMap<string, string>>> = {
  prose: new Map([['source_ids', 'uuid[]']]),
}

const INSERT_ROWS = {
  name: 'insert-rows',
  text: `with ${Object.entries(ROW_MAPPINGS)
    .map(([kind, { table, columns }]) => {
      const derived = DERIVED_COLUMNS[kind as ItemKind] ?? new Map<string, string>()
      const { names, types } = listColumns(new Map([['hash', 'bytea'], ...columns, ...derived]))
      return `new_${table} as (
        insert into ${table} (${names})
        select ${names} from jsonb_to_recordset($1::jsonb -> '${kind}') as row (${types})
        order by hash
        on conflict do nothing
      )`
    })
    .join(', ')} select 1`,
}

function toStoredRow(item: PageItem, hash: string): Record<string, unknown> {
  const columns = ROW_MAPPINGS[item.kind].toColumns(item.row)
  const derived = item.kind === 'prose' ? { source_ids: findCitedSources(item.row.markdown) } : {}
  return { hash: `\\x${hash}`, ...columns, ...derived }
}

/** Stores the rows that are new; a row that exists already is shared. Gives each item's row hash (hex), in the order of the items. */
export async function writeRows(db: EntityManager, items: readonly PageItem[]): Promise<string[]> {
  const hashes = items.map((item) => hashContent(item.row))
  const rowsByKind: Partial<Record<ItemKind, Record<string, unknown>[]>> = {}
  for (const [index, item] of items.entries()) {
    const rows = (rowsByKind[item.kind] ??= [])
    rows.push(toStoredRow(item, hashes[index] ?? ''))
  }
  await queryPrepared(db, INSERT_ROWS, [JSON.stringify(rowsByKind)])
  return hashes
}

const record = listColumns(new Map([['set_hash', 'bytea'], ['ordinal', 'int'], ...RECORD_MAPPING.columns]))
const INSERT_RECORD_SETS = {
  name: 'insert-record-sets',
  text: `
    with new_set as (
      insert into record_set (hash, dataset_id, dataset_version_id, record_count, studies, quantities, source_ids)
      select hash, dataset_id,
        (select id from dataset_version where dataset_id = set.dataset_id order by imported_at desc, id limit 1),
        record_count, studies, quantities, source_ids
      from jsonb_to_recordset($1::jsonb) as set (
        hash bytea, dataset_id text, record_count int, studies json, quantities text[], source_ids uuid[]
      )
      order by hash
      on conflict do nothing
      returning hash
    )
    insert into physiology_record (${record.names})
    select ${record.names} from jsonb_to_recordset($2::jsonb) as row (${record.types})
    where set_hash in (select hash from new_set)`,
}

/**
 * Stores the record sets that are new, with their study lines; a set that exists already is shared. A set belongs to the newest
 * version of its dataset at this moment.
 */
export async function writeRecordSets(
  db: EntityManager,
  recordSets: readonly RecordSetInput[],
): Promise<void> {
  if (recordSets.length === 0) return
  const sets = recordSets.map(({ hash, datasetId, records }) => ({
    hash: `\\x${hash}`,
    dataset_id: datasetId,
    record_count: records.length,
    studies: summariseStudies(records),
    quantities: [...new Set(records.map((row) => row.quantity))].sort(),
    source_ids: [...new Set(records.map((row) => row.sourceId).filter((id) => id !== null))].sort(),
  }))
  const records = recordSets.flatMap((set) =>
    set.records.map((row, ordinal) => ({
      set_hash: `\\x${set.hash}`,
      ordinal,
      ...RECORD_MAPPING.toColumns(row),
    })),
  )
  await queryPrepared(db, INSERT_RECORD_SETS, [JSON.stringify(sets), JSON.stringify(records)])
}
