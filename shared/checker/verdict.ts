import { z } from 'zod'
import type { Parameter, RangeRow } from '../ranges.js'
import { normalAbove, normalBelow, normalBetween } from './normal.js'
import {
  LIMIT_NEAR_PROBABILITY,
  LIMIT_PAST_PROBABILITY,
  NARROW_RANGE_FACTOR,
  NEEDED_ACCURACY_SHARE,
  RANGE_SURE_PROBABILITY,
} from './policy.js'
import type { HoldingLimit } from './selection.js'

/** Answer to "does the reading lie past a limit?". */
export const limitAnswerSchema = z.enum(['past', 'near', 'clear', 'no-limit'])
export type LimitAnswer = z.infer<typeof limitAnswerSchema>

/** Answer to "does the reading lie in the range?". `not-low` and `not-high` stand in place of `inside` where only one bound is cited. */
export const rangeAnswerSchema = z.enum([
  'inside',
  'low',
  'high',
  'unclear',
  'not-low',
  'not-high',
  'no-range',
])
export type RangeAnswer = z.infer<typeof rangeAnswerSchema>

/** The one word a verdict is ordered, counted and marked by, worst first. Only `inside` is ever shown green. */
export const standingSchema = z.enum([
  'past',
  'near',
  'high',
  'low',
  'unclear',
  'no-range',
  'not-low',
  'not-high',
  'inside',
])
export type Standing = z.infer<typeof standingSchema>

const probability = z.number().min(0).max(1)

/** One cited limit and the probability of lying past it. */
export const limitSideSchema = z.strictObject({
  /** Canonical unit. */
  value: z.number(),
  probabilityPast: probability,
  /** The range row the limit is cited in. */
  itemId: z.string(),
  /** From a less specific row that matches too, or from the whole enclosure, rather than from the row judged by. */
  isInherited: z.boolean(),
})
export type LimitSide = z.infer<typeof limitSideSchema>

export const limitVerdictSchema = z.strictObject({
  answer: limitAnswerSchema,
  /** The side the answer speaks of; null when clear or no limit. */
  side: z.enum(['lower', 'upper']).nullable(),
  lower: limitSideSchema.nullable(),
  upper: limitSideSchema.nullable(),
})
export type LimitVerdict = z.infer<typeof limitVerdictSchema>

/** Judgement of a reading by one range row, canonical units. */
export const rangeVerdictSchema = z.strictObject({
  answer: rangeAnswerSchema,
  /** The range row judged by; null when no row answers the question. */
  itemId: z.string().nullable(),
  low: z.number().nullable(),
  high: z.number().nullable(),
  /** Add up to one; null when no range is cited. With one bound only, `inside` is the probability of not lying past it. */
  probability: z.strictObject({ low: probability, inside: probability, high: probability }).nullable(),
  /** Of `unclear`: the two likeliest answers, likelier first. */
  likeliest: z.tuple([rangeAnswerSchema, rangeAnswerSchema]).nullable(),
  /** The range is narrower than this instrument can confirm; `neededAccuracy` is the ±limit that would (0: none would). */
  cannotConfirm: z.strictObject({ neededAccuracy: z.number().nonnegative() }).nullable(),
  /** The reading lies on a bound: no instrument settles it; `saferWay` is the way into the range. */
  onBound: z
    .strictObject({ bound: z.enum(['low', 'high']), saferWay: z.enum(['higher', 'lower']) })
    .nullable(),
})
export type RangeVerdict = z.infer<typeof rangeVerdictSchema>

/** A value and its standard uncertainty, canonical unit. */
export interface Measurement {
  value: number
  uncertainty: number
}

/** A difference of two doubles this small, relative to them, is rounding from a change of unit. */
const ROUNDING = 1e-12

function isSame(a: number, b: number): boolean {
  return Math.abs(a - b) <= ROUNDING * Math.max(1, Math.abs(a), Math.abs(b))
}

/**
 * Whether a bound is set by nature and so counts as met: relative humidity at 0 and 100 %, UV index at 0. Nothing lies
 * past it.
 */
export function isPhysicalBound(parameter: Parameter, side: 'low' | 'high', value: number): boolean {
  if (parameter === 'relative-humidity') return side === 'low' ? value <= 0 : value >= 100
  return parameter === 'uv-index' && side === 'low' && value <= 0
}

