import { pino } from 'pino'
import type { DestinationStream, Logger } from 'pino'
import type { Config } from './config.js'

export type Log = Logger

/** Lines are written together, because one write for each costs more than the page it tells of; none waits longer than this. */
const BATCH = { bytes: 4096, ms: 250 }

/** The server's log: one JSON object a line on standard output, or on the given stream. A fatal line is written at once. */
export function createLog(config: Pick<Config, 'logLevel'>, destination?: DestinationStream): Log {
  const options = { level: config.logLevel, base: undefined, timestamp: pino.stdTimeFunctions.isoTime }
  const standardOutput = () =>
    pino.destination({ dest: 1, sync: false, minLength: BATCH.bytes, periodicFlush: BATCH.ms })
  return pino(options, destination ?? standardOutput())
}
