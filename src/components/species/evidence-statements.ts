import { toShortCitation } from '../../../shared/citation.js'
import type { EvidenceRow } from '../../../shared/evidence.js'
import { canSupportRange } from '../../../shared/evidence-policy.js'
import { toStatedInterval } from '../../../shared/evidence-votes.js'
import {
  formatBounds,
  toReaderUnit,
  writeBoundsWithUnit,
  writePrinted,
  type ReaderUnits,
} from '../../../shared/format.js'
import { EVIDENCE_KIND_LABELS } from '../../../shared/labels.js'
import type { CitedRange } from '../../../shared/species.js'
import type { SourceBrief } from '../../../shared/sources.js'
import { fromCanonical, type Unit } from '../../../shared/units.js'

/** One statement of a source as the evidence plot and its table show it. */
export interface ShownStatement {
  itemId: string
  /** "Huey & Pianka 1977" */
  name: string
  /** Number in the page's list of sources; null when the page does not carry the source. */
  number: number | null
  kind: string
  locator: string | null
  printed: string
  /** The same in the reader's unit, where that differs from the printed one. */
  converted: string | null
  n: number | null
  note: string | null
  /** Physiological kinds are shown but support no range. */
  isSupporting: boolean
  /** In the reader's unit; a null side is open, null as a whole where no number could be read. */
  interval: { low: number | null; high: number | null } | null
}

function convert(row: EvidenceRow, unit: Unit): string | null {
  if (row.printed.unit === unit) return null
  const low = row.low ?? (row.mean === null ? null : row.mean - (row.sd ?? 0))
  const high = row.high ?? (row.mean === null ? null : row.mean + (row.sd ?? 0))
  if (low === null && high === null) return null
  if (row.statement === 'value' && row.mean !== null) {
    return writeBoundsWithUnit(formatBounds(row.mean, row.mean, unit))
  }
  const bounds = row.statement === 'at-least' ? formatBounds(low, null, unit) : formatBounds(low, high, unit)
  return writeBoundsWithUnit(row.statement === 'at-most' ? formatBounds(null, high, unit) : bounds)
}

/** The statements behind a range in their order, ready to be shown. */
export function listStatements(
  range: CitedRange,
  sources: Record<string, SourceBrief>,
  numbers: ReadonlyMap<string, number>,
  units: ReaderUnits,
): ShownStatement[] {
  const unit = toReaderUnit(range.row.typedUnit, units)
  return range.evidence.map(({ itemId, row }) => {
    const source = sources[row.sourceId]
    const interval = toStatedInterval(row)
    const show = (value: number | null) => (value === null ? null : fromCanonical(value, unit))
    return {
      itemId,
      name: source === undefined ? 'Source not on this page' : toShortCitation(source),
      number: numbers.get(row.sourceId) ?? null,
      kind: EVIDENCE_KIND_LABELS[row.kind],
      locator: row.locator,
      printed: writePrinted(row.printed, row.statement),
      converted: convert(row, unit),
      n: row.n,
      note: row.note,
      isSupporting: canSupportRange(row.kind),
      interval: interval === null ? null : { low: show(interval.low), high: show(interval.high) },
    }
  })
}
