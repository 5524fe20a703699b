import { createHash } from 'node:crypto'
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs'
import { join } from 'node:path'

/** What the build reads. */
const BUILD_INPUTS = [
  '.config/tsconfig.base.json',
  'index.html',
  'package-lock.json',
  'package.json',
  'public',
  'seeds',
  'server',
  'shared',
  'src',
  'vite.config.ts',
]
/** Read at run time, or before there is a build. */
const NOT_BUILT = ['seeds/data', 'server/setup']

/**
 * The files under the given names, in a settled order.
 * @param {string} checkout
 * @param {string[]} names
 * @param {string[]} except
 * @returns {string[]}
 */
export function listFiles(checkout, names, except) {
  return names
    .filter((name) => !except.includes(name) && existsSync(join(checkout, name)))
    .sort()
    .flatMap((name) => {
      if (!statSync(join(checkout, name)).isDirectory()) return [name]
      const children = readdirSync(join(checkout, name)).map((child) => `${name}/${child}`)
      return listFiles(checkout, children, except)
    })
}

/**
 * A fingerprint of everything the build depends on: equal when building again would give the same.
 * @param {string} checkout
 */
export function hashBuildInputs(checkout) {
  const hash = createHash('sha256').update(process.versions.node.split('.')[0] ?? '')
  for (const name of listFiles(checkout, BUILD_INPUTS, NOT_BUILT)) {
    const content = readFileSync(join(checkout, name))
    hash.update(`\n${name} ${content.length}\n`).update(content)
  }
  return hash.digest('hex')
}
