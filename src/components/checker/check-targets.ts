import type { ReadingVerdict } from '../../../shared/checker/check.js'
import { compareStandings } from '../../../shared/checker/verdict.js'
import { writeValue } from '../../../shared/checker/explain-value.js'
import {
  formatRowBounds,
  toReaderUnit,
  writeBoundsWithUnit,
  type ReaderUnits,
} from '../../../shared/format.js'
import { PARAMETER_SHORT_LABELS } from '../../../shared/labels.js'
import type { CitedRange } from '../../../shared/species.js'
import type { Reading } from '../../../shared/checker/reading.js'
import type { EnclosureTarget, TargetLine } from '../marks/enclosure-target.js'
import { comparePositions, listAnswers } from '../species/page-rows.js'
import { listTargets } from '../species/page-targets.js'
import type { AskedFor } from '../../composables/check-rows.js'

/** A reading with its verdict and the address of its row in the form. */
export interface LandedReading {
  reading: Reading
  verdict: ReadingVerdict
  address: string
}

function writeLine({ reading, verdict }: LandedReading, units: ReaderUnits): TargetLine {
  const text = writeValue(verdict.measured.value, toReaderUnit(verdict.measured.unit, units))
  const isMaximum = reading.uvMeaning === 'maximum'
  const name = PARAMETER_SHORT_LABELS[reading.parameter].toLowerCase().replace('uv', 'UV')
  return {
    parameter: reading.parameter,
    text: isMaximum ? `read ${text} peak` : `read ${text}`,
    spoken: `${isMaximum ? 'highest ' : ''}${name} read ${text}`,
    standing: verdict.standing,
  }
}

/** The text of the target that a reading was held against, as `listTargets` writes it; null where the place has none. */
function findTargetText({ reading, verdict }: LandedReading, units: ReaderUnits): string | null {
  const judgedBy = verdict.rows.find(({ itemId }) => itemId === verdict.range.itemId)?.row
  if (judgedBy === undefined || judgedBy.position !== reading.position) return null
  const bounds = writeBoundsWithUnit(formatRowBounds(judgedBy, units))
  return judgedBy.uvMeaning === 'maximum' ? `${bounds} peak` : bounds
}

/**
 * The targets of one period with the readings landed on them: in the place of a target that was read stands what was
 * read and its verdict, the worst of several first; a reading where the page has no target gets a line for itself.
 */
export function landReadings(
  ranges: readonly CitedRange[],
  asked: AskedFor & { period: 'day' | 'night' },
  landed: readonly LandedReading[],
  units: ReaderUnits,
): EnclosureTarget[] {
  const targets = listTargets(listAnswers(ranges, asked), units)
  const here = landed
    .filter(({ reading }) => reading.period === asked.period)
    .sort((a, b) => compareStandings(a.verdict.standing, b.verdict.standing))
  for (const entry of here) {
    const { position, parameter } = entry.reading
    let target = targets.find((known) => known.position === position)
    if (target === undefined) {
      target = { position, lines: [], address: entry.address }
      targets.push(target)
    }
    const line = writeLine(entry, units)
    if (target.lines.some((other) => other.text === line.text && other.parameter === parameter)) continue
    const text = findTargetText(entry, units)
    const place = target.lines.findIndex((other) => other.text === text && other.parameter === parameter)
    if (place === -1) target.lines.push(line)
    else target.lines[place] = line
  }
  return targets.sort((a, b) => comparePositions(a.position, b.position))
}
