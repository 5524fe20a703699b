import type { LifeStage, Parameter, Position, RangeRow, Season, UvMeaning } from '../ranges.js'

/** What a reading asks a page. `uvMeaning` is null for all but a UV index. */
export interface Asked {
  parameter: Parameter
  position: Position
  period: 'day' | 'night'
  season: Exclude<Season, 'any'>
  lifeStage: Exclude<LifeStage, 'any'>
  uvMeaning: UvMeaning | null
}

/** Positions a whole-enclosure row serves when they have no matching row of their own: those of air and of hides. */
export const WHOLE_ENCLOSURE_SERVES: readonly Position[] = [
  'basking-air',
  'warm-end-air',
  'warm-hide',
  'cool-end-air',
  'cool-hide',
  'humid-hide',
]
/** Life stages that a row for any stage never covers. */
export const STAGES_ANY_NEVER_COVERS: readonly LifeStage[] = ['egg', 'larva']
/** Seasons that a row for any season never covers: the cool ones. */
export const COOL_SEASONS: readonly Season[] = ['brumation']

/** Anything that carries a range row: a cited range of a page, an item of a proposal. */
export interface HasRow {
  row: RangeRow
}

/** A limit that holds for the question and the row that cites it. */
export interface HoldingLimit<R> {
  value: number
  range: R
  /** Its row is not one of those judged by. */
  isInherited: boolean
}

/** Which rows answer a question. */
export interface Selection<R> {
  /** Rows to judge by: usually one; several when the page lacks a joining row; none when no range is cited. */
  judged: R[]
  isByWholeEnclosure: boolean
  lower: HoldingLimit<R> | null
  upper: HoldingLimit<R> | null
  /** Rows of the same place and period for another stage or season: may be shown, labelled, and never judged by. */
  others: { range: R; differsIn: ('life-stage' | 'season')[] }[]
}

function matchesPeriod(row: RangeRow, asked: Asked): boolean {
  return row.period === asked.period || row.period === 'any'
}

function matchesSeason(row: RangeRow, asked: Asked): boolean {
  return row.season === asked.season || (row.season === 'any' && !COOL_SEASONS.includes(asked.season))
}

function matchesLifeStage(row: RangeRow, asked: Asked): boolean {
  if (row.lifeStage === asked.lifeStage) return true
  return row.lifeStage === 'any' && !STAGES_ANY_NEVER_COVERS.includes(asked.lifeStage)
}

/** Whether `other` is nowhere less specific than `row` and somewhere more so. Both match, so a key is named or `any`. */
function isOutrankedBy(row: RangeRow, other: RangeRow): boolean {
  const keys = ['period', 'season', 'lifeStage'] as const
  const isNowhereLess = keys.every((key) => row[key] === 'any' || other[key] !== 'any')
  return isNowhereLess && keys.some((key) => row[key] === 'any' && other[key] !== 'any')
}

function keepMostSpecific<R extends HasRow>(matching: readonly R[]): R[] {
  return matching.filter((range) => !matching.some((other) => isOutrankedBy(range.row, other.row)))
}

type LimitKey = 'lowerLimit' | 'upperLimit'

function findStrictest<R extends HasRow>(ranges: readonly R[], key: LimitKey) {
  let strictest: { value: number; range: R } | null = null
  for (const range of ranges) {
    const value = range.row[key]
    if (value === null) continue
    const isStricter =
      strictest === null || (key === 'lowerLimit' ? value > strictest.value : value < strictest.value)
    if (isStricter) strictest = { value, range }
  }
  return strictest
}

/** The limits of one side that hold at a position: each most specific row's own, else the strictest of all that lend. */
function findLimits<R extends HasRow>(rows: readonly R[], lending: readonly R[], key: LimitKey): R[] {
  const inherited = findStrictest(lending, key)
  return keepMostSpecific(rows).flatMap((range) => {
    if (range.row[key] !== null) return [range]
    return inherited === null ? [] : [inherited.range]
  })
}

/**
 * Which rows of a page answer a question, for verdicts, lints, the widening rule, comparing and finding alike.
 *
 * The position must match; each other key must equal the asked one or be `any`, which never covers egg, larva or a cool
 * season. Of the matching rows those remain that no other match outranks in specificity; several are judged one by one.
 * An air or hide position without a matching row of its own takes the whole enclosure's, whose limits hold there always. A
 * side without a limit takes the strictest limit of the matching rows. Of a UV index the meaning (typical or maximum) must
 * match too to be judged by; a limit says where harm is likely and holds for both.
 */
export function selectRanges<R extends HasRow>(ranges: readonly R[], asked: Asked): Selection<R> {
  const ofParameter = ranges.filter(({ row }) => row.parameter === asked.parameter)
  const isServed = WHOLE_ENCLOSURE_SERVES.includes(asked.position)
  const ofMeaning = ({ row }: R) => asked.parameter !== 'uv-index' || row.uvMeaning === asked.uvMeaning
  const matches = ({ row }: R) =>
    matchesPeriod(row, asked) && matchesSeason(row, asked) && matchesLifeStage(row, asked)

  const here = ofParameter.filter(({ row }) => row.position === asked.position)
  const whole = isServed ? ofParameter.filter(({ row }) => row.position === 'whole-enclosure') : []
  const matchingHere = here.filter(matches)
  const matchingWhole = whole.filter(matches)

  const own = keepMostSpecific(matchingHere.filter(ofMeaning))
  const judged = own.length > 0 ? own : keepMostSpecific(matchingWhole.filter(ofMeaning))
  const holding = (key: LimitKey): HoldingLimit<R> | null => {
    const limits = [matchingHere, matchingWhole].flatMap((matching) => {
      const meant = matching.filter(ofMeaning)
      return findLimits(meant.length > 0 ? meant : matching, matching, key)
    })
    const strictest = findStrictest(limits, key)
    return strictest && { ...strictest, isInherited: !judged.includes(strictest.range) }
  }
  const others = [...here, ...whole]
    .filter((range) => !matches(range) && matchesPeriod(range.row, asked) && ofMeaning(range))
    .map((range) => {
      const differsIn: ('life-stage' | 'season')[] = []
      if (!matchesLifeStage(range.row, asked)) differsIn.push('life-stage')
      if (!matchesSeason(range.row, asked)) differsIn.push('season')
      return { range, differsIn }
    })
  return {
    judged,
    isByWholeEnclosure: own.length === 0 && judged.length > 0,
    lower: holding('lowerLimit'),
    upper: holding('upperLimit'),
    others,
  }
}
