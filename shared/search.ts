import { z } from 'zod'
import { evidenceKindSchema } from './evidence.js'
import { parameterSchema, periodSchema, positionSchema, uvZoneSchema } from './ranges.js'
import { speciesListItemSchema } from './species.js'

export const SEARCH_PAGE_SIZE = 20
export const SEARCH_PAGE_SIZE_MAX = 100

/** "At this position and period, a page's range overlaps [low, high]" in canonical units; a missing side is open. */
export const overlapFilterSchema = z.strictObject({
  parameter: parameterSchema,
  position: positionSchema,
  period: periodSchema,
  low: z.number().nullable(),
  high: z.number().nullable(),
})
export type OverlapFilter = z.infer<typeof overlapFilterSchema>

export const searchSortSchema = z.enum(['best', 'name', 'newest'])

/** What a search asks; the address bar and the API carry it as query parameters (see `search-query.ts`). */
export const searchQuerySchema = z.strictObject({
  q: z.string().max(100),
  class: z.array(z.string()),
  order: z.array(z.string()),
  family: z.array(z.string()),
  conservation: z.array(z.string()),
  uvZone: z.array(uvZoneSchema),
  evidenceKind: z.array(evidenceKindSchema),
  hasRanges: z.boolean().nullable(),
  /** The demonstration's species only (true), real species only (false), or both (null). */
  invented: z.boolean().nullable(),
  overlaps: z.array(overlapFilterSchema).max(6),
  sort: searchSortSchema,
  cursor: z.string().nullable(),
  limit: z.int().min(1).max(SEARCH_PAGE_SIZE_MAX),
})
export type SearchQuery = z.infer<typeof searchQuerySchema>

const facetSchema = z.array(z.strictObject({ value: z.string(), count: z.int() }))

/** `GET /api/v1/species`. Facet counts are those of the answer with that facet's own choice left open. */
export const searchAnswerSchema = z.strictObject({
  items: z.array(speciesListItemSchema),
  total: z.int(),
  nextCursor: z.string().nullable(),
  facets: z.strictObject({
    class: facetSchema,
    order: facetSchema,
    family: facetSchema,
    conservation: facetSchema,
    uvZone: facetSchema,
    evidenceKind: facetSchema,
    hasRanges: facetSchema,
  }),
  /** Names near to the words when nothing was found. */
  nearest: z.array(z.strictObject({ slug: z.string(), scientificName: z.string(), name: z.string() })),
  engine: z.enum(['postgresql', 'meilisearch']),
})
export type SearchAnswer = z.infer<typeof searchAnswerSchema>
