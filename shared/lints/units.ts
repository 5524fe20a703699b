import { COOL_SEASONS } from '../checker/selection.js'
import type { EvidenceRow, PrintedNumbers } from '../evidence.js'
import { parsePrintedNumber } from '../printed-numbers.js'
import type { RangeRow } from '../ranges.js'
import type { CitedRange, SpeciesPage } from '../species.js'
import { fromCanonical, toCanonical } from '../units.js'
import type { Unit } from '../units.js'
import type { Lint } from './lint.js'
import { makeLint } from './lint-table.js'
import {
  LOOKS_LIKE_DEGC_UNDER_F,
  LOOKS_LIKE_DEGC_UNDER_F_COOL,
  LOOKS_LIKE_DEGF_OVER_C,
  LOOKS_LIKE_DEGF_OVER_C_BASKING,
  LOOKS_LIKE_DEGF_OVER_C_COOL,
  LOOKS_LIKE_FRACTION_UP_TO,
  LOOKS_LIKE_IRRADIANCE_OVER,
} from './policy.js'

function isCool(row: RangeRow): boolean {
  return COOL_SEASONS.includes(row.season)
}

/** Whether canonical numbers given in `unit` look like numbers in another one, at the place and time of `row`. */
function looksLikeOtherUnit(row: RangeRow, canonical: readonly number[], unit: Unit): boolean {
  if (canonical.length === 0) return false
  if (row.parameter === 'relative-humidity') {
    const highest = Math.max(...canonical)
    return highest > 0 && highest <= LOOKS_LIKE_FRACTION_UP_TO
  }
  if (row.parameter === 'uv-index') return canonical.some((value) => value > LOOKS_LIKE_IRRADIANCE_OVER)
  if (row.parameter !== 'temperature') return false
  if (unit === 'degF') {
    const least = isCool(row) ? LOOKS_LIKE_DEGC_UNDER_F_COOL : LOOKS_LIKE_DEGC_UNDER_F
    return canonical.some((value) => fromCanonical(value, 'degF') < least)
  }
  if (isCool(row)) return canonical.some((value) => value > LOOKS_LIKE_DEGF_OVER_C_COOL)
  const most = row.position === 'basking-surface' ? LOOKS_LIKE_DEGF_OVER_C_BASKING : LOOKS_LIKE_DEGF_OVER_C
  return canonical.some((value) => value > most)
}

/** Whether a number printed in °F was taken over as if it were °C. */
function isUnconverted(printed: string | null, unit: Unit, canonical: number | null): boolean {
  if (printed === null || canonical === null || unit !== 'degF') return false
  const number = parsePrintedNumber(printed)
  return number !== null && canonical === number && toCanonical(number, unit) !== canonical
}

type CanonicalNumbers = Pick<EvidenceRow, 'low' | 'high' | 'mean'>

function hasUnconverted(printed: PrintedNumbers, canonical: CanonicalNumbers): boolean {
  return (['low', 'high', 'mean'] as const).some((side) =>
    isUnconverted(printed[side], printed.unit, canonical[side]),
  )
}

function findNumbers(values: readonly (number | null)[]): number[] {
  return values.filter((value) => value !== null)
}

/** Warns of bounds, evidence and cited physiology whose numbers look like numbers of another unit. */
export function lintUnits(page: Pick<SpeciesPage, 'ranges' | 'physiology'>): Lint[] {
  const lints = page.ranges.flatMap(lintRangeUnits)
  for (const { itemId, row } of page.physiology) {
    if (row.form !== 'cited') continue
    const canonical = { low: row.lowC, high: row.highC, mean: row.meanC }
    const isHot = findNumbers(Object.values(canonical)).some((value) => value > LOOKS_LIKE_DEGF_OVER_C)
    if (isHot || hasUnconverted(row.printed, canonical)) {
      lints.push(makeLint('looks-like-other-unit', [itemId]))
    }
  }
  return lints
}

function lintRangeUnits({ itemId, row, evidence }: CitedRange): Lint[] {
  const lints: Lint[] = []
  // A lower limit may well lie near freezing, so it is not asked about.
  if (looksLikeOtherUnit(row, findNumbers([row.low, row.high, row.upperLimit]), row.typedUnit)) {
    lints.push(makeLint('looks-like-other-unit', [itemId]))
  }
  for (const piece of evidence) {
    const numbers = findNumbers([piece.row.low, piece.row.high, piece.row.mean])
    if (
      looksLikeOtherUnit(row, numbers, piece.row.printed.unit) ||
      hasUnconverted(piece.row.printed, piece.row)
    ) {
      lints.push(makeLint('looks-like-other-unit', [itemId, piece.itemId]))
    }
  }
  return lints
}
