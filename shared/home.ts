import { z } from 'zod'
import { revisionMarkSchema } from './revisions.js'
import { datasetBriefSchema, sourceBriefSchema } from './sources.js'

const pageRefSchema = z.strictObject({
  slug: z.string(),
  scientificName: z.string(),
  isInvented: z.boolean(),
})

/** `GET /api/v1/home`. */
export const homeAnswerSchema = z.strictObject({
  realSpecies: z.int(),
  inventedSpecies: z.int(),
  /** Of the real species, those with a cited range. */
  withRanges: z.int(),
  records: z.int(),
  sources: z.int(),
  recent: z.array(z.strictObject({ ...pageRefSchema.shape, revision: revisionMarkSchema })),
  /** Real species without a cited range, those with most records first. */
  wanting: z.array(z.strictObject({ ...pageRefSchema.shape, physiologyCount: z.int() })),
})
export type HomeAnswer = z.infer<typeof homeAnswerSchema>

/** `GET /api/v1/species/:slug/revisions?cursor=`, newest first. */
export const revisionListSchema = z.strictObject({
  species: pageRefSchema,
  items: z.array(revisionMarkSchema),
  nextCursor: z.string().nullable(),
})
export type RevisionList = z.infer<typeof revisionListSchema>

/** `GET /api/v1/sources/:id`: a source and the pages whose current revision cites it. */
export const sourcePageSchema = z.strictObject({
  source: sourceBriefSchema,
  citedBy: z.array(z.strictObject({ ...pageRefSchema.shape, ranges: z.int(), physiology: z.int() })),
  citedByTotal: z.int(),
  nextCursor: z.string().nullable(),
})
export type SourcePage = z.infer<typeof sourcePageSchema>

/** `GET /api/v1/sources?q=&cursor=`. */
export const sourceListSchema = z.strictObject({
  items: z.array(z.strictObject({ source: sourceBriefSchema, pages: z.int() })),
  total: z.int(),
  nextCursor: z.string().nullable(),
})
export type SourceList = z.infer<typeof sourceListSchema>

/** `GET /api/v1/attributions`. */
export const attributionsSchema = z.strictObject({
  datasets: z.array(
    z.strictObject({
      dataset: datasetBriefSchema,
      importedAt: z.iso.datetime(),
      rowsRead: z.int(),
      rowsAccepted: z.int(),
      rowsMerged: z.int(),
      rowsRejected: z.int(),
      pages: z.int(),
    }),
  ),
})
export type Attributions = z.infer<typeof attributionsSchema>
