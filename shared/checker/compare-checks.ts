import type { CheckResult } from './check.js'

/**
 * Indexes of the readings that two checks of the same readings answer differently, by range or by limit: what a newer
 * revision would say otherwise than the one a link pins.
 */
export function listChangedVerdicts(
  before: Pick<CheckResult, 'verdicts'>,
  after: Pick<CheckResult, 'verdicts'>,
): number[] {
  return before.verdicts.flatMap((verdict, index) => {
    const other = after.verdicts[index]
    const isSame =
      other !== undefined &&
      other.range.answer === verdict.range.answer &&
      other.limit.answer === verdict.limit.answer &&
      other.limit.side === verdict.limit.side
    return isSame ? [] : [verdict.readingIndex]
  })
}
