import { closeSync, ftruncateSync, openSync, readFileSync, writeSync } from 'node:fs'
import { spawn } from 'node:child_process'
import { say } from './say.mjs'

/**
 * Takes the lock on a file, if need be after waiting for it. The kernel holds the lock for as long as our descriptor is
 * open, so a killed holder never leaves a stale one: the file that stays behind means nothing by itself. Children do
 * not inherit the descriptor.
 * @param {string} path
 * @param {number} waitSeconds 0 gives up at once
 * @returns {Promise<{ note: (text: string) => void, release: () => void } | undefined>} undefined when another holds it
 */
export async function takeLock(path, waitSeconds) {
  const descriptor = openSync(path, 'a+', 0o644)
  const words = waitSeconds > 0 ? ['-w', String(waitSeconds), '3'] : ['-n', '3']
  const flock = spawn('flock', words, { stdio: ['ignore', 'ignore', 'inherit', descriptor] })
  const code = await new Promise((resolve) => {
    flock.once('error', () => resolve(-1))
    flock.once('exit', resolve)
  })
  if (code !== 0) {
    closeSync(descriptor)
    return undefined
  }
  return {
    /** Writes down for others who holds the lock. */
    note(text) {
      ftruncateSync(descriptor)
      writeSync(descriptor, text)
    },
    release() {
      closeSync(descriptor)
    },
  }
}

/**
 * What the holder of a lock wrote down, or nothing.
 * @param {string} path
 */
export function readLockNote(path) {
  try {
    return readFileSync(path, 'utf8')
  } catch {
    return ''
  }
}

/**
 * Does something that only one process of this checkout may do at a time, such as installing packages.
 * @template T
 * @param {string} path
 * @param {() => Promise<T>} work
 */
export async function withLock(path, work) {
  let lock = await takeLock(path, 0)
  if (!lock) {
    say('Another command is setting up this checkout; waiting for it to finish.')
    lock = await takeLock(path, 1200)
    if (!lock) throw new Error(`The lock ${path} was not released within 20 minutes.`)
  }
  try {
    return await work()
  } finally {
    lock.release()
  }
}
