import { createHash } from 'node:crypto'
import { join } from 'node:path'
import type { EntityManager } from 'typeorm'
import type { PhysiologyRecord } from '../../shared/physiology.js'
import type { RejectedLine } from '../../server/entities/DatasetVersion.js'
import { hashContent } from '../../server/content-hash.js'
import { recordDatasetVersion } from '../../server/services/datasets/record-dataset-version.js'
import { publishRevision } from '../../server/services/revisions/publish-revision.js'
import { findDataFolder } from '../data-folder.js'
import type { DatasetDefinition } from '../datasets/definition.js'
import { readTaxonomy, type PrintedTaxon, type Taxonomy } from '../names/taxonomy.js'
import { findPagesByName, findPagesOfDataset, readCurrentPages, type CurrentPage } from './current-pages.js'
import { beginPage, bringUpToDate, toKeyText, type DatasetContent } from './page-items.js'
import { readDatasetFile, type AcceptedRow, type DatasetFile } from './read-dataset.js'
import { resolveCitations, type ResolvedCitations } from './resolve-citations.js'

/** The key under which imports wait for each other. */
const IMPORT_LOCK = 7_301_002

/** Pages whose content is read, compared and published in one go. */
const PAGES_PER_BATCH = 200

export interface ImportOptions {
  /** The moment the revisions are published at. */
  importedAt: Date
  /** The file, where it is not the one in `seeds/data`. */
  path?: string
  /** Only rows of these pages, where not all are wanted. */
  onlyPages?: ReadonlySet<string>
  /** Takes a line about the progress. */
  say?: (line: string) => void
}

/** The account of one import. */
export interface ImportReport {
  datasetId: string
  version: string
  rowsRead: number
  rowsAccepted: number
  /** Accepted rows that stand on the page of another name than the one they print. */
  rowsMerged: number
  rejected: RejectedLine[]
  leftOut: { reason: string; rows: number }[]
  /** Pages that hold the dataset's rows. */
  pages: number
  pagesNew: number
  pagesChanged: number
  citationKeys: number
  citationKeysResolved: number
  /** Whether this very file was the dataset's newest already, so that nothing was done. */
  isKnown: boolean
}

/** Everything a dataset says of one page. */
interface PageRows {
  name: string
  printed: PrintedTaxon
  rows: AcceptedRow[]
}

type GroupedFile = Omit<DatasetFile, 'accepted'> & { pages: PageRows[] }

/**
 * Imports one dataset in one transaction: reads and checks the whole file first, then publishes a revision for each page
 * whose content from this dataset changes, and for no other. The same file again changes nothing. Throws InvalidInput with
 * one sentence for a file that cannot be this dataset's; nothing is written then.
 */
export async function importDataset(
  db: EntityManager,
  definition: DatasetDefinition,
  options: ImportOptions,
): Promise<ImportReport> {
  const folder = findDataFolder()
  const taxonomy = await readTaxonomy(join(folder, 'taxonomy.csv'))
  const file = await readDatasetFile(definition, options.path ?? join(folder, definition.file))
  const wanted = options.onlyPages ? keepPages(file, taxonomy, options.onlyPages) : file
  const { pages, rejected } = groupByPage(wanted, taxonomy)
  const grouped = { ...wanted, pages, rejected: [...wanted.rejected, ...rejected] }
  return db.transaction((transaction) => writeDataset(transaction, definition, grouped, taxonomy, options))
}

/** The part of a file that stands on some pages alone, under a hash of its own. */
function keepPages(file: DatasetFile, taxonomy: Taxonomy, names: ReadonlySet<string>): DatasetFile {
  const accepted = file.accepted.filter(({ row }) => names.has(taxonomy.toPageName(row.scientific_name)))
  const sha256 = createHash('sha256').update(file.sha256)
  for (const name of [...names].sort()) sha256.update(`\n${name}`)
  return {
    ...file,
    accepted,
    sha256: sha256.digest(),
    rowsRead: accepted.length,
    rejected: [],
    leftOut: new Map(),
  }
}

/**
 * The rows of a file by page, in alphabetical order. A second row that states a range the page has already from this file
 * cannot stand beside it and is rejected.
 */
