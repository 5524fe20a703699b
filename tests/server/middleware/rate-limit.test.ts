import express from 'express'
import type { Express } from 'express'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { DataSource } from 'typeorm'
import { createDataSource } from '../../../server/data-source.js'
import { toAppError } from '../../../server/middleware/error-handler.js'
import { limitRate, toNetwork } from '../../../server/middleware/rate-limit.js'
import { createTestDatabase } from '../../helpers/database.js'
import type { TestDatabase } from '../../helpers/database.js'

let database: TestDatabase
const processes: DataSource[] = []

beforeAll(async () => {
  database = await createTestDatabase()
  for (let count = 0; count < 2; count++) processes.push(await createDataSource(database.url).initialize())
})
afterAll(async () => {
  for (const dataSource of processes) await dataSource.destroy()
  await database.drop()
})

function makeApp(dataSource: DataSource, name: string): Express {
  const app = express()
  app.set('trust proxy', 1)
  app.use(
    limitRate(dataSource, { name, requests: 3, seconds: 60 }),
    (_request, response) => void response.send('done'),
  )
  const answer: express.ErrorRequestHandler = (error, _request, response, _next) => {
    const known = toAppError(error)
    response.status(known?.status ?? 500).json(known?.toProblem())
  }
  app.use(answer)
  return app
}

const ask = (app: Express, address: string) => request(app).get('/').set('X-Forwarded-For', address)

describe('limitRate', () => {
  it('refuses after so many requests, also those that other processes answered', async () => {
    const apps = processes.map((dataSource) => makeApp(dataSource, 'shared'))
    const statuses: number[] = []
    for (const index of [0, 1, 0, 1, 0]) statuses.push((await ask(apps[index]!, '192.0.2.1')).status)
    expect(statuses).toEqual([200, 200, 200, 429, 429])
  })

  it('says when to try again', async () => {
    const app = makeApp(processes[0]!, 'again')
    for (let count = 0; count < 3; count++) await ask(app, '192.0.2.1').expect(200)
    const refused = await ask(app, '192.0.2.1').expect(429)
    expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0)
    expect(Number(refused.headers['retry-after'])).toBeLessThanOrEqual(60)
    expect(refused.body).toMatchObject({ code: 'too-many', type: '/problems/too-many', status: 429 })
  })

  it('counts each network for itself', async () => {
    const app = makeApp(processes[0]!, 'networks')
    for (let count = 0; count < 3; count++) await ask(app, '2001:db8:1:2::1').expect(200)
    await ask(app, '2001:db8:1:2:ffff::9').expect(429)
    await ask(app, '2001:db8:1:3::1').expect(200)
    await ask(app, '198.51.100.7').expect(200)
  })
})

describe('toNetwork', () => {
  it.each([
    ['192.0.2.1', '192.0.2.1'],
    ['::ffff:192.0.2.1', '192.0.2.1'],
    ['::1', '0:0:0:0::/64'],
    ['2001:DB8:0001:2:3:4:5:6', '2001:db8:1:2::/64'],
    ['2001:db8::', '2001:db8:0:0::/64'],
    ['fe80::1%eth0', 'fe80:0:0:0::/64'],
    ['', ''],
  ])('makes %s into %s', (address, network) => {
    expect(toNetwork(address)).toBe(network)
  })
})
