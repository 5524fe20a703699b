import { existsSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { startCluster } from './cluster.mjs'
import { readLockNote, takeLock, withLock } from './lock.mjs'
import { installNpmPackages } from './npm-packages.mjs'
import { keepPasswords } from './passwords.mjs'
import { findDatabaseUser, findHome, root, stateFolder } from './places.mjs'
import { buildIfChanged, productProgram } from './product.mjs'
import { addresses, prepareDatabase } from './roles.mjs'
import { say, secondsSince, SetupProblem } from './say.mjs'
import { installSystemPackages } from './system-packages.mjs'

export const DATABASE = 'mossgauge'

/**
 * Installs what is missing and builds what changed, one command of this checkout at a time.
 * @param {import('./run.mjs').Run} run
 * @param {{ chromium?: boolean, build?: boolean }} wanted
 */
export async function setUp(run, { chromium = false, build = true }) {
  await withLock(join(stateFolder(), 'setup.lock'), async () => {
    await installSystemPackages(run, { chromium })
    await installNpmPackages(run, root)
    if (build) await buildIfChanged(run, root)
  })
}

/**
 * The installation's database, ready to be used.
 * @typedef {object} Installation
 * @property {string} home
 * @property {import('./cluster.mjs').Cluster} cluster
 * @property {boolean} isOurs started by us, not by another command of this checkout
 * @property {() => Promise<import('./cluster.mjs').Cluster>} restart starts it again on the same port
 */

/**
 * Starts this checkout's own cluster, or finds it running under another command.
 * @param {import('./run.mjs').Run} run
 * @returns {Promise<Installation>}
 */
export async function openInstallation(run) {
  const user = findDatabaseUser()
  const home = findHome(root, user)
  const lockPath = join(home, 'database.lock')
  const lock = await takeLock(lockPath, 0)
  if (!lock) return { home, isOurs: false, cluster: joinCluster(home, lockPath), restart: refuseRestart }
  run.defer(() => lock.release())
  const hadData = existsSync(join(home, 'postgres', 'PG_VERSION'))
  if (!hadData) say(`Creating the database in ${home}.`)
  const { passwords, isNew } = keepPasswords(home)
  const plan = { home, user, passwords, isDurable: true }
  const cluster = await startCluster(run, { ...plan, resetSuperuser: isNew && hadData })
  await prepareDatabase(cluster, DATABASE)
  lock.note(JSON.stringify({ port: cluster.port }))
  say(`The database is running on port ${cluster.port} of 127.0.0.1; its data is in ${home}.`)
  return { home, isOurs: true, cluster, restart: () => startCluster(run, { ...plan, port: cluster.port }) }
}

/** @returns {Promise<import('./cluster.mjs').Cluster>} */
function refuseRestart() {
  throw new SetupProblem('The database belongs to another command.')
}

/**
 * The cluster another command of this checkout keeps running.
 * @param {string} home
 * @param {string} lockPath
 * @returns {import('./cluster.mjs').Cluster}
 */
function joinCluster(home, lockPath) {
  const { passwords } = keepPasswords(home)
  try {
    const { port } = JSON.parse(readLockNote(lockPath))
    return { port, passwords, ended: new Promise(() => {}), stop: async () => {} }
  } catch {
    throw new SetupProblem(
      'Another command of this checkout is just starting the database. Try again in a moment.',
    )
  }
}

/**
 * What a program of the product is told by its environment.
 * @param {import('./cluster.mjs').Cluster} cluster
 * @param {{ asOwner?: boolean, mode?: string, database?: string }} [options] only what changes the schema or loads the
 *   seed knows the owner
 * @returns {NodeJS.ProcessEnv}
 */
export function productEnvironment(
  cluster,
  { asOwner = false, mode = 'production', database = DATABASE } = {},
) {
  const { app, owner } = addresses(cluster, database)
  /** @type {NodeJS.ProcessEnv} */
  const env = { ...process.env, NODE_ENV: mode, DATABASE_URL: app }
  delete env.DATABASE_OWNER_URL
  return asOwner ? { ...env, DATABASE_OWNER_URL: owner } : env
}

/**
 * Runs a program of the product that changes the database, to its end.
 * @param {import('./run.mjs').Run} run
 * @param {import('./cluster.mjs').Cluster} cluster
 * @param {string} name such as `server/migrate`
 * @param {{ from?: 'built' | 'source', words?: string[], database?: string, problem: string }} options
 */
export async function runProgram(run, cluster, name, { from = 'built', words = [], database, problem }) {
  const [command, first] = productProgram(root, from, name)
  const env = productEnvironment(cluster, {
    asOwner: true,
    mode: from === 'built' ? 'production' : 'development',
    database,
  })
  await run.finish(command, [...first, ...words], { cwd: root, env, problem })
}

/**
 * Brings the schema up to date and, the first time, loads the seed.
 * @param {import('./run.mjs').Run} run
 * @param {Installation} installation
 * @param {'built' | 'source'} from
 */
export async function fillDatabase(run, { home, cluster }, from) {
  await runProgram(run, cluster, 'server/migrate', {
    from,
    problem: 'The database could not be brought to the present schema.',
  })
  // Written when the seed is in whole: loading it is repeatable, so one that was cut off is simply loaded again.
  const stamp = join(home, 'seeded')
  if (existsSync(stamp)) return
  const startedAt = Date.now()
  say('Loading the open datasets and the demonstration (about a minute, only this once).')
  await runProgram(run, cluster, 'seeds/seed', { from, problem: 'The seed could not be loaded.' })
  writeFileSync(stamp, `${new Date().toISOString()}\n`)
  say(`Loaded the seed in ${secondsSince(startedAt)}.`)
}
