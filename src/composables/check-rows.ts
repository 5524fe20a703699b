import type { AskedLifeStage, AskedSeason, Question } from '../../shared/checker/check.js'
import type { InstrumentKind } from '../../shared/checker/instruments.js'
import type { ReadingForm } from '../../shared/checker/parse-reading.js'
import type { Reading } from '../../shared/checker/reading.js'
import { selectRanges } from '../../shared/checker/selection.js'
import {
  parameterSchema,
  positionSchema,
  uvMeaningSchema,
  type Parameter,
  type Position,
  type UvMeaning,
} from '../../shared/ranges.js'
import type { CitedRange } from '../../shared/species.js'
import type { TemperatureUnit } from '../../shared/units.js'
import { chooseInstrument, chooseUnit } from './check-instruments.js'

/** One reading of the form, its numbers as typed. */
export interface FormRow {
  id: string
  form: ReadingForm
  /** The page has a range for this place, so the row stands ready; else the person named the place. */
  isPrepared: boolean
  /** The person has left one of its fields, so what is wrong may be said. */
  isTouched: boolean
  /** Questions asked back that the person has answered with yes. */
  settled: Question[]
}

/** Whose enclosure is asked about, in which season. */
export interface AskedFor {
  lifeStage: AskedLifeStage
  season: AskedSeason
}

type Place = Pick<ReadingForm, 'parameter' | 'position' | 'period' | 'uvMeaning'>

const PERIODS = ['day', 'night'] as const
const UV_MEANINGS: readonly (UvMeaning | null)[] = uvMeaningSchema.options
const NO_MEANING: readonly (UvMeaning | null)[] = [null]
/** Light comes by day: a row for day and night asks for one reading, with the lights on. */
const BY_DAY_ONLY: readonly Parameter[] = ['uv-index', 'photoperiod', 'basking-heat-hours']

/** A reading nobody has typed yet, with the usual instrument of its place. */
export function makeForm(
  place: {
    parameter: Parameter
    position: Position
    period: 'day' | 'night'
    uvMeaning: UvMeaning | null
  },
  unit: TemperatureUnit,
): ReadingForm {
  const instrument: InstrumentKind = chooseInstrument(place.parameter, place.position)
  return {
    ...place,
    uvMeaning: place.uvMeaning ?? '',
    values: [''],
    unit: chooseUnit(place.parameter, unit),
    instrument,
    accuracyForm: 'limit',
    accuracyAbsolute: '',
    accuracyRelativePercent: '',
    accuracyCombine: 'larger',
    resolution: '',
    surface: null,
  }
}

/** One reading for every place the page has a range of its own for, lights on before lights off. */
export function prepareForms(
  ranges: readonly CitedRange[],
  asked: AskedFor,
  unit: TemperatureUnit,
): ReadingForm[] {
  const isAnswered = (place: Parameters<typeof makeForm>[0]) =>
    selectRanges(ranges, { ...place, ...asked }).judged.some(({ row }) => {
      if (row.position !== place.position) return false
      return place.period === 'day' || row.period === 'night' || !BY_DAY_ONLY.includes(place.parameter)
    })
  return PERIODS.flatMap((period) =>
    parameterSchema.options.flatMap((parameter) =>
      positionSchema.options.flatMap((position) =>
        (parameter === 'uv-index' ? UV_MEANINGS : NO_MEANING)
          .map((uvMeaning) => ({ parameter, position, period, uvMeaning }))
          .filter(isAnswered)
          .map((place) => makeForm(place, unit)),
      ),
    ),
  )
}

/** What tells one place, time and parameter from another. */
export function toPlaceKey({ parameter, position, period, uvMeaning }: Place): string {
  return [parameter, position, period, uvMeaning].join(' ')
}

const writeNumber = (value: number | null) => (value === null ? '' : String(value))

/** A reading as the form that gives it. */
export function toForm(reading: Reading): ReadingForm {
  const { accuracy, surface } = reading
  return {
    parameter: reading.parameter,
    position: reading.position,
    period: reading.period,
    values: reading.values.map(writeNumber),
    unit: reading.unit,
    instrument: reading.instrument,
    accuracyForm: accuracy?.form ?? 'limit',
    accuracyAbsolute: writeNumber(accuracy?.absolute ?? null),
    accuracyRelativePercent: writeNumber(accuracy?.relativePercent ?? null),
    accuracyCombine: accuracy?.combine ?? 'larger',
    resolution: writeNumber(reading.resolution),
    uvMeaning: reading.uvMeaning ?? '',
    surface: surface && {
      material: surface.material ?? '',
      emissivity: writeNumber(surface.emissivity),
      emissivitySet: writeNumber(surface.emissivitySet),
      surroundings: writeNumber(surface.surroundings),
    },
  }
}

/** Whether nothing has been typed: such a row is no reading and no mistake. */
export function isEmpty({ form }: Pick<FormRow, 'form'>): boolean {
  return form.values.every((text) => text.trim() === '')
}

function compareRows(a: FormRow, b: FormRow, order: ReadonlyMap<string, number>): number {
  const placeOf = ({ form }: FormRow) => order.get(toPlaceKey(form)) ?? order.size
  return placeOf(a) - placeOf(b)
}

/**
 * The rows of a form for another question or page: what was typed stays, and takes the place that stands ready for it
 * where there is one; empty rows make room. `makeId` names the new rows.
 */
export function arrangeRows(
  rows: readonly FormRow[],
  prepared: readonly ReadingForm[],
  makeId: () => string,
): FormRow[] {
  const order = new Map(prepared.map((form, index) => [toPlaceKey(form), index]))
  const taken = new Set<string>()
  const kept = rows
    .filter((row) => !isEmpty(row) || !row.isPrepared)
    .map((row) => {
      const key = toPlaceKey(row.form)
      const isPrepared = !isEmpty(row) && order.has(key) && !taken.has(key)
      if (isPrepared) taken.add(key)
      return { ...row, isPrepared }
    })
  const fresh = prepared
    .filter((form) => !taken.has(toPlaceKey(form)))
    .map((form): FormRow => toRow(form, makeId(), true))
  const ready = [...kept.filter((row) => row.isPrepared), ...fresh].sort((a, b) => compareRows(a, b, order))
  return [...ready, ...kept.filter((row) => !row.isPrepared)]
}

/** A row around a form. */
export function toRow(form: ReadingForm, id: string, isPrepared: boolean): FormRow {
  return { id, form, isPrepared, isTouched: false, settled: [] }
}

/** Id of the element that holds a field; `path` is that of the reading (`accuracy.absolute`). */
export function toFieldId(rowId: string, path: string): string {
  return `${rowId}-${path.replaceAll('.', '-')}`
}
