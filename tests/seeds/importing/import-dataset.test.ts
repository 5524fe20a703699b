import type { DataSource } from 'typeorm'
import { afterAll, beforeEach, describe, expect, it } from 'vitest'
import { createDataSource } from '../../../server/data-source.js'
import { amphitherm } from '../../../seeds/datasets/amphitherm.js'
import { globtherm } from '../../../seeds/datasets/globtherm.js'
import { eu2007 } from '../../../seeds/datasets/eu2007.js'
import { importDataset } from '../../../seeds/importing/import-dataset.js'
import { createTestDatabase, type TestDatabase } from '../../helpers/database.js'
import { makeAmphithermRow, makeFolder, toCsv, type CsvRow } from '../../helpers/dataset-files.js'

const folder = makeFolder()
let database: TestDatabase
let dataSource: DataSource
let files = 0
let minutes = 0

beforeEach(async () => {
  database = await createTestDatabase()
  dataSource = await createDataSource(database.url).initialize()
  return async () => {
    await dataSource.destroy()
    await database.drop()
  }
})
afterAll(folder.remove)

function importRows(definition: typeof amphitherm, rows: CsvRow[]) {
  return importText(definition, toCsv(rows))
}

function importText(definition: typeof amphitherm, content: string | Uint8Array) {
  files += 1
  minutes += 1
  return importDataset(dataSource.manager, definition, {
    importedAt: new Date(Date.UTC(2026, 0, 1, 0, minutes)),
    path: folder.write(`${files}.csv`, content),
  })
}

/** Every page with the number of its revision and, of each dataset, the ids of the records it shows. */
async function readPages(): Promise<Record<string, { revision: number; records: Record<string, string[]> }>> {
  const rows: { name: string; revision: number; dataset: string | null; records: string[] | null }[] =
    await dataSource.query(
      `select species.scientific_name as name, species.revision_number as revision, physiology_row.dataset_id as dataset,
         array_agg(record.record_id order by record.ordinal) as records
       from species
       left join revision_item item on item.revision_id = species.current_revision_id and item.kind = 'physiology'
       left join physiology_row on physiology_row.hash = item.row_hash
       left join physiology_record record on record.set_hash = physiology_row.record_set_hash
       group by 1, 2, 3 order by 1, 3`,
    )
  const pages: Awaited<ReturnType<typeof readPages>> = {}
  for (const { name, revision, dataset, records } of rows) {
    const page = (pages[name] ??= { revision, records: {} })
    if (dataset !== null) page.records[dataset] = records ?? []
  }
  return pages
}

async function countEverything(): Promise<unknown> {
  const [counts] = await dataSource.query(
    `select (select count(*) from species) as species, (select count(*) from revision) as revisions,
       (select count(*) from source) as sources, (select count(*) from dataset_version) as versions,
       (select count(*) from physiology_record) as records, (select number from site_epoch) as epoch`,
  )
  return counts
}

const cinerea = (number: number, part: CsvRow = {}) => makeAmphithermRow(number, part)
const marina = (number: number, part: CsvRow = {}) =>
  makeAmphithermRow(number, { scientific_name: 'Rhinella marina', family: 'Bufonidae', ...part })
const globthermRow = (number: number, part: CsvRow = {}) =>
  makeAmphithermRow(number, {
    life_stage: '',
    note: 'metric=ctmax',
    source_citation: 'Tester & Prober 2001',
    dataset: globtherm.label,
    record_id: `globtherm:${number}`,
    ...part,
  })

