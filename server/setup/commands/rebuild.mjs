import { openInstallation, runProgram, setUp } from '../installation.mjs'
import { runCommand } from '../run.mjs'

await runCommand(async (run) => {
  await setUp(run, {})
  const { cluster } = await openInstallation(run)
  await runProgram(run, cluster, 'server/rebuild-projections', {
    problem: 'The projections could not be rebuilt.',
  })
})
