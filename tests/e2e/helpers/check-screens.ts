import { JOURNEY_CHECK, toCheckAddress } from './check-links.js'
import type { Screen } from './screens.js'
import { BASKER } from './species.js'

/** The check as links open it. */
export const CHECK_SCREENS: readonly Screen[] = [
  { title: 'a check with its verdicts', path: toCheckAddress(JOURNEY_CHECK) },
  { title: 'a check against an earlier revision', path: toCheckAddress({ ...JOURNEY_CHECK, revision: 1 }) },
  { title: 'a link that was cut short', path: `/species/${BASKER.slug}/check?c=1_4_a` },
  { title: 'a link of a newer version', path: `/species/${BASKER.slug}/check?c=9_4_aa_*tbdcp46` },
]
