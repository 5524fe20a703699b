import { countDecimals, formatNumber } from '../format.js'
import { UNIT_LABELS } from '../labels.js'
import { fromCanonical } from '../units.js'
import type { Unit } from '../units.js'

/** Decimals beyond which a number is taken for one that a change of unit made, and written with one. */
const DECIMALS_KEPT = 2

/**
 * A canonical number in a reader's unit, exact to two decimals. A page may round a converted bound to whole degrees; a
 * verdict may not, or "above 115 °F" would be said of a reading of 114.9.
 */
export function writeNumber(canonical: number, shown: Unit): string {
  const value = fromCanonical(canonical, shown)
  const decimals = countDecimals(value, DECIMALS_KEPT + 1)
  const least = shown === 'uvi' ? 1 : 0
  return formatNumber(value, decimals > DECIMALS_KEPT ? 1 : Math.max(least, decimals))
}

/** The same with its unit: "114.8 °F". */
export function writeValue(canonical: number, shown: Unit): string {
  return `${writeNumber(canonical, shown)} ${UNIT_LABELS[shown]}`
}
