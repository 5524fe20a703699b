import { resolve } from 'node:path'
import { openInstallation, runProgram, setUp } from '../installation.mjs'
import { runCommand } from '../run.mjs'

await runCommand(async (run) => {
  await setUp(run, {})
  const { cluster } = await openInstallation(run)
  await runProgram(run, cluster, 'server/migrate', {
    problem: 'The database could not be brought to the present schema.',
  })
  const [dataset, file] = process.argv.slice(2)
  // npm changes to the top of the checkout; a file is named from where the person stands.
  const path = file && resolve(process.env.INIT_CWD ?? '.', file)
  await runProgram(run, cluster, 'seeds/import', {
    words: [dataset, path].filter((word) => word !== undefined),
    problem: 'The dataset was not imported; the lines above say why.',
  })
})
