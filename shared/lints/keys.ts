import { selectRanges } from '../checker/selection.js'
import type { RangeRow, UvMeaning } from '../ranges.js'
import type { CitedRange, SpeciesPage } from '../species.js'
import { isLimitInside } from './bounds.js'
import type { Lint } from './lint.js'
import { makeLint } from './lint-table.js'
import { dropRepeated, listSituations } from './situations.js'

function joinKeys(row: RangeRow): string {
  return [row.parameter, row.position, row.period, row.season, row.lifeStage, row.uvMeaning].join(' ')
}

/** Blocks ranges with the same keys, all of one key in one finding. */
export function lintDuplicateKeys(ranges: readonly CitedRange[]): Lint[] {
  const byKeys = new Map<string, string[]>()
  for (const { itemId, row } of ranges) {
    byKeys.set(joinKeys(row), [...(byKeys.get(joinKeys(row)) ?? []), itemId])
  }
  return [...byKeys.values()]
    .filter((itemIds) => itemIds.length > 1)
    .map((itemIds) => makeLint('duplicate-key', itemIds))
}

/** Every question of a page, with the rows that answer it. */
function selectAll(page: Pick<SpeciesPage, 'ranges' | 'physiology'>) {
  const places = new Map(
    page.ranges.map(({ row }) => [[row.parameter, row.position, row.uvMeaning].join(' '), row]),
  )
  return listSituations(page).flatMap((situation) =>
    [...places.values()].map(({ parameter, position, uvMeaning }) => {
      const meaning: UvMeaning | null = parameter === 'uv-index' ? uvMeaning : null
      return selectRanges(page.ranges, { ...situation, parameter, position, uvMeaning: meaning })
    }),
  )
}

/** Warns of questions that two rows answer and neither more closely than the other. */
export function lintJoiningRows(page: Pick<SpeciesPage, 'ranges' | 'physiology'>): Lint[] {
  const lints = selectAll(page).flatMap(({ judged }) => {
    const unlike = new Map(judged.map((range) => [joinKeys(range.row), range.itemId]))
    return unlike.size > 1 ? [makeLint('needs-joining-row', [...unlike.values()])] : []
  })
  return dropRepeated(lints)
}

/** Blocks a range that holds a limit which another row lends it. */
export function lintInheritedLimits(page: Pick<SpeciesPage, 'ranges' | 'physiology'>): Lint[] {
  const lints = selectAll(page).flatMap(({ judged, lower, upper }) =>
    judged.flatMap((range) => {
      const lenders = [
        isLimitInside({ lowerLimit: lower?.value ?? null, upperLimit: null }, range.row) ? lower : null,
        isLimitInside({ lowerLimit: null, upperLimit: upper?.value ?? null }, range.row) ? upper : null,
      ]
      return lenders
        .filter((lender) => lender !== null)
        .filter((lender) => lender.range.itemId !== range.itemId)
        .map((lender) => makeLint('limit-inside-range', [range.itemId, lender.range.itemId]))
    }),
  )
  return dropRepeated(lints)
}
