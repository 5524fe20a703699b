import { z } from 'zod'

/** The part of a CSL-JSON item (citation-style-language, csl-data.json 1.0) that the product reads; other fields are kept. */
export const cslItemSchema = z.looseObject({
  type: z.string(),
  title: z.string().optional(),
  author: z
    .array(
      z.looseObject({
        family: z.string().optional(),
        given: z.string().optional(),
        literal: z.string().optional(),
      }),
    )
    .optional(),
  issued: z.looseObject({ 'date-parts': z.array(z.array(z.number())).optional() }).optional(),
  'container-title': z.string().optional(),
  volume: z.string().optional(),
  page: z.string().optional(),
  DOI: z.string().optional(),
  URL: z.string().optional(),
})
export type CslItem = z.infer<typeof cslItemSchema>

export const sourceKindSchema = z.enum([
  'article',
  'book',
  'thesis',
  'report',
  'dataset',
  'law',
  'web-page',
  'other',
])
export type SourceKind = z.infer<typeof sourceKindSchema>

/** A source as a page shows it. */
export const sourceBriefSchema = z.strictObject({
  id: z.uuid(),
  kind: sourceKindSchema,
  doi: z.string().nullable(),
  csl: cslItemSchema,
  /** The reference in words, as the dataset printed it, where CSL fields could not be read from it. */
  asPrinted: z.string().nullable(),
  isInvented: z.boolean(),
})
export type SourceBrief = z.infer<typeof sourceBriefSchema>

/** An imported dataset with what its licence asks to be shown. */
export const datasetBriefSchema = z.strictObject({
  id: z.string(),
  title: z.string(),
  version: z.string(),
  doi: z.string().nullable(),
  licence: z.string(),
  licenceUrl: z.string().nullable(),
  attribution: z.string(),
})
export type DatasetBrief = z.infer<typeof datasetBriefSchema>
