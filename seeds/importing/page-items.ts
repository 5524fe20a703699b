import { randomUUID } from 'node:crypto'
import type { EvidenceRow } from '../../shared/evidence.js'
import type { RangeKeys, RangeRow } from '../../shared/ranges.js'
import type { PageItem } from '../../shared/revisions.js'
import type { TaxonDescription } from '../names/taxonomy.js'

/** What a dataset wants a page to hold. */
export interface DatasetContent {
  /** The address of its record set; null when the dataset has no records of the species. */
  recordSetHash: string | null
  ranges: { range: RangeRow; evidence: EvidenceRow }[]
}

/** The items of a page that begins: its names and its classification. */
export function beginPage({ names, classification }: TaxonDescription): PageItem[] {
  const place = () => ({ itemId: randomUUID(), parentItemId: null })
  return [
    ...names.map((row): PageItem => ({ ...place(), kind: 'name', row })),
    { ...place(), kind: 'classification', row: classification },
  ]
}

/**
 * A page's items with one dataset's own items brought up to date and every other item as it was. The dataset's own are its
 * record set, the evidence from its own source, and the ranges that rest on such evidence alone. An item keeps its id for
 * as long as it says the same thing: a record set while it is the same dataset's, a range while its keys are the same.
 */
export function bringUpToDate(
  items: readonly PageItem[],
  datasetId: string,
  ownSourceId: string | null,
  content: DatasetContent,
): PageItem[] {
  const withRecords = placeRecordSet(items, datasetId, content.recordSetHash)
  return ownSourceId === null ? withRecords : placeRanges(withRecords, ownSourceId, content.ranges)
}

function placeRecordSet(items: readonly PageItem[], datasetId: string, hash: string | null): PageItem[] {
  const isOwn = (item: PageItem) =>
    item.kind === 'physiology' && item.row.form === 'dataset' && item.row.datasetId === datasetId
  if (hash === null) return items.filter((item) => !isOwn(item))
  const row = { form: 'dataset' as const, datasetId, recordSetHash: hash }
  if (!items.some(isOwn))
    return [...items, { itemId: randomUUID(), parentItemId: null, kind: 'physiology', row }]
  return items.map((item) => (isOwn(item) && item.kind === 'physiology' ? { ...item, row } : item))
}

function placeRanges(
  items: readonly PageItem[],
  ownSourceId: string,
  wanted: DatasetContent['ranges'],
): PageItem[] {
  const result: PageItem[] = []
  const placed = new Set<string>()
  for (const item of items) {
    if (item.kind === 'evidence') continue
    if (item.kind !== 'range') {
      result.push(item)
      continue
    }
    const evidence = items.filter((other) => other.kind === 'evidence' && other.parentItemId === item.itemId)
    const own = evidence.filter((other) => other.kind === 'evidence' && other.row.sourceId === ownSourceId)
    const others = evidence.filter((other) => !own.includes(other))
    const want = wanted.find(({ range }) => toKeyText(range) === toKeyText(item.row))
    if (want) placed.add(toKeyText(want.range))
    // A range whose only evidence was the dataset's goes with it; one that others support stays as they left it.
    if (!want && own.length > 0 && others.length === 0) continue
    result.push(own.length > 0 && others.length === 0 && want ? { ...item, row: want.range } : item)
    result.push(...others)
    if (want) {
      result.push({
        itemId: own[0]?.itemId ?? randomUUID(),
        parentItemId: item.itemId,
        kind: 'evidence',
        row: want.evidence,
      })
    }
  }
  for (const { range, evidence } of wanted) {
    if (placed.has(toKeyText(range))) continue
    const itemId = randomUUID()
    result.push(
      { itemId, parentItemId: null, kind: 'range', row: range },
      { itemId: randomUUID(), parentItemId: itemId, kind: 'evidence', row: evidence },
    )
  }
  return result
}

/** The keys of a range as one text. */
export function toKeyText(keys: RangeKeys & Pick<RangeRow, 'uvMeaning'>): string {
  const { parameter, position, period, season, lifeStage, uvMeaning } = keys
  return [parameter, position, period, season, lifeStage, uvMeaning ?? ''].join(' ')
}
