import { runBrowserTests } from '../browser-tests.mjs'
import { setUp } from '../installation.mjs'
import { runCommand } from '../run.mjs'
import { say } from '../say.mjs'

await runCommand(async (run) => {
  await setUp(run, { chromium: true })
  const { passed, failed } = await runBrowserTests(run, process.argv.slice(2))
  say(`${passed} passed, ${failed} failed`)
  return failed === 0 ? 0 : 1
})
