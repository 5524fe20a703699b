import type { EntityManager } from 'typeorm'
import type { PageItem } from '../../../shared/revisions.js'
import { Conflict, InvalidInput, NotFound, type FieldError } from '../../errors.js'
import { queryPrepared } from '../../prepared.js'
import { isStorable } from '../../storable.js'
import { requireTransaction } from '../../transactions.js'
import { requirePageContent, type PageContent, type RecordSetInput } from './page-content.js'
import { refreshProjections } from './projections.js'
import { writeRecordSets, writeRows } from './write-rows.js'

/** Who brought a revision: a version of a dataset, or the demonstration scenario. */
export type BroughtBy = { form: 'dataset'; datasetVersionId: string } | { form: 'demonstration' }

export interface PublishInput {
  /** The page to publish on; without an id a new page is made. */
  species: { id: string } | { isInvented: boolean }
  /** The revision the content was made from; null for a new page. */
  baseRevisionId: string | null
  /** The whole content of the page, in order. */
  items: PageItem[]
  /** The record sets that items of the page name and that may be new. */
  recordSets: RecordSetInput[]
  summary: string
  broughtBy: BroughtBy
  publishedAt: Date
  /** Of a revert: the revision whose content comes back. */
  restoresRevisionId?: string
}

export interface PublishedRevision {
  speciesId: string
  slug: string
  revisionId: string
  number: number
}

interface Page {
  id: string
  slug: string
  currentRevisionId: string | null
  revisionNumber: number
}

const LOCK_PAGE = {
  name: 'lock-page',
  text: `
    select id, slug, current_revision_id as "currentRevisionId", revision_number as "revisionNumber"
    from species where id = $1 for update`,
}

// A page becomes visible to others only with its first revision, in the same transaction; the projections fill the rest.
const CREATE_PAGE = {
  name: 'create-page',
  text: `
    with page as (
      insert into species (slug, is_invented, revision_number, updated_at, scientific_name, common_names, class, range_count,
        physiology_count, evidence_kinds, search)
      values ($1, $2, 0, $3, $4, '{}', '', 0, 0, '{}', '')
      on conflict (slug) do nothing
      returning id, slug
    )
    select id, slug, null::uuid as "currentRevisionId", 0 as "revisionNumber" from page`,
}

const FIND_CONTRADICTIONS = {
  name: 'find-contradictions',
  text: `
    select
      array(select cited.id::text from unnest($1::uuid[]) cited (id)
        where not exists (select from source where source.id = cited.id))
        as "missingSources",
      array(
        select named.hash from jsonb_to_recordset($2::jsonb) as named (hash text, dataset_id text)
        -- A scalar look-up, because a join would be planned to read the whole table.
        where named.dataset_id is distinct from (
          select record_set.dataset_id from record_set where record_set.hash = decode(named.hash, 'hex')
        )
      ) as "missingRecordSets",
      array(
        select given.id from unnest($3::text[]) given (id)
        where not exists (select from dataset_version where dataset_version.dataset_id = given.id)
      ) as "missingDatasets",
      -- Any one place where the item stands tells its page and kind: all others agree with it.
      array(
        select item.item_id::text
        from jsonb_to_recordset($4::jsonb) as item (item_id uuid, kind text)
        cross join lateral (
          select revision.species_id, revision_item.kind from revision_item
          join revision on revision.id = revision_item.revision_id
          where revision_item.item_id = item.item_id limit 1
        ) earlier
        where earlier.kind <> item.kind or earlier.species_id is distinct from $5
      ) as "foreignItems",
      exists (select from species_slug where slug = $6 and species_id is distinct from $5) as "isNameTaken"`,
}

interface Contradictions {
  missingSources: string[]
  missingRecordSets: string[]
  missingDatasets: string[]
  foreignItems: string[]
  isNameTaken: boolean
}

// The whole revision in one statement: its line, its items, the page's pointer, and the slug where the name is new.
const INSERT_REVISION = {
  name: 'insert-revision',
  text: `
    with new_revision as (
      insert into revision (species_id, number, published_at, summary, base_revision_id, restores_revision_id, brought_by,
        dataset_version_id)
      values ($1, $2, $3, $4, $5, $6, $7, $8)
      returning id
    ), new_items as (
      insert into revision_item (revision_id, item_id, kind, parent_item_id, ordinal, row_hash)
      select new_revision.id, item.item_id, item.kind, item.parent_item_id, item.ordinal, item.row_hash
      from new_revision cross join jsonb_to_recordset($9::jsonb) as item (
        item_id uuid, kind text, parent_item_id uuid, ordinal int, row_hash bytea
      )
    ), new_slug as (
      insert into species_slug (slug, species_id) values ($10, $1) on conflict do nothing
    ), page as (
      update species set current_revision_id = new_revision.id, revision_number = $2, updated_at = $3, slug = $10
      from new_revision where species.id = $1
    )
    select id from new_revision`,
}

