import type { ReadingVerdict } from '../../../shared/checker/check.js'
import type { ReadingForm } from '../../../shared/checker/parse-reading.js'
import type { Reading } from '../../../shared/checker/reading.js'
import { writeValue } from '../../../shared/checker/explain-value.js'
import { formatNumber, toReaderUnit, type ReaderUnits } from '../../../shared/format.js'
import { PERIOD_LABELS, POSITION_LABELS, UNIT_LABELS, UV_MEANING_LABELS } from '../../../shared/labels.js'
import {
  parameterSchema,
  periodSchema,
  positionSchema,
  uvMeaningSchema,
  type Parameter,
} from '../../../shared/ranges.js'
import { differenceFromCanonical } from '../../../shared/units.js'

type Place = Pick<ReadingForm, 'parameter' | 'position' | 'period'> & { uvMeaning: string | null }

/** Half the width of an interval that holds the true value with 95 %, in standard uncertainties. */
export const COVERAGE = 1.96

const PARAMETER_NAMES: Readonly<Record<Parameter, string>> = {
  temperature: 'temperature',
  'relative-humidity': 'humidity',
  'uv-index': 'UV index',
  photoperiod: 'photoperiod',
  'basking-heat-hours': 'hours of basking heat',
}

function labelOf<K extends string>(
  labels: Readonly<Record<K, string>>,
  options: readonly K[],
  key: string | null,
) {
  const known = options.find((option) => option === key)
  return known === undefined ? null : labels[known]
}

/** "Basking surface", with what is measured there where it is no temperature: "Basking air, UV index, typical exposure". */
export function namePlace(place: Place): string {
  const position = labelOf(POSITION_LABELS, positionSchema.options, place.position)
  const parameter =
    place.parameter === 'temperature' && position !== null
      ? null
      : labelOf(PARAMETER_NAMES, parameterSchema.options, place.parameter)
  const meaning = labelOf(UV_MEANING_LABELS, uvMeaningSchema.options, place.uvMeaning)
  const words = [position, parameter, meaning?.toLowerCase() ?? null]
    .filter((part) => part !== null)
    .join(', ')
  return words.charAt(0).toUpperCase() + words.slice(1)
}

/** The same with the time, for a sentence or a table: "Basking surface, lights on". */
export function nameReading(place: Place): string {
  const period = labelOf(PERIOD_LABELS, periodSchema.options, place.period)
  return [namePlace(place), period?.toLowerCase() ?? null].filter((part) => part).join(', ')
}

/** What was read with the interval that holds it with 95 %: "49 ± 2.4 °C", in the reader's unit. */
export function writeMeasured(measured: ReadingVerdict['measured'], units: ReaderUnits): string {
  const shown = toReaderUnit(measured.unit, units)
  const spread = differenceFromCanonical(COVERAGE * measured.uncertainty, shown)
  const value = writeValue(measured.value, shown)
  const number = value.slice(0, value.lastIndexOf(' '))
  return `${number} ± ${formatNumber(spread, spread < 0.1 ? 2 : 1)} ${UNIT_LABELS[shown]}`
}

/** The numbers of a reading as they were typed, with their unit: "49, 50 °C". */
export function writeTyped(reading: Pick<Reading, 'values' | 'unit'>): string {
  return `${reading.values.map((value) => String(value).replace('-', '−')).join(', ')} ${UNIT_LABELS[reading.unit]}`
}

/** The same words with every number kept on one line with its unit. */
export function keepUnits(text: string): string {
  return text.replace(/(\d) (?=°C|°F|%|UVI|h\b)/g, '$1\u00a0')
}
