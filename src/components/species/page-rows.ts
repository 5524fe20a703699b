import { selectRanges, WHOLE_ENCLOSURE_SERVES, type HoldingLimit } from '../../../shared/checker/selection.js'
import type { Parameter, Position, UvMeaning } from '../../../shared/ranges.js'
import type { CitedRange } from '../../../shared/species.js'
import type { PageChoice } from './page-choice.js'

/** One row that answers the page's question, with the limits that hold there, whichever row cites them. */
export interface AnsweringRow {
  range: CitedRange
  lower: HoldingLimit<CitedRange> | null
  upper: HoldingLimit<CitedRange> | null
}

/** A place that has rows for another life stage or season only. */
export interface UnansweredPlace {
  position: Position
  uvMeaning: UvMeaning | null
}

/** The rows of one parameter for the page's question. */
export interface ParameterRows {
  parameter: Parameter
  rows: AnsweringRow[]
  unanswered: UnansweredPlace[]
  /** Places of this page where nobody has given this parameter yet. */
  gaps: Position[]
}

const PARAMETERS: readonly Parameter[] = [
  'temperature',
  'relative-humidity',
  'uv-index',
  'photoperiod',
  'basking-heat-hours',
]
/** From the lamp to the cool end, then what has no end. */
const POSITIONS: readonly Position[] = [
  'basking-surface',
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
const UV_MEANINGS: readonly (UvMeaning | null)[] = ['typical', 'maximum', null]
/** Humidity is worth asking for where air stands: over water and in the light of a lamp it says little. */
const HUMIDITY_POSITIONS: readonly Position[] = [
  'warm-end-air',
  'warm-hide',
  'cool-end-air',
  'cool-hide',
  'humid-hide',
]

/** Places in the order a page lists them. */
export function comparePositions(a: Position, b: Position): number {
  return POSITIONS.indexOf(a) - POSITIONS.indexOf(b)
}

function findGaps(ranges: readonly CitedRange[], parameter: Parameter): Position[] {
  if (parameter !== 'temperature' && parameter !== 'relative-humidity') return []
  const isServed = ranges.some(({ row }) => row.parameter === parameter && row.position === 'whole-enclosure')
  const present = POSITIONS.filter(
    (position) => position !== 'whole-enclosure' && ranges.some(({ row }) => row.position === position),
  )
  const wanted =
    parameter === 'temperature'
      ? present
      : present.filter((position) => HUMIDITY_POSITIONS.includes(position))
  return wanted.filter((position) => {
    if (isServed && WHOLE_ENCLOSURE_SERVES.includes(position)) return false
    return !ranges.some(({ row }) => row.parameter === parameter && row.position === position)
  })
}

function answerAt(
  ranges: readonly CitedRange[],
  choice: PageChoice,
  place: { parameter: Parameter; position: Position; uvMeaning: UvMeaning | null },
): { rows: AnsweringRow[]; isUnanswered: boolean } {
  const selection = selectRanges(ranges, { ...place, ...choice })
  const own = selection.judged.filter(({ row }) => row.position === place.position)
  const othersHere = selection.others.some(({ range }) => range.row.position === place.position)
  return {
    rows: own.map((range) => ({ range, lower: selection.lower, upper: selection.upper })),
    // Where the whole enclosure's row answers, nothing is missing: it stands in the list once, as itself.
    isUnanswered: selection.judged.length === 0 && othersHere,
  }
}

/**
 * What the page answers to the choice, by parameter and place. Which row applies is decided by the checker's selection
 * alone. A parameter with nothing to say is left out.
 */
export function listAnswers(ranges: readonly CitedRange[], choice: PageChoice): ParameterRows[] {
  const answers: ParameterRows[] = []
  for (const parameter of PARAMETERS) {
    const ofParameter = ranges.filter(({ row }) => row.parameter === parameter)
    const rows: AnsweringRow[] = []
    const unanswered: UnansweredPlace[] = []
    for (const position of POSITIONS) {
      for (const uvMeaning of UV_MEANINGS) {
        const isThere = ofParameter.some(
          ({ row }) => row.position === position && row.uvMeaning === uvMeaning,
        )
        if (!isThere) continue
        const answer = answerAt(ranges, choice, { parameter, position, uvMeaning })
        rows.push(...answer.rows)
        if (answer.isUnanswered) unanswered.push({ position, uvMeaning })
      }
    }
    const gaps = findGaps(ranges, parameter)
    if (rows.length + unanswered.length + gaps.length > 0) answers.push({ parameter, rows, unanswered, gaps })
  }
  return answers
}

/** Rows that do not answer the choice: those of other stages, seasons and periods, in the page's own order. */
export function listOtherRows(
  ranges: readonly CitedRange[],
  answers: readonly ParameterRows[],
): CitedRange[] {
  const shown = new Set(answers.flatMap(({ rows }) => rows.map(({ range }) => range.itemId)))
  return ranges
    .filter(({ itemId }) => !shown.has(itemId))
    .sort(
      (a, b) =>
        PARAMETERS.indexOf(a.row.parameter) - PARAMETERS.indexOf(b.row.parameter) ||
        comparePositions(a.row.position, b.row.position),
    )
}
