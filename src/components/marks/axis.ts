import type { Unit } from '../../../shared/units.js'

/** A measured line: from `min` to `max` in the reader's unit, with round numbers to mark. */
export interface Axis {
  min: number
  max: number
  ticks: number[]
  unit: Unit
}

/** Shares of the line are written as percentages of a drawing, with as many digits as a wide screen has pixels. */
const SHARE_DIGITS = 2
const TICKS_WANTED = 6
/** Space left beside the outermost number, as a share of the span of all numbers. */
const MARGIN = 0.08
/** The least span worth drawing, so that a single value does not become a line of its last digit. */
const LEAST_SPAN: Record<Unit, number> = { degC: 8, degF: 15, percentRh: 20, uvi: 2, h: 4, cm: 10, in: 4 }

function niceStep(span: number, ticksWanted: number): number {
  const raw = span / ticksWanted
  const power = 10 ** Math.floor(Math.log10(raw))
  const share = raw / power
  return (share <= 1 ? 1 : share <= 2 ? 2 : share <= 5 ? 5 : 10) * power
}

function listTicks(min: number, max: number, step: number): number[] {
  const count = Math.round((max - min) / step)
  // Multiplied, not summed: sums drift in the last digit.
  return Array.from({ length: count + 1 }, (_, index) =>
    Number(((Math.round(min / step) + index) * step).toFixed(6)),
  )
}

function fixedAxis(unit: Unit): Axis | null {
  if (unit === 'percentRh') return { min: 0, max: 100, ticks: [0, 25, 50, 75, 100], unit }
  if (unit === 'h') return { min: 0, max: 24, ticks: [0, 6, 12, 18, 24], unit }
  return null
}

/**
 * The axis that holds all the values (in the reader's unit) with round ends and round ticks. Humidity and hours always
 * show their whole scale unless `isClose` asks for a near look, and never leave it; a UV index starts at zero.
 */
export function chooseAxis(values: readonly number[], unit: Unit, isClose = false): Axis {
  const fixed = fixedAxis(unit)
  const known = values.filter((value) => Number.isFinite(value))
  if (fixed !== null && (!isClose || known.length === 0)) return fixed
  // A UV index is read against none at all, so its line starts there.
  const lowest = known.length === 0 || unit === 'uvi' ? 0 : Math.min(...known)
  const highest = known.length === 0 ? LEAST_SPAN[unit] : Math.max(...known)
  const missing = Math.max(0, LEAST_SPAN[unit] - (highest - lowest)) / 2
  const margin = known.length === 0 ? 0 : (highest - lowest + 2 * missing) * MARGIN
  const floor = unit === 'uvi' ? 0 : (fixed?.min ?? -Infinity)
  const ceiling = fixed?.max ?? Infinity
  const low = Math.max(floor, lowest - missing - margin)
  const high = Math.min(ceiling, highest + missing + margin)
  const step = niceStep(high - low, TICKS_WANTED)
  const min = Math.floor(low / step + 1e-9) * step
  const max = Math.min(ceiling, Math.ceil(high / step - 1e-9) * step)
  return { min, max, ticks: listTicks(min, max, step), unit }
}

/** Where a value lies on the axis, 0 at its start and 1 at its end; a value off the axis lies on its end. */
export function toShare(axis: Axis, value: number): number {
  return Math.min(1, Math.max(0, (value - axis.min) / (axis.max - axis.min)))
}

/** The same as a percentage for a drawing. */
export function toPercent(axis: Axis, value: number): string {
  return `${Number((toShare(axis, value) * 100).toFixed(SHARE_DIGITS))}%`
}

/** The width of an interval as a percentage for a drawing. */
export function toPercentWidth(axis: Axis, low: number, high: number): string {
  return `${Number(((toShare(axis, high) - toShare(axis, low)) * 100).toFixed(SHARE_DIGITS))}%`
}

/** Whether a number is within the axis or has to be shown as lying past its end. */
export function isOnAxis(axis: Axis, value: number): boolean {
  return value >= axis.min && value <= axis.max
}
