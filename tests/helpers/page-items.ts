import { randomUUID } from 'node:crypto'
import type { DataSource, EntityManager } from 'typeorm'
import type { PhysiologyRecord } from '../../shared/physiology.js'
import type { ItemKind, PageItem } from '../../shared/revisions.js'
import { hashContent } from '../../server/content-hash.js'
import { recordDatasetVersion } from '../../server/services/datasets/record-dataset-version.js'
import type { RecordSetInput } from '../../server/services/revisions/page-content.js'
import {
  publishRevision,
  type PublishedRevision,
  type PublishInput,
} from '../../server/services/revisions/publish-revision.js'
import { saveSource, type SaveSourceInput } from '../../server/services/sources/save-source.js'

export type ItemOf<K extends ItemKind> = Extract<PageItem, { kind: K }>

/** The moment at which everything of these helpers is published, unless a test says otherwise. */
export const PUBLISHED_AT = new Date('2026-03-01T10:20:30.456Z')

let lastNumber = 0

/** A scientific name that no other test uses. */
export function makeName(): string {
  lastNumber += 1
  return `Testudiculus numero${String(lastNumber).padStart(4, '0')}`
}

export function makeNameItem(part: Partial<ItemOf<'name'>['row']> = {}): ItemOf<'name'> {
  const row = {
    kind: 'scientific' as const,
    name: makeName(),
    authority: null,
    status: null,
    language: null,
    provenance: 'made for a test',
    ...part,
  }
  return { itemId: randomUUID(), parentItemId: null, kind: 'name', row }
}

export function makeClassificationItem(
  part: Partial<ItemOf<'classification'>['row']> = {},
): ItemOf<'classification'> {
  const row = {
    class: 'Reptilia',
    order: 'Squamata',
    suborder: null,
    family: 'Testidae',
    conservation: null,
    activeTime: null,
    microhabitat: null,
    region: null,
    provenance: 'made for a test',
    ...part,
  }
  return { itemId: randomUUID(), parentItemId: null, kind: 'classification', row }
}

/** Temperature at the basking surface by day, 35 to 40 °C, for any season and stage. */
export function makeRangeItem(part: Partial<ItemOf<'range'>['row']> = {}): ItemOf<'range'> {
  const row = {
    parameter: 'temperature' as const,
    position: 'basking-surface' as const,
    period: 'day' as const,
    season: 'any' as const,
    lifeStage: 'any' as const,
    low: 35,
    high: 40,
    lowerLimit: null,
    upperLimit: null,
    typedUnit: 'degC' as const,
    typed: null,
    uvMeaning: null,
    uvZone: null,
    note: null,
    ...part,
  }
  return { itemId: randomUUID(), parentItemId: null, kind: 'range', row }
}

export function makeEvidenceItem(
  rangeItemId: string,
  sourceId: string,
  part: Partial<ItemOf<'evidence'>['row']> = {},
): ItemOf<'evidence'> {
  const row = {
    sourceId,
    kind: 'guideline' as const,
    locator: 'p. 12',
    statement: 'interval' as const,
    printed: { low: '35', high: '40', mean: null, sd: null, unit: 'degC' as const },
    low: 35,
    high: 40,
    mean: null,
    sd: null,
    n: null,
    note: null,
    ...part,
  }
  return { itemId: randomUUID(), parentItemId: rangeItemId, kind: 'evidence', row }
}

export function makeProseItem(markdown: string): ItemOf<'prose'> {
  return { itemId: randomUUID(), parentItemId: null, kind: 'prose', row: { heading: 'Care', markdown } }
}

export function makeRecord(part: Partial<PhysiologyRecord> = {}): PhysiologyRecord {
  return {
    recordId: `test:${randomUUID()}`,
    nameAsPrinted: 'Testudiculus numero',
    quantity: 'critical-thermal-maximum',
    lethalPercent: null,
    lifeStage: 'unspecified',
    meanC: 41.25,
    lowC: null,
    highC: null,
    sdC: 0.5,
    seC: null,
    n: 12,
    level: 'study',
    sourceId: null,
    sourceAsPrinted: 'Nobody 1999',
    facts: { ramp: '1' },
    ...part,
  }
}

/** A record set with the item of a page that names it. */
export function makeDatasetItem(
  datasetId: string,
  records: PhysiologyRecord[],
): { item: ItemOf<'physiology'>; recordSet: RecordSetInput } {
  const hash = hashContent(records)
  const row = { form: 'dataset' as const, datasetId, recordSetHash: hash }
  return {
    item: { itemId: randomUUID(), parentItemId: null, kind: 'physiology', row },
    recordSet: { hash, datasetId, records },
  }
}

/** Saves a source of the demonstration in a transaction of its own and gives its id. */
export async function addSource(
  dataSource: DataSource,
  part: Partial<SaveSourceInput> = {},
): Promise<string> {
  const input: SaveSourceInput = {
    doi: null,
    kind: 'article',
    terms: null,
    csl: {
      type: 'article-journal',
      title: 'On tests',
      author: [{ family: 'Tester', given: 'T.' }],
      issued: { 'date-parts': [[2001]] },
    },
    reference: null,
    asPrinted: null,
    isInvented: true,
    broughtBy: { form: 'demonstration' },
    publishedAt: PUBLISHED_AT,
    ...part,
  }
  const { id } = await dataSource.transaction((db) => saveSource(db, input))
  return id
}

/** Records a version of a dataset and gives the version's id. */
export async function addDatasetVersion(
  db: EntityManager,
  datasetId: string,
  version = '1.0',
): Promise<string> {
  const { id } = await recordDatasetVersion(db, {
    dataset: {
      id: datasetId,
      title: `Dataset ${datasetId}`,
      version,
      doi: null,
      licence: 'CC0 1.0',
      licenceUrl: null,
      attribution: 'Nobody',
    },
    fileSha256: hashContent([datasetId, version]),
    importedAt: PUBLISHED_AT,
    rowsRead: 3,
    rowsAccepted: 2,
    rowsMerged: 0,
    rejected: [{ line: 4, reason: 'No value.' }],
  })
  return id
}

/** Publishes items in a transaction of their own: on a new page of an invented species, unless the part says otherwise. */
export function publish(
  dataSource: DataSource,
  items: PageItem[],
  part: Partial<PublishInput> = {},
): Promise<PublishedRevision> {
  return dataSource.transaction((db) =>
    publishRevision(db, {
      species: { isInvented: true },
      baseRevisionId: null,
      items,
      recordSets: [],
      summary: 'A test publishes this.',
      broughtBy: { form: 'demonstration' },
      publishedAt: PUBLISHED_AT,
      ...part,
    }),
  )
}
