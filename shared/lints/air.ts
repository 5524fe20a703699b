import { findAllowedVapour, hasSaturationPressure, intersectVapour } from '../humidity.js'
import type { Position } from '../ranges.js'
import type { SpeciesPage } from '../species.js'
import type { Lint } from './lint.js'
import { makeLint } from './lint-table.js'
import { dropRepeated, findAnswer, listSituations } from './situations.js'

/** Places that share the air of the enclosure; hides and substrate keep a damp of their own. */
const AIR_POSITIONS: readonly Position[] = ['basking-air', 'warm-end-air', 'cool-end-air']

/**
 * Warns where no vapour pressure suits all air positions at one time, so that the page asks for a local wet spot. Each position
 * counts that has a temperature and a humidity range, its own or the whole enclosure's.
 */
export function lintAir(page: Pick<SpeciesPage, 'ranges' | 'physiology'>): Lint[] {
  const lints = listSituations(page).flatMap((situation) => {
    const itemIds: string[] = []
    const allowed = AIR_POSITIONS.flatMap((position) => {
      const temperature = findAnswer(page.ranges, situation, 'temperature', position)
      const humidity = findAnswer(page.ranges, situation, 'relative-humidity', position)
      if (temperature === null || humidity === null) return []
      const { low: lowC, high: highC } = temperature.row
      // A value out of this world is another lint's business.
      if (![lowC, highC].every((boundC) => boundC === null || hasSaturationPressure(boundC))) return []
      itemIds.push(temperature.itemId, humidity.itemId)
      return [findAllowedVapour({ lowC, highC, lowRh: humidity.row.low, highRh: humidity.row.high })]
    })
    if (allowed.length < 2 || intersectVapour(allowed) !== null) return []
    return [makeLint('humidity-one-air-cannot-do', itemIds)]
  })
  return dropRepeated(lints)
}
