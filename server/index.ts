import { createServer } from 'node:http'
import type { Server } from 'node:http'
import { join } from 'node:path'
import { createApp } from './app.js'
import { parseConfig } from './config.js'
import { createDataSource } from './data-source.js'
import { createLog } from './log.js'
import { findApplicationRoot } from './render/application-root.js'
import { createBuildRenderer } from './render/build-renderer.js'
import { followSiteEpoch } from './render/site-epoch.js'

/** How long requests under way may take to finish once the server is told to stop. */
const STOP_PATIENCE_MS = 10_000

const config = readConfig()
const log = createLog(config)

// A render can throw outside every promise; the process is then in an unknown state and whoever started it starts it again.
for (const event of ['uncaughtException', 'unhandledRejection'] as const) {
  process.on(event, (error: unknown) => {
    log.fatal(
      { err: error },
      `Stopped by an ${event === 'uncaughtException' ? 'uncaught exception' : 'unhandled rejection'}.`,
    )
    process.exit(1)
  })
}

const dataSource = await createDataSource(config.databaseUrl).initialize()
const epoch = followSiteEpoch(config.databaseUrl, log)
const root = findApplicationRoot()
const server = createServer()
const renderer =
  config.environment === 'development'
    ? await (await import('./render/development-renderer.js')).createDevelopmentRenderer(root, server)
    : await createBuildRenderer(join(root, 'dist'))
server.on('request', createApp({ dataSource, config, log, renderer, epoch }))
await listen(server)
log.info({ host: config.host, port: config.port, publicUrl: config.publicUrl }, 'The server listens.')

for (const signal of ['SIGTERM', 'SIGINT'] as const) process.once(signal, () => void stop(signal))

function readConfig() {
  try {
    return parseConfig(process.env)
  } catch (error) {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`)
    process.exit(1)
  }
}

function listen(listener: Server): Promise<void> {
  return new Promise((resolve, reject) => {
    listener.once('error', reject)
    listener.listen(config.port, config.host, resolve)
  })
}

/** Takes no new requests, lets those under way finish, and then lets go of the database. */
async function stop(signal: string): Promise<void> {
  log.info({ signal }, 'The server stops.')
  const closed = new Promise((resolve) => server.close(resolve))
  // A connection that is kept alive is idle only once its answer is out.
  const sweep = setInterval(() => server.closeIdleConnections(), 50)
  const patience = new Promise((resolve) => setTimeout(resolve, STOP_PATIENCE_MS).unref())
  // In development Vite's sockets would stay open to the end of patience; what it still renders then is cut off.
  await renderer.close()
  await Promise.race([closed, patience])
  clearInterval(sweep)
  server.closeAllConnections()
  await epoch.stop()
  await dataSource.destroy()
  process.exit(0)
}
