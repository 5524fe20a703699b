import { CHECK_LINK_PARAMETER, encodeCheck } from '../../shared/checker/check-link.js'
import type { CheckInput } from '../../shared/checker/check.js'

/** Path and query of a check, as a link anybody can open. */
export function toCheckAddress(input: CheckInput): string {
  return `/species/${input.slug}/check?${CHECK_LINK_PARAMETER}=${encodeCheck(input)}`
}
