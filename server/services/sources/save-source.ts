import { randomUUID } from 'node:crypto'
import type { EntityManager } from 'typeorm'
import { z } from 'zod'
import { toShortCitation } from '../../../shared/citation.js'
import { toDoiKey } from '../../../shared/doi.js'
import { cslItemSchema, sourceKindSchema, type CslItem, type SourceKind } from '../../../shared/sources.js'
import { InvalidInput } from '../../errors.js'
import { isStorable } from '../../storable.js'
import { requireTransaction } from '../../transactions.js'
import { toReferenceKey } from './reference-key.js'
import { SourceRegister } from './source-register.js'
import { mergeSources } from './merge-sources.js'

export interface SaveSourceInput {
  doi: string | null
  kind: SourceKind
  /** Terms of use as the source states them. */
  terms: string | null
  csl: CslItem
  /** The full reference in words, by which the same study is known again; null for a mere author-year key. */
  reference: string | null
  /** What a page prints where the CSL fields could not be read. */
  asPrinted: string | null
  isInvented: boolean
  broughtBy: { form: 'dataset'; datasetVersionId: string } | { form: 'demonstration' }
  publishedAt: Date
}

const textsSchema = z.object({
  doi: z.string().nullable(),
  kind: sourceKindSchema,
  terms: z.string().nullable(),
  csl: cslItemSchema,
  reference: z.string().nullable(),
  asPrinted: z.string().nullable(),
})

/** Held while sources are compared and added, so that two importers cannot both add the same study. */
const SOURCES_LOCK = 7_301_001
/** A listing is indexed, and an index entry holds at most some 2,700 bytes. */
const LISTING_LENGTH_MAX = 600

const FIND_KNOWN = `
  select coalesce(heir.id, source.id) as id, coalesce(heir.doi, source.doi) as doi, source.doi as "keyDoi",
    encode(source.reference_key, 'hex') as "keyReference",
    (coalesce(heir.reference_key, source.reference_key) is not null) as "hasReference"
  from source left join source heir on heir.id = source.merged_into_id
  where source.doi = any($1)
    or source.reference_key = any(array(select decode(key, 'hex') from unnest($2::text[]) key))`

const INSERT_SOURCES = `
  with given as (
    select * from jsonb_to_recordset($1::jsonb) as given (
      id uuid, kind text, terms text, as_printed text, is_invented boolean, listing text,
      csl json, revision_id uuid, published_at timestamptz, brought_by text, dataset_version_id uuid
    )
  ), new_source as (
    insert into source (id, kind, terms, as_printed, is_invented, current_source_revision_id, listing)
    select id, kind, terms, as_printed, is_invented, revision_id, normalise_name(listing) from given
  )
  insert into source_revision (id, source_id, number, csl, published_at, brought_by, dataset_version_id)
  select revision_id, id, 1, csl, published_at, brought_by, dataset_version_id from given`

const COMPLETE_KEYS = `
  update source set
    doi = coalesce(source.doi, given.doi),
    reference_key = coalesce(source.reference_key, given.reference_key)
  from jsonb_to_recordset($1::jsonb) as given (id uuid, doi text, reference_key bytea)
  where source.id = given.id`

interface KnownRow {
  id: string
  doi: string | null
  keyDoi: string | null
  keyReference: string | null
  hasReference: boolean
}

function toBytes(hex: string | null): string | null {
  return hex === null ? null : `\\x${hex}`
}

function toListing(input: SaveSourceInput): string {
  return [toShortCitation(input), input.csl.title ?? input.asPrinted].join(' ').slice(0, LISTING_LENGTH_MAX)
}

function requireTexts(inputs: readonly SaveSourceInput[]): void {
  const result = z.array(textsSchema).safeParse(inputs)
  const errors = result.success
    ? []
    : result.error.issues.map((issue) => ({ path: issue.path.join('.'), message: issue.message }))
  if (!isStorable(inputs))
    errors.push({ path: '', message: 'The text holds characters that cannot be stored.' })
  if (errors.length > 0) throw new InvalidInput('The source does not have the form it must have.', errors)
}

/**
 * Saves sources and gives the id each is cited by, in the order given. The same DOI is the same source; without one on either
 * side, the same normalised full reference is. A source that is known already stays as it is, but takes over a DOI or reference
 * it lacked; two known sources that turn out to be one study are merged. In a few statements, however many sources there are.
 * Throws InvalidInput. Needs a transaction.
 */
export async function saveSources(
  db: EntityManager,
  inputs: readonly SaveSourceInput[],
): Promise<{ id: string }[]> {
  if (inputs.length === 0) return []
  requireTransaction(db, 'saveSources')
  requireTexts(inputs)
  await db.query('select pg_advisory_xact_lock($1)', [SOURCES_LOCK])
  const keyed = inputs.map((input) => ({
    input,
    keys: { doi: toDoiKey(input.doi), reference: toReferenceKey(input.reference) },
  }))
  const rows: KnownRow[] = await db.query(FIND_KNOWN, [
    keyed.map(({ keys }) => keys.doi),
    keyed.map(({ keys }) => keys.reference),
  ])
  const register = new SourceRegister()
  for (const row of rows) {
    register.add({ id: row.id, doi: row.doi, hasReference: row.hasReference }, row.keyDoi, row.keyReference)
  }
  const placed = keyed.map(({ input, keys }) => ({ input, ...register.place(keys, randomUUID) }))

  const added = placed.flatMap(({ input, id, isNew }) => (isNew ? [{ id, input }] : []))
  const completed = register.completedKeys()
  if (added.length > 0) {
    const newSources = added.map(({ id, input }) => ({
      id,
      kind: input.kind,
      terms: input.terms,
      as_printed: input.asPrinted,
      is_invented: input.isInvented,
      listing: toListing(input),
      csl: input.csl,
      revision_id: randomUUID(),
      published_at: input.publishedAt,
      brought_by: input.broughtBy.form,
      dataset_version_id: input.broughtBy.form === 'dataset' ? input.broughtBy.datasetVersionId : null,
    }))
    await db.query(INSERT_SOURCES, [JSON.stringify(newSources)])
  }
  if (completed.length > 0) {
    const keys = completed.map(({ id, doi, reference }) => ({ id, doi, reference_key: toBytes(reference) }))
    await db.query(COMPLETE_KEYS, [JSON.stringify(keys)])
  }
  await mergeSources(db, register.merges())
  return placed.map(({ id }) => ({ id: register.heirOf(id) }))
}

/** Saves one source and gives the id it is cited by; see `saveSources`. */
export async function saveSource(db: EntityManager, input: SaveSourceInput): Promise<{ id: string }> {
  const [saved] = await saveSources(db, [input])
  if (saved === undefined) throw new Error('The source was not saved')
  return saved
}
