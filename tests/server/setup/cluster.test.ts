import { describe, expect, test } from 'vitest'
import { parsePostmasterFile } from '../../../server/setup/cluster.mjs'
import { installLine, pickPostgresVersion } from '../../../server/setup/system-packages.mjs'

// As PostgreSQL 15 writes it: pid, data folder, start time, port, socket folder, address, shared memory, state.
const ready = '4242\n/srv/data\n1764600000\n5433\n\n127.0.0.1\n  1234567         3\nready   \n'

describe("PostgreSQL's note of itself", () => {
  test('says whose it is and that it takes connections', () => {
    expect(parsePostmasterFile(ready)).toEqual({ pid: 4242, isReady: true })
  })

  test('says when it is still starting', () => {
    expect(parsePostmasterFile(ready.replace('ready   ', 'starting'))).toEqual({ pid: 4242, isReady: false })
    expect(parsePostmasterFile(ready.split('\n').slice(0, 5).join('\n')).isReady).toBe(false)
  })

  test('says nothing when it is empty', () => {
    expect(parsePostmasterFile('')).toEqual({ pid: undefined, isReady: false })
  })
})

describe('the system packages', () => {
  test('are of the newest version there is, if it is new enough', () => {
    expect(pickPostgresVersion(['9.6', '15', '13'])).toBe(15)
    expect(pickPostgresVersion(['15', '17'])).toBe(17)
    expect(pickPostgresVersion(['13'])).toBeUndefined()
    expect(pickPostgresVersion([])).toBeUndefined()
  })

  test('are named in one line that makes no cluster of its own', () => {
    const line = installLine(['postgresql-15', 'chromium'])
    expect(line).not.toContain('\n')
    expect(line).toContain('install -y --no-install-recommends postgresql-15 chromium')
    expect(line.indexOf('create_main_cluster = false')).toBeLessThan(line.indexOf('apt-get install'))
    expect(installLine(['chromium'])).not.toContain('create_main_cluster')
  })
})
