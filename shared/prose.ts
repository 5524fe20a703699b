import { z } from 'zod'

/** A section of prose: Markdown without raw HTML. A citation is written `[@source-id]`, with an optional locator after a comma. */
export const proseRowSchema = z.strictObject({
  heading: z.string().min(1).max(120),
  markdown: z.string().min(1).max(20_000),
})
export type ProseRow = z.infer<typeof proseRowSchema>
