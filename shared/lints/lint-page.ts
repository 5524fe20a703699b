import type { SpeciesPage } from '../species.js'
import { lintAir } from './air.js'
import { lintBoundOrder, lintImpossible, lintOwnLimits, lintZones } from './bounds.js'
import { lintCoolEnd, lintHides, lintNights } from './gradient.js'
import { lintDuplicateKeys, lintInheritedLimits, lintJoiningRows } from './keys.js'
import { lintIdSchema } from './lint.js'
import type { Lint } from './lint.js'
import { lintCriticalLimits, lintTrapped } from './physiology.js'
import { lintAge, lintEnvelope, lintIndependence, lintLocators, lintMissingEvidence } from './support.js'
import { lintUnits } from './units.js'

/** What the lints read of a page; a whole `SpeciesPage` fits, and so does a proposal laid out as one. */
export type LintPage = Pick<SpeciesPage, 'classification' | 'ranges' | 'physiology' | 'sources'>

/**
 * Every finding on a page's content, in the order of the lint table: what blocks, then what warns, then what informs. Pure; `year`
 * is the calendar year in which evidence is looked at, from which its age counts.
 */
export function lintPage(page: LintPage, year: number): Lint[] {
  const { ranges } = page
  const lints = [
    ...lintBoundOrder(ranges),
    ...lintOwnLimits(ranges),
    ...lintInheritedLimits(page),
    ...lintDuplicateKeys(ranges),
    ...lintZones(ranges),
    ...lintImpossible(page),
    ...lintMissingEvidence(ranges),
    ...lintEnvelope(ranges),
    ...lintUnits(page),
    ...lintCoolEnd(page),
    ...lintTrapped(page),
    ...lintCriticalLimits(page),
    ...lintAir(page),
    ...lintJoiningRows(page),
    ...lintLocators(page),
    ...lintIndependence(ranges),
    ...lintNights(page),
    ...lintHides(page),
    ...lintAge(page, year),
  ]
  const order = lintIdSchema.options
  return lints.sort((one, other) => order.indexOf(one.id) - order.indexOf(other.id))
}
