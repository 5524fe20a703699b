import type { EvidenceKind } from '../../shared/evidence.js'
import type { ClassificationRow, NameRow } from '../../shared/names.js'
import type { Quantity } from '../../shared/physiology.js'
import type {
  LifeStage,
  Period,
  Position,
  RecordLifeStage,
  Season,
  UvMeaning,
  UvZone,
} from '../../shared/ranges.js'
import type { TemperatureUnit } from '../../shared/units.js'
import type { DemonstrationEvidence, DemonstrationPhysiology, DemonstrationRange } from './content.js'
import type { SourceKey } from './sources.js'

const PROVENANCE = 'Invented for the demonstration'

type Bounds = readonly [low: string | null, high: string | null]

interface RangeOptions {
  lifeStage?: LifeStage
  season?: Season
  lowerLimit?: string
  upperLimit?: string
  unit?: TemperatureUnit
  zone?: UvZone
  note?: string
}

function makeRange(
  keys: Pick<DemonstrationRange, 'parameter' | 'position' | 'period'> & { uvMeaning?: UvMeaning },
  [low, high]: Bounds,
  options: RangeOptions,
  evidence: DemonstrationEvidence[],
): DemonstrationRange {
  return {
    parameter: keys.parameter,
    position: keys.position,
    period: keys.period,
    season: options.season ?? 'any',
    lifeStage: options.lifeStage ?? 'any',
    low,
    high,
    lowerLimit: options.lowerLimit ?? null,
    upperLimit: options.upperLimit ?? null,
    unit: options.unit ?? 'degC',
    uvMeaning: keys.uvMeaning ?? null,
    uvZone: options.zone ?? null,
    note: options.note ?? null,
    evidence,
  }
}

/** A temperature range, °C unless the options say otherwise. */
export function temperature(
  position: Position,
  period: Period,
  bounds: Bounds,
  options: RangeOptions,
  evidence: DemonstrationEvidence[],
): DemonstrationRange {
  return makeRange({ parameter: 'temperature', position, period }, bounds, options, evidence)
}

/** A range of relative humidity in %. */
export function humidity(
  position: Position,
  period: Period,
  bounds: Bounds,
  options: RangeOptions,
  evidence: DemonstrationEvidence[],
): DemonstrationRange {
  return makeRange({ parameter: 'relative-humidity', position, period }, bounds, options, evidence)
}

/** A range of the UV index by day. */
export function uvIndex(
  position: Position,
  uvMeaning: UvMeaning,
  bounds: Bounds,
  options: RangeOptions,
  evidence: DemonstrationEvidence[],
): DemonstrationRange {
  return makeRange({ parameter: 'uv-index', position, period: 'day', uvMeaning }, bounds, options, evidence)
}

/** Hours of light a day. */
export function photoperiod(
  bounds: Bounds,
  options: RangeOptions,
  evidence: DemonstrationEvidence[],
): DemonstrationRange {
  return makeRange(
    { parameter: 'photoperiod', position: 'whole-enclosure', period: 'any' },
    bounds,
    options,
    evidence,
  )
}

/** Hours a day with the basking lamp on. */
export function baskingHours(
  bounds: Bounds,
  options: RangeOptions,
  evidence: DemonstrationEvidence[],
): DemonstrationRange {
  return makeRange(
    { parameter: 'basking-heat-hours', position: 'basking-surface', period: 'day' },
    bounds,
    options,
    evidence,
  )
}

interface EvidenceOptions {
  unit?: TemperatureUnit
  kind?: EvidenceKind
  n?: number
}

function makeEvidence(
  source: SourceKey,
  locator: string | null,
  numbers: Pick<DemonstrationEvidence, 'statement'> & Partial<DemonstrationEvidence>,
  options: EvidenceOptions,
): DemonstrationEvidence {
  return {
    source,
    locator,
    low: null,
    high: null,
    mean: null,
    sd: null,
    n: options.n ?? null,
    unit: options.unit ?? 'degC',
    kind: options.kind ?? null,
    ...numbers,
  }
}

/** "From low to high." */
export function between(
  source: SourceKey,
  locator: string | null,
  low: string,
  high: string,
  options: EvidenceOptions = {},
): DemonstrationEvidence {
  return makeEvidence(source, locator, { statement: 'interval', low, high }, options)
}

/** "From low to high", printed in °F. */
export function betweenF(
  source: SourceKey,
  locator: string | null,
  low: string,
  high: string,
): DemonstrationEvidence {
  return between(source, locator, low, high, { unit: 'degF' })
}

/** "Mean ± standard deviation of n." */
export function meanOf(
  source: SourceKey,
  locator: string,
  mean: string,
  sd: string,
  n: number,
): DemonstrationEvidence {
  return makeEvidence(source, locator, { statement: 'mean-sd', mean, sd }, { n })
}

/** A single number. */
export function value(
  source: SourceKey,
  locator: string,
  mean: string,
  options: EvidenceOptions = {},
): DemonstrationEvidence {
  return makeEvidence(source, locator, { statement: 'value', mean }, options)
}

export function atLeast(source: SourceKey, locator: string, low: string): DemonstrationEvidence {
  return makeEvidence(source, locator, { statement: 'at-least', low }, {})
}

export function atMost(source: SourceKey, locator: string, high: string): DemonstrationEvidence {
  return makeEvidence(source, locator, { statement: 'at-most', high }, {})
}

/** A cited statement about the body in °C. */
export function body(
  quantity: Quantity,
  lifeStage: RecordLifeStage,
  source: SourceKey,
  locator: string,
  [mean, sd]: readonly [mean: string, sd: string | null],
  n: number,
): DemonstrationPhysiology {
  return { quantity, lifeStage, source, locator, mean, sd, n }
}

/** The names of an invented species. */
export function namesOf(names: {
  scientific: string
  authority: string
  synonyms: readonly string[]
  common: readonly string[]
}): NameRow[] {
  const provenance = PROVENANCE
  return [
    {
      kind: 'scientific',
      name: names.scientific,
      authority: names.authority,
      status: 'accepted',
      language: null,
      provenance,
    },
    ...names.synonyms.map((name): NameRow => ({
      kind: 'synonym',
      name,
      authority: null,
      status: null,
      language: null,
      provenance,
    })),
    ...names.common.map((name): NameRow => ({
      kind: 'common',
      name,
      authority: null,
      status: null,
      language: 'en',
      provenance,
    })),
  ]
}

/** The classification of an invented species: class and order exist, the family is invented too. */
export function classificationOf(
  row: Pick<ClassificationRow, 'class' | 'order' | 'suborder' | 'family' | 'activeTime' | 'microhabitat'>,
): ClassificationRow {
  return { ...row, conservation: null, region: 'Sulenmark, an invented country', provenance: PROVENANCE }
}
