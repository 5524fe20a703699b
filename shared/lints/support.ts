import { PHYSICAL_BOUNDS } from '../checker/physical-bounds.js'
import { findYear } from '../citation.js'
import { canSupportRange } from '../evidence-policy.js'
import { summariseEvidence } from '../evidence-support.js'
import type { CitedRange, SpeciesPage } from '../species.js'
import type { Lint } from './lint.js'
import { makeLint } from './lint-table.js'
import { ENVELOPE_ROUNDING, OLD_EVIDENCE_YEARS } from './policy.js'

/** Half of 0.1 is not exact in binary. */
const FLOAT_SLACK = 1e-9

/** The pieces of evidence that can support a range, ids included. */
function listSupporting(range: CitedRange): CitedRange['evidence'] {
  return range.evidence.filter(({ row }) => canSupportRange(row.kind))
}

/** Warns of ranges that no enclosure or field source supports. */
export function lintMissingEvidence(ranges: readonly CitedRange[]): Lint[] {
  return ranges
    .filter((range) => listSupporting(range).length === 0)
    .map(({ itemId }) => makeLint('no-evidence', [itemId]))
}

/**
 * Warns of ranges that reach past the hull of what their sources state; a bound that no source states is past it too. A
 * bound at the end of what nature allows needs no source.
 */
export function lintEnvelope(ranges: readonly CitedRange[]): Lint[] {
  return ranges.filter(reachesPastEvidence).map((range) => {
    const evidenceIds = listSupporting(range).map(({ itemId }) => itemId)
    return makeLint('outside-envelope', [range.itemId, ...evidenceIds])
  })
}

function reachesPastEvidence(range: CitedRange): boolean {
  const supporting = listSupporting(range)
  if (supporting.length === 0) return false
  const { envelope } = summariseEvidence(
    range.row,
    supporting.map(({ row }) => row),
  )
  const { low, high, parameter } = range.row
  const ends = PHYSICAL_BOUNDS[parameter]
  const isPhysicalEnd = (value: number) => value === ends.low || value === ends.high
  const slack = ENVELOPE_ROUNDING + FLOAT_SLACK
  const isTooLow =
    low !== null && !isPhysicalEnd(low) && (envelope.low === null || low < envelope.low - slack)
  const isTooHigh =
    high !== null && !isPhysicalEnd(high) && (envelope.high === null || high > envelope.high + slack)
  return isTooLow || isTooHigh
}

/** Warns of evidence and cited physiology without a place in the source, a range's evidence in one finding. */
export function lintLocators(page: Pick<SpeciesPage, 'ranges' | 'physiology'>): Lint[] {
  const lacks = (locator: string | null) => locator === null || locator.trim() === ''
  const lints: Lint[] = []
  for (const range of page.ranges) {
    const missing = range.evidence.filter(({ row }) => lacks(row.locator)).map(({ itemId }) => itemId)
    if (missing.length > 0) lints.push(makeLint('locator-missing', [range.itemId, ...missing]))
  }
  for (const { itemId, row } of page.physiology) {
    if (row.form === 'cited' && lacks(row.locator)) lints.push(makeLint('locator-missing', [itemId]))
  }
  return lints
}

/** Informs of ranges behind which a single study, or nothing but keepers' reports, stands. */
export function lintIndependence(ranges: readonly CitedRange[]): Lint[] {
  const lints: Lint[] = []
  for (const range of ranges) {
    const supporting = listSupporting(range)
    if (supporting.length === 0) continue
    const itemIds = [range.itemId, ...supporting.map(({ itemId }) => itemId)]
    const studies = new Set(supporting.map(({ row }) => row.sourceId)).size
    if (studies === 1) lints.push(makeLint('one-study-only', itemIds))
    if (supporting.every(({ row }) => row.kind === 'keepers-report')) {
      lints.push(makeLint('keepers-reports-only', itemIds))
    }
  }
  return lints
}

/** Informs of evidence issued more than 30 years before `year`, a range's evidence in one finding. */
export function lintAge(page: Pick<SpeciesPage, 'ranges' | 'sources'>, year: number): Lint[] {
  return page.ranges.flatMap((range) => {
    const old = range.evidence.filter(({ row }) => {
      const source = page.sources[row.sourceId]
      const issued = source === undefined ? null : findYear(source.csl)
      return issued !== null && year - issued > OLD_EVIDENCE_YEARS
    })
    const itemIds = old.map(({ itemId }) => itemId)
    return itemIds.length === 0 ? [] : [makeLint('evidence-over-30-years', [range.itemId, ...itemIds])]
  })
}
