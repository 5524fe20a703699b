import { join } from 'node:path'
import { setUp } from '../installation.mjs'
import { root } from '../places.mjs'
import { runCommand } from '../run.mjs'
import { findChromium } from '../system-packages.mjs'

await runCommand(async (run) => {
  await setUp(run, { chromium: true })
  await run.finish(process.execPath, ['--import', 'tsx', 'tests/bench/bench.ts', ...process.argv.slice(2)], {
    cwd: root,
    env: { ...process.env, CHROMIUM: findChromium(), TSX_TSCONFIG_PATH: join(root, 'tests/tsconfig.json') },
    problem: 'The measurements broke off; the lines above say why.',
  })
})
