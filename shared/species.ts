import { z } from 'zod'
import { evidenceKindSchema, evidenceRowSchema } from './evidence.js'
import { imageRowSchema } from './images.js'
import { classificationRowSchema, nameRowSchema } from './names.js'
import { physiologyRowSchema, studyLineSchema } from './physiology.js'
import { proseRowSchema } from './prose.js'
import { rangeRowSchema, uvZoneSchema } from './ranges.js'
import { revisionMarkSchema } from './revisions.js'
import { datasetBriefSchema, sourceBriefSchema } from './sources.js'

const item = { itemId: z.uuid() }

/** A range of a page with the evidence under it. */
export const citedRangeSchema = z.strictObject({
  ...item,
  row: rangeRowSchema,
  evidence: z.array(z.strictObject({ ...item, row: evidenceRowSchema })),
})
export type CitedRange = z.infer<typeof citedRangeSchema>

/** Everything one revision of a species page shows, in one answer: `GET /api/v1/species/:slug[?revision=n]`. */
export const speciesPageSchema = z.strictObject({
  species: z.strictObject({
    id: z.uuid(),
    slug: z.string(),
    scientificName: z.string(),
    isInvented: z.boolean(),
  }),
  revision: revisionMarkSchema,
  currentRevisionNumber: z.int().positive(),
  names: z.array(z.strictObject({ ...item, row: nameRowSchema })),
  classification: z.strictObject({ ...item, row: classificationRowSchema }).nullable(),
  ranges: z.array(citedRangeSchema),
  physiology: z.array(
    z.strictObject({
      ...item,
      row: physiologyRowSchema,
      /** Of a dataset item: the dataset and its records as study lines; else null and empty. */
      dataset: datasetBriefSchema.nullable(),
      studies: z.array(studyLineSchema),
    }),
  ),
  prose: z.array(z.strictObject({ ...item, row: proseRowSchema })),
  images: z.array(z.strictObject({ ...item, row: imageRowSchema })),
  /** Every source the page cites, by id; a merged source is already its heir. */
  sources: z.record(z.uuid(), sourceBriefSchema),
  /** The newest marks of the revision line, newest first, at most five. */
  history: z.array(revisionMarkSchema),
})
export type SpeciesPage = z.infer<typeof speciesPageSchema>

/** One row of a listing or of a search answer. */
export const speciesListItemSchema = z.strictObject({
  id: z.uuid(),
  slug: z.string(),
  scientificName: z.string(),
  commonNames: z.array(z.string()),
  class: z.string(),
  order: z.string().nullable(),
  family: z.string().nullable(),
  conservation: z.string().nullable(),
  isInvented: z.boolean(),
  rangeCount: z.int().nonnegative(),
  physiologyCount: z.int().nonnegative(),
  uvZone: uvZoneSchema.nullable(),
  evidenceKinds: z.array(evidenceKindSchema),
  revisionNumber: z.int().positive(),
  updatedAt: z.iso.datetime(),
  /** The name that the words of the search met, when it is not the scientific name. */
  matchedName: z.string().nullable(),
})
export type SpeciesListItem = z.infer<typeof speciesListItemSchema>
