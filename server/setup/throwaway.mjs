import { chmodSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { startCluster } from './cluster.mjs'
import { makePasswords } from './passwords.mjs'
import { findDatabaseUser, makePrivateFolder } from './places.mjs'
import { identify, isAlive } from './processes.mjs'
import { SetupProblem } from './say.mjs'

const PREFIX = 'mossgauge-test-'
const MAKER = 'maker.json'

/** Removes clusters whose maker was killed before it could. */
function sweep(/** @type {string} */ parent) {
  for (const name of readdirSync(parent).filter((entry) => entry.startsWith(PREFIX))) {
    const home = join(parent, name)
    try {
      const maker = JSON.parse(readFileSync(join(home, MAKER), 'utf8'))
      if (!isAlive(maker)) rmSync(home, { recursive: true, force: true })
    } catch {
      // Somebody else's, or being made this very moment.
    }
  }
}

/** @param {import('./places.mjs').UnixUser | undefined} user */
function makeHome(user) {
  for (const parent of new Set([tmpdir(), '/tmp', '/var/tmp'])) {
    try {
      sweep(parent)
      const home = mkdtempSync(join(parent, PREFIX))
      chmodSync(home, 0o755)
      writeFileSync(join(home, MAKER), JSON.stringify(identify(process.pid)))
      if (makePrivateFolder(home, 'postgres', user)) return home
      rmSync(home, { recursive: true, force: true })
    } catch {
      // Not writable; the next one may be.
    }
  }
  throw new SetupProblem('No temporary folder can hold a database for the tests.')
}

/**
 * A cluster for tests: made in a temporary folder, fast instead of safe, and gone with the run whatever happens.
 * @param {import('./run.mjs').Run} run
 */
export async function startThrowawayCluster(run) {
  const user = findDatabaseUser()
  const home = makeHome(user)
  run.defer(() => rmSync(home, { recursive: true, force: true }))
  return await startCluster(run, { home, user, passwords: makePasswords(), isDurable: false })
}
