import { z } from 'zod'
import { physiologyRecordSchema } from './physiology.js'
import { sourceBriefSchema } from './sources.js'

/** `GET /api/v1/species/:slug/physiology/:itemId/records`: the records behind a dataset's study lines, as the dataset prints them. */
export const recordListSchema = z.strictObject({
  items: z.array(physiologyRecordSchema),
  /** Every source the items cite, by the id they cite; a merged source is already its heir. */
  sources: z.record(z.uuid(), sourceBriefSchema),
  total: z.int().nonnegative(),
  nextCursor: z.string().nullable(),
})
export type RecordList = z.infer<typeof recordListSchema>
