import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import Papa from 'papaparse'
import type { DataSource } from 'typeorm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createDataSource } from '../../server/data-source.js'
import { findDataFolder } from '../../seeds/data-folder.js'
import type { ImportReport } from '../../seeds/importing/import-dataset.js'
import { loadRealSpecies } from '../../seeds/real-species.js'
import { createTestDatabase, type TestDatabase } from '../helpers/database.js'

let database: TestDatabase
let dataSource: DataSource
let reports: ImportReport[]

// The one whole import of the suite: 45 s where it was measured, longer on a busy machine.
beforeAll(async () => {
  database = await createTestDatabase()
  dataSource = await createDataSource(database.url).initialize()
  const owner = await createDataSource(database.ownerUrl, { poolSize: 1 }).initialize()
  reports = await loadRealSpecies(dataSource.manager, {
    importedAt: new Date('2026-12-01T12:00:00Z'),
    onImported: () => owner.query('analyze'),
  })
  await owner.destroy()
}, 900_000)
afterAll(async () => {
  await dataSource.destroy()
  await database.drop()
})

async function query<T>(sql: string, values: unknown[] = []): Promise<T[]> {
  return dataSource.query(sql, values)
}

async function countRows(sql: string): Promise<number> {
  const [row] = await query<{ count: number }>(`select count(*)::int as count from ${sql}`)
  return row!.count
}

/** A file as a spreadsheet would read it, apart from the importer's reader. */
function readCsv(file: string): Record<string, string>[] {
  const text = readFileSync(join(findDataFolder(), file), 'utf8')
  return Papa.parse<Record<string, string>>(text, { header: true, skipEmptyLines: true }).data
}

/**
 * Counted apart from this code with Python's csv module: the page of a row is the accepted name of `taxonomy.csv` where its
 * status is "updated" or a synonym's and it is one name alone, else the printed name; merged rows are those whose page has
 * another name. Rejected and left out as in `datasets/datasets.test.ts`.
 */
const counted = [
  { datasetId: 'amphitherm', accepted: 4_399, merged: 319, pages: 608 },
  { datasetId: 'repttraits', accepted: 1_276, merged: 4, pages: 1_274 },
  { datasetId: 'eu2007', accepted: 8, merged: 1, pages: 4 },
  { datasetId: 'squambase', accepted: 1_938, merged: 5, pages: 1_354 },
  { datasetId: 'globtherm', accepted: 983, merged: 73, pages: 686 },
  { datasetId: 'moore2023', accepted: 644, merged: 48, pages: 276 },
  { datasetId: 'intratherm', accepted: 374, merged: 13, pages: 27 },
]

describe('the whole import', () => {
  it('accepts, merges and places the rows counted apart', () => {
    expect(
      reports.map(({ datasetId, rowsAccepted, rowsMerged, pages }) => ({
        datasetId,
        accepted: rowsAccepted,
        merged: rowsMerged,
        pages,
      })),
    ).toEqual(counted)
  })

  it('keeps its account with the dataset, rejected lines and reasons included', async () => {
    const versions = await query<{ datasetId: string; read: number; accepted: number; merged: number }>(
      `select dataset_id as "datasetId", rows_read as read, rows_accepted as accepted, rows_merged as merged
       from dataset_version`,
    )
    expect(versions).toHaveLength(7)
    for (const { datasetId, accepted, merged } of counted) {
      expect(versions).toContainEqual(expect.objectContaining({ datasetId, accepted, merged }))
    }
    const [moore] = await query<{ rejected: unknown }>(
      `select rejected from dataset_version where dataset_id = 'moore2023'`,
    )
    expect(moore?.rejected).toEqual([
      { line: 206, reason: 'The number of animals, 34.519, is not a whole number above 0.' },
      { line: 298, reason: 'The number of animals, 35.6, is not a whole number above 0.' },
    ])
  })

  // 2,488 pages and their statuses: counted with Python's csv module as above.
  it('makes one page for each species', async () => {
    expect(await countRows('species where not is_invented')).toBe(2_488)
    const statuses = await query<{ status: string; count: number }>(
      `select name_row.status, count(*)::int as count from species
       join revision_item item on item.revision_id = species.current_revision_id and item.kind = 'name'
       join name_row on name_row.hash = item.row_hash and name_row.kind = 'scientific' group by 1 order by 1`,
    )
    expect(statuses).toEqual([
      { status: 'accepted', count: 2_168 },
      { status: 'needs-a-person', count: 28 },
      { status: 'unresolved', count: 292 },
    ])
  })

  it('stores every accepted row once and shows no more', async () => {
    const records = counted.reduce((sum, { accepted }) => sum + accepted, 0) - 8
    expect(await countRows('physiology_record')).toBe(records)
    const [shown] = await query<{ records: number; ranges: number }>(
      `select sum(physiology_count)::int as records, sum(range_count)::int as ranges from species`,
    )
    expect(shown).toEqual({ records, ranges: 8 })
  })

  it('gives each page at most one item of each dataset', async () => {
    const twice = await query(
      `select species.id from species
       join revision_item item on item.revision_id = species.current_revision_id and item.kind = 'physiology'
       join physiology_row on physiology_row.hash = item.row_hash
       group by species.id, physiology_row.dataset_id having count(*) > 1`,
    )
    expect(twice).toEqual([])
  })

  // 309 different references stand in amphitherm.csv (`source_citation`, counted with Python); with the sources of
  // ReptTraits, SquamBase and the recommendation that makes 312.
  it('makes one source of each full reference and none of an author-year key', async () => {
    expect(await countRows('source where merged_into_id is null')).toBe(312)
  })

  // Keys: different values of `source_citation` in globtherm.csv (167), moore2023-tpref.csv (174), intratherm-subset.csv
  // (23). The resolved ones were read one by one beside the reference they lead to.
  it('resolves author-year keys only where one source answers', () => {
    expect(
      reports
        .filter(({ citationKeys }) => citationKeys > 0)
        .map(({ datasetId, citationKeys, citationKeysResolved }) => [
          datasetId,
          citationKeys,
          citationKeysResolved,
        ]),
    ).toEqual([
      ['globtherm', 167, 15],
      ['moore2023', 174, 8],
      ['intratherm', 23, 6],
    ])
  })

  it('names a source or the citation as printed behind every record', async () => {
    expect(await countRows(`physiology_record where source_as_printed = ''`)).toBe(0)
    expect(await countRows(`physiology_record where level = 'summary' and source_id is null`)).toBe(0)
    const datasets = await query<{ dataset: string }>(
      `select distinct record_set.dataset_id as dataset from physiology_record
       join record_set on record_set.hash = physiology_record.set_hash where source_id is null order by 1`,
    )
    expect(datasets.map(({ dataset }) => dataset)).toEqual(['globtherm', 'intratherm', 'moore2023'])
  })

  it('brings no optimum, no record of a single study out of SquamBase, and nothing of the table without a licence', async () => {
    expect(await countRows(`physiology_record where quantity = 'optimum-temperature'`)).toBe(0)
    expect(
      await countRows(
        `physiology_record where record_id like 'squambase:%' and record_id not like '%:summary'`,
      ),
    ).toBe(0)
    expect(await countRows(`physiology_record where record_id like 'buckley%'`)).toBe(0)
  })
})

