import { z } from 'zod'
import type { Parameter, Position } from '../ranges.js'
import { differenceFromCanonical } from '../units.js'
import type { Unit } from '../units.js'

/** Kinds of instrument a reading may come from. */
export const instrumentKindSchema = z.enum([
  'probe-thermometer',
  'infrared-thermometer',
  'dial-thermometer',
  'glass-thermometer',
  'capacitive-hygrometer',
  'dial-hygrometer',
  'uv-index-meter',
  'timer',
])
export type InstrumentKind = z.infer<typeof instrumentKindSchema>

/** What stands in where a keeper's own instrument data are not given, in canonical units. */
export interface InstrumentDefaults {
  label: string
  /** The parameters it can read; any other is refused. */
  parameters: readonly [Parameter, ...Parameter[]]
  /** The positions it can read well; null for every one. A reading elsewhere is asked back. */
  positions: readonly Position[] | null
  /** Accuracy as a limit ±a: a constant (a difference of temperatures in °C), a part of the reading in %, the larger of both. */
  accuracyAbsolute: number | null
  accuracyRelativePercent: number | null
  accuracySource: string
  resolution: number
  resolutionSource: string
  /** Standard deviation of repeats at one place, as kept from reading to reading by hand. */
  repeatability: number
  repeatabilitySource: string
}

const COMMON_PRACTICE = 'common practice, no source'
const FROM_MEMORY = 'from memory, not confirmed'
const SURFACES: readonly Position[] = [
  'basking-surface',
  'warm-hide',
  'cool-hide',
  'humid-hide',
  'shade',
  'substrate',
  'water',
]
const AWAY_FROM_BASKING_SURFACE: readonly Position[] = [
  'basking-air',
  'warm-end-air',
  'warm-hide',
  'cool-end-air',
  'cool-hide',
  'humid-hide',
  'shade',
  'substrate',
  'water',
  'whole-enclosure',
]
const AIR_AND_HIDES: readonly Position[] = AWAY_FROM_BASKING_SURFACE.filter(
  (position) => position !== 'substrate' && position !== 'water',
)

/** The kinds with their defaults, each default with its source. A keeper's own instrument data replace them. */
export const INSTRUMENTS: Readonly<Record<InstrumentKind, InstrumentDefaults>> = {
  'probe-thermometer': {
    label: 'Digital probe',
    parameters: ['temperature'],
    positions: null,
    accuracyAbsolute: 1,
    accuracyRelativePercent: null,
    accuracySource: `usual class of consumer thermistor data sheets, ±0.5 to ±1 °C; ${FROM_MEMORY}`,
    resolution: 0.1,
    resolutionSource: COMMON_PRACTICE,
    repeatability: 0.3,
    repeatabilitySource: COMMON_PRACTICE,
  },
  'infrared-thermometer': {
    label: 'Infrared thermometer',
    parameters: ['temperature'],
    positions: SURFACES,
    accuracyAbsolute: 2,
    accuracyRelativePercent: 2,
    accuracySource: `usual class of consumer data sheets, ±2 °C or ±2 % of the reading, whichever is larger; ${FROM_MEMORY}`,
    resolution: 0.1,
    resolutionSource: COMMON_PRACTICE,
    repeatability: 0.5,
    repeatabilitySource: COMMON_PRACTICE,
  },
  'dial-thermometer': {
    label: 'Dial thermometer',
    parameters: ['temperature'],
    positions: AIR_AND_HIDES,
    accuracyAbsolute: 3,
    accuracyRelativePercent: null,
    accuracySource: COMMON_PRACTICE,
    resolution: 1,
    resolutionSource: COMMON_PRACTICE,
    repeatability: 0.5,
    repeatabilitySource: COMMON_PRACTICE,
  },
  'glass-thermometer': {
    label: 'Glass thermometer',
    parameters: ['temperature'],
    positions: AWAY_FROM_BASKING_SURFACE,
    accuracyAbsolute: 1,
    accuracyRelativePercent: null,
    accuracySource: COMMON_PRACTICE,
    resolution: 0.5,
    resolutionSource: COMMON_PRACTICE,
    repeatability: 0.3,
    repeatabilitySource: COMMON_PRACTICE,
  },
  'capacitive-hygrometer': {
    label: 'Digital hygrometer',
    parameters: ['relative-humidity'],
    positions: null,
    accuracyAbsolute: 5,
    accuracyRelativePercent: null,
    accuracySource: `consumer instruments around a capacitive element of ±2 to ±3 points between 20 and 80 %; ${FROM_MEMORY}; widened for age and for readings outside that span: ${COMMON_PRACTICE}`,
    resolution: 1,
    resolutionSource: COMMON_PRACTICE,
    repeatability: 1,
    repeatabilitySource: COMMON_PRACTICE,
  },
  'dial-hygrometer': {
    label: 'Dial hygrometer',
    parameters: ['relative-humidity'],
    positions: null,
    accuracyAbsolute: 10,
    accuracyRelativePercent: null,
    accuracySource: COMMON_PRACTICE,
    resolution: 5,
    resolutionSource: COMMON_PRACTICE,
    repeatability: 2,
    repeatabilitySource: COMMON_PRACTICE,
  },
  'uv-index-meter': {
    label: 'UV index meter',
    parameters: ['uv-index'],
    positions: null,
    accuracyAbsolute: null,
    accuracyRelativePercent: 10,
    accuracySource:
      'calibration uncertainty of erythemal broadband meters, ±10 %, WMO-STUK intercomparison 1995; a hand-held meter before an uncommon lamp may be worse',
    resolution: 0.1,
    resolutionSource: COMMON_PRACTICE,
    repeatability: 0.1,
    repeatabilitySource: COMMON_PRACTICE,
  },
  timer: {
    label: 'Timer',
    parameters: ['photoperiod', 'basking-heat-hours'],
    positions: null,
    accuracyAbsolute: 0.25,
    accuracyRelativePercent: null,
    accuracySource: `segments of a mechanical timer, 15 min: ${COMMON_PRACTICE}`,
    resolution: 0.25,
    resolutionSource: COMMON_PRACTICE,
    repeatability: 0.05,
    repeatabilitySource: COMMON_PRACTICE,
  },
}

/** Whether this kind of instrument reads this parameter at all. */
export function canRead(kind: InstrumentKind, parameter: Parameter): boolean {
  return INSTRUMENTS[kind].parameters.includes(parameter)
}

/** Whether this kind of instrument reads well at a position: an infrared thermometer reads surfaces, never air. */
export function fitsPosition(kind: InstrumentKind, position: Position): boolean {
  return INSTRUMENTS[kind].positions?.includes(position) ?? true
}

/** The kind's usual accuracy with its constant part in `unit`, to fill a form or to stand in for an unstated one. */
export function defaultAccuracy(kind: InstrumentKind, unit: Unit) {
  const { accuracyAbsolute, accuracyRelativePercent } = INSTRUMENTS[kind]
  return {
    form: 'limit' as const,
    absolute: accuracyAbsolute === null ? null : differenceFromCanonical(accuracyAbsolute, unit),
    relativePercent: accuracyRelativePercent,
    combine: 'larger' as const,
  }
}
