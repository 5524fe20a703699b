import type { DataSource } from 'typeorm'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { createDataSource } from '../../../../server/data-source.js'
import { findAttributions } from '../../../../server/queries/attributions.js'
import {
  findDatasetVersion,
  recordDatasetVersion,
  type DatasetVersionInput,
} from '../../../../server/services/datasets/record-dataset-version.js'
import { createTestDatabase, type TestDatabase } from '../../../helpers/database.js'
import {
  makeDatasetItem,
  makeNameItem,
  makeRangeItem,
  makeRecord,
  publish,
} from '../../../helpers/page-items.js'

let database: TestDatabase
let dataSource: DataSource

beforeAll(async () => {
  database = await createTestDatabase()
  dataSource = await createDataSource(database.url).initialize()
})

afterAll(async () => {
  await dataSource.destroy()
  await database.drop()
})

const FIRST_FILE = 'a1'.repeat(32)
const SECOND_FILE = 'b2'.repeat(32)
const FIRST: DatasetVersionInput = {
  dataset: {
    id: 'lizards',
    title: 'Lizards of nowhere',
    version: '1.0',
    doi: '10.5555/lizards',
    licence: 'CC BY 4.0',
    licenceUrl: 'https://creativecommons.org/licenses/by/4.0/',
    attribution: 'Nobody et al. 2020',
  },
  fileSha256: FIRST_FILE,
  importedAt: new Date('2026-02-01T00:00:00Z'),
  rowsRead: 10,
  rowsAccepted: 7,
  rowsMerged: 1,
  rejected: [
    { line: 4, reason: 'No value.' },
    { line: 9, reason: 'No name.' },
  ],
}

test('the same file again is the same version, its account written anew', async () => {
  const first = await recordDatasetVersion(dataSource.manager, { ...FIRST, rowsAccepted: 0 })
  const again = await recordDatasetVersion(dataSource.manager, FIRST)
  expect(again).toEqual(first)
  expect(await findDatasetVersion(dataSource.manager, 'lizards', FIRST_FILE)).toBe(first.id)
  expect(await findDatasetVersion(dataSource.manager, 'lizards', SECOND_FILE)).toBeNull()
  expect(await findAttributions(dataSource.manager)).toEqual({
    datasets: [
      {
        dataset: FIRST.dataset,
        importedAt: '2026-02-01T00:00:00.000Z',
        rowsRead: 10,
        rowsAccepted: 7,
        rowsMerged: 1,
        rowsRejected: 2,
        pages: 0,
      },
    ],
  })
})

test('attributions show the newest version and count the pages that a version of the dataset changed', async () => {
  const id = await findDatasetVersion(dataSource.manager, 'lizards', FIRST_FILE)
  const broughtBy = { form: 'dataset' as const, datasetVersionId: id ?? '' }
  const name = makeNameItem()
  const first = await publish(dataSource, [name], { broughtBy })
  await publish(dataSource, [name, makeRangeItem()], {
    species: { id: first.speciesId },
    baseRevisionId: first.revisionId,
    broughtBy,
  })
  await publish(dataSource, [makeNameItem()], { broughtBy })
  await publish(dataSource, [makeNameItem()])
  const newer = { ...FIRST.dataset, version: '1.1', licence: 'CC0 1.0' }
  await recordDatasetVersion(dataSource.manager, {
    ...FIRST,
    dataset: newer,
    fileSha256: SECOND_FILE,
    importedAt: new Date('2026-02-02T00:00:00Z'),
  })
  const { datasets } = await findAttributions(dataSource.manager)
  expect(datasets).toHaveLength(1)
  expect(datasets[0]).toMatchObject({ dataset: newer, pages: 2 })
})

test('a record set keeps the version that first brought it', async () => {
  const { item, recordSet } = makeDatasetItem('lizards', [makeRecord()])
  await publish(dataSource, [makeNameItem(), item], { recordSets: [recordSet] })
  const [{ version }] = await dataSource.query(
    `select version from record_set join dataset_version on dataset_version.id = dataset_version_id
     where hash = decode($1, 'hex')`,
    [recordSet.hash],
  )
  expect(version).toBe('1.1')
})
