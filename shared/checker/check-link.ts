import { checkInputSchema } from './check.js'
import type { CheckInput } from './check.js'
import { toFieldErrors } from './parse-reading.js'
import type { FieldError } from './parse-reading.js'
import type { Reading } from './reading.js'

/** Name of the query parameter that carries a check; the species stands in the path. */
export const CHECK_LINK_PARAMETER = 'c'
/** Longest text a link may carry; a check of 40 readings with repeats stays well below. */
export const CHECK_LINK_LENGTH_MAX = 20_000

/*
 * Version 1: `1_revision_keys_room*reading*reading…` out of letters, digits and `* - . _`, none of which a query escapes.
 * keys: one letter each for season and life stage. room: a unit letter and a number, or nothing.
 * reading: five letters (parameter, position, period, unit, instrument) and the values parted by `x`, then any of
 * `_a` accuracy (form, combine, absolute x relative), `_d` resolution, `_m` UV meaning, `_s` surface (material letter,
 * emissivity x set x surroundings). A number is its shortest exact decimal. The letters never change meaning: a new
 * option gets a new letter, a new layout a new version.
 */
const VERSION = '1'

const SEASON_LETTERS = { a: 'active', b: 'brumation', e: 'aestivation' } as const
const LIFE_STAGE_LETTERS = {
  e: 'egg',
  l: 'larva',
  m: 'metamorph',
  h: 'hatchling',
  j: 'juvenile',
  a: 'adult',
  g: 'gravid',
} as const
const PARAMETER_LETTERS = {
  t: 'temperature',
  h: 'relative-humidity',
  u: 'uv-index',
  p: 'photoperiod',
  b: 'basking-heat-hours',
} as const
const POSITION_LETTERS = {
  b: 'basking-surface',
  a: 'basking-air',
  w: 'warm-end-air',
  h: 'warm-hide',
  c: 'cool-end-air',
  k: 'cool-hide',
  u: 'humid-hide',
  s: 'shade',
  g: 'substrate',
  l: 'water',
  e: 'whole-enclosure',
} as const
const PERIOD_LETTERS = { d: 'day', n: 'night' } as const
const UNIT_LETTERS = { c: 'degC', f: 'degF', r: 'percentRh', u: 'uvi', h: 'h' } as const
const INSTRUMENT_LETTERS = {
  p: 'probe-thermometer',
  i: 'infrared-thermometer',
  d: 'dial-thermometer',
  g: 'glass-thermometer',
  c: 'capacitive-hygrometer',
  h: 'dial-hygrometer',
  u: 'uv-index-meter',
  t: 'timer',
} as const
const UV_MEANING_LETTERS = { t: 'typical', m: 'maximum' } as const
const ACCURACY_FORM_LETTERS = { l: 'limit', e: 'expanded' } as const
const COMBINE_LETTERS = { l: 'larger', s: 'sum' } as const
const MATERIAL_LETTERS = {
  s: 'sand',
  o: 'soil',
  t: 'timber',
  b: 'brick',
  c: 'concrete',
  m: 'marble',
  l: 'slate',
  k: 'ceramic',
  g: 'glass',
  p: 'plastic',
  r: 'black-rubber',
  a: 'paper',
  w: 'water',
} as const
/** Stands for "no material named". */
const NO_MATERIAL = '0'

type Letters = Readonly<Record<string, string>>

function toLetter(letters: Letters, word: string): string {
  return Object.keys(letters).find((letter) => letters[letter] === word) ?? ''
}

function fromLetter(letters: Letters, letter: string | undefined): string | null {
  return letter !== undefined && Object.hasOwn(letters, letter) ? (letters[letter] ?? null) : null
}

function writeNumber(value: number | null): string {
  return value === null ? '' : String(value).replace('e+', 'e')
}

/** A number as this module writes it; NaN for anything else, which the schema refuses; null for nothing. */
function readNumber(text: string | undefined): number | null {
  if (text === undefined || text === '') return null
  return /^-?\d+(?:\.\d+)?(?:e-?\d+)?$/.test(text) ? Number(text) : Number.NaN
}

function writeReading(reading: Reading): string {
  const { accuracy, resolution, uvMeaning, surface } = reading
  const letters = [
    toLetter(PARAMETER_LETTERS, reading.parameter),
    toLetter(POSITION_LETTERS, reading.position),
    toLetter(PERIOD_LETTERS, reading.period),
    toLetter(UNIT_LETTERS, reading.unit),
    toLetter(INSTRUMENT_LETTERS, reading.instrument),
  ]
  const parts = [letters.join('') + reading.values.map(writeNumber).join('x')]
  if (accuracy !== null) {
    const form = toLetter(ACCURACY_FORM_LETTERS, accuracy.form)
    const how = toLetter(COMBINE_LETTERS, accuracy.combine)
    parts.push(`a${form}${how}${writeNumber(accuracy.absolute)}x${writeNumber(accuracy.relativePercent)}`)
  }
  if (resolution !== null) parts.push(`d${writeNumber(resolution)}`)
  if (uvMeaning !== null) parts.push(`m${toLetter(UV_MEANING_LETTERS, uvMeaning)}`)
  if (surface !== null) {
    const material = surface.material === null ? NO_MATERIAL : toLetter(MATERIAL_LETTERS, surface.material)
    const numbers = [surface.emissivity, surface.emissivitySet, surface.surroundings]
    parts.push(`s${material}${numbers.map(writeNumber).join('x')}`)
  }
  return parts.join('_')
}

