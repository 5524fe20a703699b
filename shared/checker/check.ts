import { z } from 'zod'
import { lifeStageSchema, recordLifeStageSchema, seasonSchema } from '../ranges.js'
import { citedRangeSchema } from '../species.js'
import type { SpeciesPage } from '../species.js'
import { temperatureUnitSchema, unitSchema } from '../unit-schemas.js'
import { findImpossibility } from './physical-bounds.js'
import { readingSchema } from './reading.js'
import { limitVerdictSchema, rangeVerdictSchema, standingSchema } from './verdict.js'

/** Most readings in one check. */
export const READINGS_MAX = 40
/** Longest slug a check may name. */
export const SLUG_LENGTH_MAX = 200

/** A check asks about one season and one life stage, never about any. */
export const askedSeasonSchema = seasonSchema.exclude(['any'])
export type AskedSeason = z.infer<typeof askedSeasonSchema>
export const askedLifeStageSchema = lifeStageSchema.exclude(['any'])
export type AskedLifeStage = z.infer<typeof askedLifeStageSchema>

/** A set of readings to hold against one page: body of `POST /api/v1/checks`, content of a check link. */
export const checkInputSchema = z.strictObject({
  slug: z.string().min(1).max(SLUG_LENGTH_MAX),
  /** The revision to judge by; null for the current one. */
  revision: z.int().positive().nullable(),
  season: askedSeasonSchema,
  lifeStage: askedLifeStageSchema,
  /** Of the room around the enclosure, as typed; null when not measured. */
  roomTemperature: z
    .strictObject({ value: z.number(), unit: temperatureUnitSchema })
    .superRefine((room, context) => {
      const message = findImpossibility('temperature', room.value, room.unit)
      if (message !== null) context.addIssue({ code: 'custom', path: ['value'], message })
    })
    .nullable(),
  readings: z.array(readingSchema).min(1).max(READINGS_MAX),
})
export type CheckInput = z.infer<typeof checkInputSchema>

/** What a check needs of a species page; a whole `SpeciesPage` fits. */
export type CheckPage = Pick<
  SpeciesPage,
  'species' | 'revision' | 'currentRevisionNumber' | 'classification' | 'ranges' | 'physiology' | 'sources'
>

/** A question the person can confirm: the value is possible, but looks like another unit or a slip. */
export const questionSchema = z.enum([
  'meant-fahrenheit',
  'temperature-very-high',
  'uv-index-very-high',
  'instrument-does-not-fit-position',
])
export type Question = z.infer<typeof questionSchema>

/** What the reading says once repeats, instrument and surface are accounted for; canonical unit. */
export const measuredSchema = z.strictObject({
  value: z.number(),
  unit: unitSchema,
  /** Standard uncertainty u. */
  uncertainty: z.number().nonnegative(),
  repeats: z.int().positive(),
  /** Root-sum-of-squares parts of u, canonical; `isDefault` where the kind's default stands in for the unstated. */
  parts: z.array(
    z.strictObject({
      from: z.enum(['accuracy', 'resolution', 'repeatability', 'emissivity']),
      uncertainty: z.number().nonnegative(),
      isDefault: z.boolean(),
    }),
  ),
  /** What the infrared thermometer showed before the surface's emissivity was accounted for; null when not corrected. */
  uncorrectedValue: z.number().nullable(),
})
export type Measured = z.infer<typeof measuredSchema>

/** A row that does not answer the question, but may be shown, labelled by what it differs in. */
export const otherRowSchema = z.strictObject({
  itemId: z.string(),
  differsIn: z.array(z.enum(['life-stage', 'season'])),
})

/** The answer for one reading. `range` and `limit` are the worst over all rows that apply; neither hides the other. */
export const readingVerdictSchema = z.strictObject({
  readingIndex: z.int().nonnegative(),
  /** The revision whose rows were judged by. */
  revisionNumber: z.int().positive(),
  measured: measuredSchema,
  standing: standingSchema,
  /** True for `inside` with `clear` or `no-limit` only. */
  isGreen: z.boolean(),
  limit: limitVerdictSchema,
  range: rangeVerdictSchema,
  /** One judgement for each row that applies (more than one when the page needs a joining row), worst first. */
  judgements: z.array(rangeVerdictSchema),
  /** The rows judged by and those that lend a limit, with their evidence. */
  rows: z.array(citedRangeSchema),
  /** The judged rows are those of the whole enclosure, for want of a row for this position. */
  isByWholeEnclosure: z.boolean(),
  otherRows: z.array(otherRowSchema),
  questions: z.array(questionSchema),
})
export type ReadingVerdict = z.infer<typeof readingVerdictSchema>

