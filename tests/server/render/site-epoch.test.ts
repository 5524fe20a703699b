import { pino } from 'pino'
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest'
import type { DataSource } from 'typeorm'
import { createDataSource } from '../../../server/data-source.js'
import { keepCountsByEpoch } from '../../../server/render/epoch-counts.js'
import { followSiteEpoch } from '../../../server/render/site-epoch.js'
import type { SiteEpoch } from '../../../server/render/site-epoch.js'
import { moveSiteEpoch } from '../../../server/services/site-epoch.js'
import { createTestDatabase } from '../../helpers/database.js'
import type { TestDatabase } from '../../helpers/database.js'

const log = pino({ level: 'silent' })
let database: TestDatabase
let dataSource: DataSource
let epoch: SiteEpoch

beforeAll(async () => {
  database = await createTestDatabase()
  dataSource = await createDataSource(database.url).initialize()
  epoch = followSiteEpoch(database.url, log)
  await vi.waitUntil(() => epoch.current() !== null)
})
afterAll(async () => {
  await epoch.stop()
  await dataSource.destroy()
  await database.drop()
})

const move = () => dataSource.transaction((db) => moveSiteEpoch(db))

describe('followSiteEpoch', () => {
  it('hears of every move once it is committed', async () => {
    const before = BigInt(epoch.current() ?? '0')
    await move()
    await vi.waitUntil(() => epoch.current() === String(before + 1n))
    await move()
    await vi.waitUntil(() => epoch.current() === String(before + 2n))
  })

  it('hears nothing of a transaction that is rolled back', async () => {
    const before = epoch.current()
    const failing = dataSource.transaction(async (db) => {
      await moveSiteEpoch(db)
      throw new Error('No.')
    })
    await expect(failing).rejects.toThrow('No.')
    await move()
    await vi.waitUntil(() => epoch.current() !== before)
    expect(epoch.current()).toBe(String(BigInt(before ?? '0') + 1n))
  })

  it('knows no epoch while its connection is down, and the right one once it is back', async () => {
    const before = BigInt(epoch.current() ?? '0')
    const seen: (string | null)[] = []
    await dataSource.query(
      `select pg_terminate_backend(pid) from pg_stat_activity
        where application_name = 'mossgauge epoch' and datname = current_database()`,
    )
    await vi.waitUntil(() => epoch.current() === null, { interval: 1 })
    seen.push(epoch.current())
    await move()
    await vi.waitUntil(() => epoch.current() !== null, { timeout: 10_000 })
    seen.push(epoch.current())
    expect(seen).toEqual([null, String(before + 1n)])
  })

  it('knows none after it was stopped', async () => {
    const other = followSiteEpoch(database.url, log)
    await vi.waitUntil(() => other.current() !== null)
    await other.stop()
    expect(other.current()).toBeNull()
  })
})

describe('keepCountsByEpoch', () => {
  const counts = { total: 3, facets: {} as never }

  it('keeps counts until the epoch moves, and none that were begun before', () => {
    let now: string | null = '1'
    const store = keepCountsByEpoch({ current: () => now, stop: () => Promise.resolve() })
    const first = store()
    first?.keep('a', counts)
    expect(store()?.find('a')).toEqual(counts)
    now = '2'
    expect(store()?.find('a')).toBeNull()
    first?.keep('b', counts)
    expect(store()?.find('b')).toBeNull()
    now = null
    expect(store()).toBeNull()
  })
})
