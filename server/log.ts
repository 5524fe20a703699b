import { pino } from 'pino'
import type { DestinationStream, Logger } from 'pino'
import type { Config } from './config.js'

export type Log = Logger

/** Lines are written together, because one write for each costs more than the page it tells of; none waits longer than this. */
const BATCH = { bytes: 4096, ms: 250 }

/** The server's log: one JSON object a line on standard output, or on the given stream. A fatal line is written at once. */
export function createLog(config: Pick<Config, 'logLevel'>, destination?: DestinationStream): Log {
  const options = {
    level: config.logLevel,
    base: undefined,
    timestamp: pino.stdTimeFunctions.isoTime,
    serializers: { err: describeError },
  }
  const standardOutput = () =>
    pino.destination({ dest: 1, sync: false, minLength: BATCH.bytes, periodicFlush: BATCH.ms })
  return pino(options, destination ?? standardOutput())
}

/** An error without what it carries along: the values of a failed statement may be what a visitor typed. */
function describeError(error: unknown): object {
  if (!(error instanceof Error)) return { message: String(error) }
  const { name, message, stack, cause } = error
  const code = 'code' in error ? String(error.code) : undefined
  return { type: name, message, code, stack, ...(cause !== undefined && { cause: describeError(cause) }) }
}
