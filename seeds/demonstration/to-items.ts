import type { EvidenceRow, PrintedNumbers } from '../../shared/evidence.js'
import type { PhysiologyRow } from '../../shared/physiology.js'
import { parsePrintedNumber } from '../../shared/printed-numbers.js'
import type { Parameter, RangeRow } from '../../shared/ranges.js'
import type { PageItem } from '../../shared/revisions.js'
import { differenceToCanonical, toCanonical } from '../../shared/units.js'
import type { Unit } from '../../shared/units.js'
import type {
  DemonstrationContent,
  DemonstrationEvidence,
  DemonstrationPhysiology,
  DemonstrationRange,
} from './content.js'
import { toItemId } from './item-ids.js'
import { SOURCES } from './sources.js'
import type { SourceKey } from './sources.js'

/** The id under which each invented source was saved. */
export type SourceIds = ReadonlyMap<SourceKey, string>

const CANONICAL_UNITS: Readonly<Record<Exclude<Parameter, 'temperature'>, Unit>> = {
  'relative-humidity': 'percentRh',
  'uv-index': 'uvi',
  photoperiod: 'h',
  'basking-heat-hours': 'h',
}

function readNumber(text: string): number {
  const number = parsePrintedNumber(text)
  if (number === null) throw new Error(`The scenario prints "${text}" where a number belongs`)
  return number
}

function convert(text: string | null, unit: Unit): number | null {
  return text === null ? null : toCanonical(readNumber(text), unit)
}

function requireSourceId(sourceIds: SourceIds, key: SourceKey): string {
  const id = sourceIds.get(key)
  if (id === undefined) throw new Error(`The scenario's source ${key} was not saved`)
  return id
}

function toRangeRow(range: DemonstrationRange): RangeRow {
  const { evidence: _, unit: temperatureUnit, low, high, lowerLimit, upperLimit, ...keys } = range
  const unit = range.parameter === 'temperature' ? temperatureUnit : CANONICAL_UNITS[range.parameter]
  return {
    ...keys,
    low: convert(low, unit),
    high: convert(high, unit),
    lowerLimit: convert(lowerLimit, unit),
    upperLimit: convert(upperLimit, unit),
    typedUnit: unit,
    typed: unit === 'degF' ? { low, high, lowerLimit, upperLimit } : null,
  }
}

function toEvidenceRow(
  evidence: DemonstrationEvidence,
  parameter: Parameter,
  sourceIds: SourceIds,
): EvidenceRow {
  const { low, high, mean, sd, n, locator, statement } = evidence
  const unit = parameter === 'temperature' ? evidence.unit : CANONICAL_UNITS[parameter]
  return {
    sourceId: requireSourceId(sourceIds, evidence.source),
    kind: evidence.kind ?? SOURCES[evidence.source].evidenceKind,
    locator,
    statement,
    printed: { low, high, mean, sd, unit },
    low: convert(low, unit),
    high: convert(high, unit),
    mean: convert(mean, unit),
    sd: sd === null ? null : differenceToCanonical(readNumber(sd), unit),
    n,
    note: null,
  }
}

function toPhysiologyRow(physiology: DemonstrationPhysiology, sourceIds: SourceIds): PhysiologyRow {
  const { quantity, lifeStage, source, locator, mean, sd, n } = physiology
  const printed: PrintedNumbers = { low: null, high: null, mean, sd, unit: 'degC' }
  return {
    form: 'cited',
    quantity,
    lifeStage,
    sourceId: requireSourceId(sourceIds, source),
    locator,
    printed,
    meanC: readNumber(mean),
    lowC: null,
    highC: null,
    sdC: sd === null ? null : readNumber(sd),
    n,
    note: null,
  }
}

/** Puts the saved source's id in place of its key in each citation. */
function citeById(markdown: string, sourceIds: SourceIds): string {
  return markdown.replace(/\[@([a-z-]+)(?=[\],])/g, (_, key: string) => {
    if (!(key in SOURCES)) throw new Error(`The scenario's prose cites ${key}, which is no source of it`)
    return `[@${requireSourceId(sourceIds, key as SourceKey)}`
  })
}

function toRangeItems(speciesKey: string, range: DemonstrationRange, sourceIds: SourceIds): PageItem[] {
  const row = toRangeRow(range)
  const keys = [row.parameter, row.position, row.period, row.season, row.lifeStage, row.uvMeaning ?? '']
  const name = `${speciesKey}/range/${keys.join('.')}`
  const itemId = toItemId(name)
  const spoken = new Map<SourceKey, number>()
  const evidence = range.evidence.map((piece): PageItem => {
    // A source that speaks twice of one range has two items.
    const time = (spoken.get(piece.source) ?? 0) + 1
    spoken.set(piece.source, time)
    return {
      itemId: toItemId(`${name}/evidence/${piece.source}/${time}`),
      parentItemId: itemId,
      kind: 'evidence',
      row: toEvidenceRow(piece, row.parameter, sourceIds),
    }
  })
  return [{ itemId, parentItemId: null, kind: 'range', row }, ...evidence]
}

/**
 * The items of an invented page in the order they are shown. An item's id comes from what it is about, so that it stays the same
 * from revision to revision and from one installation to the next.
 */
export function toItems(speciesKey: string, content: DemonstrationContent, sourceIds: SourceIds): PageItem[] {
  const place = (name: string) => ({ itemId: toItemId(`${speciesKey}/${name}`), parentItemId: null })
  return [
    ...content.names.map((row): PageItem => ({
      ...place(`name/${row.kind}/${row.name}`),
      kind: 'name',
      row,
    })),
    { ...place('classification'), kind: 'classification', row: content.classification },
    ...content.ranges.flatMap((range) => toRangeItems(speciesKey, range, sourceIds)),
    ...content.physiology.map((physiology): PageItem => ({
      ...place(`physiology/${physiology.quantity}/${physiology.lifeStage}/${physiology.source}`),
      kind: 'physiology',
      row: toPhysiologyRow(physiology, sourceIds),
    })),
    ...content.prose.map(({ key, heading, markdown }): PageItem => ({
      ...place(`prose/${key}`),
      kind: 'prose',
      row: { heading, markdown: citeById(markdown, sourceIds) },
    })),
  ]
}
