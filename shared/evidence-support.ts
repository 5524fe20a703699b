import type { EvidenceRow } from './evidence.js'
import { CORE_SUPPORT } from './evidence-policy.js'
import { collectVotes, holdsValue } from './evidence-votes.js'
import type { ClosedInterval, EvidenceVote } from './evidence-votes.js'
import type { RangeRow } from './ranges.js'

/** A stretch of values with one support. Where two stretches touch, the shared value has the higher support. */
export interface SupportStretch extends ClosedInterval {
  support: number
}

/** The hull of what is stated, canonical units; a null side is one that no source states. */
export interface EvidenceEnvelope {
  low: number | null
  high: number | null
}

/** How far the sources of one range agree. */
export interface EvidenceSummary {
  votes: EvidenceVote[]
  /** Independent studies behind the range: the number of votes. */
  studies: number
  /** The support between the lowest and the highest stated value, left to right, exact, no gaps. */
  stretches: SupportStretch[]
  /** The values that more than half of the evidence supports: several pieces, or none. */
  core: ClosedInterval[]
  envelope: EvidenceEnvelope
  /** Mean support over the adopted range, 0 to 1 (see `findAgreement`). */
  agreement: number | null
}

/**
 * The share of the evidence that supports a value, 0 to 1: the weight of the votes whose interval holds it over the weight
 * of all votes. A one-sided vote counts for its bound only: in full against values past it, not at all elsewhere.
 * Where no interval holds the value the answer is 0.
 */
export function findSupport(votes: readonly EvidenceVote[], value: number): number {
  let holding = 0
  let speaking = 0
  for (const vote of votes) {
    const holds = holdsValue(vote, value)
    if (holds === null) continue
    speaking += vote.weight
    if (holds) holding += vote.weight
  }
  return speaking === 0 ? 0 : holding / speaking
}

/** Every stated end, sorted, each once: support changes nowhere else. */
function listEnds(votes: readonly EvidenceVote[]): number[] {
  const ends = votes.flatMap((vote) => [
    ...vote.intervals.flatMap(({ low, high }) => [low, high]),
    ...[vote.atLeast, vote.atMost].filter((bound) => bound !== null),
  ])
  return [...new Set(ends)].sort((a, b) => a - b)
}

/**
 * The support as stretches from the lowest to the highest stated value. Between two neighbouring ends it cannot change, so
 * one value inside stands for all: exact, not sampled. An end that has more support than both its sides is a stretch of its
 * own with `low` equal to `high`.
 */
export function listSupportStretches(votes: readonly EvidenceVote[]): SupportStretch[] {
  const ends = listEnds(votes)
  const stretches: SupportStretch[] = []
  ends.forEach((end, index) => {
    const atEnd = findSupport(votes, end)
    const next = ends[index + 1]
    const after = next === undefined ? null : findSupport(votes, end + (next - end) / 2)
    const before = stretches.at(-1)
    if ((before === undefined || atEnd > before.support) && (after === null || atEnd > after)) {
      stretches.push({ low: end, high: end, support: atEnd })
    }
    if (next === undefined || after === null) return
    const last = stretches.at(-1)
    if (last?.high === end && last.support === after && atEnd === after) last.high = next
    else stretches.push({ low: end, high: next, support: after })
  })
  return stretches
}

/** The pieces where support is over one half, touching pieces joined; empty when no value has that much. */
export function findCore(stretches: readonly SupportStretch[]): ClosedInterval[] {
  const core: ClosedInterval[] = []
  for (const { low, high, support } of stretches) {
    if (support <= CORE_SUPPORT) continue
    const last = core.at(-1)
    if (last?.high === low) last.high = high
    else core.push({ low, high })
  }
  return core
}

/** The hull of all stated ends. A side that no source states is null: one-sided statements reach no further than their bound. */
export function findEnvelope(votes: readonly EvidenceVote[]): EvidenceEnvelope {
  const ends = listEnds(votes)
  const hasLow = votes.some((vote) => vote.intervals.length > 0 || vote.atLeast !== null)
  const hasHigh = votes.some((vote) => vote.intervals.length > 0 || vote.atMost !== null)
  return { low: hasLow ? (ends[0] ?? null) : null, high: hasHigh ? (ends.at(-1) ?? null) : null }
}

/**
 * Agreement, 0 to 1: the mean of the support over the adopted range, each value of the range counting alike. 1 means that
 * every source holds every adopted value. For a range of a single value or with one bound it is the support at that value.
 * Null when there is no interval to agree with.
 */
export function findAgreement(
  votes: readonly EvidenceVote[],
  range: Pick<RangeRow, 'low' | 'high'>,
): number | null {
  if (!votes.some((vote) => vote.intervals.length > 0)) return null
  const low = range.low ?? range.high
  const high = range.high ?? range.low
  if (low === null || high === null || high < low) return null
  if (high === low) return findSupport(votes, low)
  let total = 0
  for (const stretch of listSupportStretches(votes)) {
    const width = Math.min(high, stretch.high) - Math.max(low, stretch.low)
    if (width > 0) total += width * stretch.support
  }
  return Math.min(1, total / (high - low))
}

/**
 * What the sources behind one range say together: their votes, the support, the core, the envelope and the agreement with
 * the adopted range. Evidence rows in canonical units; nothing is thrown.
 */
export function summariseEvidence(
  range: Pick<RangeRow, 'low' | 'high'>,
  rows: readonly EvidenceRow[],
): EvidenceSummary {
  const votes = collectVotes(rows)
  const stretches = listSupportStretches(votes)
  return {
    votes,
    studies: votes.length,
    stretches,
    core: findCore(stretches),
    envelope: findEnvelope(votes),
    agreement: findAgreement(votes, range),
  }
}
