import { mkdirSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { runBrowserTests } from '../browser-tests.mjs'
import { setUp } from '../installation.mjs'
import { root } from '../places.mjs'
import { runCommand } from '../run.mjs'
import { complain, say, secondsSince, SetupProblem } from '../say.mjs'
import { countVitest, readCount } from '../test-reports.mjs'

/** A run that takes longer hangs. The bar is 25 minutes on two processors; a machine busy with other things takes more. */
const longestMinutes = Number(process.env.TEST_MINUTES) || 70
const bin = (/** @type {string} */ name) => join(root, 'node_modules/.bin', name)

/** What is asked of the code before it runs. */
const READINGS = [
  { name: 'Format', command: 'prettier', words: ['--check', '--log-level', 'warn', '.'] },
  { name: 'Types', command: 'vue-tsc', words: ['-b'] },
  { name: 'Lint', command: 'eslint', words: ['-c', '.config/eslint.config.js', '--max-warnings', '0', '.'] },
]

/**
 * Runs vitest and counts.
 * @param {import('../run.mjs').Run} run
 */
async function runUnitTests(run) {
  const results = join(root, 'test-results')
  const report = join(results, 'unit.json')
  mkdirSync(results, { recursive: true })
  rmSync(report, { force: true })
  const words = ['run', '--reporter=default', '--reporter=json', `--outputFile.json=${report}`]
  const code = await run.attempt(bin('vitest'), words, {
    cwd: root,
    env: { ...process.env, NODE_ENV: 'test' },
  })
  return readCount(report, countVitest, code)
}

await runCommand(async (run) => {
  const startedAt = Date.now()
  const overtime = new SetupProblem(`The tests took longer than ${longestMinutes} minutes.`)
  setTimeout(() => run.fail(overtime), longestMinutes * 60_000).unref()
  let passed = 0
  let failed = 0
  /**
   * Does one part of the work; one that breaks is a failure and does not keep the others from being tried.
   * @param {string} name
   * @param {() => Promise<{ passed: number, failed: number }>} part
   */
  const take = async (name, part) => {
    const partStartedAt = Date.now()
    say(`${name} …`)
    const count = await part().catch((error) => {
      complain(error instanceof SetupProblem ? error.message : String(error?.stack ?? error))
      return { passed: 0, failed: 1 }
    })
    passed += count.passed
    failed += count.failed
    say(`${name}: ${count.failed === 0 ? 'good' : 'failed'}, ${secondsSince(partStartedAt)}.`)
    return count.failed === 0
  }

  await setUp(run, { chromium: true, build: false })
  const isBuilt = await take('Build', async () => {
    await setUp(run, { chromium: true })
    return { passed: 0, failed: 0 }
  })
  for (const { name, command, words } of READINGS) {
    await take(name, async () => {
      const code = await run.attempt(bin(command), words, { cwd: root })
      return { passed: 0, failed: code === 0 ? 0 : 1 }
    })
  }
  await take('Unit and server tests', () => runUnitTests(run))
  if (isBuilt) await take('Browser tests', () => runBrowserTests(run, []))
  say(`The tests took ${secondsSince(startedAt)}.`)
  say(`${passed} passed, ${failed} failed`)
  return failed === 0 ? 0 : 1
})
