import { countDecimals, formatNumber } from '../../../shared/format.js'
import { UNIT_LABELS } from '../../../shared/labels.js'
import type { Axis } from './axis.js'

/** A number of the axis as it is written under it; all numbers of one axis have the same count of decimals. */
export function describeTick(axis: Axis, value: number, withUnit = false): string {
  const decimals = Math.max(0, ...axis.ticks.map((tick) => countDecimals(tick, 2)))
  const number = formatNumber(value, decimals)
  return withUnit ? `${number} ${UNIT_LABELS[axis.unit]}` : number
}