describe('importing a dataset', () => {
  it('makes a page with names, classification and one item for all records of a species', async () => {
    const report = await importRows(amphitherm, [cinerea(1), cinerea(2, { value: '39' }), marina(3)])
    expect(report).toMatchObject({ rowsRead: 3, rowsAccepted: 3, rowsMerged: 0, pages: 2, pagesNew: 2 })
    expect(await readPages()).toEqual({
      'Hyla cinerea': { revision: 1, records: { amphitherm: ['amphitherm:1', 'amphitherm:2'] } },
      'Rhinella marina': { revision: 1, records: { amphitherm: ['amphitherm:3'] } },
    })
    const kinds: { kind: string }[] = await dataSource.query(
      `select distinct item.kind from revision_item item join species on species.current_revision_id = item.revision_id
       where species.scientific_name = 'Hyla cinerea' order by 1`,
    )
    expect(kinds.map(({ kind }) => kind)).toEqual(['classification', 'name', 'physiology'])
    const [revision] = await dataSource.query(
      `select revision.summary, revision.brought_by as "broughtBy", dataset_version.dataset_id as dataset
       from revision join species on species.current_revision_id = revision.id
       join dataset_version on dataset_version.id = revision.dataset_version_id
       where species.scientific_name = 'Hyla cinerea'`,
    )
    expect(revision).toEqual({
      summary: '2 records from AmphiTherm',
      broughtBy: 'dataset',
      dataset: 'amphitherm',
    })
  })

  it('changes nothing when the same file comes again', async () => {
    const content = toCsv([cinerea(1), marina(2)])
    await importText(amphitherm, content)
    const before = await countEverything()
    const again = await importText(amphitherm, content)
    expect(again).toMatchObject({ isKnown: true, pagesNew: 0, pagesChanged: 0 })
    expect(await countEverything()).toEqual(before)
  })

  it('publishes no revision for rows that only stand in another order', async () => {
    await importRows(amphitherm, [cinerea(1), cinerea(2), marina(3)])
    const report = await importRows(amphitherm, [marina(3), cinerea(2), cinerea(1)])
    expect(report).toMatchObject({ isKnown: false, pagesNew: 0, pagesChanged: 0 })
  })

  it('lets a second import of the same file wait for the first and then do nothing', async () => {
    const path = folder.write('twice.csv', toCsv([cinerea(1), marina(2)]))
    const [first, second] = await Promise.all(
      [1, 2].map(() => importDataset(dataSource.manager, amphitherm, { importedAt: new Date(), path })),
    )
    expect([first?.isKnown, second?.isKnown].sort()).toEqual([false, true])
    expect(await dataSource.query('select id from revision')).toHaveLength(2)
  })

  it('puts the records of an old combination on the page of the accepted name', async () => {
    const report = await importRows(amphitherm, [marina(1), marina(2, { scientific_name: 'Bufo marinus' })])
    expect(report).toMatchObject({ pages: 1, rowsMerged: 1 })
    expect(await readPages()).toEqual({
      'Rhinella marina': { revision: 1, records: { amphitherm: ['amphitherm:1', 'amphitherm:2'] } },
    })
    const printed = await dataSource.query(
      'select name_as_printed as name from physiology_record order by record_id',
    )
    expect(printed).toEqual([{ name: 'Rhinella marina' }, { name: 'Bufo marinus' }])
  })

  it('keeps a name that stands in no list on a page of its own that says so', async () => {
    await importRows(amphitherm, [
      cinerea(1, { scientific_name: 'Nomen nusquam', authority: 'Printer, 1900' }),
    ])
    const [name] = await dataSource.query('select name, authority, status, provenance from name_row')
    expect(name).toEqual({
      name: 'Nomen nusquam',
      authority: 'Printer, 1900',
      status: 'unresolved',
      provenance: 'as printed in AmphiTherm; in no list of names',
    })
  })

  it('lists rows that cannot be used by line and reason and takes the others', async () => {
    const report = await importRows(amphitherm, [
      cinerea(1, { value: '104' }),
      cinerea(2),
      marina(3, { n: '7.5' }),
    ])
    expect(report).toMatchObject({
      rowsRead: 3,
      rowsAccepted: 1,
      rejected: [
        { line: 2, reason: '104 °C is not plausible for this quantity (10 to 65 °C).' },
        { line: 4, reason: 'The number of animals, 7.5, is not a whole number above 0.' },
      ],
    })
    expect(Object.keys(await readPages())).toEqual(['Hyla cinerea'])
    const [version] = await dataSource.query('select rejected from dataset_version')
    expect(version.rejected).toEqual(report.rejected)
  })
})

