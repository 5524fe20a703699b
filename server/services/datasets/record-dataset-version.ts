import type { EntityManager } from 'typeorm'
import type { DatasetBrief } from '../../../shared/sources.js'
import type { RejectedLine } from '../../entities/DatasetVersion.js'

export interface DatasetVersionInput {
  /** The dataset with the label of this version. */
  dataset: DatasetBrief
  /** SHA-256 of the imported file, hex. */
  fileSha256: string
  importedAt: Date
  rowsRead: number
  rowsAccepted: number
  rowsMerged: number
  rejected: RejectedLine[]
}

const SAVE_DATASET_VERSION = `
  with saved_dataset as (
    insert into dataset (id, title, doi, licence, licence_url, attribution) values ($1, $2, $3, $4, $5, $6)
    on conflict (id) do update set title = excluded.title, doi = excluded.doi, licence = excluded.licence,
      licence_url = excluded.licence_url, attribution = excluded.attribution
    returning id
  ), saved_version as (
    insert into dataset_version (dataset_id, version, file_sha256, imported_at, rows_read, rows_accepted, rows_merged,
      rows_rejected, rejected)
    select id, $7, decode($8, 'hex'), $9, $10, $11, $12, $13, $14::jsonb from saved_dataset
    on conflict (dataset_id, file_sha256) do update set version = excluded.version, imported_at = excluded.imported_at,
      rows_read = excluded.rows_read, rows_accepted = excluded.rows_accepted, rows_merged = excluded.rows_merged,
      rows_rejected = excluded.rows_rejected, rejected = excluded.rejected
    returning id
  )
  select id from saved_version`

/**
 * Records one imported file of a dataset, its licence and the account of its rows. The same file again is the same version, its
 * account written anew, so the counts may be given before the pages are published and corrected after.
 */
export async function recordDatasetVersion(
  db: EntityManager,
  input: DatasetVersionInput,
): Promise<{ id: string }> {
  const { dataset } = input
  const rows: { id: string }[] = await db.query(SAVE_DATASET_VERSION, [
    dataset.id,
    dataset.title,
    dataset.doi,
    dataset.licence,
    dataset.licenceUrl,
    dataset.attribution,
    dataset.version,
    input.fileSha256,
    input.importedAt,
    input.rowsRead,
    input.rowsAccepted,
    input.rowsMerged,
    input.rejected.length,
    JSON.stringify(input.rejected),
  ])
  const [version] = rows
  if (version === undefined) throw new Error('The dataset version was not written')
  return version
}

/** The id of the version that a file of a dataset was recorded as, or null when that file was never recorded. */
export async function findDatasetVersion(
  db: EntityManager,
  datasetId: string,
  fileSha256: string,
): Promise<string | null> {
  const rows: { id: string }[] = await db.query(
    `select id from dataset_version where dataset_id = $1 and file_sha256 = decode($2, 'hex')`,
    [datasetId, fileSha256],
  )
  return rows[0]?.id ?? null
}
