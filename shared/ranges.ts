import { z } from 'zod'
import { unitSchema } from './unit-schemas.js'

export const parameterSchema = z.enum([
  'temperature',
  'relative-humidity',
  'uv-index',
  'photoperiod',
  'basking-heat-hours',
])
export type Parameter = z.infer<typeof parameterSchema>

export const positionSchema = z.enum([
  'basking-surface',
  'basking-air',
  'warm-end-air',
  'warm-hide',
  'cool-end-air',
  'cool-hide',
  'humid-hide',
  'shade',
  'substrate',
  'water',
  'whole-enclosure',
])
export type Position = z.infer<typeof positionSchema>

/** `day` means lights on. */
export const periodSchema = z.enum(['day', 'night', 'any'])
export type Period = z.infer<typeof periodSchema>

export const seasonSchema = z.enum(['active', 'brumation', 'aestivation', 'any'])
export type Season = z.infer<typeof seasonSchema>

/** Life stages a range can be for. `any` never covers egg or larva. */
export const lifeStageSchema = z.enum([
  'egg',
  'larva',
  'metamorph',
  'hatchling',
  'juvenile',
  'adult',
  'gravid',
  'any',
])
export type LifeStage = z.infer<typeof lifeStageSchema>

/** Life stages of records: a study may leave the stage unsaid, which is not the same as any stage. */
export const recordLifeStageSchema = z.enum([...lifeStageSchema.options, 'unspecified'])
export type RecordLifeStage = z.infer<typeof recordLifeStageSchema>

/** Whether a UV index range says what an animal usually meets, or the most it may meet. */
export const uvMeaningSchema = z.enum(['typical', 'maximum'])
export type UvMeaning = z.infer<typeof uvMeaningSchema>

/** One of the four published exposure zones (Ferguson et al. 2010; Baines et al. 2016): a class of animals, not a meter's reading. */
export const uvZoneSchema = z.union([z.literal(1), z.literal(2), z.literal(3), z.literal(4)])
export type UvZone = z.infer<typeof uvZoneSchema>

/** The text of each bound as the contributor typed it, in `typedUnit`; null where the canonical number is exact. */
export const typedBoundsSchema = z.strictObject({
  low: z.string().nullable(),
  high: z.string().nullable(),
  lowerLimit: z.string().nullable(),
  upperLimit: z.string().nullable(),
})
export type TypedBounds = z.infer<typeof typedBoundsSchema>

/**
 * The content of one range: what one position should read, for one period, season and life stage.
 * Numbers are canonical (°C, % RH, UV index, h); past a limit harm is likely.
 */
export const rangeRowSchema = z.strictObject({
  parameter: parameterSchema,
  position: positionSchema,
  period: periodSchema,
  season: seasonSchema,
  lifeStage: lifeStageSchema,
  low: z.number().nullable(),
  high: z.number().nullable(),
  lowerLimit: z.number().nullable(),
  upperLimit: z.number().nullable(),
  typedUnit: unitSchema,
  typed: typedBoundsSchema.nullable(),
  uvMeaning: uvMeaningSchema.nullable(),
  uvZone: uvZoneSchema.nullable(),
  note: z.string().max(500).nullable(),
})
export type RangeRow = z.infer<typeof rangeRowSchema>

/** The question a reading asks, and the part of a range that is unique within a revision (with `uvMeaning`). */
export type RangeKeys = Pick<RangeRow, 'parameter' | 'position' | 'period' | 'season' | 'lifeStage'>