const rows = [
  'amphitherm.csv',
  'repttraits-tb.csv',
  'globtherm.csv',
  'moore2023-tpref.csv',
  'intratherm-subset.csv',
  'squambase-thermal.csv',
].flatMap(readCsv)
const toNumber = (cell: string | undefined) => (cell === undefined || cell === '' ? null : Number(cell))

describe('the numbers after the import', () => {
  it('are those of the rows, every one', async () => {
    const stored = new Map(
      (
        await query<{ id: string; name: string; numbers: (number | null)[]; printed: string }>(
          `select record_id as id, name_as_printed as name, source_as_printed as printed,
             json_build_array(mean_c, low_c, high_c, n) as numbers from physiology_record`,
        )
      ).map(({ id, ...record }) => [id, record]),
    )
    const fromFiles = new Map(
      rows
        .filter(({ record_id }) => stored.has(record_id!))
        .map((row) => [
          row.record_id!,
          {
            name: row.scientific_name,
            printed: row.source_citation,
            numbers: [row.value, row.min, row.max, row.n].map(toNumber),
          },
        ]),
    )
    expect(stored.size).toBe(9_614)
    expect(Object.fromEntries(stored)).toEqual(Object.fromEntries(fromFiles))
  })
})

describe('ten pages after the import', () => {
  /** Old names whose records stand on the page, read in taxonomy.csv by hand. */
  const pages: [page: string, printed: string[]][] = [
    ['Thamnophis sirtalis', []],
    ['Hyla cinerea', []],
    ['Rhinella marina', ['Bufo marinus']],
    ['Sceloporus occidentalis', []],
    ['Pogona vitticeps', []],
    ['Tiliqua rugosa', []],
    ['Eublepharis macularius', []],
    ['Xenopus laevis', []],
    ['Rana sylvatica', ['Lithobates sylvatica', 'Lithobates sylvaticus']],
    ['Cataglyphis bicolor', []],
  ]
  it.each(pages)('show of %s exactly the numbers and citations of its rows', async (page, oldNames) => {
    const expected = rows
      .filter(({ scientific_name }) => [page, ...oldNames].includes(scientific_name!))
      .filter(
        ({ dataset, note }) => !dataset!.startsWith('SquamBase') || note!.includes('level=species_summary'),
      )
      .map((row) => ({
        recordId: row.record_id,
        meanC: toNumber(row.value),
        lowC: toNumber(row.min),
        highC: toNumber(row.max),
        n: toNumber(row.n),
        printed: row.source_citation,
      }))
      .sort((a, b) => (a.recordId! < b.recordId! ? -1 : 1))
    const shown = await query(
      `select record.record_id as "recordId", record.mean_c as "meanC", record.low_c as "lowC", record.high_c as "highC",
         record.n::int as n, record.source_as_printed as printed
       from species
       join revision_item item on item.revision_id = species.current_revision_id and item.kind = 'physiology'
       join physiology_row on physiology_row.hash = item.row_hash
       join physiology_record record on record.set_hash = physiology_row.record_set_hash
       where species.scientific_name = $1 order by record.record_id collate "C"`,
      [page],
    )
    expect(expected.length).toBeGreaterThan(0)
    expect(shown).toEqual(expected)
  })
})

