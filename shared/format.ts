import type { PrintedNumbers, Statement } from './evidence.js'
import { UNIT_LABELS } from './labels.js'
import type { RangeRow, TypedBounds } from './ranges.js'
import { fromCanonical } from './units.js'
import type { LengthUnit, TemperatureUnit, Unit } from './units.js'

/** The units a reader has chosen; everything else has one unit only. */
export interface ReaderUnits {
  temperature: TemperatureUnit
  length: LengthUnit
}

const NO_BREAK_SPACE = '\u00a0'
const DECIMALS_MAX = 6

/** The unit a reader is shown a canonical quantity in: `degC` and `cm` follow the reader, the others stay. */
export function toReaderUnit(canonical: Unit, units: ReaderUnits): Unit {
  if (canonical === 'degC' || canonical === 'degF') return units.temperature
  if (canonical === 'cm' || canonical === 'in') return units.length
  return canonical
}

/** How many decimals a number needs to be written whole, at most `most`. */
export function countDecimals(value: number, most: number): number {
  for (let decimals = 0; decimals < most; decimals += 1) {
    const scaled = value * 10 ** decimals
    if (Math.abs(scaled - Math.round(scaled)) < 1e-7 * Math.max(1, Math.abs(scaled))) return decimals
  }
  return most
}

/** A number with a fixed count of decimals and a real minus sign; never "-0". */
export function formatNumber(value: number, decimals: number): string {
  const text = Math.abs(value).toFixed(Math.min(decimals, DECIMALS_MAX))
  return value < 0 && Number(text) !== 0 ? `−${text}` : text
}

/** A count in groups of thousands that stay on one line: 9 630. */
export function formatCount(count: number): string {
  return String(count).replace(/\B(?=(\d{3})+(?!\d))/g, NO_BREAK_SPACE)
}

/** "1 study", "28 studies". */
export function formatPlural(count: number, one: string, many: string): string {
  return `${formatCount(count)}${NO_BREAK_SPACE}${count === 1 ? one : many}`
}

/** The decimals a bare canonical number is shown with: UV indices always one, the others none or one. */
function decimalsShown(values: readonly number[], shown: Unit): number {
  if (shown === 'uvi') return 1
  return Math.max(0, ...values.map((value) => countDecimals(value, 1)))
}

/** A canonical number in a reader's unit, with its unit: "40 °C", "104 °F", "3.0 UVI". */
export function formatValue(canonical: number, shown: Unit): string {
  return `${formatBareValue(canonical, shown)}${NO_BREAK_SPACE}${UNIT_LABELS[shown]}`
}

/** The same without the unit. */
export function formatBareValue(canonical: number, shown: Unit): string {
  return formatNumber(fromCanonical(canonical, shown), decimalsShown([canonical], shown))
}

/** A stored number in full for a list of records: as many decimals as it has, in °C no fewer than the data print. */
export function formatExact(canonical: number, shown: Unit): string {
  const value = fromCanonical(canonical, shown)
  const decimals = shown === 'degF' ? Math.max(1, countDecimals(canonical, 4)) : countDecimals(value, 4)
  return `${formatNumber(value, decimals)}${NO_BREAK_SPACE}${UNIT_LABELS[shown]}`
}

/** Numbers of a range, ready to be set: the bounds (null where open) and the unit. */
export interface ShownBounds {
  low: string | null
  high: string | null
  unit: string
}

/** Two bounds with the same count of decimals, in a reader's unit. */
export function formatBounds(low: number | null, high: number | null, shown: Unit): ShownBounds {
  const known = [low, high].filter((bound): bound is number => bound !== null)
  const decimals = decimalsShown(known, shown)
  const write = (bound: number | null) =>
    bound === null ? null : formatNumber(fromCanonical(bound, shown), decimals)
  return { low: write(low), high: write(high), unit: UNIT_LABELS[shown] }
}

type BoundName = keyof TypedBounds

function wasTypedIn(row: RangeRow, shown: Unit, bounds: readonly BoundName[]): boolean {
  const { typed } = row
  if (typed === null || row.typedUnit !== shown) return false
  return bounds.every((bound) => row[bound] === null || isPlainNumber(typed[bound]))
}

function isPlainNumber(text: string | null): text is string {
  return text !== null && /^[-−]?\d+(?:\.\d+)?$/.test(text.trim())
}

