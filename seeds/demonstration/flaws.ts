import type { LintId } from '../../shared/lints/lint.js'

/** A flaw put into a page on purpose, so that its lint has something to find. */
interface DeliberateFlaw {
  /** The species, by its key in the scenario. */
  species: string
  lint: LintId
  where: string
}

/** One deliberate flaw for each invented species, in its newest revision. */
export const DELIBERATE_FLAWS: readonly DeliberateFlaw[] = [
  { species: 'salt-pan-lizard', lint: 'locator-missing', where: 'cool hide by day' },
  { species: 'hush-gecko', lint: 'hide-warmer-than-basking', where: 'warm hide of adults by day' },
  { species: 'cloudwood-climber', lint: 'humidity-one-air-cannot-do', where: 'both ends by day' },
  {
    species: 'rimeback-snake',
    lint: 'needs-joining-row',
    where: 'humidity of the cool end, juvenile by night',
  },
  { species: 'down-tortoise', lint: 'outside-envelope', where: 'cool end by night' },
  { species: 'mere-turtle', lint: 'looks-like-other-unit', where: 'a report on the water of hatchlings' },
  { species: 'dripleaf-frog', lint: 'trapped-in-cautions', where: 'warm end of metamorphs by day' },
  { species: 'tunnel-spider', lint: 'keepers-reports-only', where: 'humidity of adults' },
]
