import {
  chmodSync,
  mkdirSync,
  mkdtempSync,
  readFileSync,
  renameSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, test } from 'vitest'
import {
  candidateHomes,
  findDatabaseUser,
  findHome,
  findUser,
  makePrivateFolder,
} from '../../../server/setup/places.mjs'

const uid = process.getuid?.() ?? 0
const user = findDatabaseUser()
let parent: string

beforeEach(() => {
  parent = mkdtempSync(join(tmpdir(), 'places-'))
  chmodSync(parent, 0o755)
})
afterEach(() => rmSync(parent, { recursive: true, force: true }))

describe('the user the database runs as', () => {
  test('is found by its name in a passwd file', () => {
    const passwd = 'root:x:0:0:root:/root:/bin/sh\npostgres:x:101:104:,,,:/var/lib/postgresql:/bin/bash\n'
    expect(findUser(passwd, 'postgres')).toEqual({ uid: 101, gid: 104 })
    expect(findUser(passwd, 'post')).toBeUndefined()
  })

  test('is nobody else when an ordinary user runs the command, and never root', () => {
    if (uid === 0) expect(user?.uid).toBeGreaterThan(0)
    else expect(user).toBeUndefined()
  })
})

describe('the folders that may hold the database', () => {
  test('begin with the checkout and tell two checkouts apart', () => {
    const [inside, ...outside] = candidateHomes('/srv/one', 0)
    expect(inside).toBe('/srv/one/.data')
    expect(outside).toHaveLength(2)
    expect(candidateHomes('/srv/two', 0)).not.toEqual(expect.arrayContaining([outside[0]]))
    expect(candidateHomes('/srv/one', 0)).toEqual([inside, ...outside])
  })
})

describe('finding the home of a checkout', () => {
  test('takes the checkout itself where the database can reach it, closed to everybody else', () => {
    const home = findHome(parent, user)
    expect(home).toBe(join(parent, '.data'))
    expect(statSync(join(home, 'postgres')).mode & 0o777).toBe(0o700)
    expect(statSync(join(home, 'postgres')).uid).toBe(user?.uid ?? uid)
  })

  test('moves along with the checkout', () => {
    const checkout = join(parent, 'before')
    mkdirSync(checkout)
    findHome(checkout, user)
    writeFileSync(join(checkout, '.data/postgres/PG_VERSION'), '15\n')
    renameSync(checkout, join(parent, 'after'))
    expect(findHome(join(parent, 'after'), user)).toBe(join(parent, 'after/.data'))
  })

  test('complains about a database it cannot reach any more instead of beginning an empty one', () => {
    findHome(parent, user)
    writeFileSync(join(parent, '.data/home'), '/srv/no-such-folder\n')
    expect(() => findHome(parent, user)).toThrow('/srv/no-such-folder, which cannot be used now')
    expect(readFileSync(join(parent, '.data/home'), 'utf8')).toBe('/srv/no-such-folder\n')
  })

  test.runIf(uid === 0)('leaves a folder that the database cannot pass through', () => {
    const closed = join(parent, 'closed')
    mkdirSync(closed, { mode: 0o700 })
    expect(makePrivateFolder(join(closed, '.data'), 'postgres', user)).toBe(false)
    expect(makePrivateFolder(join(parent, 'open'), 'postgres', user)).toBe(true)
  })
})
