import type { EvidenceRow } from './evidence.js'
import { canSupportRange, EVIDENCE_WEIGHTS } from './evidence-policy.js'
import { countPrintedDecimals } from './printed-numbers.js'
import { differenceToCanonical } from './units.js'
import type { Unit } from './units.js'

/** What one statement says, in the canonical unit of its parameter; a null side is a side it says nothing of. */
export interface StatedInterval {
  low: number | null
  high: number | null
}

/** A closed interval in canonical units. */
export interface ClosedInterval {
  low: number
  high: number
}

/**
 * The one vote of one source. It holds every value of its intervals and speaks against every other value. A vote that
 * has no interval, only a bound, speaks against the values past that bound and says nothing of the rest.
 */
export interface EvidenceVote {
  sourceId: string
  weight: number
  intervals: ClosedInterval[]
  /** The lowest "at least" of the source that no "at most" of the same source closes. */
  atLeast: number | null
  /** The highest "at most" of the source that no "at least" of the same source closes. */
  atMost: number | null
}

/**
 * Half a step of the last digit of a printed number, in canonical units: "32" in °C gives 0.5, "90.0" in °F gives 0.05 × 5/9.
 * Null when the text is not a plain decimal number.
 */
export function findHalfLastDigit(printed: string, unit: Unit): number | null {
  const decimals = countPrintedDecimals(printed)
  if (decimals === null) return null
  return differenceToCanonical(0.5 * 10 ** -decimals, unit)
}

function toValueSpan(value: number | null, printed: string | null, unit: Unit): StatedInterval | null {
  if (value === null) return null
  const half = (printed === null ? null : findHalfLastDigit(printed, unit)) ?? 0
  return { low: value - half, high: value + half }
}

/**
 * The interval a statement stands for: mean ± sd as that interval, a bare value as the span of its last printed digit, a
 * one-sided statement its bound alone. Null when the row holds no number.
 */
export function toStatedInterval(row: EvidenceRow): StatedInterval | null {
  switch (row.statement) {
    case 'mean-sd':
      return row.mean === null || row.sd === null
        ? toValueSpan(row.mean, row.printed.mean, row.printed.unit)
        : { low: row.mean - row.sd, high: row.mean + row.sd }
    case 'value':
      return toValueSpan(row.mean, row.printed.mean, row.printed.unit)
    case 'at-least':
      return row.low === null ? null : { low: row.low, high: null }
    case 'at-most':
      return row.high === null ? null : { low: null, high: row.high }
    case 'interval':
      if (row.low === null && row.high === null) return null
      if (row.low === null || row.high === null) return { low: row.low, high: row.high }
      return { low: Math.min(row.low, row.high), high: Math.max(row.low, row.high) }
  }
}

function toVote(sourceId: string, rows: readonly EvidenceRow[]): EvidenceVote | null {
  const stated = rows.map(toStatedInterval).filter((interval) => interval !== null)
  if (stated.length === 0) return null
  const intervals: ClosedInterval[] = []
  const floors: number[] = []
  const ceilings: number[] = []
  for (const { low, high } of stated) {
    if (low !== null && high !== null) intervals.push({ low, high })
    else if (low !== null) floors.push(low)
    else if (high !== null) ceilings.push(high)
  }
  let atLeast = floors.length === 0 ? null : Math.min(...floors)
  let atMost = ceilings.length === 0 ? null : Math.max(...ceilings)
  // "At least 24" and "at most 30" of one source are one interval said in two sentences.
  if (atLeast !== null && atMost !== null && atLeast <= atMost) {
    intervals.push({ low: atLeast, high: atMost })
    atLeast = null
    atMost = null
  }
  const weight = Math.max(...rows.map((row) => EVIDENCE_WEIGHTS[row.kind]))
  return { sourceId, weight, intervals, atLeast, atMost }
}

/**
 * One vote for each original study behind a range, in the order the sources first appear. Several statements of one source
 * make one vote that holds what any of them holds and weighs as its weightiest kind. Physiological kinds give none.
 * Source ids must already be resolved to their heirs.
 */
export function collectVotes(rows: readonly EvidenceRow[]): EvidenceVote[] {
  const bySource = new Map<string, EvidenceRow[]>()
  for (const row of rows) {
    if (!canSupportRange(row.kind)) continue
    const known = bySource.get(row.sourceId)
    if (known === undefined) bySource.set(row.sourceId, [row])
    else known.push(row)
  }
  return [...bySource].map(([sourceId, own]) => toVote(sourceId, own)).filter((vote) => vote !== null)
}

/** Whether a vote holds a value: true it does, false it speaks against it, null it says nothing of it. */
export function holdsValue(vote: EvidenceVote, value: number): boolean | null {
  if (vote.intervals.length > 0) {
    return vote.intervals.some(({ low, high }) => low <= value && value <= high)
  }
  if (vote.atLeast !== null && value < vote.atLeast) return false
  if (vote.atMost !== null && value > vote.atMost) return false
  return null
}
