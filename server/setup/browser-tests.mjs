import { closeSync, mkdirSync, openSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { productEnvironment, runProgram } from './installation.mjs'
import { root } from './places.mjs'
import { findFreePort } from './ports.mjs'
import { waitUntil } from './processes.mjs'
import { productProgram } from './product.mjs'
import { prepareDatabase } from './roles.mjs'
import { say, SetupProblem } from './say.mjs'
import { findChromium } from './system-packages.mjs'
import { answers } from './serve.mjs'
import { countPlaywright, readCount } from './test-reports.mjs'
import { startThrowawayCluster } from './throwaway.mjs'

const DATABASE = 'mossgauge'
const READY_PATIENCE_MS = 60_000

/**
 * Runs the browser tests on the built product, with a small seed in a cluster of their own.
 * @param {import('./run.mjs').Run} run
 * @param {string[]} words for Playwright
 */
export async function runBrowserTests(run, words) {
  const results = join(root, 'test-results')
  const report = join(results, 'e2e.json')
  mkdirSync(results, { recursive: true })
  rmSync(report, { force: true })
  const cluster = await startThrowawayCluster(run)
  await prepareDatabase(cluster, DATABASE)
  say('Loading the small seed for the browser tests.')
  const problem = 'The database for the browser tests could not be filled.'
  await runProgram(run, cluster, 'server/migrate', { problem })
  await runProgram(run, cluster, 'seeds/seed', { words: ['small'], problem })

  const port = await findFreePort()
  const address = `http://127.0.0.1:${port}`
  const logPath = join(results, 'server.log')
  const log = openSync(logPath, 'w')
  const [command, first] = productProgram(root, 'built', 'server/index')
  const env = { ...productEnvironment(cluster), HOST: '127.0.0.1', PORT: String(port), PUBLIC_URL: address }
  const server = run.start(command, first, { cwd: root, env, stdio: ['ignore', log, log] })
  closeSync(log)
  let hasEnded = false
  void server.ended.then(() => (hasEnded = true))
  await waitUntil(async () => hasEnded || (await answers(port)), READY_PATIENCE_MS)
  if (hasEnded || !(await answers(port)))
    throw new SetupProblem(`The server does not start; ${logPath} says why.`)

  const playwright = join(root, 'node_modules/.bin/playwright')
  const code = await run.attempt(
    playwright,
    ['test', '--config', 'tests/e2e/playwright.config.ts', ...words],
    {
      cwd: root,
      env: {
        ...process.env,
        NODE_ENV: 'test',
        E2E_BASE_URL: address,
        E2E_REPORT: report,
        CHROMIUM: findChromium(),
      },
      // Playwright closes its browsers on SIGINT and on nothing else.
      endSignal: 'SIGINT',
    },
  )
  await server.stop()
  await cluster.stop()
  return readCount(report, countPlaywright, code)
}
