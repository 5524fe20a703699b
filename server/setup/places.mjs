import { spawnSync } from 'node:child_process'
import { createHash } from 'node:crypto'
import { chmodSync, chownSync, existsSync, mkdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { homedir, tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { SetupProblem } from './say.mjs'

/** The top of the checkout. */
export const root = resolve(import.meta.dirname, '../..')

/** @typedef {{ uid: number, gid: number }} UnixUser */

/**
 * The user a passwd file names, or undefined.
 * @param {string} passwd
 * @param {string} name
 * @returns {UnixUser | undefined}
 */
export function findUser(passwd, name) {
  const fields = passwd
    .split('\n')
    .map((line) => line.split(':'))
    .find((parts) => parts[0] === name)
  return fields ? { uid: Number(fields[2]), gid: Number(fields[3]) } : undefined
}

/**
 * Whom the database runs as: nobody else when we are an ordinary user, the package's own user when we are root, since
 * PostgreSQL refuses to run as root.
 * @returns {UnixUser | undefined}
 */
export function findDatabaseUser() {
  if (process.getuid?.() !== 0) return undefined
  const user = findUser(readFileSync('/etc/passwd', 'utf8'), 'postgres')
  if (!user)
    throw new SetupProblem(
      'There is no system user "postgres", which the Debian package postgresql-15 creates.',
    )
  return user
}

/**
 * The checkout's own folder for state: locks, the server's log, and the data where the database can reach it.
 * @param {string} [checkout]
 */
export function stateFolder(checkout = root) {
  const folder = join(checkout, '.data')
  try {
    mkdirSync(folder, { recursive: true })
    // The database's user passes through here; nobody reads more than the names.
    if (process.getuid?.() === 0) chmodSync(folder, 0o755)
  } catch (error) {
    throw new SetupProblem(`${folder} cannot be made or used (${/** @type {Error} */ (error).message}).`)
  }
  return folder
}

/**
 * The folders that may hold the data, best first: the checkout's own, then one outside it, kept apart by its path.
 * @param {string} checkout
 * @param {number} uid of whoever runs the command
 */
export function candidateHomes(checkout, uid) {
  const key = createHash('sha256').update(checkout).digest('hex').slice(0, 12)
  const outside = uid === 0 ? '/var/lib' : join(homedir(), '.local/share')
  return [join(checkout, '.data'), join(outside, 'mossgauge', key), join(tmpdir(), `mossgauge-${uid}-${key}`)]
}

/**
 * Whether the database's user can work in a folder, found out by trying.
 * @param {string} folder
 * @param {UnixUser | undefined} user
 */
export function canWork(folder, user) {
  return (
    spawnSync('test', ['-w', folder, '-a', '-x', folder], user ? { ...user, cwd: '/' } : { cwd: '/' })
      .status === 0
  )
}

/**
 * Makes the folder `name` inside a home, owned by the database's user and closed to others; false where it cannot be
 * made, or where the home belongs to somebody else.
 * @param {string} home
 * @param {string} name
 * @param {UnixUser | undefined} user
 */
export function makePrivateFolder(home, name, user) {
  try {
    mkdirSync(home, { recursive: true, mode: 0o755 })
    if (statSync(home).uid !== process.getuid?.()) return false
    const folder = join(home, name)
    mkdirSync(folder, { recursive: true, mode: 0o700 })
    if (user) chownSync(folder, user.uid, user.gid)
    chmodSync(folder, 0o700)
    return canWork(folder, user)
  } catch {
    return false
  }
}

/**
 * Where this checkout's database lives: where it was put before, otherwise the first folder its user can reach. The
 * choice is written down, because a folder that stops being reachable must be a complaint, not a new empty database.
 * @param {string} checkout
 * @param {UnixUser | undefined} user
 * @returns {string}
 */
export function findHome(checkout, user) {
  const state = stateFolder(checkout)
  const note = join(state, 'home')
  const homes = candidateHomes(checkout, process.getuid?.() ?? 0)
  // Noted from the state folder, so that a checkout can be moved with its database inside.
  const noted = existsSync(note) ? resolve(state, readFileSync(note, 'utf8').trim()) : undefined
  const known = noted ?? homes.find((home) => existsSync(join(home, 'postgres', 'PG_VERSION')))
  if (known) {
    if (!existsSync(known) || !makePrivateFolder(known, 'postgres', user)) {
      throw new SetupProblem(
        `The database of this checkout is in ${known}, which cannot be used now. Make it reachable for the user who runs the database, or delete ${note} to begin with an empty one.`,
      )
    }
  }
  const home = known ?? homes.find((candidate) => makePrivateFolder(candidate, 'postgres', user))
  if (!home) throw new SetupProblem(`None of these folders can hold the database: ${homes.join(', ')}.`)
  if (!noted) writeFileSync(note, `${home === state ? '.' : home}\n`)
  return home
}
