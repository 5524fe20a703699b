import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { hashBuildInputs } from './inputs.mjs'
import { say, secondsSince } from './say.mjs'

/** @param {string} checkout */
function stampPath(checkout) {
  return join(checkout, 'dist/inputs.sha256')
}

/**
 * Builds the server, the seeds and both halves of the client.
 * @param {import('./run.mjs').Run} run
 * @param {string} checkout
 */
export async function buildProduct(run, checkout) {
  const startedAt = Date.now()
  say('Building the product.')
  const inputs = hashBuildInputs(checkout)
  rmSync(join(checkout, 'dist'), { recursive: true, force: true })
  const bin = (/** @type {string} */ name) => join(checkout, 'node_modules/.bin', name)
  const env = { ...process.env, NODE_ENV: 'production' }
  const options = { cwd: checkout, env, problem: 'The build failed; the lines above say why.' }
  const server = run.finish(bin('tsc'), ['-b', 'server', 'seeds'], options)
  const client = run
    .finish(bin('vite'), ['build', '--logLevel', 'warn'], options)
    .then(() =>
      run.finish(bin('vite'), ['build', '--logLevel', 'warn', '--ssr', 'src/entry-server.ts'], options),
    )
  // Both are waited for before either failure counts, so that none is left running.
  const results = await Promise.allSettled([server, client])
  for (const result of results) if (result.status === 'rejected') throw result.reason
  // Written last: a build that was cut off has no stamp and is made again.
  writeFileSync(stampPath(checkout), inputs)
  say(`Built the product in ${secondsSince(startedAt)}.`)
}

/**
 * Builds when anything changed since the last build.
 * @param {import('./run.mjs').Run} run
 * @param {string} checkout
 */
export async function buildIfChanged(run, checkout) {
  const stamp = stampPath(checkout)
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === hashBuildInputs(checkout)) return
  await buildProduct(run, checkout)
}

/**
 * How a program of the product is started: as built, or straight from its source while developing.
 * @param {string} checkout
 * @param {'built' | 'source'} from
 * @param {string} name such as `server/migrate`
 * @returns {[string, string[]]}
 */
export function productProgram(checkout, from, name) {
  if (from === 'built')
    return [process.execPath, ['--enable-source-maps', join(checkout, 'dist', `${name}.js`)]]
  const room = name.split('/')[0] ?? ''
  return [
    join(checkout, 'node_modules/.bin/tsx'),
    ['--tsconfig', join(checkout, room, 'tsconfig.json'), join(checkout, `${name}.ts`)],
  ]
}
