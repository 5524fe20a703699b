import type { EntityManager } from 'typeorm'
import { InvalidInput } from '../server/errors.js'
import { runSeedingCommand } from './command.js'
import { loadDemonstration } from './demonstration/load-demonstration.js'
import { describeReport } from './importing/describe-report.js'
import { loadRealSpecies, type LoadOptions } from './real-species.js'
import { loadSmallSeed } from './small.js'

interface Totals {
  real: number
  invented: number
  revisions: number
  sources: number
  records: number
  ranges: number
}

async function countTotals(db: EntityManager): Promise<Totals> {
  const [totals]: Totals[] = await db.query(
    `select (select count(*)::int from species where not is_invented) as real,
       (select count(*)::int from species where is_invented) as invented,
       (select count(*)::int from revision) as revisions,
       (select count(*)::int from source where merged_into_id is null) as sources,
       (select sum(physiology_count)::int from species) as records,
       (select sum(range_count)::int from species) as ranges`,
  )
  if (totals === undefined) throw new Error('The totals could not be counted.')
  return totals
}

// seed [small]: loads the open datasets and the demonstration. What is there already stays, so that a seed that was cut off
// is finished by starting it again.
await runSeedingCommand(async ({ dataSource, renewStatistics, say }) => {
  const [size, ...more] = process.argv.slice(2)
  if ((size !== undefined && size !== 'small') || more.length > 0) {
    throw new InvalidInput('The seed takes one word at most: small.')
  }
  const db = dataSource.manager
  const startedAt = new Date()
  const options: LoadOptions = {
    importedAt: startedAt,
    say,
    onImported: async (report) => {
      for (const line of describeReport(report)) say(line)
      // Without statistics the next dataset's statements are planned for empty tables and take several times as long.
      await renewStatistics()
    },
  }
  if (size === 'small') await loadSmallSeed(db, options)
  else {
    await loadRealSpecies(db, options)
    await loadDemonstration(db)
  }
  await renewStatistics()
  const totals = await countTotals(db)
  say(
    `The database holds ${totals.real} real and ${totals.invented} invented species, ${totals.records} records, ` +
      `${totals.ranges} ranges, ${totals.sources} sources and ${totals.revisions} revisions ` +
      `(${Math.round((Date.now() - startedAt.getTime()) / 1000)} s).`,
  )
})
