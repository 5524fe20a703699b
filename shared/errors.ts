import { z } from 'zod'

/** RFC 9457 problem document, the one form in which the API answers with an error. */
export const problemSchema = z.looseObject({
  /** Stable address of the kind of problem: `/problems/<code>`. */
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string().optional(),
  code: z.string(),
  requestId: z.string().optional(),
  errors: z.array(z.strictObject({ path: z.string(), message: z.string() })).optional(),
})
export type Problem = z.infer<typeof problemSchema>