function padDecimals(texts: readonly (string | null)[], least: number): (string | null)[] {
  const clean = texts.map((text) => text?.trim().replace('-', '−') ?? null)
  const decimals = Math.max(least, ...clean.map((text) => text?.split('.')[1]?.length ?? 0))
  return clean.map((text) => {
    if (text === null) return null
    const [whole, fraction = ''] = text.split('.')
    return decimals === 0 ? (whole ?? text) : `${whole}.${fraction.padEnd(decimals, '0')}`
  })
}

/** The bounds of a range row: as the contributor typed them where the reader uses that unit, else converted. */
export function formatRowBounds(row: RangeRow, units: ReaderUnits): ShownBounds {
  const shown = toReaderUnit(row.typedUnit, units)
  if (!wasTypedIn(row, shown, ['low', 'high'])) return formatBounds(row.low, row.high, shown)
  const texts = [
    row.low === null ? null : (row.typed?.low ?? null),
    row.high === null ? null : (row.typed?.high ?? null),
  ]
  const [low = null, high = null] = padDecimals(texts, shown === 'uvi' ? 1 : 0)
  return { low, high, unit: UNIT_LABELS[shown] }
}

/** One limit of a range row with its unit, or null where none is cited. */
export function formatRowLimit(
  row: RangeRow,
  limit: 'lowerLimit' | 'upperLimit',
  units: ReaderUnits,
): string | null {
  const value = row[limit]
  if (value === null) return null
  const shown = toReaderUnit(row.typedUnit, units)
  const typed = row.typed?.[limit] ?? null
  if (wasTypedIn(row, shown, [limit]) && typed !== null) {
    const [text] = padDecimals([typed], shown === 'uvi' ? 1 : 0)
    return `${text}${NO_BREAK_SPACE}${UNIT_LABELS[shown]}`
  }
  return formatValue(value, shown)
}

/** "40 – 46", "40 or more", "at most 46", "40": the numbers of a range without their unit. */
export function writeBounds(bounds: ShownBounds): string {
  const { low, high } = bounds
  if (low !== null && high !== null) {
    return low === high ? low : `${low}${NO_BREAK_SPACE}–${NO_BREAK_SPACE}${high}`
  }
  if (low !== null) return `at least${NO_BREAK_SPACE}${low}`
  if (high !== null) return `at most${NO_BREAK_SPACE}${high}`
  return 'not given'
}

/** "40 – 46 °C": the numbers of a range with their unit. */
export function writeBoundsWithUnit(bounds: ShownBounds): string {
  return `${writeBounds(bounds)}${NO_BREAK_SPACE}${bounds.unit}`
}

/** "40 to 46 °C": the same for a sentence read aloud. */
export function speakBounds(bounds: ShownBounds): string {
  const { low, high, unit } = bounds
  if (low !== null && high !== null && low !== high) return `${low} to ${high}${NO_BREAK_SPACE}${unit}`
  return writeBoundsWithUnit(bounds)
}

/** A date in words in the given locale, the day as it is in UTC: "3 October 2026". */
export function formatDate(iso: string, locale: string): string {
  return new Intl.DateTimeFormat(locale, {
    day: 'numeric',
    month: 'long',
    year: 'numeric',
    timeZone: 'UTC',
  }).format(new Date(iso))
}

/** The ISO form of the same day, for the hover and for machines: "2026-10-03". */
export function formatIsoDate(iso: string): string {
  return new Date(iso).toISOString().slice(0, 10)
}

/** A statement's numbers exactly as its source prints them, with the printed unit: "38.2 ± 1.4 °C". */
export function writePrinted(printed: PrintedNumbers, statement: Statement): string {
  const unit = `${NO_BREAK_SPACE}${UNIT_LABELS[printed.unit]}`
  const { low, high, mean, sd } = printed
  switch (statement) {
    case 'interval':
      return `${writeBounds({ low, high, unit: '' })}${unit}`
    case 'mean-sd':
      return `${mean ?? '?'}${sd === null ? '' : `${NO_BREAK_SPACE}±${NO_BREAK_SPACE}${sd}`}${unit}`
    case 'value':
      return `${mean ?? '?'}${unit}`
    case 'at-least':
      return `at least${NO_BREAK_SPACE}${low ?? '?'}${unit}`
    case 'at-most':
      return `at most${NO_BREAK_SPACE}${high ?? '?'}${unit}`
  }
}
