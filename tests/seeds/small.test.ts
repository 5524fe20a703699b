import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { DataSource } from 'typeorm'
import { createDataSource } from '../../server/data-source.js'
import { Species } from '../../server/entities/Species.js'
import { findSpeciesPage } from '../../server/queries/species.js'
import { lintPage } from '../../shared/lints/lint-page.js'
import { loadSmallSeed } from '../../seeds/small.js'
import { createTestDatabase, type TestDatabase } from '../helpers/database.js'

let database: TestDatabase
let dataSource: DataSource

beforeAll(async () => {
  database = await createTestDatabase()
  dataSource = await createDataSource(database.url, { poolSize: 2 }).initialize()
  await loadSmallSeed(dataSource.manager, { importedAt: new Date('2026-11-02T08:00:00Z') })
})

afterAll(async () => {
  await dataSource.destroy()
  await database.drop()
})

describe('the small seed', () => {
  it('holds the eight invented species and some thirty real ones, told apart', async () => {
    expect(await dataSource.manager.countBy(Species, { isInvented: true })).toBe(8)
    const real = await dataSource.manager.countBy(Species, { isInvented: false })
    expect(real).toBeGreaterThanOrEqual(25)
    expect(real).toBeLessThanOrEqual(40)
  })

  it('holds real pages that no lint blocks', async () => {
    const pages = await dataSource.manager.findBy(Species, { isInvented: false })
    const levels = new Map<string, string[]>()
    for (const { slug } of pages) {
      const page = await findSpeciesPage(dataSource.manager, slug, null)
      levels.set(
        slug,
        lintPage(page!, 2026).map(({ level }) => level),
      )
    }
    expect(levels.get('thamnophis-sirtalis')).toContain('informs')
    expect([...levels.values()].flat()).not.toContain('blocks')
  })
})
