import type { EvidenceKind, Statement } from '../../shared/evidence.js'
import type { ClassificationRow, NameRow } from '../../shared/names.js'
import type { Quantity } from '../../shared/physiology.js'
import type {
  LifeStage,
  Parameter,
  Period,
  Position,
  RecordLifeStage,
  Season,
  UvMeaning,
  UvZone,
} from '../../shared/ranges.js'
import type { TemperatureUnit } from '../../shared/units.js'
import type { SourceKey } from './sources.js'

/** One statement of an invented source, numbers as that source prints them. */
export interface DemonstrationEvidence {
  source: SourceKey
  locator: string | null
  statement: Statement
  low: string | null
  high: string | null
  mean: string | null
  sd: string | null
  n: number | null
  /** Of a temperature; anything else is printed in its canonical unit. */
  unit: TemperatureUnit
  /** Null for the kind that the source usually gives. */
  kind: EvidenceKind | null
}

/** One range, numbers as typed. */
export interface DemonstrationRange {
  parameter: Parameter
  position: Position
  period: Period
  season: Season
  lifeStage: LifeStage
  low: string | null
  high: string | null
  lowerLimit: string | null
  upperLimit: string | null
  unit: TemperatureUnit
  uvMeaning: UvMeaning | null
  uvZone: UvZone | null
  note: string | null
  evidence: DemonstrationEvidence[]
}

/** One cited statement about the body, numbers as printed, °C. */
export interface DemonstrationPhysiology {
  quantity: Quantity
  lifeStage: RecordLifeStage
  source: SourceKey
  locator: string
  mean: string
  sd: string | null
  n: number
}

/** A section of prose; a citation names the source by its key, as in `[@field-stations, table 4]`. */
export interface DemonstrationProse {
  key: string
  heading: string
  markdown: string
}

/** Everything one revision of an invented page says. */
export interface DemonstrationContent {
  names: NameRow[]
  classification: ClassificationRow
  ranges: DemonstrationRange[]
  physiology: DemonstrationPhysiology[]
  prose: DemonstrationProse[]
}

export interface DemonstrationRevision {
  publishedAt: string
  summary: string
  content: DemonstrationContent
}

/** An invented species with every revision of its page, oldest first. */
export interface DemonstrationSpecies {
  /** Names the species in ids; never changed, so that links to its items last. */
  key: string
  revisions: [DemonstrationRevision, ...DemonstrationRevision[]]
}
