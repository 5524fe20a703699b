import {
  chownSync,
  closeSync,
  existsSync,
  mkdirSync,
  openSync,
  readFileSync,
  renameSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs'
import { join } from 'node:path'
import { findFreePort } from './ports.mjs'
import { endProcess, identify, readArguments, waitUntil } from './processes.mjs'
import { SetupProblem } from './say.mjs'
import { findPostgres } from './system-packages.mjs'

const START_PATIENCE_MS = 180_000
const START_TRIES = 5
const LOG_LIMIT_BYTES = 5_000_000

/** What every cluster of ours is started with: nothing but loopback, passwords as SCRAM, times in UTC. */
const SETTINGS = {
  listen_addresses: '127.0.0.1',
  unix_socket_directories: '',
  password_encryption: 'scram-sha-256',
  timezone: 'UTC',
  log_timezone: 'UTC',
  jit: 'off',
  // A page asks for twenty rows: starting helpers for them takes longer than reading them.
  max_parallel_workers_per_gather: '0',
}

/** For data that is thrown away: as fast as it gets, and worthless after a crash. */
const THROWAWAY_SETTINGS = {
  fsync: 'off',
  synchronous_commit: 'off',
  full_page_writes: 'off',
  max_connections: '200',
}

/** For real data: an acknowledged change survives a crash. */
const DURABLE_SETTINGS = {
  fsync: 'on',
  synchronous_commit: 'on',
  full_page_writes: 'on',
  max_connections: '100',
}

/**
 * A private cluster that Debian's tools know nothing of.
 * @typedef {object} ClusterPlan
 * @property {string} home the folder that holds everything of the cluster
 * @property {import('./places.mjs').UnixUser | undefined} user whom it runs as, when not as ourselves
 * @property {import('./passwords.mjs').Passwords} passwords
 * @property {boolean} isDurable
 * @property {boolean} [resetSuperuser] the stored password was lost and made anew
 * @property {number} [port] the port to use again, after the database ended by itself
 */

/**
 * @typedef {object} Cluster
 * @property {number} port
 * @property {import('./passwords.mjs').Passwords} passwords
 * @property {Promise<string | number>} ended how the database ended
 * @property {() => Promise<void>} stop
 */

/**
 * What postmaster.pid says: whose it is and how far the start has come.
 * @param {string} text
 */
export function parsePostmasterFile(text) {
  const lines = text.split('\n')
  return { pid: Math.abs(Number(lines[0])) || undefined, isReady: lines[7]?.trim() === 'ready' }
}

/** @param {string} data */
function readPostmasterFile(data) {
  try {
    return parsePostmasterFile(readFileSync(join(data, 'postmaster.pid'), 'utf8'))
  } catch {
    return { pid: undefined, isReady: false }
  }
}

/** @param {ClusterPlan} plan */
function folderOf(plan) {
  return join(plan.home, 'postgres')
}

/**
 * Makes the data folder, whole or not at all.
 * @param {import('./run.mjs').Run} run
 * @param {ClusterPlan} plan
 */
async function initialise(run, plan) {
  const { home, user, passwords, isDurable } = plan
  const bin = findPostgres()
  if (!bin) throw new SetupProblem('PostgreSQL is not installed.')
  const draft = join(home, 'postgres.new')
  const passwordFile = join(home, 'superuser.new')
  const logPath = join(home, 'initdb.log')
  rmSync(draft, { recursive: true, force: true })
  rmSync(passwordFile, { force: true })
  writeFileSync(passwordFile, passwords.superuser, { mode: 0o600 })
  if (user) chownSync(passwordFile, user.uid, user.gid)
  // The program's user may not create a folder here, so it is handed an empty one.
  makeEmptyFolder(draft, user)
  const log = openSync(logPath, 'w', 0o644)
  const words = ['-D', draft, '-U', 'postgres', '-A', 'scram-sha-256', `--pwfile=${passwordFile}`]
  words.push('-E', 'UTF8', '--locale=C.UTF-8', isDurable ? '--data-checksums' : '--no-sync')
  try {
    await run.finish(join(bin, 'initdb'), words, {
      user,
      cwd: '/',
      env: databaseEnvironment(),
      stdio: ['ignore', log, log],
      problem: `The database could not be created; ${logPath} says why.`,
    })
  } finally {
    closeSync(log)
    rmSync(passwordFile, { force: true })
  }
  renameSync(draft, folderOf(plan))
}

/**
 * @param {string} folder
 * @param {import('./places.mjs').UnixUser | undefined} user
 */
function makeEmptyFolder(folder, user) {
  mkdirSync(folder, { mode: 0o700 })
  if (user) chownSync(folder, user.uid, user.gid)
}

/** The database gets nothing of our environment but where programs are: PGDATA and its like would mislead it. */
function databaseEnvironment() {
  return { PATH: process.env.PATH, LC_ALL: 'C.UTF-8', HOME: '/' }
}

/**
 * Ends a database that an earlier run left running on this folder, and removes what it left behind when it was killed.
 * Only called by the holder of the folder's lock, so whatever runs there has no owner.
 * @param {string} data
 */
async function clearLeftovers(data) {
  const { pid } = readPostmasterFile(data)
  if (pid === undefined) return
  const identity = identify(pid)
  if (identity && readArguments(pid).includes(data)) {
    await endProcess(identity, ['SIGINT', 'SIGQUIT', 'SIGKILL'], 30_000)
  }
  // The number may have gone to another program since, which would make PostgreSQL refuse to start.
  rmSync(join(data, 'postmaster.pid'), { force: true })
}

/**
 * Starts the cluster, after making it if there is none and tidying up after an earlier one.
 * @param {import('./run.mjs').Run} run
 * @param {ClusterPlan} plan
 * @returns {Promise<Cluster>}
 */
export async function startCluster(run, plan) {
  const data = folderOf(plan)
  if (!existsSync(join(data, 'PG_VERSION'))) await initialise(run, plan)
  else await clearLeftovers(data)
  const version = Number(readFileSync(join(data, 'PG_VERSION'), 'utf8'))
  const bin = findPostgres(version)
  if (!bin) {
    throw new SetupProblem(
      `The database in ${data} was made by PostgreSQL ${version}, which is not installed. Install the Debian package postgresql-${version}.`,
    )
  }
  if (plan.resetSuperuser) await resetSuperuser(run, plan, bin)
  const logPath = join(plan.home, 'postgres.log')
  if (existsSync(logPath) && statSync(logPath).size > LOG_LIMIT_BYTES) renameSync(logPath, `${logPath}.old`)
  for (let attempt = 1; attempt <= START_TRIES; attempt += 1) {
    const cluster = await tryToStart(run, plan, bin, logPath)
    if (cluster) return cluster
    // After a kill -9 the orphaned children need a moment to notice; or the port was snatched away.
    await new Promise((resolve) => setTimeout(resolve, 1_000))
  }
  throw new SetupProblem(`The database does not start; ${logPath} says why.`)
}

/**
 * @param {import('./run.mjs').Run} run
 * @param {ClusterPlan} plan
 * @param {string} bin
 * @param {string} logPath
 * @returns {Promise<Cluster | undefined>}
 */
async function tryToStart(run, plan, bin, logPath) {
  const data = folderOf(plan)
  const port = plan.port ?? (await findFreePort())
  const settings = {
    ...SETTINGS,
    ...(plan.isDurable ? DURABLE_SETTINGS : THROWAWAY_SETTINGS),
    port: String(port),
  }
  const log = openSync(logPath, 'a', 0o644)
  const words = [
    '-D',
    data,
    ...Object.entries(settings).flatMap(([name, value]) => ['-c', `${name}=${value}`]),
  ]
  const started = run.start(join(bin, 'postgres'), words, {
    user: plan.user,
    cwd: '/',
    env: databaseEnvironment(),
    stdio: ['ignore', log, log],
    // To PostgreSQL SIGINT means: end the connections and shut down in order. SIGTERM would wait for the connections.
    endSignal: plan.isDurable ? 'SIGINT' : 'SIGQUIT',
    politeMs: 60_000,
  })
  closeSync(log)
  let hasEnded = false
  void started.ended.then(() => (hasEnded = true))
  const isReady = () => {
    const file = readPostmasterFile(data)
    return hasEnded || (file.isReady && file.pid === started.child.pid)
  }
  const wasReady = await waitUntil(isReady, START_PATIENCE_MS, 20)
  if (wasReady && !hasEnded)
    return { port, passwords: plan.passwords, ended: started.ended, stop: started.stop }
  await started.stop()
  return undefined
}

/**
 * Gives the superuser a new password without signing in, for when the file of passwords was lost.
 * @param {import('./run.mjs').Run} run
 * @param {ClusterPlan} plan
 * @param {string} bin
 */
async function resetSuperuser(run, plan, bin) {
  const started = run.start(join(bin, 'postgres'), ['--single', '-D', folderOf(plan), 'postgres'], {
    user: plan.user,
    cwd: '/',
    env: databaseEnvironment(),
    stdio: ['pipe', 'ignore', 'ignore'],
  })
  started.child.stdin?.end(`alter role postgres password '${plan.passwords.superuser}'\n`)
  const code = await started.ended
  if (code !== 0) throw new SetupProblem('The password of the database could not be renewed.')
}
