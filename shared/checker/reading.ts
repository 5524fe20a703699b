import { z } from 'zod'
import { parameterSchema, periodSchema, positionSchema, uvMeaningSchema } from '../ranges.js'
import type { Parameter } from '../ranges.js'
import { unitSchema } from '../unit-schemas.js'
import { toCanonical } from '../units.js'
import type { Unit } from '../units.js'
import { correctForEmissivity, surfaceMaterialSchema } from './emissivity.js'
import { canRead, instrumentKindSchema } from './instruments.js'
import { findImpossibility } from './physical-bounds.js'

/** Most repeats of one reading. */
export const REPEATS_MAX = 20
/** Lowest emissivity that may be typed; below it a surface is a mirror and the instrument reads the room. */
export const EMISSIVITY_MIN = 0.1

/** Largest constant part of an accuracy, and largest step of a display, in the reading's unit. */
export const ACCURACY_ABSOLUTE_MAX = 1000
export const RESOLUTION_MAX = 100

const NOT_EXACT = 'No instrument is exact. Leave this empty when its papers say nothing.'
const emissivityNumberSchema = z
  .number()
  .min(EMISSIVITY_MIN, 'Emissivity lies between 0.1 and 1.')
  .max(1, 'Emissivity lies between 0.1 and 1.')

/** A reading is taken with the lights on (day) or off (night). */
export const readingPeriodSchema = periodSchema.exclude(['any'])
export type ReadingPeriod = z.infer<typeof readingPeriodSchema>

/** Units each parameter may be read in; the first is the canonical one. */
export const UNITS_OF_PARAMETER: Readonly<Record<Parameter, readonly [Unit, ...Unit[]]>> = {
  temperature: ['degC', 'degF'],
  'relative-humidity': ['percentRh'],
  'uv-index': ['uvi'],
  photoperiod: ['h'],
  'basking-heat-hours': ['h'],
}

/**
 * Accuracy as the instrument's papers state it, in the instrument's own unit, which is the unit of the reading: `limit` is
 * "at most ±a" (rectangular), `expanded` a stated k = 2 uncertainty. `absolute` is a constant (for humidity: points),
 * `relativePercent` a part of the reading; with both, `combine` says whether the larger or their sum holds.
 */
export const accuracySchema = z
  .strictObject({
    form: z.enum(['limit', 'expanded']),
    absolute: z.number().positive(NOT_EXACT).max(ACCURACY_ABSOLUTE_MAX).nullable(),
    relativePercent: z.number().positive(NOT_EXACT).max(100).nullable(),
    combine: z.enum(['larger', 'sum']),
  })
  .refine((accuracy) => accuracy.absolute !== null || accuracy.relativePercent !== null, {
    error: 'Give a constant, a part of the reading, or leave the accuracy out.',
  })
export type Accuracy = z.infer<typeof accuracySchema>

/** The surface an infrared thermometer looked at; `surroundings` is the temperature around it, in the reading's unit. */
export const surfaceSchema = z.strictObject({
  material: surfaceMaterialSchema.nullable(),
  emissivity: emissivityNumberSchema,
  /** What the instrument was set to; 1 or 0.95 on most that cannot be set. */
  emissivitySet: emissivityNumberSchema,
  surroundings: z.number(),
})
export type Surface = z.infer<typeof surfaceSchema>

function hasBalance(values: readonly number[], unit: Unit, surface: Surface): boolean {
  const { emissivity, emissivitySet } = surface
  const surroundingsC = toCanonical(surface.surroundings, unit)
  return values.every((value) => {
    const readC = toCanonical(value, unit)
    return correctForEmissivity({ readC, emissivitySet, emissivity, surroundingsC }) !== null
  })
}

/** One measured value with its instrument, numbers as typed in `unit`. Its value is the mean of `values`. */
export const readingSchema = z
  .strictObject({
    parameter: parameterSchema,
    position: positionSchema,
    period: readingPeriodSchema,
    /** The repeats, in the order read. */
    values: z.array(z.number()).min(1).max(REPEATS_MAX),
    unit: unitSchema,
    instrument: instrumentKindSchema,
    /** Null when unstated: then the kind's default stands in, never zero. */
    accuracy: accuracySchema.nullable(),
    /** Smallest step of the display, in `unit`; null for the kind's default. */
    resolution: z.number().positive(NOT_EXACT).max(RESOLUTION_MAX).nullable(),
    /** Of a UV index: where the animal usually is, or the highest place that it can reach. Null for all else. */
    uvMeaning: uvMeaningSchema.nullable(),
    /** Of an infrared temperature whose surface is named; null for all else. */
    surface: surfaceSchema.nullable(),
  })
  .superRefine((reading, context) => {
    if (!UNITS_OF_PARAMETER[reading.parameter].includes(reading.unit)) {
      context.addIssue({
        code: 'custom',
        path: ['unit'],
        message: 'This unit does not belong to this parameter.',
      })
      return
    }
    reading.values.forEach((value, index) => {
      const message = findImpossibility(reading.parameter, value, reading.unit)
      if (message !== null) context.addIssue({ code: 'custom', path: ['values', index], message })
    })
    if ((reading.parameter === 'uv-index') !== (reading.uvMeaning !== null)) {
      const message =
        reading.parameter === 'uv-index'
          ? 'Say whether this is where the animal usually is, or the highest place it can reach.'
          : 'Only a UV index is typical or maximum.'
      context.addIssue({ code: 'custom', path: ['uvMeaning'], message })
    }
    if (reading.surface !== null) {
      if (reading.parameter !== 'temperature' || reading.instrument !== 'infrared-thermometer') {
        const message = 'Only an infrared temperature depends on the surface.'
        context.addIssue({ code: 'custom', path: ['surface'], message })
      } else {
        const message = findImpossibility('temperature', reading.surface.surroundings, reading.unit)
        if (message !== null) {
          context.addIssue({ code: 'custom', path: ['surface', 'surroundings'], message })
        } else if (!hasBalance(reading.values, reading.unit, reading.surface)) {
          const hint = 'No surface at these settings and in these surroundings could give this reading.'
          context.addIssue({ code: 'custom', path: ['surface', 'emissivity'], message: hint })
        }
      }
    }
    if (!canRead(reading.instrument, reading.parameter)) {
      const message = 'This instrument does not measure this.'
      context.addIssue({ code: 'custom', path: ['instrument'], message })
    }
  })
export type Reading = z.infer<typeof readingSchema>
