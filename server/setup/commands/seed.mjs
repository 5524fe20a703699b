import { writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { openInstallation, runProgram, setUp } from '../installation.mjs'
import { runCommand } from '../run.mjs'

await runCommand(async (run) => {
  await setUp(run, {})
  const { home, cluster } = await openInstallation(run)
  await runProgram(run, cluster, 'server/migrate', {
    problem: 'The database could not be brought to the present schema.',
  })
  await runProgram(run, cluster, 'seeds/seed', {
    words: process.argv.slice(2),
    problem: 'The seed could not be loaded.',
  })
  writeFileSync(join(home, 'seeded'), `${new Date().toISOString()}\n`)
})
