import { z } from 'zod'

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
