import {
  canRead,
  defaultAccuracy,
  instrumentKindSchema,
  INSTRUMENTS,
  type InstrumentKind,
} from '../../shared/checker/instruments.js'
import { UNITS_OF_PARAMETER } from '../../shared/checker/reading.js'
import { countDecimals, formatNumber } from '../../shared/format.js'
import { UNIT_LABELS } from '../../shared/labels.js'
import type { Parameter, Position } from '../../shared/ranges.js'
import { differenceFromCanonical, type TemperatureUnit, type Unit } from '../../shared/units.js'

/** The kinds of instrument that read a parameter. */
export function listInstruments(parameter: Parameter): InstrumentKind[] {
  return instrumentKindSchema.options.filter((kind) => canRead(kind, parameter))
}

/** The kind a row starts with: a surface under a lamp is read from afar, the rest with a probe (common practice, no source). */
export function chooseInstrument(parameter: Parameter, position: Position): InstrumentKind {
  switch (parameter) {
    case 'temperature':
      return position === 'basking-surface' ? 'infrared-thermometer' : 'probe-thermometer'
    case 'relative-humidity':
      return 'capacitive-hygrometer'
    case 'uv-index':
      return 'uv-index-meter'
    case 'photoperiod':
    case 'basking-heat-hours':
      return 'timer'
  }
}

/** The unit a row starts with. */
export function chooseUnit(parameter: Parameter, temperatureUnit: TemperatureUnit): Unit {
  return parameter === 'temperature' ? temperatureUnit : UNITS_OF_PARAMETER[parameter][0]
}

function writeShort(value: number): string {
  return formatNumber(value, countDecimals(value, 2))
}

/** What a constant part of an accuracy is counted in: points for humidity, else the unit. */
export function describeAbsoluteUnit(unit: Unit): string {
  return unit === 'percentRh' ? 'points' : UNIT_LABELS[unit]
}

/** A kind's usual accuracy in words: "±2 °C or ±2 % of the reading, whichever is larger". */
export function describeAccuracy(kind: InstrumentKind, unit: Unit): string {
  const { absolute, relativePercent } = defaultAccuracy(kind, unit)
  const constant = absolute === null ? null : `±${writeShort(absolute)} ${describeAbsoluteUnit(unit)}`
  const part = relativePercent === null ? null : `±${writeShort(relativePercent)} % of the reading`
  if (constant !== null && part !== null) return `${constant} or ${part}, whichever is larger`
  return constant ?? part ?? ''
}

/** The usual numbers of a kind as the texts a field shows while it is empty. */
export function listUsualTexts(kind: InstrumentKind, unit: Unit) {
  const { absolute, relativePercent } = defaultAccuracy(kind, unit)
  return {
    absolute: absolute === null ? '' : writeShort(absolute),
    relativePercent: relativePercent === null ? '' : writeShort(relativePercent),
    resolution: writeShort(differenceFromCanonical(INSTRUMENTS[kind].resolution, unit)),
  }
}
