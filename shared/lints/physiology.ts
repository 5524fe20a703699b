import type { PhysiologyCaution } from '../checker/check.js'
import { BASKING_POSITIONS, cautionTrapped, findBodyTemperatures } from '../checker/physiology-cautions.js'
import { selectRanges } from '../checker/selection.js'
import type { EvidenceRow } from '../evidence.js'
import type { RangeRow } from '../ranges.js'
import type { CitedRange, SpeciesPage } from '../species.js'
import type { Lint } from './lint.js'
import { makeLint } from './lint-table.js'
import { dropRepeated, listSituations } from './situations.js'
import type { Situation } from './situations.js'

type PageBody = Pick<SpeciesPage, 'ranges' | 'physiology' | 'sources' | 'classification'>

const COLD_KINDS: readonly PhysiologyCaution['kind'][] = ['near-critical-minimum', 'near-freezing']

/** The items of the studies that call for caution when an animal is kept at a temperature, from heat or from cold; null when none do. */
function findCaution(
  page: PageBody,
  situation: Situation,
  valueC: number | null,
  from: 'heat' | 'cold',
): string[] | null {
  if (valueC === null) return null
  const body = findBodyTemperatures(page, situation.lifeStage)
  const findings = cautionTrapped({ valueC, uncertaintyC: 0 }, body, situation.season).filter(
    ({ kind }) => COLD_KINDS.includes(kind) === (from === 'cold'),
  )
  if (findings.length === 0) return null
  return findings.flatMap(({ study }) => (study === null ? [] : [study.itemId]))
}

/** The situations in which a page answers for a range's own position by this range. */
function listOwnSituations(page: PageBody, range: CitedRange): Situation[] {
  const { parameter, position, uvMeaning } = range.row
  return listSituations(page).filter((situation) =>
    selectRanges(page.ranges, { ...situation, parameter, position, uvMeaning }).judged.includes(range),
  )
}

/** Warns of ranges at places an animal cannot leave that reach into the physiology cautions. */
export function lintTrapped(page: PageBody): Lint[] {
  const lints = page.ranges
    .filter(({ row }) => row.parameter === 'temperature' && !BASKING_POSITIONS.includes(row.position))
    .flatMap((range) =>
      listOwnSituations(page, range).flatMap((situation) => {
        const heat = findCaution(page, situation, range.row.high ?? range.row.low, 'heat')
        const cold = findCaution(page, situation, range.row.low ?? range.row.high, 'cold')
        if (heat === null && cold === null) return []
        return [makeLint('trapped-in-cautions', [range.itemId, ...(heat ?? []), ...(cold ?? [])])]
      }),
    )
  return dropRepeated(lints)
}

/** Which limits of a range a critical temperature behind it speaks of: that on its own side of the range, or both. */
function findRestingSides(row: RangeRow, evidence: EvidenceRow): { lower: boolean; upper: boolean } {
  const critical = evidence.mean ?? evidence.high ?? evidence.low
  const lowest = row.low ?? row.high
  const highest = row.high ?? row.low
  if (critical === null) return { lower: false, upper: false }
  return { lower: highest === null || critical < highest, upper: lowest === null || critical > lowest }
}

/** Warns of limits that rest on a critical temperature and lie past the temperature from which physiology calls for caution. */
export function lintCriticalLimits(page: PageBody): Lint[] {
  const lints = page.ranges
    .filter(({ row }) => row.parameter === 'temperature')
    .flatMap((range) =>
      range.evidence
        .filter(({ row }) => row.kind === 'tolerance-limit')
        .flatMap((critical) => {
          const sides = findRestingSides(range.row, critical.row)
          return listOwnSituations(page, range).flatMap((situation) => {
            const { lowerLimit, upperLimit } = range.row
            const heat = sides.upper ? findCaution(page, situation, upperLimit, 'heat') : null
            const cold = sides.lower ? findCaution(page, situation, lowerLimit, 'cold') : null
            if (heat === null && cold === null) return []
            const studies = [...(heat ?? []), ...(cold ?? [])]
            return [makeLint('limit-past-cautions', [range.itemId, critical.itemId, ...studies])]
          })
        }),
    )
  return dropRepeated(lints)
}
