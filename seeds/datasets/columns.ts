import { z } from 'zod'

/** The columns every dataset's file has, in this order. */
export const recordColumns = [
  'scientific_name',
  'authority',
  'class',
  'order',
  'family',
  'common_names',
  'parameter',
  'value',
  'min',
  'max',
  'unit',
  'n',
  'life_stage',
  'note',
  'source_citation',
  'source_doi',
  'dataset',
  'dataset_doi',
  'dataset_licence',
  'record_id',
] as const

const text = z.string().max(2_000)
const textOrNull = text.transform((value) => (value === '' ? null : value))

/** A number in figures as the file prints it, or null where the cell is empty. Words are no number. */
const printedNumber = z
  .string()
  .max(40)
  .regex(/^(?:-?\d+(?:\.\d+)?)?$/, 'is not a number')
  .transform((value) => (value === '' ? null : value))

/** One row of a dataset's file. Numbers stay as printed; each dataset narrows what its parameter and unit may be. */
export const recordRowSchema = z.strictObject({
  scientific_name: z
    .string()
    .max(200)
    .regex(/^\p{Lu}[\p{L}-]+(?: [\p{L}-]+){1,2}$/u, 'is not a scientific name'),
  authority: z.string().max(200),
  class: z.string().min(1, 'is empty').max(100),
  order: textOrNull,
  family: textOrNull,
  common_names: text,
  parameter: z.string().max(60),
  value: printedNumber,
  min: printedNumber,
  max: printedNumber,
  unit: z.string().max(20),
  n: printedNumber,
  life_stage: z.enum(['', 'egg', 'larva', 'metamorph', 'hatchling', 'juvenile', 'adult', 'gravid']),
  note: text,
  source_citation: z.string().min(1, 'is empty').max(1_000),
  source_doi: z
    .string()
    .max(200)
    .regex(/^(?:10\.\d{4,9}\/\S+)?$/, 'is not a DOI')
    .transform((value) => (value === '' ? null : value)),
  dataset: text,
  dataset_doi: text,
  dataset_licence: text,
  record_id: z.string().min(1, 'is empty').max(100),
})
export type RecordRow = z.infer<typeof recordRowSchema>