describe('a file that is not the dataset’s', () => {
  const good = [cinerea(1), marina(2)]
  it.each([
    ['has other columns', 'name,value\nHyla cinerea,40\n', /^The file has other columns: “scientific_name”/],
    [
      'is in another encoding',
      Buffer.from(toCsv([cinerea(1, { authority: 'Günther' })]), 'latin1'),
      /^The file is not UTF-8/,
    ],
    ['is cut off inside a row', toCsv(good).slice(0, -30), /cut off|columns instead of/],
    ['is cut off before its last line break', toCsv(good).slice(0, -1), /cut off/],
    [
      'is cut off inside quotation marks',
      toCsv(good).slice(0, toCsv(good).lastIndexOf('"') - 3),
      /^The file ends inside the quotation marks opened on line 3/,
    ],
    [
      'has words for numbers',
      toCsv([...good, cinerea(3, { value: 'warm' })]),
      /^Line 4, column “value”: “warm” is not a number\.$/,
    ],
    [
      'writes numbers with a decimal comma',
      toCsv([...good, cinerea(3, { value: '40,1' })]),
      /^Line 4, column “value”: “40,1” is not a number\.$/,
    ],
    [
      'holds the rows of another dataset',
      toCsv([...good, globthermRow(3)]),
      /^Line 4 is not of AmphiTherm: it names “GlobTherm/,
    ],
    [
      'has a parameter of another dataset',
      toCsv([cinerea(1, { parameter: 'tb_field' })]),
      /^Line 2 has a parameter that AmphiTherm does not hold: “tb_field”\.$/,
    ],
    [
      'has another unit',
      toCsv([cinerea(1, { unit: 'degF' })]),
      /^Line 2 has a unit that AmphiTherm does not use: “degF”\.$/,
    ],
    [
      'has a record twice',
      toCsv([...good, cinerea(2)]),
      /^The record amphitherm:2 stands on line 3 and again on line 4\.$/,
    ],
    [
      'has a name that is none',
      toCsv([cinerea(1, { scientific_name: 'a frog' })]),
      /^Line 2, column “scientific_name”: “a frog” is not a scientific name\.$/,
    ],
    [
      'has a row without a citation',
      toCsv([cinerea(1, { source_citation: '' })]),
      /column “source_citation”: “” is empty/,
    ],
  ])('is refused whole when it %s, and leaves the database as it was', async (_, content, sentence) => {
    await importRows(amphitherm, [cinerea(9)])
    const before = await countEverything()
    await expect(importText(amphitherm, content)).rejects.toThrow(sentence)
    expect(await countEverything()).toEqual(before)
  })

  it('leaves nothing half-written when publishing fails in the middle', async () => {
    await importRows(amphitherm, [cinerea(1)])
    const before = await countEverything()
    // A name that gives another page's address: the page cannot be made, after others were.
    const rows = [marina(2), cinerea(3, { scientific_name: 'Hyla cinereä' })]
    await expect(importRows(amphitherm, [cinerea(1), ...rows])).rejects.toThrow(
      'There is already another page',
    )
    expect(await countEverything()).toEqual(before)
  })
})

describe('a newer version of a dataset', () => {
  beforeEach(async () => {
    await importRows(amphitherm, [cinerea(1), cinerea(2), marina(3)])
    await importRows(globtherm, [globthermRow(1), globthermRow(2, { scientific_name: 'Bufo marinus' })])
  })

  it('publishes revisions only where its records changed, and leaves other datasets’ items alone', async () => {
    const report = await importRows(amphitherm, [cinerea(1), cinerea(2, { value: '39.5' }), marina(3)])
    expect(report).toMatchObject({ pagesNew: 0, pagesChanged: 1 })
    expect(report.version).toMatch(/^2025, revision 8f5be5b8, file [0-9a-f]{8}$/)
    expect(await readPages()).toEqual({
      'Hyla cinerea': {
        revision: 3,
        records: { amphitherm: ['amphitherm:1', 'amphitherm:2'], globtherm: ['globtherm:1'] },
      },
      'Rhinella marina': {
        revision: 2,
        records: { amphitherm: ['amphitherm:3'], globtherm: ['globtherm:2'] },
      },
    })
  })

  it('keeps the ids of all items', async () => {
    const idsOf = async () =>
      dataSource.query(
        `select item.item_id from revision_item item join species on species.current_revision_id = item.revision_id
         order by 1`,
      )
    const before = await idsOf()
    await importRows(amphitherm, [cinerea(1), cinerea(2, { value: '39.5' }), marina(3)])
    expect(await idsOf()).toEqual(before)
  })

  it('takes its item off the page of a species it no longer holds', async () => {
    await importRows(amphitherm, [cinerea(1), cinerea(2)])
    expect((await readPages())['Rhinella marina']).toEqual({
      revision: 3,
      records: { globtherm: ['globtherm:2'] },
    })
    const [revision] = await dataSource.query(
      `select revision.summary from revision join species on species.current_revision_id = revision.id
       where species.scientific_name = 'Rhinella marina'`,
    )
    expect(revision).toEqual({ summary: 'AmphiTherm holds this species no longer' })
  })

  it('adds a page for a species that is new in it', async () => {
    const rows = [cinerea(1), cinerea(2), marina(3), cinerea(4, { scientific_name: 'Acris crepitans' })]
    expect(await importRows(amphitherm, rows)).toMatchObject({ pagesNew: 1, pagesChanged: 0 })
  })

  it('can be taken back by importing the older file again', async () => {
    const older = [cinerea(1), cinerea(2), marina(3)]
    await importRows(amphitherm, [cinerea(1)])
    expect(await importRows(amphitherm, older)).toMatchObject({ isKnown: false, pagesChanged: 2 })
    expect((await readPages())['Rhinella marina']?.records).toEqual({
      amphitherm: ['amphitherm:3'],
      globtherm: ['globtherm:2'],
    })
  })
})

