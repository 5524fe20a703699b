import type { EntityManager } from 'typeorm'
import { loadDemonstration } from './demonstration/load-demonstration.js'
import { loadSmallRealSpecies, type LoadOptions } from './real-species.js'

/** The seed of the browser tests: the demonstration and some thirty real species, by the same way as the whole seed. */
export async function loadSmallSeed(db: EntityManager, options: LoadOptions): Promise<void> {
  await loadDemonstration(db)
  await loadSmallRealSpecies(db, options)
}
