import { existsSync, readFileSync, rmSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { say, secondsSince } from './say.mjs'

/**
 * @typedef {{ version?: string, optional?: boolean, link?: boolean }} LockedPackage
 * @typedef {{ packages: Record<string, LockedPackage> }} LockFile
 */

/**
 * The packages of the lock file that are not installed as it says. npm writes `installed`, the list of what it put into
 * node_modules, when it is done; optional packages may be missing on purpose, being for other systems.
 * @param {LockFile} wanted
 * @param {LockFile} installed
 * @param {(path: string) => boolean} isThere
 */
export function findMissingPackages(wanted, installed, isThere) {
  return Object.entries(wanted.packages)
    .filter(([path]) => path !== '')
    .filter(([path, { version, optional }]) => {
      const present = installed.packages[path]
      if (!present) return !optional
      return present.version !== version || !isThere(path)
    })
    .map(([path]) => path)
}

/** @param {string} path */
function readLockFile(path) {
  return /** @type {LockFile} */ (JSON.parse(readFileSync(path, 'utf8')))
}

/**
 * How to start npm: the very one that started us where that is known.
 * @returns {[string, string[]]}
 */
function npmProgram() {
  const path = process.env.npm_execpath
  return path?.endsWith('.js') && existsSync(path) ? [process.execPath, [path]] : ['npm', []]
}

/**
 * Installs the npm packages of the lock file, development ones too, unless they are there.
 * @param {import('./run.mjs').Run} run
 * @param {string} checkout
 */
export async function installNpmPackages(run, checkout) {
  const lockPath = join(checkout, 'package-lock.json')
  const installedPath = join(checkout, 'node_modules/.package-lock.json')
  try {
    const isThere = (/** @type {string} */ path) => existsSync(join(checkout, path, 'package.json'))
    if (findMissingPackages(readLockFile(lockPath), readLockFile(installedPath), isThere).length === 0) return
  } catch {
    // No list, or half of one: an installation that never came to its end.
  }
  const startedAt = Date.now()
  say('Installing the npm packages (about a minute the first time).')
  rmSync(installedPath, { force: true })
  const env = { ...process.env }
  // Either would leave out the development packages, which build and test the product.
  delete env.NODE_ENV
  delete env.npm_config_omit
  delete env.npm_config_production
  env.PATH = `${dirname(process.execPath)}:${env.PATH ?? ''}`
  const [command, words] = npmProgram()
  await run.finish(
    command,
    [...words, 'ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'],
    {
      cwd: checkout,
      env,
      problem: 'The npm packages could not be installed; the lines above say why.',
    },
  )
  say(`Installed the npm packages in ${secondsSince(startedAt)}.`)
}