describe('the sources of a dataset', () => {
  const readSources = () =>
    dataSource.query(
      `select source.doi, source.kind, source_revision.csl ->> 'title' as title from source
       join source_revision on source_revision.id = source.current_source_revision_id order by title`,
    )

  it('are one where the words of the reference agree', async () => {
    const printed = 'Tester, A. (2001) One study. Journal of Tests 1(1) pp. 1-9'
    await importRows(amphitherm, [
      cinerea(1, { source_citation: printed }),
      marina(2, { source_citation: printed.replace('1(1)', '1 (1)').replace('Journal', 'JOURNAL') }),
    ])
    expect(await readSources()).toHaveLength(1)
  })

  it('are one where the DOI agrees, however the reference is printed', async () => {
    await importRows(amphitherm, [cinerea(1, { source_doi: '10.1234/ABC' })])
    const printed = 'Tester, Anna (2001) A test. Journal of Tests 1 pp. 1-9'
    await importRows(amphitherm, [cinerea(1, { source_citation: printed, source_doi: '10.1234/abc' })])
    expect(await readSources()).toEqual([{ doi: '10.1234/abc', kind: 'article', title: 'A test of 1 frogs' }])
  })

  it('are not joined by a DOI that one file prints beside two references', async () => {
    await importRows(amphitherm, [
      cinerea(1, { source_doi: '10.1234/abc' }),
      marina(2, { source_doi: '10.1234/abc' }),
    ])
    expect(await readSources()).toEqual([
      { doi: null, kind: 'article', title: 'A test of 1 frogs' },
      { doi: null, kind: 'article', title: 'A test of 2 frogs' },
    ])
  })

  it('answer to author-year keys of other datasets where one alone can be meant', async () => {
    await importRows(amphitherm, [cinerea(1)])
    await importRows(globtherm, [globthermRow(1), globthermRow(2, { source_citation: 'Nobody 1999' })])
    const records = await dataSource.query(
      `select record.record_id as id, record.source_as_printed as printed, source_id is not null as "isResolved"
       from physiology_record record where record_id like 'globtherm%' order by 1`,
    )
    expect(records).toEqual([
      { id: 'globtherm:1', printed: 'Tester & Prober 2001', isResolved: true },
      { id: 'globtherm:2', printed: 'Nobody 1999', isResolved: false },
    ])
  })

  it('make no source of a key that none answers to', async () => {
    await importRows(globtherm, [globthermRow(1)])
    expect(await readSources()).toEqual([])
  })
})

describe('the housing recommendation', () => {
  const euRow = (number: number, part: CsvRow = {}) =>
    makeAmphithermRow(number, {
      parameter: 'ambient_temperature_recommended',
      value: '',
      min: '18',
      max: '25',
      n: '',
      note: 'level=published_housing_recommendation (laboratory housing); table I.1; how_obtained=read today',
      source_citation: 'Commission Recommendation 2007/526/EC, p. 77',
      dataset: eu2007.label,
      record_id: `eu2007:${number}`,
      ...part,
    })
  const readRanges = () =>
    dataSource.query(
      `select species.scientific_name as name, current_range.low, current_range.high from current_range
       join species on species.id = current_range.species_id
       where position = stated_position and period = stated_period order by 1, 2`,
    )

  it('brings its ranges up to date without touching records', async () => {
    await importRows(amphitherm, [cinerea(1)])
    await importRows(eu2007, [euRow(1), euRow(2, { scientific_name: 'Bufo marinus', min: '23', max: '27' })])
    expect(await readRanges()).toEqual([
      { name: 'Hyla cinerea', low: 18, high: 25 },
      { name: 'Rhinella marina', low: 23, high: 27 },
    ])
    await importRows(eu2007, [euRow(1, { min: '19' })])
    expect(await readRanges()).toEqual([{ name: 'Hyla cinerea', low: 19, high: 25 }])
    expect((await readPages())['Hyla cinerea']).toEqual({
      revision: 3,
      records: { amphitherm: ['amphitherm:1'] },
    })
  })

  it('rejects a second row for the same range of one page', async () => {
    const report = await importRows(eu2007, [
      euRow(1, { scientific_name: 'Rhinella marina' }),
      euRow(2, { scientific_name: 'Bufo marinus', min: '20' }),
    ])
    expect(report).toMatchObject({
      rowsAccepted: 1,
      rejected: [{ line: 3, reason: 'Line 2 gives the same range of Rhinella marina already.' }],
    })
  })
})