function groupByPage(file: DatasetFile, taxonomy: Taxonomy): { pages: PageRows[]; rejected: RejectedLine[] } {
  const pages = new Map<string, PageRows>()
  const lineOfRange = new Map<string, number>()
  const rejected: RejectedLine[] = []
  for (const accepted of file.accepted) {
    const { line, row, reading } = accepted
    const name = taxonomy.toPageName(row.scientific_name)
    if (reading.form === 'range') {
      const range = `${name} ${toKeyText(reading.range)}`
      const earlier = lineOfRange.get(range)
      if (earlier !== undefined) {
        rejected.push({ line, reason: `Line ${earlier} gives the same range of ${name} already.` })
        continue
      }
      lineOfRange.set(range, line)
    }
    const page = pages.get(name)
    if (page) page.rows.push(accepted)
    else {
      const { authority, class: className, order, family } = row
      pages.set(name, {
        name,
        printed: { name, authority, class: className, order, family },
        rows: [accepted],
      })
    }
  }
  return { pages: [...pages.values()].sort((a, b) => (a.name < b.name ? -1 : 1)), rejected }
}

async function writeDataset(
  db: EntityManager,
  definition: DatasetDefinition,
  file: GroupedFile,
  taxonomy: Taxonomy,
  { importedAt, say = () => undefined }: ImportOptions,
): Promise<ImportReport> {
  // Imports wait for each other: of one dataset, the second then finds the first one's work done; of two, both may want to
  // begin the same page.
  await db.query('select pg_advisory_xact_lock($1)', [IMPORT_LOCK])
  const { pages } = file
  const rows = pages.flatMap((page) => page.rows)
  const { isKnown, version } = await findVersion(db, definition, file.sha256)
  const report: ImportReport = {
    datasetId: definition.id,
    version,
    rowsRead: file.rowsRead,
    rowsAccepted: rows.length,
    rowsMerged: pages.reduce(
      (sum, { name, rows }) => sum + rows.filter(({ row }) => row.scientific_name !== name).length,
      0,
    ),
    rejected: file.rejected,
    leftOut: [...file.leftOut].map(([reason, count]) => ({ reason, rows: count })),
    pages: pages.length,
    pagesNew: 0,
    pagesChanged: 0,
    citationKeys: 0,
    citationKeysResolved: 0,
    isKnown,
  }
  if (isKnown) return report

  const { id: datasetVersionId } = await recordDatasetVersion(db, {
    dataset: { ...toBrief(definition), version },
    fileSha256: file.sha256.toString('hex'),
    importedAt,
    rowsRead: report.rowsRead,
    rowsAccepted: report.rowsAccepted,
    rowsMerged: report.rowsMerged,
    rejected: report.rejected,
  })
  const broughtBy = { form: 'dataset' as const, datasetVersionId }
  const citations = await resolveCitations(
    db,
    definition,
    rows.map(({ reading }) => reading.citation),
    { broughtBy, publishedAt: importedAt },
  )
  report.citationKeys = citations.keys
  report.citationKeysResolved = citations.keysResolved

  const idOfPage = await findPagesByName(
    db,
    pages.map(({ name }) => name),
  )
  const abandoned = await findPagesOfDataset(db, definition.id, citations.ownSourceId)
  for (const { name } of pages) abandoned.delete(idOfPage.get(name) ?? '')
  const work: { speciesId: string | null; page: PageRows | null }[] = [
    ...pages.map((page) => ({ speciesId: idOfPage.get(page.name) ?? null, page })),
    ...[...abandoned].sort().map((speciesId) => ({ speciesId, page: null })),
  ]
  for (let start = 0; start < work.length; start += PAGES_PER_BATCH) {
    const batch = work.slice(start, start + PAGES_PER_BATCH)
    const current = await readCurrentPages(
      db,
      batch.map(({ speciesId }) => speciesId).filter((id) => id !== null),
    )
    for (const { speciesId, page } of batch) {
      const outcome = await publishPage({
        db,
        definition,
        taxonomy,
        citations,
        datasetVersionId,
        importedAt,
        page,
        current: speciesId === null ? null : (current.get(speciesId) ?? null),
      })
      if (outcome === 'new') report.pagesNew += 1
      else if (outcome === 'changed') report.pagesChanged += 1
    }
    say(`${definition.title}: ${Math.min(start + PAGES_PER_BATCH, work.length)} of ${work.length} species`)
  }
  return report
}