/** Probability of lying below a bound; with u = 0 certain, and 0 on it. */
function below(measurement: Measurement, bound: number): number {
  const distance = bound - measurement.value
  if (isSame(bound, measurement.value)) return measurement.uncertainty === 0 ? 0 : 0.5
  if (measurement.uncertainty === 0) return distance > 0 ? 1 : 0
  return normalBelow(distance / measurement.uncertainty)
}

/** Probability of lying above a bound; with u = 0 certain, and 0 on it. */
function above(measurement: Measurement, bound: number): number {
  const distance = bound - measurement.value
  if (isSame(bound, measurement.value)) return measurement.uncertainty === 0 ? 0 : 0.5
  if (measurement.uncertainty === 0) return distance < 0 ? 1 : 0
  return normalAbove(distance / measurement.uncertainty)
}

function between(measurement: Measurement, low: number, high: number): number {
  const { value, uncertainty } = measurement
  if (uncertainty === 0) return below(measurement, low) === 0 && above(measurement, high) === 0 ? 1 : 0
  const toLow = isSame(low, value) ? 0 : (low - value) / uncertainty
  const toHigh = isSame(high, value) ? 0 : (high - value) / uncertainty
  return normalBetween(toLow, toHigh)
}

/** Limits that hold for a question, from `selectRanges`, with the id of the citing row. */
export interface LimitsToJudge {
  lower: HoldingLimit<{ itemId: string }> | null
  upper: HoldingLimit<{ itemId: string }> | null
}

function judgeLimitSide(
  parameter: Parameter,
  measurement: Measurement,
  limit: HoldingLimit<{ itemId: string }> | null,
  side: 'lower' | 'upper',
): LimitSide | null {
  if (limit === null) return null
  const { value } = limit
  let probabilityPast: number
  if (isPhysicalBound(parameter, side === 'lower' ? 'low' : 'high', value)) probabilityPast = 0
  // With u = 0 a reading on a limit is past it, while a range is closed.
  else if (measurement.uncertainty === 0 && isSame(value, measurement.value)) probabilityPast = 1
  else probabilityPast = side === 'lower' ? below(measurement, value) : above(measurement, value)
  return { value, probabilityPast, itemId: limit.range.itemId, isInherited: limit.isInherited }
}

/**
 * Whether a reading lies past a lower or upper limit, each tested alone: `past` from a probability of 0.5, `near` from
 * 0.05, else `clear`; `no-limit` where none is cited. Probabilities as in JCGM 106:2012, clause 7.
 */
export function judgeLimits(
  parameter: Parameter,
  measurement: Measurement,
  limits: LimitsToJudge,
): LimitVerdict {
  const lower = judgeLimitSide(parameter, measurement, limits.lower, 'lower')
  const upper = judgeLimitSide(parameter, measurement, limits.upper, 'upper')
  if (lower === null && upper === null) return { answer: 'no-limit', side: null, lower, upper }
  const side = (lower?.probabilityPast ?? -1) > (upper?.probabilityPast ?? -1) ? 'lower' : 'upper'
  const worst = Math.max(lower?.probabilityPast ?? 0, upper?.probabilityPast ?? 0)
  if (worst >= LIMIT_PAST_PROBABILITY) return { answer: 'past', side, lower, upper }
  if (worst >= LIMIT_NEAR_PROBABILITY) return { answer: 'near', side, lower, upper }
  return { answer: 'clear', side: null, lower, upper }
}

/** The verdict where no range is cited for exactly the question; `itemId` names a row that cites limits only. */
export function noRange(itemId: string | null): RangeVerdict {
  return {
    answer: 'no-range',
    itemId,
    low: null,
    high: null,
    probability: null,
    likeliest: null,
    cannotConfirm: null,
    onBound: null,
  }
}

function findBoundUnderReading(measurement: Measurement, row: RangeRow): RangeVerdict['onBound'] {
  const isOn = (bound: number | null, side: 'low' | 'high') =>
    bound !== null && !isPhysicalBound(row.parameter, side, bound) && isSame(bound, measurement.value)
  if (isOn(row.low, 'low')) return { bound: 'low', saferWay: 'higher' }
  if (isOn(row.high, 'high')) return { bound: 'high', saferWay: 'lower' }
  return null
}

