import {
  closeSync,
  existsSync,
  openSync,
  readFileSync,
  renameSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs'
import { join } from 'node:path'
import { fillDatabase, openInstallation, productEnvironment, setUp } from './installation.mjs'
import { readLockNote, takeLock } from './lock.mjs'
import { root, stateFolder } from './places.mjs'
import { choosePort, parsePort } from './ports.mjs'
import { endProcess, identify, isAlive, waitUntil } from './processes.mjs'
import { productProgram } from './product.mjs'
import { say, secondsSince, SetupProblem } from './say.mjs'

const USUAL_PORT = 8080
const READY_PATIENCE_MS = 60_000
const SERVER_POLITE_MS = 15_000
const LOG_LIMIT_BYTES = 20_000_000
/** So many unexpected ends within a minute, and it is not worth starting again. */
const MOST_RESTARTS = 5
const RESTART_WINDOW_MS = 60_000

/**
 * Sets everything up, then keeps database and server running until told to stop.
 * @param {import('./run.mjs').Run} run
 * @param {'built' | 'source'} from
 */
export async function serve(run, from) {
  const startedAt = Date.now()
  const asked = parsePort(process.env.PORT)
  const state = stateFolder()
  const lockPath = join(state, 'start.lock')
  const lock = await takeLock(lockPath, 0)
  if (!lock) {
    const where = readLockNote(lockPath)
    throw new SetupProblem(
      where
        ? `Mossgauge already runs from this checkout at ${where}.`
        : 'Mossgauge is already being started from this checkout.',
    )
  }
  run.defer(() => lock.release())
  lock.note('')

  const serverNote = join(state, 'server.json')
  await endEarlierServer(serverNote)
  // A busy port is said before the long work; it is asked again after it.
  await choosePort(asked, USUAL_PORT)
  await setUp(run, { build: from === 'built' })
  const installation = await openInstallation(run)
  if (!installation.isOurs)
    throw new SetupProblem(
      'Another command of this checkout is using the database; start again when it is done.',
    )
  await fillDatabase(run, installation, from)

  const port = await choosePort(asked, USUAL_PORT)
  if (port !== USUAL_PORT && asked === undefined) say(`Port ${USUAL_PORT} is in use; taking ${port}.`)
  const address = `http://127.0.0.1:${port}`
  keepDatabaseRunning(run, installation)
  await keepServerRunning(
    run,
    installation,
    { from, port, serverNote, logPath: join(state, 'server.log') },
    () => {
      lock.note(address)
      say(`Mossgauge is at ${address} (ready in ${secondsSince(startedAt)}). Ctrl-C stops it.`)
    },
  )
}

/**
 * Ends a server whose starter was killed and which has not noticed yet; it would hold the port.
 * @param {string} notePath
 */
async function endEarlierServer(notePath) {
  if (!existsSync(notePath)) return
  try {
    const identity = JSON.parse(readFileSync(notePath, 'utf8'))
    // It was told to stop when its starter died, and a second word would cut short the requests it is finishing.
    await waitUntil(() => !isAlive(identity), SERVER_POLITE_MS)
    await endProcess(identity, ['SIGKILL'], SERVER_POLITE_MS)
  } catch {
    // Half a note: its writer was killed in the act.
  }
  rmSync(notePath, { force: true })
}

/** Counts ends that nobody asked for, and gives up when they come too often. */
class Patience {
  /** @type {number[]} */
  #times = []

  /** @param {string} problem */
  spend(problem) {
    const now = Date.now()
    this.#times = [...this.#times.filter((time) => now - time < RESTART_WINDOW_MS), now]
    if (this.#times.length > MOST_RESTARTS) throw new SetupProblem(problem)
  }
}

/**
 * @param {import('./run.mjs').Run} run
 * @param {import('./installation.mjs').Installation} installation
 */
function keepDatabaseRunning(run, installation) {
  const patience = new Patience()
  const watch = async () => {
    let { cluster } = installation
    for (;;) {
      const how = await cluster.ended
      if (run.isEnding) return
      say(`The database ended unexpectedly (${how}); starting it again.`)
      patience.spend('The database keeps ending.')
      cluster = await installation.restart()
      say('The database is running again.')
    }
  }
  watch().catch((error) => run.fail(error))
}

/**
 * @param {import('./run.mjs').Run} run
 * @param {import('./installation.mjs').Installation} installation
 * @param {{ from: 'built' | 'source', port: number, serverNote: string, logPath: string }} plan
 * @param {() => void} onReady called the first time the server answers
 */
async function keepServerRunning(run, { cluster }, { from, port, serverNote, logPath }, onReady) {
  const patience = new Patience()
  const env = {
    ...productEnvironment(cluster, { mode: from === 'built' ? 'production' : 'development' }),
    HOST: '127.0.0.1',
    PORT: String(port),
    PUBLIC_URL: process.env.PUBLIC_URL ?? `http://127.0.0.1:${port}`,
  }
  run.defer(() => rmSync(serverNote, { force: true }))
  let hasBeenReady = false
  for (;;) {
    const started = startServer(run, from, env, logPath)
    const identity = started.child.pid ? identify(started.child.pid) : undefined
    if (identity) writeFileSync(serverNote, JSON.stringify(identity))
    let hasEnded = false
    void started.ended.then(() => (hasEnded = true))
    const isReady = await waitUntil(async () => hasEnded || (await answers(port)), READY_PATIENCE_MS)
    if (!isReady)
      throw new SetupProblem(`The server does not answer on port ${port}; ${logPath} may say why.`)
    if (!hasEnded && !hasBeenReady) onReady()
    hasBeenReady ||= !hasEnded
    const how = await started.ended
    if (run.isEnding) return
    if (!hasBeenReady)
      throw new SetupProblem(`The server could not start (it ended with ${how}); ${logPath} may say more.`)
    say(`The server ended unexpectedly (${how}); starting it again.`)
    patience.spend(`The server keeps ending; ${logPath} may say why.`)
  }
}

/**
 * @param {import('./run.mjs').Run} run
 * @param {'built' | 'source'} from
 * @param {NodeJS.ProcessEnv} env
 * @param {string} logPath
 */
function startServer(run, from, env, logPath) {
  const options = { cwd: root, env, politeMs: SERVER_POLITE_MS }
  if (from === 'source') {
    const [command, [option = '', config = '', file = '']] = productProgram(root, 'source', 'server/index')
    return run.start(command, ['watch', '--clear-screen=false', option, config, file], options)
  }
  if (existsSync(logPath) && statSync(logPath).size > LOG_LIMIT_BYTES) renameSync(logPath, `${logPath}.old`)
  const log = openSync(logPath, 'a', 0o600)
  const [command, words] = productProgram(root, 'built', 'server/index')
  const started = run.start(command, words, { ...options, stdio: ['ignore', log, 'inherit'] })
  closeSync(log)
  return started
}

/** @param {number} port */
export async function answers(port) {
  try {
    const answer = await fetch(`http://127.0.0.1:${port}/healthz`, { signal: AbortSignal.timeout(2_000) })
    await answer.body?.cancel()
    return answer.ok
  } catch {
    return false
  }
}
