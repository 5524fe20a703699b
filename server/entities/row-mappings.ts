import type { ItemKind } from '../../shared/revisions.js'

/** A field of a row's JSON and the column it stands in; or an object of fields, null as a whole where its flag says so. */
type Field =
  { key: string; column: string; type: string } | { key: string; fields: Field[]; presence: string | null }

type Content = Readonly<Record<string, unknown>>

function toColumnName(key: string): string {
  return key.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`)
}

function fields(type: string, ...keys: string[]): Field[] {
  return keys.map((key) => ({ key, column: toColumnName(key), type }))
}

function nested(key: string, keys: string[], presence: string | null): Field {
  const texts = keys.map((inner) => ({ key: inner, column: `${key}_${toColumnName(inner)}`, type: 'text' }))
  return { key, fields: texts, presence }
}

const PRINTED = nested('printed', ['low', 'high', 'mean', 'sd', 'unit'], null)

const RANGE_FIELDS = [
  ...fields('text', 'parameter', 'position', 'period', 'season', 'lifeStage'),
  ...fields('double precision', 'low', 'high', 'lowerLimit', 'upperLimit'),
  ...fields('text', 'typedUnit'),
  nested('typed', ['low', 'high', 'lowerLimit', 'upperLimit'], 'has_typed'),
  ...fields('text', 'uvMeaning'),
  ...fields('smallint', 'uvZone'),
  ...fields('text', 'note'),
]
const EVIDENCE_FIELDS = [
  ...fields('uuid', 'sourceId'),
  ...fields('text', 'kind', 'locator', 'statement'),
  PRINTED,
  ...fields('double precision', 'low', 'high', 'mean', 'sd'),
  ...fields('bigint', 'n'),
  ...fields('text', 'note'),
]
const DATASET_PHYSIOLOGY_FIELDS = [
  ...fields('text', 'form', 'datasetId'),
  ...fields('bytea', 'recordSetHash'),
]
const CITED_PHYSIOLOGY_FIELDS = [
  ...fields('text', 'form', 'quantity', 'lifeStage'),
  ...fields('uuid', 'sourceId'),
  ...fields('text', 'locator'),
  PRINTED,
  ...fields('double precision', 'meanC', 'lowC', 'highC', 'sdC'),
  ...fields('bigint', 'n'),
  ...fields('text', 'note'),
]
const NAME_FIELDS = fields('text', 'kind', 'name', 'authority', 'status', 'language', 'provenance')
const CLASSIFICATION_FIELDS = fields(
  'text',
  'class',
  'order',
  'suborder',
  'family',
  'conservation',
  'activeTime',
  'microhabitat',
  'region',
  'provenance',
)
const PROSE_FIELDS = fields('text', 'heading', 'markdown')
const IMAGE_FIELDS = [
  ...fields('uuid', 'mediaId'),
  ...fields('text', 'alternativeText', 'caption', 'licence', 'credit'),
]
const RECORD_FIELDS = [
  ...fields('text', 'recordId', 'nameAsPrinted', 'quantity'),
  ...fields('smallint', 'lethalPercent'),
  ...fields('text', 'lifeStage'),
  ...fields('double precision', 'meanC', 'lowC', 'highC', 'sdC', 'seC'),
  ...fields('bigint', 'n'),
  ...fields('text', 'level'),
  ...fields('uuid', 'sourceId'),
  ...fields('text', 'sourceAsPrinted'),
  ...fields('jsonb', 'facts'),
]

/** How one kind of row stands in its table, in both directions, so that a row read back has the hash it was stored under. */
export interface RowMapping {
  table: string
  /** Column names, quoted, with their PostgreSQL types; `hash` not among them. */
  columns: ReadonlyMap<string, string>
  /** The row's content by column name. */
  toColumns: (row: Content) => Record<string, unknown>
  /** An SQL expression that gives the row's content as JSON, read from the table under an alias. */
  toJson: (alias: string) => string
}

function quote(column: string): string {
  return `"${column}"`
}

function flatten(list: readonly Field[]): Map<string, string> {
  const columns = new Map<string, string>()
  for (const field of list) {
    if ('column' in field) columns.set(quote(field.column), field.type)
    else {
      if (field.presence !== null) columns.set(quote(field.presence), 'boolean')
      for (const [name, type] of flatten(field.fields)) columns.set(name, type)
    }
  }
  return columns
}

function isContent(value: unknown): value is Content {
  return typeof value === 'object' && value !== null
}

function writeColumns(list: readonly Field[], content: Content): Record<string, unknown> {
  const columns: Record<string, unknown> = {}
  for (const field of list) {
    const value = content[field.key]
    if ('column' in field) {
      columns[field.column] = field.type === 'bytea' && typeof value === 'string' ? `\\x${value}` : value
    } else {
      if (field.presence !== null) columns[field.presence] = isContent(value)
      if (isContent(value)) Object.assign(columns, writeColumns(field.fields, value))
    }
  }
  return columns
}

function readJson(list: readonly Field[], alias: string): string {
  const pairs = list.map((field) => {
    if ('column' in field) {
      const column = `${alias}.${quote(field.column)}`
      return `'${field.key}', ${field.type === 'bytea' ? `encode(${column}, 'hex')` : column}`
    }
    const inner = readJson(field.fields, alias)
    return `'${field.key}', ${field.presence === null ? inner : `case when ${alias}.${field.presence} then ${inner} end`}`
  })
  return `json_build_object(${pairs.join(', ')})`
}

function mapping(table: string, list: readonly Field[]): RowMapping {
  return {
    table,
    columns: flatten(list),
    toColumns: (row) => writeColumns(list, row),
    toJson: (alias) => readJson(list, alias),
  }
}

const physiologyMapping: RowMapping = {
  ...mapping('physiology_row', [...DATASET_PHYSIOLOGY_FIELDS, ...CITED_PHYSIOLOGY_FIELDS]),
  toColumns: (row) =>
    writeColumns(row['form'] === 'dataset' ? DATASET_PHYSIOLOGY_FIELDS : CITED_PHYSIOLOGY_FIELDS, row),
  toJson: (alias) =>
    `case ${alias}.form when 'dataset' then ${readJson(DATASET_PHYSIOLOGY_FIELDS, alias)} ` +
    `else ${readJson(CITED_PHYSIOLOGY_FIELDS, alias)} end`,
}

/** The table of each kind of item. */
export const ROW_MAPPINGS: Readonly<Record<ItemKind, RowMapping>> = {
  range: mapping('range_row', RANGE_FIELDS),
  evidence: mapping('evidence_row', EVIDENCE_FIELDS),
  physiology: physiologyMapping,
  name: mapping('name_row', NAME_FIELDS),
  classification: mapping('classification_row', CLASSIFICATION_FIELDS),
  prose: mapping('prose_row', PROSE_FIELDS),
  image: mapping('image_row', IMAGE_FIELDS),
}

/** The table of the records of datasets. */
export const RECORD_MAPPING: RowMapping = mapping('physiology_record', RECORD_FIELDS)
