import { z } from 'zod'

/** The use of an uploaded image on a page. */
export const imageRowSchema = z.strictObject({
  mediaId: z.uuid(),
  alternativeText: z.string().min(1).max(300),
  caption: z.string().max(500).nullable(),
  licence: z.string().min(1).max(100),
  credit: z.string().min(1).max(200),
})
export type ImageRow = z.infer<typeof imageRowSchema>
