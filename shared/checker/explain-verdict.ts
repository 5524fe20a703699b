import { countDecimals, formatNumber, toReaderUnit } from '../format.js'
import type { ReaderUnits } from '../format.js'
import { UNIT_LABELS } from '../labels.js'
import type { RangeRow } from '../ranges.js'
import { differenceFromCanonical } from '../units.js'
import type { Unit } from '../units.js'
import type { ReadingVerdict } from './check.js'
import { writeProbability } from './explain-probability.js'
import { writeNumber, writeValue } from './explain-value.js'
import type { RangeAnswer, RangeVerdict } from './verdict.js'

/** A verdict in words: one sentence that holds both answers, and what else should be known of it. */
export interface ExplainedVerdict {
  sentence: string
  notes: string[]
}

function findRow(verdict: ReadingVerdict, itemId: string | null): RangeRow | null {
  return verdict.rows.find((range) => range.itemId === itemId)?.row ?? null
}

function writeBound(row: RangeRow, side: 'low' | 'high', units: ReaderUnits): string {
  const bound = row[side]
  return bound === null ? '' : writeValue(bound, toReaderUnit(row.typedUnit, units))
}

function writeSpan(row: RangeRow, units: ReaderUnits): string {
  const { low, high } = row
  if (low === null || high === null || low === high)
    return writeBound(row, low === null ? 'high' : 'low', units)
  const shown = toReaderUnit(row.typedUnit, units)
  return `${writeNumber(low, shown)} to ${writeValue(high, shown)}`
}

/** "Above 46 °C", "inside 40 to 46 °C": one answer about a range, begun in lower case. */
function sayAnswer(answer: RangeAnswer, row: RangeRow, units: ReaderUnits): string {
  switch (answer) {
    case 'inside':
      return `inside ${writeSpan(row, units)}`
    case 'low':
      return `below ${writeBound(row, 'low', units)}`
    case 'high':
      return `above ${writeBound(row, 'high', units)}`
    case 'not-low':
      return `not below ${writeBound(row, 'low', units)}`
    case 'not-high':
      return `not above ${writeBound(row, 'high', units)}`
    case 'unclear':
    case 'no-range':
      return ''
  }
}

function findProbability(range: RangeVerdict, answer: RangeAnswer): number {
  if (answer === 'low') return range.probability?.low ?? 0
  if (answer === 'high') return range.probability?.high ?? 0
  return range.probability?.inside ?? 0
}

function sayRange(verdict: ReadingVerdict, units: ReaderUnits): string {
  const { range } = verdict
  const row = findRow(verdict, range.itemId)
  if (range.answer === 'no-range' || row === null) return 'no range is cited for exactly this question'
  const isCertain = verdict.measured.uncertainty === 0
  const write = (answer: RangeAnswer) => writeProbability(findProbability(range, answer), isCertain)
  if (range.likeliest !== null) {
    const [first, second] = range.likeliest
    const likely = `${sayAnswer(first, row, units)} (${write(first)})`
    return `this reading cannot tell: ${likely} or ${sayAnswer(second, row, units)} (${write(second)})`
  }
  const words = `${sayAnswer(range.answer, row, units)} (${write(range.answer)} sure)`
  if (range.answer === 'not-low') return `${words}, with no upper bound cited`
  return range.answer === 'not-high' ? `${words}, with no lower bound cited` : words
}

function sayLimit(verdict: ReadingVerdict, units: ReaderUnits): string {
  const { answer, side, lower, upper } = verdict.limit
  const write = (which: 'lower' | 'upper') => {
    const limit = which === 'lower' ? lower : upper
    return limit && writeValue(limit.value, toReaderUnit(verdict.measured.unit, units))
  }
  if (answer === 'no-limit') return 'no limit is cited'
  if (answer === 'clear') {
    const known = [write('lower'), write('upper')].filter((text) => text !== null)
    return `clear of the ${known.length > 1 ? 'limits' : 'limit'} at ${known.join(' and ')}`
  }
  const limit = side === 'lower' ? lower : upper
  const probability = writeProbability(limit?.probabilityPast ?? 0, verdict.measured.uncertainty === 0)
  const where = `the ${side ?? ''} limit at ${(side && write(side)) ?? ''}`
  return answer === 'past'
    ? `past ${where} (${probability} likely)`
    : `near ${where} (${probability} likely past it)`
}

