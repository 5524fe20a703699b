import type { z } from 'zod'
import { askBack } from './ask-back.js'
import type { Question } from './check.js'
import { parseNumber } from './parse-number.js'
import { readingSchema } from './reading.js'
import type { Reading } from './reading.js'

/** A reading as a form holds it: every number as typed text, every choice as its key or empty. */
export interface ReadingForm {
  parameter: string
  position: string
  period: string
  /** Repeats as typed; empty ones are left out. */
  values: string[]
  unit: string
  instrument: string
  accuracyForm: string
  accuracyAbsolute: string
  accuracyRelativePercent: string
  accuracyCombine: string
  resolution: string
  uvMeaning: string
  /** Null when the surface is not named. */
  surface: { material: string; emissivity: string; emissivitySet: string; surroundings: string } | null
}

/** What is wrong with one field; the path is that of the reading (`values.0`, `accuracy.absolute`). */
export interface FieldError {
  path: string
  message: string
}

export type ParsedReading =
  /** `questions` are to be confirmed by the person before the verdict is believed. */
  { ok: true; reading: Reading; questions: Question[] } | { ok: false; errors: FieldError[] }

const MESSAGES = {
  missing: 'Type what the instrument shows.',
  'not-a-number': 'This is not a number. Write it like 38.5 or 38,5, without unit.',
  zone: 'A zone is a class of animals, numbered 1 to 4; a meter shows a UV index. Type the number the meter shows.',
  choose: 'Choose one.',
} as const

/** "zone 3", "Z3": somebody typed an exposure zone where the meter's index belongs. */
function looksLikeZone(text: string): boolean {
  return /^\s*(?:uv\s*)?z(?:one)?\s*\d*\s*$/i.test(text)
}

/** Zod issues as field errors, paths joined by dots. */
export function toFieldErrors(error: z.ZodError): FieldError[] {
  return error.issues.map(({ path, message }) => ({ path: path.map(String).join('.'), message }))
}

/**
 * A form's text as a reading, or what is wrong with each field. Empty is missing, never zero; an accuracy or resolution left
 * empty stays unstated, and the instrument kind's default stands in for it later.
 */
export function parseReading(form: ReadingForm): ParsedReading {
  const errors: FieldError[] = []
  const read = (path: string, text: string, isRequired: boolean): number | null => {
    const parsed = parseNumber(text)
    if (parsed.form === 'number') return parsed.value
    if (parsed.form === 'not-a-number') errors.push({ path, message: MESSAGES['not-a-number'] })
    else if (isRequired) errors.push({ path, message: MESSAGES.missing })
    return null
  }

  const values: number[] = []
  /** Where each value stood in the form, so that an error lands on the field that was typed in. */
  const places: number[] = []
  form.values.forEach((text, index) => {
    if (form.parameter === 'uv-index' && looksLikeZone(text)) {
      errors.push({ path: `values.${index}`, message: MESSAGES.zone })
      return
    }
    const value = read(`values.${index}`, text, false)
    if (value === null) return
    values.push(value)
    places.push(index)
  })
  if (values.length === 0 && errors.length === 0) errors.push({ path: 'values.0', message: MESSAGES.missing })

  const absolute = read('accuracy.absolute', form.accuracyAbsolute, false)
  const relativePercent = read('accuracy.relativePercent', form.accuracyRelativePercent, false)
  const isStated = absolute !== null || relativePercent !== null
  const accuracy = isStated
    ? { form: form.accuracyForm, absolute, relativePercent, combine: form.accuracyCombine || 'larger' }
    : null
  const resolution = read('resolution', form.resolution, false)
  const surface = form.surface && {
    material: form.surface.material === '' ? null : form.surface.material,
    emissivity: read('surface.emissivity', form.surface.emissivity, true),
    emissivitySet: read('surface.emissivitySet', form.surface.emissivitySet, true),
    surroundings: read('surface.surroundings', form.surface.surroundings, true),
  }
  for (const key of ['parameter', 'position', 'period', 'unit', 'instrument'] as const) {
    if (form[key] === '') errors.push({ path: key, message: MESSAGES.choose })
  }
  if (errors.length > 0) return { ok: false, errors }

  const { parameter, position, period, unit, instrument } = form
  const uvMeaning = form.uvMeaning === '' ? null : form.uvMeaning
  const candidate = {
    parameter,
    position,
    period,
    values,
    unit,
    instrument,
    accuracy,
    resolution,
    uvMeaning,
    surface,
  }
  const parsed = readingSchema.safeParse(candidate)
  if (!parsed.success) {
    const inForm = ({ path, message }: FieldError): FieldError => {
      const place = /^values\.(\d+)$/.exec(path)?.[1]
      return { path: place === undefined ? path : `values.${places[Number(place)] ?? place}`, message }
    }
    return { ok: false, errors: toFieldErrors(parsed.error).map(inForm) }
  }
  return { ok: true, reading: parsed.data, questions: askBack(parsed.data) }
}
