import express from 'express'
import request from 'supertest'
import { afterAll, beforeAll, describe, it } from 'vitest'
import { createDataSource } from '../../../server/data-source.js'
import { createLog } from '../../../server/log.js'
import { errorHandler } from '../../../server/middleware/error-handler.js'
import { health } from '../../../server/routes/health.js'
import { createTestDatabase } from '../../helpers/database.js'
import { startTestApp } from '../../helpers/test-app.js'
import type { TestApp } from '../../helpers/test-app.js'

let test: TestApp
beforeAll(async () => {
  test = await startTestApp()
})
afterAll(() => test.stop())

describe('GET /healthz', () => {
  it('says that the process answers', async () => {
    await request(test.app).get('/healthz').expect(200, { status: 'ok' }).expect('Cache-Control', 'no-store')
  })
})

describe('GET /readyz', () => {
  it('says that the database answers at the schema of this build', async () => {
    await request(test.app).get('/readyz').expect(200, { status: 'ready' })
  })

  it('says that a migration is missing, and that the database is gone, while the process still answers', async () => {
    const database = await createTestDatabase()
    const owner = await createDataSource(database.ownerUrl).initialize()
    const dataSource = await createDataSource(database.url).initialize()
    const app = express().use(health(dataSource), errorHandler(createLog({ logLevel: 'silent' })))
    await request(app).get('/readyz').expect(200)
    await owner.query('delete from migration where id = (select max(id) from migration)')
    await request(app).get('/readyz').expect(503)
    await owner.destroy()
    await dataSource.destroy()
    await database.drop()
    await request(app).get('/readyz').expect(503)
    await request(app).get('/healthz').expect(200)
  })
})
