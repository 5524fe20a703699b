import { z } from 'zod'
import { physiologyRecordSchema, type PhysiologyRecord } from '../../../shared/physiology.js'
import { findCitedSources } from '../../../shared/prose-citations.js'
import { pageItemSchema, type PageItem } from '../../../shared/revisions.js'
import { toSlug } from '../../../shared/slugs.js'
import { hashContent } from '../../content-hash.js'
import { InvalidInput, type FieldError } from '../../errors.js'
import { isStorable } from '../../storable.js'

/** All records one dataset holds for a species, with the hash of their canonical list. */
export interface RecordSetInput {
  hash: string
  datasetId: string
  records: PhysiologyRecord[]
}

/** A page's whole content, checked. */
export interface PageContent {
  items: PageItem[]
  recordSets: RecordSetInput[]
  scientificName: string
  slug: string
  /** Every source that an item or a record cites. */
  sourceIds: string[]
}

const recordSetSchema = z.strictObject({
  hash: z.string().regex(/^[0-9a-f]{64}$/),
  datasetId: z.string().min(1),
  records: z.array(physiologyRecordSchema).min(1),
})

function parseList<T>(schema: z.ZodType<T>, list: readonly unknown[], path: string): T[] {
  const result = z.array(schema).safeParse(list)
  if (result.success) return result.data
  throw new InvalidInput(
    'The content of the page does not have the form it must have.',
    result.error.issues.map((issue) => ({ path: [path, ...issue.path].join('.'), message: issue.message })),
  )
}

function findPlacementErrors(items: readonly PageItem[]): FieldError[] {
  const kinds = new Map<string, PageItem['kind']>()
  const errors: FieldError[] = []
  for (const [index, item] of items.entries()) {
    if (kinds.has(item.itemId)) {
      errors.push({ path: `items.${index}.itemId`, message: 'This item stands on the page twice.' })
    }
    kinds.set(item.itemId, item.kind)
  }
  for (const [index, item] of items.entries()) {
    const path = `items.${index}.parentItemId`
    if (item.kind === 'evidence') {
      if (item.parentItemId === null || kinds.get(item.parentItemId) !== 'range') {
        errors.push({ path, message: 'Evidence must stand under a range of the page.' })
      }
    } else if (item.parentItemId !== null) {
      errors.push({ path, message: 'Only evidence stands under another item.' })
    }
  }
  return errors
}

function findRangeErrors(items: readonly PageItem[]): FieldError[] {
  const seen = new Set<string>()
  const errors: FieldError[] = []
  for (const [index, item] of items.entries()) {
    if (item.kind !== 'range') continue
    const { parameter, position, period, season, lifeStage, uvMeaning, low, high } = item.row
    const keys = [parameter, position, period, season, lifeStage, uvMeaning].join(' ')
    if (seen.has(keys)) {
      errors.push({
        path: `items.${index}.row`,
        message: 'Another range of the page has the same parameter, position, period, season and life stage.',
      })
    }
    seen.add(keys)
    if (low !== null && high !== null && low > high) {
      errors.push({ path: `items.${index}.row.low`, message: 'The low end must not lie above the high end.' })
    }
  }
  return errors
}

function findNameErrors(items: readonly PageItem[]): FieldError[] {
  const scientific = items.filter((item) => item.kind === 'name' && item.row.kind === 'scientific')
  const classifications = items.filter((item) => item.kind === 'classification')
  const errors: FieldError[] = []
  if (scientific.length !== 1) {
    errors.push({ path: 'items', message: 'A page has exactly one scientific name.' })
  }
  if (classifications.length > 1) {
    errors.push({ path: 'items', message: 'A page has one classification at most.' })
  }
  return errors
}

function findRecordSetErrors(recordSets: readonly RecordSetInput[]): FieldError[] {
  return recordSets
    .map(({ hash, records }, index) => ({ index, isRight: hashContent(records) === hash }))
    .filter(({ isRight }) => !isRight)
    .map(({ index }) => ({
      path: `recordSets.${index}.hash`,
      message: 'The hash is not that of the records.',
    }))
}

function citedSourcesOf(item: PageItem): string[] {
  switch (item.kind) {
    case 'evidence':
      return [item.row.sourceId]
    case 'physiology':
      return item.row.form === 'cited' ? [item.row.sourceId] : []
    case 'prose':
      return findCitedSources(item.row.markdown)
    default:
      return []
  }
}

/**
 * Checks a page's whole content for what can be told without the database. Throws InvalidInput naming every fault: a row that
 * does not fit its schema, an item that stands twice, evidence without its range, two ranges with the same keys, a low end
 * above the high end, not exactly one scientific name, a record set under another hash than its own.
 */
export function requirePageContent(input: {
  items: readonly unknown[]
  recordSets: readonly unknown[]
}): PageContent {
  const items = parseList(pageItemSchema, input.items, 'items')
  const recordSets = parseList(recordSetSchema, input.recordSets, 'recordSets')
  const errors = [
    ...findPlacementErrors(items),
    ...findRangeErrors(items),
    ...findNameErrors(items),
    ...findRecordSetErrors(recordSets),
  ]
  if (!isStorable(items) || !isStorable(recordSets)) {
    errors.push({ path: 'items', message: 'The text holds characters that cannot be stored.' })
  }
  const name = items.find((item) => item.kind === 'name' && item.row.kind === 'scientific')
  const scientificName = name?.kind === 'name' ? name.row.name : ''
  const slug = toSlug(scientificName)
  if (name !== undefined && slug === '') {
    errors.push({ path: 'items', message: 'The scientific name has no letters that an address could carry.' })
  }
  if (errors.length > 0) throw new InvalidInput('The content of the page contradicts itself.', errors)
  const recordSources = recordSets.flatMap(({ records }) => records.map((record) => record.sourceId))
  const sourceIds = new Set([...items.flatMap(citedSourcesOf), ...recordSources.filter((id) => id !== null)])
  return { items, recordSets, scientificName, slug, sourceIds: [...sourceIds] }
}
