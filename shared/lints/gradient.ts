import type { Position, RangeRow } from '../ranges.js'
import type { CitedRange, SpeciesPage } from '../species.js'
import type { Lint, LintId } from './lint.js'
import { makeLint } from './lint-table.js'
import { dropRepeated, findAnswer, listSituations } from './situations.js'

type PageRanges = Pick<SpeciesPage, 'ranges' | 'physiology'>
type Bounds = Pick<RangeRow, 'low' | 'high'>

/** Cool places and the warm ones they must not be warmer than. */
const COOL_AND_WARM: readonly (readonly [Position, Position])[] = [
  ['cool-end-air', 'warm-end-air'],
  ['cool-hide', 'warm-hide'],
]
const HIDES: readonly Position[] = ['warm-hide', 'cool-hide', 'humid-hide']

/** Whether one range lies warmer than another: by their middles, or by the bound that both have. */
export function isWarmer(one: Bounds, other: Bounds): boolean {
  if (one.low !== null && one.high !== null && other.low !== null && other.high !== null) {
    return one.low + one.high > other.low + other.high
  }
  if (one.low !== null && other.low !== null) return one.low > other.low
  if (one.high !== null && other.high !== null) return one.high > other.high
  return false
}

function lintWarmer(id: LintId, one: CitedRange | null, other: CitedRange | null): Lint[] {
  if (one === null || other === null || one.itemId === other.itemId) return []
  return isWarmer(one.row, other.row) ? [makeLint(id, [one.itemId, other.itemId])] : []
}

/** Warns of a cool end, or a cool hide, that is warmer than the warm one at the same time. */
export function lintCoolEnd(page: PageRanges): Lint[] {
  const lints = listSituations(page).flatMap((situation) =>
    COOL_AND_WARM.flatMap(([cool, warm]) =>
      lintWarmer(
        'cool-end-warmer',
        findAnswer(page.ranges, situation, 'temperature', cool),
        findAnswer(page.ranges, situation, 'temperature', warm),
      ),
    ),
  )
  return dropRepeated(lints)
}

/** Informs of places that are warmer with the lights off than with the lights on. */
export function lintNights(page: PageRanges): Lint[] {
  const positions = new Set(page.ranges.map(({ row }) => row.position))
  const lints = listSituations(page)
    .filter(({ period }) => period === 'night')
    .flatMap((night) =>
      [...positions].flatMap((position) =>
        lintWarmer(
          'night-warmer-than-day',
          findAnswer(page.ranges, night, 'temperature', position),
          findAnswer(page.ranges, { ...night, period: 'day' }, 'temperature', position),
        ),
      ),
    )
  return dropRepeated(lints)
}

/** Informs of hides that are warmer than the basking place with the lights on. */
export function lintHides(page: PageRanges): Lint[] {
  const lints = listSituations(page)
    .filter(({ period }) => period === 'day')
    .flatMap((day) => {
      const basking =
        findAnswer(page.ranges, day, 'temperature', 'basking-surface') ??
        findAnswer(page.ranges, day, 'temperature', 'basking-air')
      return HIDES.flatMap((hide) =>
        lintWarmer('hide-warmer-than-basking', findAnswer(page.ranges, day, 'temperature', hide), basking),
      )
    })
  return dropRepeated(lints)
}
