import { Run } from '../../server/setup/run.mjs'
import { addresses, databaseRights, prepareDatabase, runStatements } from '../../server/setup/roles.mjs'
import { startThrowawayCluster } from '../../server/setup/throwaway.mjs'

const TEMPLATE = 'mossgauge_template'

/** The addresses by which a database is reached: as superuser, as the schema's owner, as the application. */
export interface Addresses {
  superuser: string
  owner: string
  app: string
}

/** A throw-away cluster that holds one migrated database, to be copied and never changed. */
export interface TestCluster {
  /** Of the database `postgres`, from which copies are made. */
  superuserUrl: string
  template: string
  /** How a copy of that name is reached. */
  reach: (database: string) => Addresses
  stop: () => Promise<void>
}

/** Starts a throw-away cluster and lets `migrate` make the schema of its template. */
export async function startTestCluster(
  migrate: (ownerUrl: string) => Promise<unknown>,
): Promise<TestCluster> {
  const run = new Run()
  try {
    const cluster = await startThrowawayCluster(run)
    await prepareDatabase(cluster, TEMPLATE)
    await migrate(addresses(cluster, TEMPLATE).owner)
    const superuserUrl = addresses(cluster, 'postgres').superuser
    await runStatements(superuserUrl, [
      `alter database ${TEMPLATE} with is_template true allow_connections false`,
    ])
    return {
      superuserUrl,
      template: TEMPLATE,
      reach: (database) => addresses(cluster, database),
      stop: () => run.end(),
    }
  } catch (error) {
    await run.end()
    throw error
  }
}

/** Copies the template into a database of its own. */
export async function copyTemplate(superuserUrl: string, template: string, database: string): Promise<void> {
  await runStatements(superuserUrl, [
    `create database ${database} owner mossgauge_owner template ${template} strategy file_copy`,
    ...databaseRights(database),
  ])
}

/** Removes a database, ending whatever connections it still has. */
export async function dropDatabase(superuserUrl: string, database: string): Promise<void> {
  await runStatements(superuserUrl, [`drop database if exists ${database} with (force)`])
}
