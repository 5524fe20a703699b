import { PHYSICAL_BOUNDS } from '../checker/physical-bounds.js'
import type { EvidenceRow } from '../evidence.js'
import type { Parameter, RangeRow } from '../ranges.js'
import type { CitedRange, SpeciesPage } from '../species.js'
import type { Lint } from './lint.js'
import { makeLint } from './lint-table.js'

function isImpossible(parameter: Parameter, value: number | null): boolean {
  if (value === null) return false
  const { low, high } = PHYSICAL_BOUNDS[parameter]
  return !Number.isFinite(value) || value < low || (high !== null && value > high)
}

/** Blocks a range whose bounds, or whose limits, are the wrong way round. */
export function lintBoundOrder(ranges: readonly CitedRange[]): Lint[] {
  return ranges
    .filter(({ row }) => {
      const isOver = row.low !== null && row.high !== null && row.low > row.high
      const isLimitOver =
        row.lowerLimit !== null && row.upperLimit !== null && row.lowerLimit >= row.upperLimit
      return isOver || isLimitOver
    })
    .map(({ itemId }) => makeLint('low-over-high', [itemId]))
}

/** Whether a limit lies in a range, ends counted in, or on the far side of it. */
export function isLimitInside(
  limits: Pick<RangeRow, 'lowerLimit' | 'upperLimit'>,
  row: Pick<RangeRow, 'low' | 'high'>,
): boolean {
  const lowest = row.low ?? row.high
  const highest = row.high ?? row.low
  if (lowest === null || highest === null) return false
  const { lowerLimit, upperLimit } = limits
  return (lowerLimit !== null && lowerLimit >= lowest) || (upperLimit !== null && upperLimit <= highest)
}

/** Blocks a range that holds one of its own limits. */
export function lintOwnLimits(ranges: readonly CitedRange[]): Lint[] {
  return ranges
    .filter(({ row }) => isLimitInside(row, row))
    .map(({ itemId }) => makeLint('limit-inside-range', [itemId]))
}

/** Blocks exposure zones other than the four published ones; looks at drafts too, where any number may stand. */
export function lintZones(
  ranges: readonly { itemId: string; row: { parameter: Parameter; uvZone: number | null } }[],
): Lint[] {
  return ranges
    .filter(({ row: { uvZone } }) => uvZone !== null && ![1, 2, 3, 4].includes(uvZone))
    .map(({ itemId }) => makeLint('zone-outside-1-to-4', [itemId]))
}

function hasImpossibleNumber(parameter: Parameter, row: EvidenceRow): boolean {
  return [row.low, row.high, row.mean].some((value) => isImpossible(parameter, value))
}

/** Blocks values that cannot be: bounds, limits, evidence and physiology, and a relative humidity under water. */
export function lintImpossible(page: Pick<SpeciesPage, 'ranges' | 'physiology'>): Lint[] {
  const lints: Lint[] = []
  for (const { itemId, row, evidence } of page.ranges) {
    const bounds = [row.low, row.high, row.lowerLimit, row.upperLimit]
    const isWaterHumidity = row.parameter === 'relative-humidity' && row.position === 'water'
    if (isWaterHumidity || bounds.some((bound) => isImpossible(row.parameter, bound))) {
      lints.push(makeLint('physically-impossible', [itemId]))
    }
    for (const piece of evidence) {
      if (hasImpossibleNumber(row.parameter, piece.row)) {
        lints.push(makeLint('physically-impossible', [itemId, piece.itemId]))
      }
    }
  }
  for (const { itemId, row } of page.physiology) {
    if (row.form !== 'cited') continue
    if ([row.meanC, row.lowC, row.highC].some((value) => isImpossible('temperature', value))) {
      lints.push(makeLint('physically-impossible', [itemId]))
    }
  }
  return lints
}
