import { z } from 'zod'
import { unitSchema } from './unit-schemas.js'

export const evidenceKindSchema = z.enum([
  'guideline',
  'keepers-report',
  'field-site',
  'field-body-temperature',
  'selected-in-gradient',
  'tolerance-limit',
  'review',
])
export type EvidenceKind = z.infer<typeof evidenceKindSchema>

/** How the source states its number. */
export const statementSchema = z.enum(['interval', 'mean-sd', 'value', 'at-least', 'at-most'])
export type Statement = z.infer<typeof statementSchema>

/** The numbers exactly as the source prints them. */
export const printedNumbersSchema = z.strictObject({
  low: z.string().nullable(),
  high: z.string().nullable(),
  mean: z.string().nullable(),
  sd: z.string().nullable(),
  unit: unitSchema,
})
export type PrintedNumbers = z.infer<typeof printedNumbersSchema>

/**
 * One statement from one source behind a range. `interval` fills low and high, `value` and `mean-sd` fill mean (and sd),
 * `at-least` fills low, `at-most` fills high. Canonical units beside the printed numbers.
 */
export const evidenceRowSchema = z.strictObject({
  sourceId: z.uuid(),
  kind: evidenceKindSchema,
  locator: z.string().max(200).nullable(),
  statement: statementSchema,
  printed: printedNumbersSchema,
  low: z.number().nullable(),
  high: z.number().nullable(),
  mean: z.number().nullable(),
  sd: z.number().nonnegative().nullable(),
  n: z.int().positive().nullable(),
  note: z.string().max(500).nullable(),
})
export type EvidenceRow = z.infer<typeof evidenceRowSchema>
