import { z } from 'zod'

/** Longest name a page may be asked for under. */
export const REQUESTED_NAME_LENGTH_MAX = 200

/** Body of `POST /api/v1/page-requests`: the name of a species that has no page yet. */
export const pageRequestInput = z.strictObject({
  name: z
    .string()
    .trim()
    .max(REQUESTED_NAME_LENGTH_MAX, `A name of at most ${REQUESTED_NAME_LENGTH_MAX} characters.`)
    .regex(/\p{L}/u, 'Say which species the page is wanted for.'),
})
export type PageRequestInput = z.infer<typeof pageRequestInput>

/** Its answer: the name as it was first typed, and how often it was asked for. */
export const pageRequestAnswerSchema = z.strictObject({ name: z.string(), times: z.int().positive() })
export type PageRequestAnswer = z.infer<typeof pageRequestAnswerSchema>
