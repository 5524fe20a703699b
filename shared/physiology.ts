import { z } from 'zod'
import { printedNumbersSchema } from './evidence.js'
import { recordLifeStageSchema } from './ranges.js'

/** What is known of the animal's body, never of the enclosure. All in °C. */
export const quantitySchema = z.enum([
  'field-body-temperature',
  'selected-body-temperature',
  'critical-thermal-minimum',
  'critical-thermal-maximum',
  'lethal-minimum',
  'lethal-maximum',
  'supercooling-point',
  'optimum-temperature',
])
export type Quantity = z.infer<typeof quantitySchema>

/** One record of an imported dataset, as that dataset prints it; temperatures in °C. */
export const physiologyRecordSchema = z.strictObject({
  recordId: z.string(),
  nameAsPrinted: z.string(),
  quantity: quantitySchema,
  /** Share of animals that died, for lethal temperatures (LT50 is 50); else null. */
  lethalPercent: z.union([z.literal(0), z.literal(50), z.literal(100)]).nullable(),
  lifeStage: recordLifeStageSchema,
  meanC: z.number().nullable(),
  lowC: z.number().nullable(),
  highC: z.number().nullable(),
  sdC: z.number().nullable(),
  seC: z.number().nullable(),
  n: z.int().positive().nullable(),
  /** One study, or a compiler's summary over several (then low and high span study means). */
  level: z.enum(['study', 'summary']),
  /** Stable id of the source, or null when an author-year key could not be resolved. */
  sourceId: z.uuid().nullable(),
  sourceAsPrinted: z.string(),
  /** Remaining facts the dataset gives: acclimation, ramp, locality. */
  facts: z.record(z.string(), z.string()),
})
export type PhysiologyRecord = z.infer<typeof physiologyRecordSchema>

/**
 * Many records of one study as one line with their spread. `isIndependent` is false for a compiler's summary and for a
 * source that could not be resolved: such a line adds nothing to the count of independent studies.
 */
export const studyLineSchema = z.strictObject({
  quantity: quantitySchema,
  lethalPercent: z.union([z.literal(0), z.literal(50), z.literal(100)]).nullable(),
  lifeStage: recordLifeStageSchema,
  sourceId: z.uuid().nullable(),
  sourceAsPrinted: z.string(),
  level: z.enum(['study', 'summary']),
  records: z.int().positive(),
  animals: z.int().positive().nullable(),
  /** Mean over the records that give one (weighted by nothing), °C; null when none does. */
  meanC: z.number().nullable(),
  lowC: z.number(),
  highC: z.number(),
  isIndependent: z.boolean(),
})
export type StudyLine = z.infer<typeof studyLineSchema>

/** All records one dataset holds for a species: one item of the page, however many records. */
export const datasetPhysiologyRowSchema = z.strictObject({
  form: z.literal('dataset'),
  datasetId: z.string(),
  /** SHA-256 (hex) of the canonical list of records. */
  recordSetHash: z.string().regex(/^[0-9a-f]{64}$/),
})

/** One cited statement about the animal's body. */
export const citedPhysiologyRowSchema = z.strictObject({
  form: z.literal('cited'),
  quantity: quantitySchema,
  lifeStage: recordLifeStageSchema,
  sourceId: z.uuid(),
  locator: z.string().max(200).nullable(),
  printed: printedNumbersSchema,
  meanC: z.number().nullable(),
  lowC: z.number().nullable(),
  highC: z.number().nullable(),
  sdC: z.number().nonnegative().nullable(),
  n: z.int().positive().nullable(),
  note: z.string().max(500).nullable(),
})

export const physiologyRowSchema = z.discriminatedUnion('form', [
  datasetPhysiologyRowSchema,
  citedPhysiologyRowSchema,
])
export type PhysiologyRow = z.infer<typeof physiologyRowSchema>
