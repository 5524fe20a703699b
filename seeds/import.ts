import { InvalidInput } from '../server/errors.js'
import { runSeedingCommand } from './command.js'
import { datasets } from './datasets/all.js'
import { describeReport } from './importing/describe-report.js'
import { importDataset } from './importing/import-dataset.js'

// import DATASET [FILE]: imports one open dataset, from the file that comes with the product or from another.
await runSeedingCommand(async ({ dataSource, renewStatistics, say }) => {
  const [id, path] = process.argv.slice(2)
  const definition = datasets.find((dataset) => dataset.id === id)
  if (!definition) {
    const known = datasets.map((dataset) => dataset.id).join(', ')
    throw new InvalidInput(`Name one of the datasets: ${known}.`)
  }
  const report = await importDataset(dataSource.manager, definition, {
    importedAt: new Date(),
    say,
    ...(path !== undefined && { path }),
  })
  await renewStatistics()
  for (const line of describeReport(report)) say(line)
})
