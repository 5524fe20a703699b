import { z } from 'zod'

/** What a lint does to a proposal: stops it, asks for a second look, or tells something worth knowing. */
export const lintLevelSchema = z.enum(['blocks', 'warns', 'informs'])
export type LintLevel = z.infer<typeof lintLevelSchema>

export const lintIdSchema = z.enum([
  'low-over-high',
  'limit-inside-range',
  'duplicate-key',
  'zone-outside-1-to-4',
  'physically-impossible',
  'no-evidence',
  'outside-envelope',
  'looks-like-other-unit',
  'cool-end-warmer',
  'trapped-in-cautions',
  'limit-past-cautions',
  'humidity-one-air-cannot-do',
  'needs-joining-row',
  'locator-missing',
  'one-study-only',
  'keepers-reports-only',
  'night-warmer-than-day',
  'hide-warmer-than-basking',
  'evidence-over-30-years',
])
export type LintId = z.infer<typeof lintIdSchema>

/** One finding on a page, with the items it concerns: ranges first, then the evidence or physiology behind them. */
export const lintSchema = z.strictObject({
  id: lintIdSchema,
  level: lintLevelSchema,
  /** What is wrong and what to do about it. */
  sentence: z.string(),
  itemIds: z.array(z.string()).min(1),
})
export type Lint = z.infer<typeof lintSchema>
