import { z } from 'zod'

const SLUG_LENGTH_MAX = 200
/** The largest number PostgreSQL's int holds. */
const REVISION_NUMBER_MAX = 2_147_483_647

/** The form of every slug; anything else names no page. */
export const slugSchema = z
  .string()
  .max(SLUG_LENGTH_MAX)
  .regex(/^[a-z0-9-]+$/)

/** A number that a revision may have. */
export const revisionNumberSchema = z
  .int('A revision is a whole number from 1 on.')
  .min(1, 'A revision is a whole number from 1 on.')
  .max(REVISION_NUMBER_MAX, 'There are not so many revisions.')
