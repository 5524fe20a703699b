import { mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, test } from 'vitest'
import { keepPasswords } from '../../../server/setup/passwords.mjs'

describe('the passwords of an installation', () => {
  let home: string
  beforeEach(() => {
    home = mkdtempSync(join(tmpdir(), 'passwords-'))
  })
  afterEach(() => rmSync(home, { recursive: true }))

  test('are made once, readable by their owner alone', () => {
    const first = keepPasswords(home)
    expect(first.isNew).toBe(true)
    expect(statSync(join(home, 'passwords.json')).mode & 0o777).toBe(0o600)
    expect(keepPasswords(home)).toEqual({ passwords: first.passwords, isNew: false })
  })

  test('differ from role to role and from one installation to the next', () => {
    const { passwords } = keepPasswords(home)
    const other = mkdtempSync(join(tmpdir(), 'passwords-'))
    const all = [...Object.values(passwords), ...Object.values(keepPasswords(other).passwords)]
    rmSync(other, { recursive: true })
    expect(new Set(all).size).toBe(6)
    for (const password of all) expect(password.length).toBeGreaterThanOrEqual(32)
  })

  test.each(['', '{"superuser":"', '{}', '{"superuser":"a","owner":"b","app":"c"}'])(
    'are made anew when the file holds %j',
    (text) => {
      writeFileSync(join(home, 'passwords.json'), text)
      const { passwords, isNew } = keepPasswords(home)
      expect(isNew).toBe(true)
      expect(JSON.parse(readFileSync(join(home, 'passwords.json'), 'utf8'))).toEqual(passwords)
    },
  )
})
