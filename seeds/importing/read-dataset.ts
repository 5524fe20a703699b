import type { z } from 'zod'
import { InvalidInput } from '../../server/errors.js'
import { recordColumns, recordRowSchema, type RecordRow } from '../datasets/columns.js'
import type { DatasetDefinition, RowReading } from '../datasets/definition.js'
import { readTable, type TableRow } from '../reading/read-table.js'

/** A row that was taken over, with where it stood. */
export interface AcceptedRow {
  line: number
  row: RecordRow
  reading: Extract<RowReading, { form: 'record' | 'range' }>
}

/** A file of a dataset after reading: every row is accepted, rejected or left out. */
export interface DatasetFile {
  sha256: Buffer
  rowsRead: number
  accepted: AcceptedRow[]
  rejected: { line: number; reason: string }[]
  /** How many rows were left out, by reason. */
  leftOut: Map<string, number>
}

/**
 * Reads and checks a whole file before anything is written. A file that is not this dataset's (other columns, another
 * dataset's rows, words for numbers, a record twice) is refused whole with one sentence (InvalidInput).
 */
export async function readDatasetFile(definition: DatasetDefinition, path: string): Promise<DatasetFile> {
  const table = await readTable(path, recordColumns)
  const file: DatasetFile = {
    sha256: table.sha256,
    rowsRead: table.rows.length,
    accepted: [],
    rejected: [],
    leftOut: new Map(),
  }
  const lineOfRecord = new Map<string, number>()
  for (const tableRow of table.rows) {
    const row = parseRow(definition, tableRow)
    const { line } = tableRow
    const earlier = lineOfRecord.get(row.record_id)
    if (earlier !== undefined) {
      throw new InvalidInput(
        `The record ${row.record_id} stands on line ${earlier} and again on line ${line}.`,
      )
    }
    lineOfRecord.set(row.record_id, line)
    const reading = definition.readRow(row)
    if (reading.form === 'rejected') file.rejected.push({ line, reason: reading.reason })
    else if (reading.form === 'left-out') {
      file.leftOut.set(reading.reason, (file.leftOut.get(reading.reason) ?? 0) + 1)
    } else file.accepted.push({ line, row, reading })
  }
  return file
}

function parseRow(definition: DatasetDefinition, { line, cells }: TableRow): RecordRow {
  const parsed = recordRowSchema.safeParse(cells)
  if (!parsed.success) throw new InvalidInput(describeIssue(line, cells, parsed.error))
  const row = parsed.data
  if (row.dataset !== definition.label || !row.record_id.startsWith(definition.recordIdPrefix)) {
    throw new InvalidInput(`Line ${line} is not of ${definition.title}: it names “${row.dataset}”.`)
  }
  if (!definition.parameters.includes(row.parameter)) {
    throw new InvalidInput(
      `Line ${line} has a parameter that ${definition.title} does not hold: “${row.parameter}”.`,
    )
  }
  if (!definition.units.includes(row.unit)) {
    throw new InvalidInput(`Line ${line} has a unit that ${definition.title} does not use: “${row.unit}”.`)
  }
  return row
}

function describeIssue(line: number, cells: Record<string, string>, error: z.ZodError): string {
  const issue = error.issues[0]
  const column = issue?.path.join('.') ?? ''
  const found = (cells[column] ?? '').slice(0, 60)
  const what = issue?.message.startsWith('is ') ? issue.message : 'cannot be used'
  return `Line ${line}, column “${column}”: “${found}” ${what}.`
}
