import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { DataSource } from 'typeorm'
import { createDataSource } from '../../../server/data-source.js'
import { findSpeciesPage } from '../../../server/queries/species.js'
import { findSiteEpoch } from '../../../server/services/site-epoch.js'
import { lintPage } from '../../../shared/lints/lint-page.js'
import { speciesPageSchema } from '../../../shared/species.js'
import type { DemonstrationSpecies } from '../../../seeds/demonstration/content.js'
import { DELIBERATE_FLAWS } from '../../../seeds/demonstration/flaws.js'
import { loadDemonstration } from '../../../seeds/demonstration/load-demonstration.js'
import { DEMONSTRATION_SPECIES } from '../../../seeds/demonstration/scenario.js'
import { SOURCES } from '../../../seeds/demonstration/sources.js'
import { toSlug } from '../../../shared/slugs.js'
import { createTestDatabase, type TestDatabase } from '../../helpers/database.js'

const slugs = new Map(
  DEMONSTRATION_SPECIES.map(({ key, revisions }) => [key, toSlug(revisions[0].content.names[0]!.name)]),
)
const revisionCount = DEMONSTRATION_SPECIES.reduce((sum, { revisions }) => sum + revisions.length, 0)

let database: TestDatabase
let dataSource: DataSource

beforeAll(async () => {
  database = await createTestDatabase()
  dataSource = await createDataSource(database.url, { poolSize: 2 }).initialize()
})

afterAll(async () => {
  await dataSource.destroy()
  await database.drop()
})

async function countRows(): Promise<Record<string, number>> {
  const [counts] = await dataSource.query<Record<string, number>[]>(`
    select (select count(*)::int from species) as species,
      (select count(*)::int from species where is_invented) as invented,
      (select count(*)::int from revision) as revisions,
      (select count(*)::int from revision_item) as items,
      (select count(*)::int from source) as sources,
      (select count(*)::int from source where is_invented) as "inventedSources"`)
  return counts!
}

describe('loading the demonstration', () => {
  it('publishes every revision of the eight pages, all marked as invented', async () => {
    expect(await loadDemonstration(dataSource.manager)).toEqual({ published: revisionCount })
    expect(await countRows()).toMatchObject({
      species: 8,
      invented: 8,
      revisions: revisionCount,
      sources: Object.keys(SOURCES).length,
      inventedSources: Object.keys(SOURCES).length,
    })
  })

  it('changes nothing when run again', async () => {
    const before = [await countRows(), await findSiteEpoch(dataSource.manager)]
    expect(await loadDemonstration(dataSource.manager)).toEqual({ published: 0 })
    expect([await countRows(), await findSiteEpoch(dataSource.manager)]).toEqual(before)
  })

  it.each(DELIBERATE_FLAWS)(
    'gives pages whose lints find the one flaw: $species',
    async ({ species, lint }) => {
      const page = await findSpeciesPage(dataSource.manager, slugs.get(species)!, null)
      expect(speciesPageSchema.safeParse(page).error).toBeUndefined()
      expect(page!.species.isInvented).toBe(true)
      expect(Object.values(page!.sources).every(({ isInvented }) => isInvented)).toBe(true)
      expect(lintPage(page!, 2026).map(({ id }) => id)).toEqual([lint])
    },
  )

  it('keeps each revision of the desert basker readable', async () => {
    const bounds = await Promise.all(
      [1, 2, 3, 4].map(async (number) => {
        const page = await findSpeciesPage(dataSource.manager, 'apricator-salinarum', number)
        const basking = page!.ranges.find(
          ({ row }) =>
            row.position === 'basking-surface' &&
            row.parameter === 'temperature' &&
            row.lifeStage === 'adult',
        )!
        return [page!.revision.number, basking.row.high, basking.evidence.length, page!.ranges.length]
      }),
    )
    const ranges = bounds[0]![3]!
    expect(bounds).toEqual([
      [1, 46, 3, ranges],
      [2, 50, 4, ranges],
      [3, 50, 4, ranges + 3],
      [4, 50, 4, ranges + 3],
    ])
  })

  it('adds what a longer scenario has, keeping the ids of items', async () => {
    const other = await createTestDatabase()
    const source = await createDataSource(other.url, { poolSize: 2 }).initialize()
    try {
      const firstRevisions = DEMONSTRATION_SPECIES.slice(0, 4).map((species) => ({
        ...species,
        revisions: [species.revisions[0]] satisfies DemonstrationSpecies['revisions'],
      }))
      expect(await loadDemonstration(source.manager, firstRevisions)).toEqual({ published: 4 })
      const before = await findSpeciesPage(source.manager, 'pruinophis-hollinensis', null)
      expect(await loadDemonstration(source.manager)).toEqual({ published: revisionCount - 4 })
      const after = await findSpeciesPage(source.manager, 'pruinophis-hollinensis', null)
      expect([before!.revision.number, after!.revision.number]).toEqual([1, 2])
      const itemIds = after!.ranges.map(({ itemId }) => itemId)
      expect(itemIds.slice(0, before!.ranges.length)).toEqual(before!.ranges.map(({ itemId }) => itemId))
      expect(itemIds.length).toBeGreaterThan(before!.ranges.length)
    } finally {
      await source.destroy()
      await other.drop()
    }
  })
})
