import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import Papa from 'papaparse'
import { recordColumns } from '../../seeds/datasets/columns.js'

export type CsvRow = Partial<Record<(typeof recordColumns)[number], string>>

/** A folder for the files of one test file; everything in it goes with `remove`. */
export function makeFolder() {
  const folder = mkdtempSync(join(tmpdir(), 'dataset-'))
  return {
    /** Writes bytes or text under a name and gives the path. */
    write: (name: string, content: string | Uint8Array): string => {
      const path = join(folder, name)
      writeFileSync(path, content)
      return path
    },
    remove: () => rmSync(folder, { recursive: true, force: true }),
  }
}

/** A CSV text with the columns of a dataset's file. */
export function toCsv(rows: CsvRow[]): string {
  const data = rows.map((row) => recordColumns.map((column) => row[column] ?? ''))
  return `${Papa.unparse([[...recordColumns], ...data], { newline: '\n' })}\n`
}

/** A row with every column, blank where it is not given. */
export function toCells(row: CsvRow): Record<string, string> {
  return Object.fromEntries(recordColumns.map((column) => [column, row[column] ?? '']))
}

/** A row as AmphiTherm prints it, of a named frog that is in the list of names; change what the test is about. */
export function makeAmphithermRow(number: number, part: CsvRow = {}): CsvRow {
  return {
    scientific_name: 'Hyla cinerea',
    class: 'Amphibia',
    order: 'Anura',
    family: 'Hylidae',
    parameter: 'ctmax',
    value: '40.1',
    unit: 'degC',
    n: '12',
    life_stage: 'adult',
    note: `sd=0.5; acclimation_temp_C=20; ref_key=Test_${number}`,
    source_citation: `Tester, A.; Prober, B. (2001) A test of ${number} frogs. Journal of Tests ${number}(1) pp. 1-9`,
    dataset: 'AmphiTherm (Pottier et al. 2025)',
    dataset_doi: '10.5281/zenodo.16751427',
    dataset_licence: 'CC BY 4.0',
    record_id: `amphitherm:${number}`,
    ...part,
  }
}
