import { readFileSync } from 'node:fs'

/**
 * Who a process is: its number alone is used again, number and start time together are not.
 * @typedef {{ pid: number, startedAt: string }} ProcessIdentity
 */

/**
 * The state, parent and start time in a line of /proc/PID/stat. The name, in brackets, may itself hold brackets and
 * spaces, so the fields are counted from the last closing one.
 * @param {string} stat
 */
export function parseStat(stat) {
  const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ')
  return { state: fields[0] ?? '', parentPid: Number(fields[1]), startedAt: fields[19] ?? '' }
}

/** @param {number} pid */
function readStat(pid) {
  try {
    return parseStat(readFileSync(`/proc/${pid}/stat`, 'utf8'))
  } catch {
    return undefined
  }
}

/**
 * The identity of a living process; undefined when there is none. A zombie counts as gone: where nobody reaps it, it
 * would look alive for ever.
 * @param {number} pid
 * @returns {ProcessIdentity | undefined}
 */
export function identify(pid) {
  const stat = readStat(pid)
  return stat && stat.state !== 'Z' && stat.state !== 'X' ? { pid, startedAt: stat.startedAt } : undefined
}

/**
 * @param {ProcessIdentity} identity
 */
export function isAlive(identity) {
  return identify(identity.pid)?.startedAt === identity.startedAt
}

/**
 * The words a process was started with.
 * @param {number} pid
 * @returns {string[]}
 */
export function readArguments(pid) {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0').filter(Boolean)
  } catch {
    return []
  }
}

/**
 * The npm this process was started by, a few steps up; undefined when npm did not start it.
 * @returns {ProcessIdentity | undefined}
 */
export function findNpm() {
  let pid = process.ppid
  for (let steps = 0; steps < 4 && pid > 1; steps += 1) {
    if (/(^|\/)npm(-cli\.js)?( |$)/.test(readArguments(pid).slice(0, 2).join(' '))) return identify(pid)
    pid = readStat(pid)?.parentPid ?? 0
  }
  return undefined
}

/**
 * Asks until the answer is yes or the time is up.
 * @param {() => boolean | Promise<boolean>} ask
 * @param {number} timeoutMs
 * @param {number} [pauseMs]
 */
export async function waitUntil(ask, timeoutMs, pauseMs = 50) {
  const end = Date.now() + timeoutMs
  for (;;) {
    if (await ask()) return true
    if (Date.now() >= end) return false
    await new Promise((resolve) => setTimeout(resolve, pauseMs))
  }
}

/**
 * Ends a process that an earlier run left behind, first politely.
 * @param {ProcessIdentity} identity
 * @param {NodeJS.Signals[]} signals from the polite one to the last resort
 * @param {number} patienceMs for each signal
 */
export async function endProcess(identity, signals, patienceMs) {
  for (const signal of signals) {
    if (!isAlive(identity)) return
    try {
      process.kill(identity.pid, signal)
    } catch {
      return
    }
    if (await waitUntil(() => !isAlive(identity), patienceMs)) return
  }
}
