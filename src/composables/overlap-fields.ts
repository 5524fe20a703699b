import { PHYSICAL_BOUNDS } from '../../shared/checker/physical-bounds.js'
import type { OverlapFilter } from '../../shared/search.js'
import { readOverlap, writeOverlap, type QueryParameters } from '../../shared/search-query.js'
import { UNIT_LABELS } from '../../shared/labels.js'
import { toReaderUnit, formatBounds, writeBoundsWithUnit } from '../../shared/format.js'
import type { Parameter } from '../../shared/ranges.js'
import { toCanonical, type TemperatureUnit, type Unit } from '../../shared/units.js'

/** The fields of the form that adds an overlap filter, as typed; bounds in the reader's unit. */
export interface OverlapFields {
  parameter: string
  position: string
  period: string
  from: string
  to: string
}

/** Names of those fields in a form that is sent without script. */
export const OVERLAP_FIELD_NAMES = {
  parameter: 'addParameter',
  position: 'addPosition',
  period: 'addPeriod',
  from: 'addFrom',
  to: 'addTo',
} as const

const CANONICAL_UNITS: Record<Parameter, Unit> = {
  temperature: 'degC',
  'relative-humidity': 'percentRh',
  'uv-index': 'uvi',
  photoperiod: 'h',
  'basking-heat-hours': 'h',
}

/** The unit a reader types and sees a parameter in. */
export function toParameterUnit(parameter: Parameter, temperatureUnit: TemperatureUnit): Unit {
  return toReaderUnit(CANONICAL_UNITS[parameter], { temperature: temperatureUnit, length: 'cm' })
}

function isParameter(text: string): text is Parameter {
  return text in CANONICAL_UNITS
}

/** A bound as typed, with comma or point: null where empty, NaN where it is no number. */
function readBound(text: string, unit: Unit): number | null {
  const plain = text.trim().replace(',', '.').replace('−', '-')
  if (plain === '') return null
  return /^-?\d+(\.\d+)?$/.test(plain) ? toCanonical(Number(plain), unit) : Number.NaN
}

/** The filter that the fields describe, or a sentence that says what is wrong with them. */
export function readOverlapFields(
  fields: OverlapFields,
  temperatureUnit: TemperatureUnit,
): OverlapFilter | string {
  if (!isParameter(fields.parameter)) return 'Choose what is measured.'
  const unit = toParameterUnit(fields.parameter, temperatureUnit)
  const low = readBound(fields.from, unit)
  const high = readBound(fields.to, unit)
  if (low === null && high === null) return 'Type at least one of the two bounds.'
  if (Number.isNaN(low) || Number.isNaN(high)) return 'A bound is a number, such as 35 or 35.5.'
  const { low: floor, high: ceiling } = PHYSICAL_BOUNDS[fields.parameter]
  for (const bound of [low, high]) {
    if (bound !== null && (bound < floor || (ceiling !== null && bound > ceiling))) {
      return `There is no such ${UNIT_LABELS[unit]}.`
    }
  }
  if (low !== null && high !== null && low > high) return 'The lower bound is above the upper one.'
  const side = (bound: number | null): string => (bound === null ? '' : String(Math.round(bound * 1e4) / 1e4))
  return readOverlap(`${fields.parameter}.${fields.position}.${fields.period}.${side(low)}_${side(high)}`)
}

/**
 * Folds the fields of a form sent without script into the `overlap` parameter. Gives the query that the address should
 * have instead, or null where there are no such fields. Fields left open or mistyped are dropped.
 */
export function foldOverlapFields(
  parameters: QueryParameters,
  temperatureUnit: TemperatureUnit,
): QueryParameters | null {
  const names: readonly string[] = Object.values(OVERLAP_FIELD_NAMES)
  if (!names.some((name) => name in parameters)) return null
  const one = (name: string): string => [parameters[name]].flat()[0] ?? ''
  const filter = readOverlapFields(
    {
      parameter: one(OVERLAP_FIELD_NAMES.parameter),
      position: one(OVERLAP_FIELD_NAMES.position),
      period: one(OVERLAP_FIELD_NAMES.period),
      from: one(OVERLAP_FIELD_NAMES.from),
      to: one(OVERLAP_FIELD_NAMES.to),
    },
    temperatureUnit,
  )
  const rest = Object.fromEntries(Object.entries(parameters).filter(([name]) => !names.includes(name)))
  if (typeof filter === 'string') return rest
  return { ...rest, overlap: [...[rest.overlap ?? []].flat(), writeOverlap(filter)] }
}

/** The bounds of a filter in words and in the reader's unit: "35 – 40 °C", "at most 22 °C". */
export function describeOverlapBounds(filter: OverlapFilter, temperatureUnit: TemperatureUnit): string {
  const unit = toParameterUnit(filter.parameter, temperatureUnit)
  return writeBoundsWithUnit(formatBounds(filter.low, filter.high, unit))
}