describe('the housing recommendation after the import', () => {
  // Read row by row in eu-2007-526-ec.csv; Bufo marinus stands on the page of Rhinella marina.
  it('gives four pages eight ranges, each with its page, table and printed numbers', async () => {
    const ranges = await query(
      `select species.scientific_name as name, range_row.parameter, range_row.position, range_row.period,
         range_row.life_stage as stage, range_row.low, range_row.high, evidence_row.kind, evidence_row.locator,
         evidence_row.printed_low as "printedLow", evidence_row.printed_high as "printedHigh"
       from species
       join revision_item item on item.revision_id = species.current_revision_id and item.kind = 'range'
       join range_row on range_row.hash = item.row_hash
       join revision_item under on under.revision_id = item.revision_id and under.parent_item_id = item.item_id
       join evidence_row on evidence_row.hash = under.row_hash
       order by name, parameter desc, position desc`,
    )
    const common = { period: 'any', stage: 'adult', kind: 'guideline' }
    const whole = { ...common, position: 'whole-enclosure' }
    expect(ranges).toEqual([
      {
        ...whole,
        name: 'Hyla cinerea',
        parameter: 'temperature',
        low: 18,
        high: 25,
        printedLow: '18',
        printedHigh: '25',
        locator: 'p. 77, table I.1',
      },
      {
        ...whole,
        name: 'Hyla cinerea',
        parameter: 'relative-humidity',
        low: 50,
        high: 70,
        printedLow: '50',
        printedHigh: '70',
        locator: 'p. 77, table I.1',
      },
      {
        ...whole,
        name: 'Rhinella marina',
        parameter: 'temperature',
        low: 23,
        high: 27,
        printedLow: '23',
        printedHigh: '27',
        locator: 'p. 77, table I.1',
      },
      {
        ...whole,
        name: 'Thamnophis sirtalis',
        parameter: 'temperature',
        low: 22,
        high: 27,
        printedLow: '22',
        printedHigh: '27',
        locator: 'p. 82, table J.1',
      },
      {
        ...whole,
        name: 'Thamnophis sirtalis',
        parameter: 'relative-humidity',
        low: 60,
        high: 80,
        printedLow: '60',
        printedHigh: '80',
        locator: 'p. 82, table J.1',
      },
      {
        ...whole,
        name: 'Trachemys scripta',
        parameter: 'temperature',
        low: 20,
        high: 25,
        printedLow: '20',
        printedHigh: '25',
        locator: 'p. 82, table J.1',
      },
      {
        ...common,
        name: 'Trachemys scripta',
        position: 'water',
        parameter: 'temperature',
        low: null,
        high: 25,
        printedLow: null,
        printedHigh: '25',
        locator: 'p. 83',
      },
      {
        ...whole,
        name: 'Trachemys scripta',
        parameter: 'relative-humidity',
        low: 80,
        high: 100,
        printedLow: '80',
        printedHigh: '100',
        locator: 'p. 82, table J.1',
      },
    ])
  })
})

describe('names after the import', () => {
  const pageOf = async (kind: string, name: string) =>
    (
      await query<{ name: string }>(
        `select species.scientific_name as name from species_name join species on species.id = species_name.species_id
         where species_name.kind = $1 and species_name.name = $2`,
        [kind, name],
      )
    ).map((row) => row.name)

  it('leads from an old combination to the accepted name', async () => {
    expect(await pageOf('synonym', 'Bufo marinus')).toEqual(['Rhinella marina'])
    expect(await pageOf('synonym', 'Ameiva festiva')).toEqual(['Holcosus festivus'])
    expect(await pageOf('scientific', 'Bufo marinus')).toEqual([])
  })

  it('leads from a common name to its species', async () => {
    expect(await pageOf('common', 'Common garter snake')).toEqual(['Thamnophis sirtalis'])
    expect(await pageOf('common', 'African Clawed Frog')).toEqual(['Xenopus laevis'])
  })
})

describe('importing the same files again', () => {
  it('changes nothing', async () => {
    const stateOf = () =>
      query(
        `select (select count(*) from revision) as revisions, (select max(published_at) from revision) as newest,
           (select count(*) from source_revision) as sources, (select count(*) from physiology_record) as records,
           (select number from site_epoch) as epoch, (select max(imported_at) from dataset_version) as imported`,
      )
    const before = await stateOf()
    const again = await loadRealSpecies(dataSource.manager, { importedAt: new Date('2027-01-01T00:00:00Z') })
    expect(again.map(({ isKnown, pagesNew, pagesChanged }) => ({ isKnown, pagesNew, pagesChanged }))).toEqual(
      counted.map(() => ({ isKnown: true, pagesNew: 0, pagesChanged: 0 })),
    )
    expect(await stateOf()).toEqual(before)
  })
})
