import { isIPv6 } from 'node:net'
import type { RequestHandler } from 'express'
import type { Pool } from 'pg'
import { RateLimiterMemory, RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible'
import type { DataSource } from 'typeorm'
import type { PostgresDriver } from 'typeorm/driver/postgres/PostgresDriver.js'
import { TooMany } from '../errors.js'

export interface RateLimit {
  /** Names the counter; two limits of one name count together. */
  name: string
  requests: number
  seconds: number
}

/**
 * Lets one network address do something so many times in a span. The count is kept in PostgreSQL, so it holds across
 * processes and restarts; while the database does not answer, each process counts for itself. A row with its address
 * goes when it has been out of date for an hour.
 */
export function limitRate(dataSource: DataSource, limit: RateLimit): RequestHandler {
  const options = { keyPrefix: limit.name, points: limit.requests, duration: limit.seconds }
  const limiter = new RateLimiterPostgres({
    ...options,
    storeClient: (dataSource.driver as PostgresDriver).master as Pool,
    storeType: 'pool',
    tableName: 'rate_limit',
    tableCreated: true,
    insuranceLimiter: new RateLimiterMemory(options),
  })
  return async (request, response, next) => {
    try {
      await limiter.consume(toNetwork(request.ip ?? ''))
    } catch (refusal) {
      if (!(refusal instanceof RateLimiterRes)) throw refusal
      const seconds = Math.max(1, Math.ceil(refusal.msBeforeNext / 1000))
      response.setHeader('Retry-After', String(seconds))
      throw new TooMany(`That was asked too often. Please try again in ${inWords(seconds)}.`, seconds)
    }
    next()
  }
}

/** The address, or of an IPv6 address its /64 network: one reader holds that many addresses. */
export function toNetwork(address: string): string {
  if (!isIPv6(address)) return address
  const mapped = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/i.exec(address)
  if (mapped?.[1] !== undefined) return mapped[1]
  const [head = '', tail] = address.split('%', 1)[0]?.split('::') ?? []
  const left = head === '' ? [] : head.split(':')
  const right = tail === undefined || tail === '' ? [] : tail.split(':')
  const gap = tail === undefined ? 0 : Math.max(0, 8 - left.length - right.length)
  const groups = [...left, ...Array.from({ length: gap }, () => '0'), ...right]
  return `${groups
    .slice(0, 4)
    .map((group) => group.replace(/^0+(?=.)/, '').toLowerCase())
    .join(':')}::/64`
}

function inWords(seconds: number): string {
  if (seconds < 90) return seconds === 1 ? '1 second' : `${seconds} seconds`
  return `${Math.ceil(seconds / 60)} minutes`
}