function toBrief({ id, title, version, doi, licence, licenceUrl, attribution }: DatasetDefinition) {
  return { id, title, version, doi, licence, licenceUrl, attribution }
}

/** Whether the dataset's newest imported file is this one, and how this one is called beside the versions known before. */
async function findVersion(
  db: EntityManager,
  definition: DatasetDefinition,
  sha256: Buffer,
): Promise<{ isKnown: boolean; version: string }> {
  const known: { version: string; isThis: boolean }[] = await db.query(
    `select version, file_sha256 = $2 as "isThis" from dataset_version where dataset_id = $1
     order by imported_at desc, id`,
    [definition.id, sha256],
  )
  const isNamed = known.some(({ version, isThis }) => version === definition.version && !isThis)
  return {
    isKnown: known[0]?.isThis ?? false,
    version: isNamed
      ? `${definition.version}, file ${sha256.toString('hex').slice(0, 8)}`
      : definition.version,
  }
}

interface PublishingInput {
  db: EntityManager
  definition: DatasetDefinition
  taxonomy: Taxonomy
  citations: ResolvedCitations
  datasetVersionId: string
  importedAt: Date
  /** What the file says of the page; null where it says nothing any more. */
  page: PageRows | null
  current: CurrentPage | null
}

async function publishPage(input: PublishingInput): Promise<'new' | 'changed' | 'unchanged'> {
  const { db, definition, taxonomy, citations, page, current } = input
  const records = page === null ? [] : toRecords(page.rows, citations)
  const recordSetHash = records.length === 0 ? null : hashContent(records)
  const content: DatasetContent = {
    recordSetHash,
    ranges: page === null ? [] : toRanges(page.rows, citations),
  }
  const before =
    current?.items ??
    (page === null ? [] : beginPage(taxonomy.describe(page.name, page.printed, definition.title)))
  const items = bringUpToDate(before, definition.id, citations.ownSourceId, content)
  if (current !== null && hashContent(items) === hashContent(current.items)) return 'unchanged'
  await publishRevision(db, {
    species: current === null ? { isInvented: false } : { id: current.speciesId },
    baseRevisionId: current?.revisionId ?? null,
    items,
    recordSets: recordSetHash === null ? [] : [{ hash: recordSetHash, datasetId: definition.id, records }],
    summary: summarise(definition.title, records.length, content.ranges.length),
    broughtBy: { form: 'dataset', datasetVersionId: input.datasetVersionId },
    publishedAt: input.importedAt,
  })
  return current === null ? 'new' : 'changed'
}

function summarise(title: string, records: number, ranges: number): string {
  const parts = [
    records > 0 ? `${records} ${records === 1 ? 'record' : 'records'}` : null,
    ranges > 0 ? `${ranges} ${ranges === 1 ? 'range' : 'ranges'}` : null,
  ].filter((part) => part !== null)
  return parts.length > 0 ? `${parts.join(' and ')} from ${title}` : `${title} holds this species no longer`
}

/** The records of one page in the order of their ids, so that a file in another order is the same record set. */
function toRecords(rows: readonly AcceptedRow[], citations: ResolvedCitations): PhysiologyRecord[] {
  return rows
    .flatMap(({ reading }) =>
      reading.form === 'record'
        ? [
            {
              ...reading.record,
              sourceId: citations.findSourceId(reading.citation),
              sourceAsPrinted: reading.citation.asPrinted,
            },
          ]
        : [],
    )
    .sort((a, b) => (a.recordId < b.recordId ? -1 : 1))
}

function toRanges(rows: readonly AcceptedRow[], citations: ResolvedCitations): DatasetContent['ranges'] {
  const ranges = new Map<string, DatasetContent['ranges'][number]>()
  for (const { reading } of rows) {
    if (reading.form !== 'range') continue
    const sourceId = citations.findSourceId(reading.citation)
    if (sourceId === null) continue
    ranges.set(toKeyText(reading.range), {
      range: reading.range,
      evidence: { ...reading.evidence, sourceId },
    })
  }
  return [...ranges.values()]
}
