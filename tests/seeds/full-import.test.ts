import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { DataSource } from 'typeorm'
import { createDataSource } from '../../server/data-source.js'
import { datasets } from '../../seeds/datasets/all.js'
import { importDataset } from '../../seeds/importing/import-dataset.js'
import { createTestDatabase, type TestDatabase } from '../helpers/database.js'

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
describe('x', () => {
  it('y', async () => {
    for (const d of datasets) {
      const t = Date.now()
      const r = await importDataset(dataSource.manager, d, { importedAt: new Date('2026-12-01') })
      process.stdout.write(JSON.stringify(r) + ' ' + (Date.now() - t) + 'ms\n')
    }
    expect(1).toBe(1)
  })
})
