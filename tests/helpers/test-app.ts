import { Writable } from 'node:stream'
import express from 'express'
import type { Express } from 'express'
import type { DataSource } from 'typeorm'
import { vi } from 'vitest'
import { createApp } from '../../server/app.js'
import type { Config } from '../../server/config.js'
import { createDataSource } from '../../server/data-source.js'
import { createLog } from '../../server/log.js'
import type { PageRenderer, RenderInput } from '../../server/render/page-renderer.js'
import { followSiteEpoch } from '../../server/render/site-epoch.js'
import type { SiteEpoch } from '../../server/render/site-epoch.js'
import { createTestDatabase } from './database.js'

export const TEST_ORIGIN = 'http://127.0.0.1:8080'

export interface TestApp {
  app: Express
  dataSource: DataSource
  epoch: SiteEpoch
  databaseUrl: string
  /** What was logged, a line each. */
  logged: string[]
  /** How many pages were rendered so far. */
  renders: () => number
  stop: () => Promise<void>
}

/**
 * A renderer that stands in for the built client: a species page's text is its scientific name, a listing's how many
 * there are, any other page's its address, and a failed read gives its status.
 */
export function createTestRenderer(): PageRenderer & { renders: () => number } {
  let renders = 0
  return {
    buildId: 'test',
    files: express.Router().get('/assets/app.js', (_request, response) => void response.type('js').send('1')),
    renders: () => renders,
    close: () => Promise.resolve(),
    async render(url, input) {
      renders += 1
      const text = await writeText(url, input)
      const { status, body } =
        typeof text === 'string' ? { status: 200, body: text } : { status: text, body: '' }
      const { temperatureUnit, lengthUnit, theme } = input.preferences
      const html = `<!doctype html><title>${body}</title>${temperatureUnit} ${lengthUnit} ${theme} ${input.origin}`
      return { status, location: null, html, cacheable: status === 200 }
    },
  }
}

async function writeText(url: string, input: RenderInput): Promise<string | number> {
  if (url === '/broken') throw new Error('The renderer failed.')
  if (!url.startsWith('/species')) return url
  try {
    const answer = (await input.read(url)) as { species?: { scientificName: string }; total?: number }
    return answer.species?.scientificName ?? `${answer.total} species`
  } catch (error) {
    return (error as { status: number }).status
  }
}

/** The app on a database of its own, with the stand-in renderer. Call `stop` when done. */
export async function startTestApp(part: Partial<Config> = {}): Promise<TestApp> {
  const database = await createTestDatabase()
  const config: Config = {
    environment: 'test',
    databaseUrl: database.url,
    host: '127.0.0.1',
    port: 8080,
    publicUrl: TEST_ORIGIN,
    logLevel: 'info',
    trustedProxies: 0,
    ...part,
  }
  const logged: string[] = []
  const sink = new Writable({
    write(chunk: Buffer, _encoding, done) {
      logged.push(chunk.toString())
      done()
    },
  })
  const log = createLog(config, sink)
  const dataSource = await createDataSource(database.url).initialize()
  const epoch = followSiteEpoch(database.url, log)
  await vi.waitUntil(() => epoch.current() !== null, { timeout: 10_000 })
  const renderer = createTestRenderer()
  return {
    app: createApp({ dataSource, config, log, renderer, epoch }),
    dataSource,
    epoch,
    databaseUrl: database.url,
    logged,
    renders: renderer.renders,
    async stop() {
      await epoch.stop()
      await dataSource.destroy()
      await database.drop()
    },
  }
}
