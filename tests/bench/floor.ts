import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import compression from 'compression'
import express from 'express'
import pg from 'pg'
import { z } from 'zod'

/**
 * The floor the product is measured against: bare Express that answers with the same bytes. A program of its own, so that
 * neither shares a process with the other or with what measures them.
 */
const environment = z
  .object({
    DATABASE_URL: z.string(),
    PORT: z.coerce.number(),
    /** Whole pages as files, named by slug. */
    FLOOR_PAGES: z.string(),
    /** The built client. */
    FLOOR_CLIENT: z.string(),
  })
  .parse(process.env)

const pool = new pg.Pool({ connectionString: environment.DATABASE_URL })
const app = express()
app.disable('x-powered-by')

/** One query by key for the answer as it stands. */
app.get('/json/:slug', async (request, response) => {
  const { rows } = await pool.query<{ body: string }>({
    name: 'find-body',
    text: 'select body from floor_body where slug = $1',
    values: [request.params.slug],
  })
  response.type('json').send(rows[0]?.body)
})

const held = new Map<string, Buffer>()
/** The same bytes from memory. */
app.get('/html/:slug', async (request, response) => {
  const { slug } = request.params
  const bytes = held.get(slug) ?? (await readFile(join(environment.FLOOR_PAGES, `${slug}.html`)))
  held.set(slug, bytes)
  response.type('html').send(bytes)
})

/** The same page as a file, with the files it asks for, compressed as on any host of files. */
app.use(compression())
app.use('/static', express.static(environment.FLOOR_PAGES))
app.use(express.static(environment.FLOOR_CLIENT, { index: false }))

app.get('/bare', (_request, response) => {
  response.type('text').send('1')
})
app.listen(environment.PORT, '127.0.0.1')
