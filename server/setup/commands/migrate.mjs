import { openInstallation, runProgram, setUp } from '../installation.mjs'
import { runCommand } from '../run.mjs'

await runCommand(async (run) => {
  await setUp(run, {})
  const { cluster } = await openInstallation(run)
  await runProgram(run, cluster, 'server/migrate', {
    words: process.argv.slice(2),
    problem: 'The database could not be brought to the present schema.',
  })
})
