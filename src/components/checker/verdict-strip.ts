import type { ReadingVerdict } from '../../../shared/checker/check.js'
import { writeValue } from '../../../shared/checker/explain-value.js'
import { canSupportRange } from '../../../shared/evidence-policy.js'
import { toStatedInterval } from '../../../shared/evidence-votes.js'
import { formatRowBounds, speakBounds, toReaderUnit, type ReaderUnits } from '../../../shared/format.js'
import type { Parameter } from '../../../shared/ranges.js'
import { fromCanonical } from '../../../shared/units.js'
import { chooseAxis, type Axis } from '../marks/axis.js'
import type { Stretch } from '../marks/lanes.js'
import type { StripReading } from '../marks/RangeStrip.vue'
import { COVERAGE } from './reading-words.js'

/** What the range strip draws of a verdict, numbers in the unit of the axis. */
export interface VerdictStrip {
  axis: Axis
  parameter: Parameter
  range: Stretch
  lowerLimit: number | null
  upperLimit: number | null
  evidence: Stretch[]
  readings: StripReading[]
  label: string
}

const isNumber = (value: number | null): value is number => value !== null

/** The reading on the strip of the range it was judged by; null where the page has neither range nor limit for it. */
export function drawVerdict(verdict: ReadingVerdict, units: ReaderUnits): VerdictStrip | null {
  const { measured, range, limit, rows } = verdict
  const judged = rows.find(({ itemId }) => itemId === range.itemId) ?? null
  const [first] = rows
  const parameter = (judged ?? first)?.row.parameter
  if (parameter === undefined) return null
  const unit = toReaderUnit(measured.unit, units)
  const show = (value: number | null) => (value === null ? null : fromCanonical(value, unit))
  const evidence = (judged?.evidence ?? []).flatMap(({ row }) => {
    const interval = canSupportRange(row.kind) ? toStatedInterval(row) : null
    return interval === null ? [] : [{ low: show(interval.low), high: show(interval.high) }]
  })
  const bounds = { low: show(range.low), high: show(range.high) }
  const limits = { lower: show(limit.lower?.value ?? null), upper: show(limit.upper?.value ?? null) }
  const spread = COVERAGE * measured.uncertainty
  const ends = [measured.value - spread, measured.value, measured.value + spread].map(show)
  const values = [
    bounds.low,
    bounds.high,
    limits.lower,
    limits.upper,
    ...evidence.flatMap(({ low, high }) => [low, high]),
    ...ends,
  ].filter(isNumber)
  const [start = 0, value = 0] = ends.filter(isNumber)

  const spoken = [
    judged === null || (range.low === null && range.high === null)
      ? 'No range'
      : `Range ${speakBounds(formatRowBounds(judged.row, units))}`,
    limit.lower === null ? null : `lower limit ${writeValue(limit.lower.value, unit)}`,
    limit.upper === null ? null : `upper limit ${writeValue(limit.upper.value, unit)}`,
    `reading ${writeValue(measured.value, unit)}`,
  ]
  return {
    axis: chooseAxis(values, unit),
    parameter,
    range: bounds,
    lowerLimit: limits.lower,
    upperLimit: limits.upper,
    evidence,
    readings: [{ value, halfWidth: value - start, standing: verdict.standing }],
    label: spoken.filter((part) => part !== null).join(', '),
  }
}
