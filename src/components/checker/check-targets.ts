import type { ReadingVerdict } from '../../../shared/checker/check.js'
import { compareStandings, type Standing } from '../../../shared/checker/verdict.js'
import { writeValue } from '../../../shared/checker/explain-value.js'
import { toReaderUnit, type ReaderUnits } from '../../../shared/format.js'
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

function findWorst(standings: readonly Standing[]): Standing | null {
  return [...standings].sort(compareStandings)[0] ?? null
}

function writeLine({ reading, verdict }: LandedReading, units: ReaderUnits): TargetLine {
  const text = writeValue(verdict.measured.value, toReaderUnit(verdict.measured.unit, units))
  const name = PARAMETER_SHORT_LABELS[reading.parameter].toLowerCase().replace('uv', 'UV')
  return {
    parameter: reading.parameter,
    text: `read ${text}`,
    spoken: `${name} read ${text}`,
    standing: verdict.standing,
  }
}

/**
 * The targets of one period with the readings landed on them: a target that was read shows what was read and the worst
 * verdict there; a reading where the page has no target of its own gets a line for itself.
 */
export function landReadings(
  ranges: readonly CitedRange[],
  asked: AskedFor & { period: 'day' | 'night' },
  landed: readonly LandedReading[],
  units: ReaderUnits,
): EnclosureTarget[] {
  const targets = listTargets(listAnswers(ranges, asked), units)
  const here = landed.filter(({ reading }) => reading.period === asked.period)
  const byPosition = new Map(
    targets.map((target) => [target.position, { ...target, lines: [...target.lines] }]),
  )
  for (const entry of here) {
    const { position, parameter } = entry.reading
    const target = byPosition.get(position) ?? { position, lines: [], address: entry.address }
    target.address = entry.address
    const same = here.filter(
      ({ reading }) => reading.position === position && reading.parameter === parameter,
    )
    const isFirst = same[0] === entry
    if (isFirst) {
      target.lines = target.lines.filter((line) => line.parameter !== parameter)
      for (const other of same) {
        const line = writeLine(other, units)
        const twin = target.lines.find(
          ({ text, parameter: named }) => text === line.text && named === parameter,
        )
        if (twin) twin.standing = findWorst([twin.standing, line.standing].filter((mark) => mark !== null))
        else target.lines.push(line)
      }
    }
    byPosition.set(position, target)
  }
  return [...byPosition.values()].sort((a, b) => comparePositions(a.position, b.position))
}
