import { pino } from 'pino'
import type { DestinationStream, Logger } from 'pino'
import type { Config } from './config.js'

export type Log = Logger

/** The server's log: one JSON object a line on standard output, or on the given stream. */
export function createLog(config: Pick<Config, 'logLevel'>, destination?: DestinationStream): Log {
  const options = { level: config.logLevel, base: undefined, timestamp: pino.stdTimeFunctions.isoTime }
  return destination === undefined ? pino(options) : pino(options, destination)
}
