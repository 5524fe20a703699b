import type { Position } from '../ranges.js'
import { toCanonical } from '../units.js'
import type { Question } from './check.js'
import { fitsPosition } from './instruments.js'
import { ASKED_BACK_TEMPERATURE_C, ASKED_BACK_UV_INDEX } from './policy.js'
import type { Reading } from './reading.js'
import { mean } from './uncertainty.js'

/** Positions under a lamp that may truly be hotter than 60 °C; at every other one the value is asked back. */
const SURFACES_THAT_GET_HOT: readonly Position[] = ['basking-surface', 'substrate']

/** What to ask back about a reading before its verdict is believed; empty when nothing looks like a slip. */
export function askBack(reading: Reading): Question[] {
  const questions: Question[] = []
  const value = toCanonical(mean(reading.values), reading.unit)
  if (reading.parameter === 'temperature' && value > ASKED_BACK_TEMPERATURE_C) {
    if (!SURFACES_THAT_GET_HOT.includes(reading.position)) {
      questions.push(reading.unit === 'degC' ? 'meant-fahrenheit' : 'temperature-very-high')
    }
  }
  if (reading.parameter === 'uv-index' && value > ASKED_BACK_UV_INDEX) questions.push('uv-index-very-high')
  if (!fitsPosition(reading.instrument, reading.position)) questions.push('instrument-does-not-fit-position')
  return questions
}
