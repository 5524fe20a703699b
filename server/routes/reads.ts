import { z } from 'zod'
import { quantitySchema } from '../../shared/physiology.js'
import { recordLifeStageSchema } from '../../shared/ranges.js'
import { parseSearchQuery } from '../../shared/search-query.js'
import { findAttributions } from '../queries/attributions.js'
import { findHome } from '../queries/home.js'
import { findPhysiologyRecords } from '../queries/physiology.js'
import { findRevisions } from '../queries/revisions.js'
import { searchSpecies } from '../queries/search.js'
import type { CountStore } from '../queries/search.js'
import { findSourcePage, findSources } from '../queries/sources.js'
import { findSpeciesPageJson } from '../queries/species.js'
import { revisionNumberSchema, slugSchema } from './page-key.js'
import { defineRead, JsonText, noParameters } from './read.js'
import type { Read } from './read.js'

const CURSOR_LENGTH_MAX = 2000
const TEXT_LENGTH_MAX = 200
/** A source that could not be resolved is named by its reference as printed. */
const REFERENCE_LENGTH_MAX = 2000

const cursorSchema = z.string().min(1).max(CURSOR_LENGTH_MAX).optional()
/** A revision's number as text. */
const revisionTextSchema = z
  .string()
  .regex(/^[1-9]\d*$/, 'A revision is a whole number from 1 on.')
  .transform(Number)
  .pipe(revisionNumberSchema)

/** A search as `shared/search-query.ts` reads it, its errors by parameter. */
const searchParametersSchema = z
  .record(z.string(), z.union([z.string(), z.array(z.string())]))
  .transform((given, context) => {
    const parsed = parseSearchQuery(given)
    if (parsed.ok) return parsed.query
    for (const { path, message } of parsed.errors) context.addIssue({ code: 'custom', path: [path], message })
    return z.NEVER
  })

const lethalPercentSchema = z.enum(['0', '50', '100']).transform((word) => Number(word) as 0 | 50 | 100)

/** Every read of the public API. `countsNow` gives where the counts of searches may be kept for now, or null. */
export function listReads(countsNow: () => CountStore | null): Read[] {
  return [
    defineRead({
      path: '/home',
      params: noParameters,
      query: noParameters,
      read: (db) => findHome(db),
    }),
    defineRead({
      path: '/species',
      params: noParameters,
      query: searchParametersSchema,
      read: (db, { query }) => searchSpecies(db, query, countsNow()),
    }),
    defineRead({
      path: '/species/:slug',
      params: z.strictObject({ slug: slugSchema }),
      query: z.strictObject({ revision: revisionTextSchema.optional() }),
      async read(db, { params, query }) {
        const text = await findSpeciesPageJson(db, params.slug, query.revision ?? null)
        return text === null ? null : new JsonText(text)
      },
    }),
    defineRead({
      path: '/species/:slug/revisions',
      params: z.strictObject({ slug: slugSchema }),
      query: z.strictObject({ cursor: cursorSchema }),
      read: (db, { params, query }) => findRevisions(db, params.slug, query.cursor ?? null),
    }),
    defineRead({
      path: '/species/:slug/physiology/:itemId/records',
      params: z.strictObject({ slug: slugSchema, itemId: z.uuid() }),
      query: z.strictObject({
        quantity: quantitySchema.optional(),
        lethalPercent: lethalPercentSchema.optional(),
        lifeStage: recordLifeStageSchema.optional(),
        level: z.enum(['study', 'summary']).optional(),
        source: z.string().min(1).max(REFERENCE_LENGTH_MAX).optional(),
        revision: revisionTextSchema.optional(),
        cursor: cursorSchema,
      }),
      read(db, { params, query: { cursor, revision, ...filter } }) {
        return findPhysiologyRecords(db, params.slug, params.itemId, filter, cursor ?? null, revision ?? null)
      },
    }),
    defineRead({
      path: '/sources',
      params: noParameters,
      query: z.strictObject({ q: z.string().max(TEXT_LENGTH_MAX).optional(), cursor: cursorSchema }),
      read: (db, { query }) => findSources(db, query.q ?? '', query.cursor ?? null),
    }),
    defineRead({
      path: '/sources/:id',
      params: z.strictObject({ id: z.uuid() }),
      query: z.strictObject({ cursor: cursorSchema }),
      read: (db, { params, query }) => findSourcePage(db, params.id, query.cursor ?? null),
    }),
    defineRead({
      path: '/attributions',
      params: noParameters,
      query: noParameters,
      read: (db) => findAttributions(db),
    }),
  ]
}
