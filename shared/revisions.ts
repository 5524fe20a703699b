import { z } from 'zod'
import { evidenceRowSchema } from './evidence.js'
import { imageRowSchema } from './images.js'
import { classificationRowSchema, nameRowSchema } from './names.js'
import { physiologyRowSchema } from './physiology.js'
import { proseRowSchema } from './prose.js'
import { rangeRowSchema } from './ranges.js'

/**
 * A page's content is items. An item keeps its id from the revision in which it first appears; each of its states is an
 * immutable row, addressed by the SHA-256 of its canonical JSON (RFC 8785). Evidence hangs under its range item.
 */
const place = { itemId: z.uuid(), parentItemId: z.uuid().nullable() }
export const pageItemSchema = z.discriminatedUnion('kind', [
  z.strictObject({ ...place, kind: z.literal('range'), row: rangeRowSchema }),
  z.strictObject({ ...place, kind: z.literal('evidence'), row: evidenceRowSchema }),
  z.strictObject({ ...place, kind: z.literal('physiology'), row: physiologyRowSchema }),
  z.strictObject({ ...place, kind: z.literal('name'), row: nameRowSchema }),
  z.strictObject({ ...place, kind: z.literal('classification'), row: classificationRowSchema }),
  z.strictObject({ ...place, kind: z.literal('prose'), row: proseRowSchema }),
  z.strictObject({ ...place, kind: z.literal('image'), row: imageRowSchema }),
])
/** One item of a page in one state. The order of a page's items is the order of the list they stand in. */
export type PageItem = z.infer<typeof pageItemSchema>
export type ItemKind = PageItem['kind']

/** One mark on the revision line. */
export const revisionMarkSchema = z.strictObject({
  id: z.uuid(),
  number: z.int().positive(),
  publishedAt: z.iso.datetime(),
  summary: z.string(),
  /** Who brought it: a dataset with its version, or people once accounts exist. */
  broughtBy: z.discriminatedUnion('form', [
    z.strictObject({
      form: z.literal('dataset'),
      datasetId: z.string(),
      title: z.string(),
      version: z.string(),
    }),
    z.strictObject({ form: z.literal('demonstration') }),
  ]),
})
export type RevisionMark = z.infer<typeof revisionMarkSchema>
