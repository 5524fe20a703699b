import { randomBytes } from 'node:crypto'
import { inject } from 'vitest'
import { copyTemplate, dropDatabase } from './cluster.js'

/** A database for one test file: migrated, empty of rows, and nobody else's. */
export interface TestDatabase {
  /** As the application, which may read and write rows. */
  url: string
  /** As the owner of the schema. */
  ownerUrl: string
  drop: () => Promise<void>
}

/** Copies the migrated template into a new database. For the `server` and `seeds` projects of vitest. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const { superuserUrl, template, ownerPattern, appPattern } = inject('testCluster')
  const database = `test_${randomBytes(6).toString('hex')}`
  await copyTemplate(superuserUrl, template, database)
  return {
    url: appPattern.replace('{database}', database),
    ownerUrl: ownerPattern.replace('{database}', database),
    drop: () => dropDatabase(superuserUrl, database),
  }
}
