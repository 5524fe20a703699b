import {
  formatRowBounds,
  speakBounds,
  writeBoundsWithUnit,
  type ReaderUnits,
} from '../../../shared/format.js'
import { PARAMETER_SHORT_LABELS } from '../../../shared/labels.js'
import type { Position } from '../../../shared/ranges.js'
import type { EnclosureTarget, TargetLine } from '../marks/enclosure-target.js'
import { comparePositions, type AnsweringRow, type ParameterRows } from './page-rows.js'

/** The id of a row's element: the drawing leads to it, and a link to one row keeps working. */
export function toRowId(itemId: string): string {
  return `range-${itemId}`
}

function toLine({ range: { row } }: AnsweringRow, units: ReaderUnits): TargetLine {
  const bounds = formatRowBounds(row, units)
  const isMaximum = row.uvMeaning === 'maximum'
  const name = PARAMETER_SHORT_LABELS[row.parameter].toLowerCase().replace('uv', 'UV')
  return {
    parameter: row.parameter,
    text: isMaximum ? `${writeBoundsWithUnit(bounds)} peak` : writeBoundsWithUnit(bounds),
    spoken: `${isMaximum ? 'highest ' : ''}${name} ${speakBounds(bounds)}`,
    standing: null,
  }
}

/**
 * The day's targets by place: one entry for each position that has a row, its numbers in the order of the parameters.
 * Where several rows answer for one number, each is a line of its own.
 */
export function listTargets(answers: readonly ParameterRows[], units: ReaderUnits): EnclosureTarget[] {
  const byPosition = new Map<Position, EnclosureTarget>()
  for (const answer of answers.flatMap(({ rows }) => rows)) {
    const { position } = answer.range.row
    const line = toLine(answer, units)
    const target = byPosition.get(position)
    if (target === undefined) {
      byPosition.set(position, { position, lines: [line], address: `#${toRowId(answer.range.itemId)}` })
    } else if (
      !target.lines.some(({ text, parameter }) => text === line.text && parameter === line.parameter)
    ) {
      target.lines.push(line)
    }
  }
  return [...byPosition.values()].sort((a, b) => comparePositions(a.position, b.position))
}
