import { closeSync, mkdirSync, openSync } from 'node:fs'
import { join } from 'node:path'
import type { Cluster } from '../../server/setup/cluster.mjs'
import { productEnvironment } from '../../server/setup/installation.mjs'
import { root } from '../../server/setup/places.mjs'
import { findFreePort } from '../../server/setup/ports.mjs'
import { waitUntil } from '../../server/setup/processes.mjs'
import { productProgram } from '../../server/setup/product.mjs'
import type { Run } from '../../server/setup/run.mjs'
import { SetupProblem } from '../../server/setup/say.mjs'

const READY_PATIENCE_MS = 60_000

/** The folder for what is left to look at after a run. */
export const resultsFolder = join(root, 'test-results/bench')

async function start(
  run: Run,
  name: string,
  [command, words]: [string, string[]],
  env: NodeJS.ProcessEnv,
  path: string,
): Promise<string> {
  const port = await findFreePort()
  const address = `http://127.0.0.1:${port}`
  mkdirSync(resultsFolder, { recursive: true })
  const logPath = join(resultsFolder, `${name}.log`)
  const log = openSync(logPath, 'w')
  const server = run.start(command, words, {
    cwd: root,
    env: { ...env, HOST: '127.0.0.1', PORT: String(port), PUBLIC_URL: address },
    stdio: ['ignore', log, log],
  })
  closeSync(log)
  let hasEnded = false
  void server.ended.then(() => (hasEnded = true))
  const isReady = () =>
    fetch(address + path).then(
      (response) => response.ok,
      () => false,
    )
  await waitUntil(async () => hasEnded || (await isReady()), READY_PATIENCE_MS)
  if (hasEnded || !(await isReady())) throw new SetupProblem(`${name} does not start; ${logPath} says why.`)
  return address
}

/** Starts the built product, as shipped, on a database of the cluster; gives its address. */
export function startProduct(run: Run, cluster: Cluster, database: string): Promise<string> {
  const program = productProgram(root, 'built', 'server/index')
  return start(run, `product-${database}`, program, productEnvironment(cluster, { database }), '/readyz')
}

/** Starts the floor on the same database, with a folder of pages; gives its address. */
export function startFloor(run: Run, cluster: Cluster, database: string, pages: string): Promise<string> {
  const env = {
    ...productEnvironment(cluster, { database }),
    FLOOR_PAGES: pages,
    FLOOR_CLIENT: join(root, 'dist/client'),
    TSX_TSCONFIG_PATH: join(root, 'tests/tsconfig.json'),
  }
  const words = ['--import', 'tsx', join(root, 'tests/bench/floor.ts')]
  return start(run, 'floor', [process.execPath, words], env, '/bare')
}
