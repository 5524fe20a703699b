import { spawn } from 'node:child_process'
import { constants } from 'node:os'
import { findNpm, isAlive } from './processes.mjs'
import { complain, SetupProblem } from './say.mjs'

const POLITE_MS = 10_000
const WATCH_MS = 500

/**
 * @typedef {object} StartOptions
 * @property {string} [cwd]
 * @property {NodeJS.ProcessEnv} [env]
 * @property {{ uid: number, gid: number } | undefined} [user] run as this user instead of our own
 * @property {import('node:child_process').StdioOptions} [stdio]
 * @property {NodeJS.Signals} [endSignal] what asks it politely to end; SIGTERM unless said otherwise
 * @property {number} [politeMs] how long it may take about it
 */

/**
 * @typedef {object} Started
 * @property {import('node:child_process').ChildProcess} child
 * @property {Promise<string | number>} ended the exit code, or the signal's name
 * @property {() => Promise<void>} stop
 */

/**
 * One run of a command: what it started and how all of it ends, by itself, by a signal, or because npm is gone.
 *
 * Every child gets a process group of its own, so that Ctrl-C reaches only us and we end things in order; and the
 * kernel signals the child if we die without having had the chance.
 */
export class Run {
  /** @type {Array<() => Promise<void> | void>} */
  #cleanups = []
  /** @type {Promise<void> | undefined} */
  #ending
  /** @type {NodeJS.Timeout | undefined} */
  #watch

  /** @param {{ exitCodeOnSignal?: number }} [options] what a signal means: for a server it is the ordinary end */
  constructor({ exitCodeOnSignal } = {}) {
    for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
      process.on(signal, () => void this.#leave(exitCodeOnSignal ?? 128 + constants.signals[signal]))
    }
    // Whoever read our lines may be gone before us; that is no reason to stop tidying up.
    for (const stream of [process.stdout, process.stderr]) stream.on('error', () => {})
    const npm = findNpm()
    if (npm) {
      this.#watch = setInterval(() => {
        if (!isAlive(npm)) void this.#leave(1)
      }, WATCH_MS)
      this.#watch.unref()
    }
  }

  get isEnding() {
    return this.#ending !== undefined
  }

  /** @param {number} code */
  async #leave(code) {
    await this.end()
    process.exit(code)
  }

  /**
   * Ends the run because something going on beside the body failed.
   * @param {unknown} error
   */
  fail(error) {
    if (this.isEnding) return
    explain(error)
    void this.#leave(1)
  }

  /** Undoes everything deferred, the last first. Safe to call twice. */
  end() {
    this.#ending ??= (async () => {
      clearInterval(this.#watch)
      for (const cleanup of this.#cleanups.reverse()) {
        try {
          await cleanup()
        } catch (error) {
          complain(`While ending: ${error instanceof Error ? error.message : String(error)}`)
        }
      }
    })()
    return this.#ending
  }

  /**
   * Names something to be done when the run ends; gives back a function that forgets it again.
   * @param {() => Promise<void> | void} cleanup
   */
  defer(cleanup) {
    this.#cleanups.push(cleanup)
    return () => {
      const at = this.#cleanups.indexOf(cleanup)
      if (at >= 0 && !this.isEnding) this.#cleanups.splice(at, 1)
    }
  }

  /**
   * Starts a program and sees to it that it ends with us.
   * @param {string} command
   * @param {string[]} words
   * @param {StartOptions} [options]
   * @returns {Started}
   */
  start(command, words, options = {}) {
    if (this.isEnding) throw new SetupProblem('The command was stopped.')
    const { user, endSignal = 'SIGTERM', politeMs = POLITE_MS } = options
    const wrapper = ['--pdeathsig', endSignal.replace('SIG', '')]
    if (user) wrapper.push(`--reuid=${user.uid}`, `--regid=${user.gid}`, '--clear-groups')
    const child = spawn('setpriv', [...wrapper, '--', command, ...words], {
      cwd: options.cwd,
      env: options.env ?? process.env,
      stdio: options.stdio ?? ['ignore', 'inherit', 'inherit'],
      detached: true,
    })
    /** @type {Promise<string | number>} */
    const ended = new Promise((resolve) => {
      child.once('error', (error) => resolve(error.message))
      child.once('exit', (code, signal) => resolve(code ?? signal ?? 'unknown'))
    })
    /** @param {NodeJS.Signals} signal */
    const signalGroup = (signal) => {
      try {
        if (child.pid) process.kill(-child.pid, signal)
      } catch {
        // The group is gone already, which is what was wanted.
      }
    }
    const stop = async () => {
      if (child.exitCode === null && child.signalCode === null) {
        // Only the program itself is asked: it knows how to end its own children.
        child.kill(endSignal)
        const timer = setTimeout(() => signalGroup('SIGKILL'), politeMs)
        await ended
        clearTimeout(timer)
      }
      signalGroup('SIGKILL')
    }
    const forget = this.defer(stop)
    void ended.then(forget)
    return { child, ended, stop }
  }

  /**
   * Runs a program to its end. Throws a SetupProblem with the sentence given when it fails.
   * @param {string} command
   * @param {string[]} words
   * @param {StartOptions & { problem: string }} options
   */
  async finish(command, words, options) {
    const code = await this.attempt(command, words, options)
    if (code !== 0) throw new SetupProblem(`${options.problem} (${command} ended with ${code}.)`)
  }

  /**
   * Runs a program to its end and gives its exit code.
   * @param {string} command
   * @param {string[]} words
   * @param {StartOptions} [options]
   */
  async attempt(command, words, options) {
    const code = await this.start(command, words, options).ended
    if (this.isEnding) await new Promise(() => {})
    return code
  }
}

/** @param {unknown} error */
function explain(error) {
  if (error instanceof SetupProblem) complain(error.message)
  else complain(error instanceof Error ? (error.stack ?? error.message) : String(error))
}

/**
 * Runs the body of a command: tidies up whatever happens and leaves with an honest exit code.
 * @param {(run: Run) => Promise<number | void>} body
 * @param {{ exitCodeOnSignal?: number }} [options]
 */
export async function runCommand(body, options) {
  const run = new Run(options)
  const code = await body(run).catch((error) => {
    if (!run.isEnding) explain(error)
    return 1
  })
  // A signal came first: it tidies up and leaves by itself.
  if (run.isEnding) return
  await run.end()
  process.exit(code ?? 0)
}