/** A check as the value of the link's query parameter; reads back to an equal check. The slug is left to the path. */
export function encodeCheck(input: Omit<CheckInput, 'slug'>): string {
  const { revision, season, lifeStage, roomTemperature, readings } = input
  const keys = toLetter(SEASON_LETTERS, season) + toLetter(LIFE_STAGE_LETTERS, lifeStage)
  const room =
    roomTemperature === null
      ? ''
      : toLetter(UNIT_LETTERS, roomTemperature.unit) + writeNumber(roomTemperature.value)
  const head = [VERSION, writeNumber(revision), keys, room].join('_')
  return [head, ...readings.map(writeReading)].join('*')
}

function readReading(text: string) {
  const [main = '', ...options] = text.split('_')
  const reading: Record<string, unknown> = {
    parameter: fromLetter(PARAMETER_LETTERS, main[0]),
    position: fromLetter(POSITION_LETTERS, main[1]),
    period: fromLetter(PERIOD_LETTERS, main[2]),
    values: main.slice(5).split('x').map(readNumber),
    unit: fromLetter(UNIT_LETTERS, main[3]),
    instrument: fromLetter(INSTRUMENT_LETTERS, main[4]),
    accuracy: null,
    resolution: null,
    uvMeaning: null,
    surface: null,
  }
  for (const option of options) {
    const rest = option.slice(1)
    switch (option[0]) {
      case 'a': {
        const [absolute, relativePercent] = rest.slice(2).split('x').map(readNumber)
        reading.accuracy = {
          form: fromLetter(ACCURACY_FORM_LETTERS, rest[0]),
          combine: fromLetter(COMBINE_LETTERS, rest[1]),
          absolute: absolute ?? null,
          relativePercent: relativePercent ?? null,
        }
        break
      }
      case 'd':
        reading.resolution = readNumber(rest) ?? Number.NaN
        break
      case 'm':
        reading.uvMeaning = fromLetter(UV_MEANING_LETTERS, rest[0]) ?? ''
        break
      case 's': {
        const [emissivity, emissivitySet, surroundings] = rest.slice(1).split('x').map(readNumber)
        const material = rest[0] === NO_MATERIAL ? null : (fromLetter(MATERIAL_LETTERS, rest[0]) ?? '')
        reading.surface = { material, emissivity, emissivitySet, surroundings }
        break
      }
      default:
        // An option this version does not know would change the verdict unseen; the schema refuses the extra key.
        reading[`option ${option[0] ?? ''}`] = rest
    }
  }
  return reading
}

export type DecodedCheck = { ok: true; input: CheckInput } | { ok: false; errors: FieldError[] }

const UNREADABLE = 'This link cannot be read. It may have been cut short; ask for it again.'

/** The check a link carries, for the species of its path, or what is wrong with it. Never throws. */
export function decodeCheck(slug: string, text: string): DecodedCheck {
  if (text.length > CHECK_LINK_LENGTH_MAX) {
    return {
      ok: false,
      errors: [{ path: CHECK_LINK_PARAMETER, message: 'This link is too long for a check.' }],
    }
  }
  const [head = '', ...readings] = text.split('*')
  const [version, revision, keys = '', room = '', ...surplus] = head.split('_')
  if (version !== VERSION || surplus.length > 0) {
    const isNewer = version !== undefined && /^\d+$/.test(version) && Number(version) > Number(VERSION)
    const message = isNewer ? 'This link was made by a newer version of the checker.' : UNREADABLE
    return { ok: false, errors: [{ path: CHECK_LINK_PARAMETER, message }] }
  }
  const parsed = checkInputSchema.safeParse({
    slug,
    revision: readNumber(revision),
    season: fromLetter(SEASON_LETTERS, keys[0]),
    lifeStage: fromLetter(LIFE_STAGE_LETTERS, keys[1]),
    roomTemperature:
      room === '' ? null : { unit: fromLetter(UNIT_LETTERS, room[0]), value: readNumber(room.slice(1)) },
    readings: readings.map(readReading),
  })
  if (parsed.success) return { ok: true, input: parsed.data }
  return {
    ok: false,
    errors: [{ path: CHECK_LINK_PARAMETER, message: UNREADABLE }, ...toFieldErrors(parsed.error)],
  }
}
