import { join } from 'node:path'
import { fillDatabase, openInstallation, productEnvironment, setUp } from '../installation.mjs'
import { root } from '../places.mjs'
import { runCommand } from '../run.mjs'
import { findChromium } from '../system-packages.mjs'

await runCommand(async (run) => {
  await setUp(run, { chromium: true })
  const installation = await openInstallation(run)
  await fillDatabase(run, installation, 'built')
  await run.finish(
    join(root, 'node_modules/.bin/tsx'),
    ['--tsconfig', 'tests/tsconfig.json', 'tests/bench/bench.ts', ...process.argv.slice(2)],
    {
      cwd: root,
      env: { ...productEnvironment(installation.cluster, { asOwner: true }), CHROMIUM: findChromium() },
      problem: 'The measurements broke off; the lines above say why.',
    },
  )
})
