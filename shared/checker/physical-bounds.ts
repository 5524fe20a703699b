import type { Parameter } from '../ranges.js'
import { toCanonical } from '../units.js'
import type { Unit } from '../units.js'

/** Absolute zero, exact by definition of the degree Celsius (SI brochure, 9th edition, section 2.3.1). */
export const ABSOLUTE_ZERO_C = -273.15

/** Lowest and highest value nature allows, in canonical units; null where there is none. */
export const PHYSICAL_BOUNDS: Readonly<Record<Parameter, { low: number; high: number | null }>> = {
  temperature: { low: ABSOLUTE_ZERO_C, high: null },
  'relative-humidity': { low: 0, high: 100 },
  'uv-index': { low: 0, high: null },
  photoperiod: { low: 0, high: 24 },
  'basking-heat-hours': { low: 0, high: 24 },
}

/** Why a value in `unit` cannot be, as a sentence for its field; null when it can be. */
export function findImpossibility(parameter: Parameter, value: number, unit: Unit): string | null {
  if (!Number.isFinite(value)) return 'This is not a number.'
  const canonical = toCanonical(value, unit)
  const { low, high } = PHYSICAL_BOUNDS[parameter]
  const isBelow = canonical < low
  const isAbove = high !== null && canonical > high
  if (!isBelow && !isAbove) return null
  switch (parameter) {
    case 'temperature':
      return 'Nothing is colder than absolute zero (−273.15 °C, −459.67 °F).'
    case 'relative-humidity':
      return 'Relative humidity lies between 0 and 100 %.'
    case 'uv-index':
      return 'A UV index is never below 0.'
    case 'photoperiod':
    case 'basking-heat-hours':
      return 'A day has between 0 and 24 hours.'
  }
}
