import { spawn } from 'node:child_process'
import type { ChildProcess } from 'node:child_process'
import { once } from 'node:events'
import { createServer } from 'node:net'
import type { AddressInfo } from 'node:net'
import { join } from 'node:path'
import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest'
import { createTestDatabase } from '../helpers/database.js'
import type { TestDatabase } from '../helpers/database.js'

const root = join(import.meta.dirname, '../..')
let database: TestDatabase
const started: ChildProcess[] = []

beforeAll(async () => {
  database = await createTestDatabase()
})
afterEach(() => {
  for (const child of started.splice(0)) child.kill('SIGKILL')
})
afterAll(() => database.drop())

/** Starts the server from its source, in development, so that no build is needed. */
function start(environment: Record<string, string>) {
  const child = spawn(process.execPath, ['--import', 'tsx', 'server/index.ts'], {
    cwd: root,
    env: {
      PATH: process.env.PATH,
      NODE_ENV: 'development',
      TSX_TSCONFIG_PATH: join(root, 'server/tsconfig.json'),
      ...environment,
    },
  })
  started.push(child)
  const said = { out: '', error: '' }
  child.stdout.on('data', (chunk: Buffer) => (said.out += chunk.toString()))
  child.stderr.on('data', (chunk: Buffer) => (said.error += chunk.toString()))
  const ended = once(child, 'close').then(([code]) => code as number | null)
  return { child, said, ended }
}

async function findFreePort(): Promise<number> {
  const listener = createServer().listen(0, '127.0.0.1')
  await once(listener, 'listening')
  const { port } = listener.address() as AddressInfo
  listener.close()
  await once(listener, 'close')
  return port
}

describe('the server process', () => {
  it('does not start with a wrong environment, and names the variable in a sentence', async () => {
    const { said, ended } = start({ DATABASE_URL: database.url, PORT: 'abc' })
    expect(await ended).toBe(1)
    expect(said.error).toBe('PORT must be a whole number from 0 to 65535.\n')
  })

  it('does not start without its database, and logs why', async () => {
    const port = await findFreePort()
    const { said, ended } = start({ DATABASE_URL: `postgres://nobody@127.0.0.1:${port}/nothing` })
    expect(await ended).toBe(1)
    expect(said.out).toContain('ECONNREFUSED')
  })

  it('answers until it is told to stop, and then ends by itself', async () => {
    const port = await findFreePort()
    const { child, said, ended } = start({ DATABASE_URL: database.url, PORT: String(port) })
    const answer = await vi.waitFor(() => fetch(`http://127.0.0.1:${port}/readyz`), {
      timeout: 60_000,
      interval: 100,
    })
    expect(answer.status).toBe(200)
    child.kill('SIGTERM')
    expect(await ended).toBe(0)
    expect(said.out).toContain('The server stops.')
    await expect(fetch(`http://127.0.0.1:${port}/healthz`)).rejects.toThrow()
  }, 90_000)
})