/**
 * Where a reading lies in one row's range, by the conformance probabilities of JCGM 106:2012 (ISO/IEC Guide 98-4), clause
 * 7: p_low = Φ((L − x)/u), p_high = 1 − Φ((U − x)/u), p_in the rest. An answer is given from 0.95, else `unclear` with the
 * two likeliest. With one bound only `not-low` or `not-high` stands in place of `inside`.
 */
export function judgeRange(measurement: Measurement, range: { itemId: string; row: RangeRow }): RangeVerdict {
  const { row, itemId } = range
  const { low, high, parameter } = row
  if (low === null && high === null) return noRange(itemId)

  const openLow = low !== null && isPhysicalBound(parameter, 'low', low) ? null : low
  const openHigh = high !== null && isPhysicalBound(parameter, 'high', high) ? null : high
  const pLow = openLow === null ? 0 : below(measurement, openLow)
  const pHigh = openHigh === null ? 0 : above(measurement, openHigh)
  let pInside = 1
  if (openLow !== null && openHigh !== null) pInside = between(measurement, openLow, openHigh)
  else if (openLow !== null) pInside = above(measurement, openLow)
  else if (openHigh !== null) pInside = below(measurement, openHigh)
  // With u = 0 the range is closed, so a bound belongs to it.
  if (measurement.uncertainty === 0) pInside = 1 - pLow - pHigh

  const met: RangeAnswer = high === null ? 'not-low' : low === null ? 'not-high' : 'inside'
  const candidates: { answer: RangeAnswer; probability: number }[] = [{ answer: met, probability: pInside }]
  if (openLow !== null) candidates.push({ answer: 'low', probability: pLow })
  if (openHigh !== null) candidates.push({ answer: 'high', probability: pHigh })
  candidates.sort((a, b) => b.probability - a.probability)
  const [first, second] = candidates
  const isSure = first === undefined || second === undefined || first.probability >= RANGE_SURE_PROBABILITY
  const answer = first !== undefined && isSure ? first.answer : 'unclear'

  const width = openLow === null || openHigh === null ? null : openHigh - openLow
  const isTooNarrow =
    width !== null && answer !== 'inside' && width < NARROW_RANGE_FACTOR * measurement.uncertainty
  return {
    answer,
    itemId,
    low,
    high,
    probability: { low: pLow, inside: pInside, high: pHigh },
    likeliest: isSure ? null : [first.answer, second.answer],
    cannotConfirm: isTooNarrow ? { neededAccuracy: Math.max(0, NEEDED_ACCURACY_SHARE * width) } : null,
    onBound: findBoundUnderReading(measurement, row),
  }
}

/** Severity of a standing: 0 is the worst. `high` and `low` weigh the same, as do `not-low` and `not-high`. */
const SEVERITY: Readonly<Record<Standing, number>> = {
  past: 0,
  near: 1,
  high: 2,
  low: 2,
  unclear: 3,
  'no-range': 4,
  'not-low': 5,
  'not-high': 5,
  inside: 6,
}

/** Orders standings worst first, for sorting. */
export function compareStandings(a: Standing, b: Standing): number {
  return SEVERITY[a] - SEVERITY[b]
}

/** The one word for a limit and a range verdict together; a limit past or near outweighs every answer about the range. */
export function toStanding(limit: LimitVerdict, range: RangeVerdict): Standing {
  return limit.answer === 'past' || limit.answer === 'near' ? limit.answer : range.answer
}

/** Whether a verdict may be shown green: inside its range, and no limit past or near. */
export function isGreen(limit: LimitVerdict, range: RangeVerdict): boolean {
  return range.answer === 'inside' && (limit.answer === 'clear' || limit.answer === 'no-limit')
}

/** The worst of some standings and the count of each. */
export function summarise(standings: readonly Standing[]) {
  const counts = Object.fromEntries(standingSchema.options.map((standing) => [standing, 0])) as Record<
    Standing,
    number
  >
  let worst: Standing = standings[0] ?? 'no-range'
  for (const standing of standings) {
    counts[standing] += 1
    if (compareStandings(standing, worst) < 0) worst = standing
  }
  return { worst, counts }
}