/** Two gauges at one place that differ by more than 2·√(u₁² + u₂²); canonical unit. */
export const gaugeDisagreementSchema = z.strictObject({
  readingIndexes: z.tuple([z.int(), z.int()]),
  difference: z.number().nonnegative(),
  allowed: z.number().nonnegative(),
})
export type GaugeDisagreement = z.infer<typeof gaugeDisagreementSchema>

/** The study a caution rests on. */
export const namedStudySchema = z.strictObject({
  itemId: z.string(),
  name: z.string(),
  sourceId: z.string().nullable(),
  lifeStage: recordLifeStageSchema,
  valueC: z.number(),
  /** Animals measured; null when the study does not say. */
  n: z.int().positive().nullable(),
  /** How the study states the value: its mean, an end of a compiler's span of study means, or an end of a span where it gives no mean. */
  basis: z.enum(['mean', 'span-of-means', 'span-without-mean']),
})
export type NamedStudy = z.infer<typeof namedStudySchema>

/** What is known of the animal's body, held against the readings. */
export const physiologyCautionSchema = z.strictObject({
  level: z.enum(['danger', 'caution', 'inform']),
  kind: z.enum([
    'near-critical-maximum',
    'near-critical-minimum',
    'near-freezing',
    'above-selected-temperature',
    'above-share-of-critical-maximum',
    'selected-temperature-not-reached',
    'contact-burn',
  ]),
  /** The reading it speaks of; null when it speaks of the whole check. */
  readingIndex: z.int().nonnegative().nullable(),
  /** The temperature the reading was held against. */
  thresholdC: z.number(),
  study: namedStudySchema.nullable(),
})
export type PhysiologyCaution = z.infer<typeof physiologyCautionSchema>

/** What to change first. Numbers are estimates, to be read again after the change. */
export const firstChangeSchema = z.strictObject({
  /** Of the table in `change-rules.ts`. */
  ruleId: z.string(),
  readingIndex: z.int().nonnegative(),
  isUrgent: z.boolean(),
  /** r = (T_target − T_room)/(T_read − T_room); null when it cannot be told. */
  powerRatio: z.number().positive().nullable(),
  targetC: z.number().nullable(),
  /** Night thermostat floor; null for other rules. */
  thermostatFloorC: z.number().nullable(),
})
export type FirstChange = z.infer<typeof firstChangeSchema>

export const generalCautionSchema = z.enum(['heat-burns', 'uv-harms', 'no-veterinary-advice', 'local-law'])
export type GeneralCaution = z.infer<typeof generalCautionSchema>

/** Answer of `POST /api/v1/checks` and of `checkReadings` in the browser alike. */
export const checkResultSchema = z.strictObject({
  species: z.strictObject({ slug: z.string(), scientificName: z.string(), isInvented: z.boolean() }),
  /** The revision the check rests on, and the page's current one. */
  revision: z.strictObject({
    id: z.string(),
    number: z.int().positive(),
    publishedAt: z.string(),
    currentNumber: z.int().positive(),
  }),
  season: askedSeasonSchema,
  lifeStage: askedLifeStageSchema,
  /** In the order of the readings. */
  verdicts: z.array(readingVerdictSchema),
  summary: z.strictObject({ worst: standingSchema, counts: z.record(standingSchema, z.int().nonnegative()) }),
  gaugeDisagreements: z.array(gaugeDisagreementSchema),
  /** Worst first. */
  physiologyCautions: z.array(physiologyCautionSchema),
  firstChange: firstChangeSchema.nullable(),
  generalCautions: z.array(generalCautionSchema),
})
export type CheckResult = z.infer<typeof checkResultSchema>
