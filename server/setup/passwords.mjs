import { randomBytes } from 'node:crypto'
import { chmodSync, existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'

/**
 * The passwords of the database's three roles.
 * @typedef {{ superuser: string, owner: string, app: string }} Passwords
 */

/** @returns {Passwords} */
export function makePasswords() {
  const make = () => randomBytes(24).toString('base64url')
  return { superuser: make(), owner: make(), app: make() }
}

/**
 * @param {string} text
 * @returns {Passwords | undefined} undefined when the text is not a whole set
 */
export function parsePasswords(text) {
  try {
    const { superuser, owner, app } = JSON.parse(text)
    return [superuser, owner, app].every((word) => typeof word === 'string' && word.length >= 16)
      ? { superuser, owner, app }
      : undefined
  } catch {
    return undefined
  }
}

/**
 * Writes the file whole or not at all, readable by us alone.
 * @param {string} path
 * @param {string} text
 */
export function writePrivateFile(path, text) {
  const draft = `${path}.new`
  writeFileSync(draft, text, { mode: 0o600 })
  chmodSync(draft, 0o600)
  renameSync(draft, path)
}

/**
 * This installation's passwords, made at the first start.
 * @param {string} home
 * @returns {{ passwords: Passwords, isNew: boolean }}
 */
export function keepPasswords(home) {
  const path = join(home, 'passwords.json')
  const known = existsSync(path) ? parsePasswords(readFileSync(path, 'utf8')) : undefined
  if (known) return { passwords: known, isNew: false }
  const passwords = makePasswords()
  writePrivateFile(path, `${JSON.stringify(passwords, undefined, 2)}\n`)
  return { passwords, isNew: true }
}
