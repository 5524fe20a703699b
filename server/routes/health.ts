import { Router } from 'express'
import type { DataSource } from 'typeorm'
import { Unavailable } from '../errors.js'

/** `/healthz`: this process answers. `/readyz`: it can work, because the database answers and its schema is this build's. */
export function health(dataSource: DataSource): Router {
  const router = Router()
  router.use((_request, response, next) => {
    response.setHeader('Cache-Control', 'no-store')
    next()
  })
  router.get('/healthz', (_request, response) => {
    response.json({ status: 'ok' })
  })
  router.get('/readyz', async (_request, response) => {
    const missing = await findMissingMigrations(dataSource)
    if (missing.length > 0) throw new Unavailable('The database is not at the schema of this build.')
    response.json({ status: 'ready' })
  })
  return router
}

async function findMissingMigrations(dataSource: DataSource): Promise<string[]> {
  const table = dataSource.options.migrationsTableName ?? 'migrations'
  let done: { name: string }[]
  try {
    done = await dataSource.query<{ name: string }[]>(`select name from "${table}"`)
  } catch (cause) {
    throw new Unavailable('The database does not answer, or holds no schema.', { cause })
  }
  const names = new Set(done.map(({ name }) => name))
  return dataSource.migrations
    .map(({ name, constructor }) => name ?? constructor.name)
    .filter((name) => !names.has(name))
}
