import type { EvidenceRow } from '../../shared/evidence.js'
import type { PhysiologyRecord } from '../../shared/physiology.js'
import type { RangeRow } from '../../shared/ranges.js'
import type { CslItem, DatasetBrief, SourceKind } from '../../shared/sources.js'
import type { RecordRow } from './columns.js'

/** A source that is not read from the rows: the dataset's own paper, or the law itself. */
export interface OwnSource {
  kind: SourceKind
  doi: string | null
  csl: CslItem
}

/** How a row says where its value comes from. */
export type Citation =
  /** The dataset's own source. */
  | { form: 'own'; asPrinted: string }
  /** A reference in full. */
  | { form: 'reference'; asPrinted: string; doi: string | null }
  /** Author and year, to be resolved where only one known source answers to them. */
  | { form: 'key'; asPrinted: string }

/** One record before its source has an id. */
export type ReadRecord = Omit<PhysiologyRecord, 'sourceId' | 'sourceAsPrinted'>

/** What one row of a dataset's file comes to. */
export type RowReading =
  | { form: 'left-out'; reason: string }
  | { form: 'rejected'; reason: string }
  | { form: 'record'; record: ReadRecord; citation: Citation }
  | { form: 'range'; range: RangeRow; evidence: Omit<EvidenceRow, 'sourceId'>; citation: Citation }

/** A dataset the importer knows: what it is, what its licence asks for, and how its rows are read. */
export interface DatasetDefinition extends DatasetBrief {
  /** Name of its file in `seeds/data`. */
  file: string
  /** What the `dataset` column says in every row. */
  label: string
  /** What a record id begins with. */
  recordIdPrefix: string
  ownSource: OwnSource | null
  parameters: readonly string[]
  units: readonly string[]
  readRow(row: RecordRow): RowReading
}