async function lockPage(db: EntityManager, speciesId: string): Promise<Page> {
  const [page] = await queryPrepared<Page>(db, LOCK_PAGE, [speciesId])
  if (page === undefined) throw new NotFound('There is no such page.')
  return page
}

async function createPage(
  db: EntityManager,
  content: PageContent,
  isInvented: boolean,
  publishedAt: Date,
): Promise<Page> {
  const values = [content.slug, isInvented, publishedAt, content.scientificName]
  const [page] = await queryPrepared<Page>(db, CREATE_PAGE, values)
  if (page === undefined) throw nameTaken(content)
  return page
}

function nameTaken(content: PageContent): Conflict {
  return new Conflict(`There is already another page named ${content.scientificName}.`)
}

async function requireKnownReferences(
  db: EntityManager,
  content: PageContent,
  page: Page | null,
): Promise<void> {
  const given = new Map(content.recordSets.map((set) => [set.hash, set.datasetId]))
  const named = content.items.flatMap((item) =>
    item.kind === 'physiology' && item.row.form === 'dataset' ? [item.row] : [],
  )
  const elsewhere = named.filter((row) => given.get(row.recordSetHash) !== row.datasetId)
  const [found] = await queryPrepared<Contradictions>(db, FIND_CONTRADICTIONS, [
    content.sourceIds,
    JSON.stringify(elsewhere.map((row) => ({ hash: row.recordSetHash, dataset_id: row.datasetId }))),
    [...new Set(content.recordSets.map((set) => set.datasetId))],
    JSON.stringify(content.items.map((item) => ({ item_id: item.itemId, kind: item.kind }))),
    page?.id ?? null,
    content.slug,
  ])
  if (found === undefined) return
  if (found.isNameTaken) throw nameTaken(content)
  const errors: FieldError[] = [
    ...found.missingSources.map((id) => ({ path: 'items', message: `There is no source ${id}.` })),
    ...found.missingRecordSets.map((hash) => ({
      path: 'recordSets',
      message: `There is no record set ${hash}.`,
    })),
    ...found.missingDatasets.map((id) => ({ path: 'recordSets', message: `There is no dataset ${id}.` })),
    ...found.foreignItems.map((id) => ({
      path: 'items',
      message: `Item ${id} is another page's or of another kind.`,
    })),
  ]
  if (errors.length > 0) throw new InvalidInput('The content of the page names what does not exist.', errors)
}

async function insertRevision(
  db: EntityManager,
  page: Page,
  content: PageContent,
  input: PublishInput,
  rowHashes: readonly string[],
): Promise<PublishedRevision> {
  const number = page.revisionNumber + 1
  const items = content.items.map((item, ordinal) => ({
    item_id: item.itemId,
    kind: item.kind,
    parent_item_id: item.parentItemId,
    ordinal,
    row_hash: `\\x${rowHashes[ordinal] ?? ''}`,
  }))
  const [revision] = await queryPrepared<{ id: string }>(db, INSERT_REVISION, [
    page.id,
    number,
    input.publishedAt,
    input.summary,
    input.baseRevisionId,
    input.restoresRevisionId ?? null,
    input.broughtBy.form,
    input.broughtBy.form === 'dataset' ? input.broughtBy.datasetVersionId : null,
    JSON.stringify(items),
    content.slug,
  ])
  if (revision === undefined) throw new Error('The revision was not written')
  return { speciesId: page.id, slug: content.slug, revisionId: revision.id, number }
}

/**
 * Publishes the whole content of a page as its next revision: the only function that changes what is published. Writes the rows
 * that are new, the revision with its items, the page's pointer and projections; at most twelve statements, however long the page or its history. It needs the caller's transaction, so that it happens whole or not at all.
 *
 * Throws InvalidInput for content that contradicts itself or names what does not exist, NotFound for an unknown page, Conflict
 * where the base is no longer the current revision or another page has the name. All of these come before the first write.
 */
export async function publishRevision(db: EntityManager, input: PublishInput): Promise<PublishedRevision> {
  requireTransaction(db, 'publishRevision')
  if (input.summary.trim() === '' || !isStorable(input.summary)) {
    throw new InvalidInput('A revision says in a few words what it changes.', [
      { path: 'summary', message: 'Say in a few words what changes.' },
    ])
  }
  const content = requirePageContent(input)
  const known = 'id' in input.species ? await lockPage(db, input.species.id) : null
  if ((known?.currentRevisionId ?? null) !== input.baseRevisionId) {
    throw new Conflict('The page has moved on since this change was begun.')
  }
  await requireKnownReferences(db, content, known)
  const page =
    known ??
    (await createPage(
      db,
      content,
      'isInvented' in input.species && input.species.isInvented,
      input.publishedAt,
    ))
  await writeRecordSets(db, content.recordSets)
  const rowHashes = await writeRows(db, content.items)
  const published = await insertRevision(db, page, content, input, rowHashes)
  await refreshProjections(db, page.id)
  return published
}