function capitalise(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1)
}

/** What taking all radiation together costs, by the check values' own estimate. */
const TOTAL_RADIATION_ERROR_C = 0.2

/** A canonical difference in a reader's unit, cut to the digits that leave it true: "±0.6 °C". */
function writeTolerance(canonical: number, shown: Unit): string {
  const difference = differenceFromCanonical(canonical, shown)
  const decimals = difference >= 1 ? 1 : 2
  const cut = Math.floor(difference * 10 ** decimals + 1e-9) / 10 ** decimals
  return `±${formatNumber(cut, countDecimals(cut, decimals))} ${UNIT_LABELS[shown]}`
}

function listNotes(verdict: ReadingVerdict, units: ReaderUnits): string[] {
  const { range, limit, measured } = verdict
  const shown = toReaderUnit(measured.unit, units)
  const row = findRow(verdict, range.itemId)
  const notes: string[] = []
  if (range.onBound !== null && row !== null) {
    const { bound, saferWay } = range.onBound
    notes.push(
      `The reading lies on the bound of ${writeBound(row, bound, units)}. No instrument settles which side it is on; ${saferWay} is safer.`,
    )
  }
  if (range.cannotConfirm !== null) {
    const { neededAccuracy } = range.cannotConfirm
    notes.push(
      neededAccuracy > 0
        ? `This instrument cannot confirm a range this narrow. One accurate to ${writeTolerance(neededAccuracy, shown)} could.`
        : 'This range has no width, so no instrument can confirm it.',
    )
  }
  if (verdict.isByWholeEnclosure) {
    notes.push('No range is cited for this position, so the one for the whole enclosure answers.')
  }
  if (verdict.judgements.length > 1) {
    notes.push(
      'More than one range answers this question and none is the closer answer. The worst verdict stands.',
    )
  }
  if (limit.lower?.isInherited === true || limit.upper?.isInherited === true) {
    notes.push('A limit comes from a more general range of this page, because it holds here too.')
  }
  if (range.answer === 'no-range' && verdict.otherRows.length > 0) {
    notes.push('Ranges for another life stage or season are cited. They do not answer this question.')
  }
  if (measured.uncorrectedValue !== null) {
    notes.push(
      `The instrument showed ${writeValue(measured.uncorrectedValue, shown)}; with the emissivity of the surface that is ${writeValue(measured.value, shown)}. This takes all radiation together, an approximation good to about ${writeTolerance(TOTAL_RADIATION_ERROR_C, shown).slice(1)}.`,
    )
  }
  if (measured.parts.some(({ from, isDefault }) => from === 'accuracy' && isDefault)) {
    notes.push(
      'The accuracy is the usual one for this kind of instrument. Your instrument’s own would be better.',
    )
  }
  return notes
}

/** A verdict in words a keeper understands, in the reader's units: "Above 46 °C (99.5 % sure), clear of the limit at 54 °C." */
export function explainVerdict(verdict: ReadingVerdict, units: ReaderUnits): ExplainedVerdict {
  const range = sayRange(verdict, units)
  const limit = sayLimit(verdict, units)
  const isLimitFirst = verdict.limit.answer === 'past' || verdict.limit.answer === 'near'
  const [first, second] = isLimitFirst ? [limit, range] : [range, limit]
  const isLong = [first, second].some((part) => /[:]|, with|^no /.test(part))
  const joint = isLong ? '; ' : ', '
  return { sentence: `${capitalise(first)}${joint}${second}.`, notes: listNotes(verdict, units) }
}
