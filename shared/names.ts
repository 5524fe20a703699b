import { z } from 'zod'

export const nameKindSchema = z.enum(['scientific', 'synonym', 'common'])
export type NameKind = z.infer<typeof nameKindSchema>

/** Whether a naming authority in the data accepts a scientific name. */
export const nameStatusSchema = z.enum(['accepted', 'unresolved', 'needs-a-person'])
export type NameStatus = z.infer<typeof nameStatusSchema>

/** One name of a page's taxon. Exactly one is `scientific`. */
export const nameRowSchema = z.strictObject({
  kind: nameKindSchema,
  name: z.string().min(1).max(200),
  authority: z.string().max(200).nullable(),
  /** Only of the scientific name. */
  status: nameStatusSchema.nullable(),
  /** BCP 47, of a common name; null when not known. */
  language: z.string().max(20).nullable(),
  /** Where the name was read, or "from memory". */
  provenance: z.string().max(300),
})
export type NameRow = z.infer<typeof nameRowSchema>

/** Where the taxon stands, and what open data say of it. */
export const classificationRowSchema = z.strictObject({
  class: z.string(),
  order: z.string().nullable(),
  suborder: z.string().nullable(),
  family: z.string().nullable(),
  /** A conservation category as an open dataset prints it ("Least Concern"). */
  conservation: z.string().nullable(),
  activeTime: z.string().nullable(),
  microhabitat: z.string().nullable(),
  region: z.string().nullable(),
  provenance: z.string(),
})
export type ClassificationRow = z.infer<typeof classificationRowSchema>
