import { describe, expect, it } from 'vitest'
import { checkReadings } from '../../../shared/checker/check-readings.js'
import {
  GENERAL_CAUTIONS,
  explainChange,
  explainGaugeDisagreement,
  explainPhysiologyCaution,
  explainQuestion,
} from '../../../shared/checker/explain.js'
import { writeProbability } from '../../../shared/checker/explain-probability.js'
import { explainVerdict } from '../../../shared/checker/explain-verdict.js'
import type { Reading } from '../../../shared/checker/reading.js'
import { generalCautionSchema, questionSchema } from '../../../shared/checker/check.js'
import type { CitedRange } from '../../../shared/species.js'
import { makeCheckInput, makeCheckPage, makeCitedPhysiology, makeReading } from '../../helpers/check-page.js'
import { makeRange } from '../../helpers/page-content.js'

const celsius = { temperature: 'degC', length: 'cm' } as const
const fahrenheit = { temperature: 'degF', length: 'in' } as const
/** With four equal repeats and this accuracy, u is √(1² + (0.1/√12)²): 1.0004. */
const u1 = { form: 'expanded', absolute: 2, relativePercent: null, combine: 'larger' } as const

function explain(
  ranges: CitedRange[],
  value: number,
  part: Partial<Reading> = {},
  units: typeof celsius | typeof fahrenheit = celsius,
) {
  const reading = makeReading({ values: [value, value, value, value], accuracy: u1, ...part })
  const [verdict] = checkReadings(makeCheckPage({ ranges }), makeCheckInput([reading])).verdicts
  if (verdict === undefined) throw new Error('A reading without a verdict.')
  return explainVerdict(verdict, units)
}

describe('a probability in words', () => {
  it.each([
    [0.995, '99.5 %'],
    [0.9496, '94.9 %'],
    [0.95, '95.0 %'],
    [0.9991, 'over 99.9 %'],
    [0.999, '99.9 %'],
    [1, 'over 99.9 %'],
    [0.0004, 'under 0.1 %'],
    [0, 'under 0.1 %'],
    [0.001, '0.1 %'],
    [0.5, '50.0 %'],
  ])('%d is %s', (probability, words) => {
    expect(writeProbability(probability, false)).toBe(words)
  })

  it('is 0 or 100 % only when certain', () => {
    expect([writeProbability(0, true), writeProbability(1, true)]).toEqual(['0 %', '100 %'])
  })
})

describe('a verdict in words', () => {
  const row = makeRange('row', { low: 40, high: 46, lowerLimit: 10, upperLimit: 54 })
  const upperOnly = makeRange('row', { low: 40, high: 46, upperLimit: 54 })

  it('holds the range and the limit in one sentence', () => {
    expect(explain([upperOnly], 49).sentence).toBe('Above 46 °C (99.8 % sure), clear of the limit at 54 °C.')
    expect(explain([row], 43).sentence).toBe(
      'Inside 40 to 46 °C (99.7 % sure), clear of the limits at 10 °C and 54 °C.',
    )
  })

  it('puts a limit first that is near or past', () => {
    expect(explain([row], 53).sentence).toBe(
      'Near the upper limit at 54 °C (15.8 % likely past it), above 46 °C (over 99.9 % sure).',
    )
    expect(explain([row], 55).sentence).toBe(
      'Past the upper limit at 54 °C (84.1 % likely), above 46 °C (over 99.9 % sure).',
    )
    expect(explain([row], 9.5).sentence).toMatch(
      /^Past the lower limit at 10 °C \(69\.1 % likely\), below 40 °C/,
    )
  })

  it('names the two likeliest answers when it cannot tell', () => {
    expect(explain([makeRange('row', { low: 40, high: 46 })], 46.5).sentence).toBe(
      'This reading cannot tell: above 46 °C (69.1 %) or inside 40 to 46 °C (30.8 %); no limit is cited.',
    )
  })

  it('speaks the reader’s unit', () => {
    expect(explain([upperOnly], 49, {}, fahrenheit).sentence).toBe(
      'Above 114.8 °F (99.8 % sure), clear of the limit at 129.2 °F.',
    )
  })

  it('says what a single bound leaves open', () => {
    expect(explain([makeRange('row', { low: 20 })], 30).sentence).toBe(
      'Not below 20 °C (over 99.9 % sure), with no upper bound cited; no limit is cited.',
    )
  })

  it('says that no range is cited, and that others are', () => {
    const juvenile = makeRange('row', { lifeStage: 'juvenile', low: 40, high: 46 })
    const { sentence, notes } = explain([juvenile], 43)
    expect(sentence).toBe('No range is cited for exactly this question; no limit is cited.')
    expect(notes.join(' ')).toMatch(/another life stage or season/)
  })

  it('notes what the instrument cannot do, in differences of the reader’s unit', () => {
    const narrow = [makeRange('row', { low: 24, high: 26 })]
    expect(explain(narrow, 25).notes).toEqual([
      'This instrument cannot confirm a range this narrow. One accurate to ±0.88 °C could.',
    ])
    expect(explain(narrow, 25, {}, fahrenheit).notes.join(' ')).toContain('±1.5 °F')
  })

  it('notes a reading on a bound and the safer way', () => {
    expect(explain([row], 46).notes).toEqual([
      'The reading lies on the bound of 46 °C. No instrument settles which side it is on; lower is safer.',
    ])
  })

  it('notes the whole enclosure, a borrowed limit and a default accuracy', () => {
    const whole = makeRange('whole', { position: 'whole-enclosure', low: 20, high: 30, upperLimit: 35 })
    expect(explain([whole], 25).notes.join(' ')).toMatch(/whole enclosure answers/)
    expect(explain([whole, makeRange('own', { low: 20, high: 30 })], 25).notes.join(' ')).toMatch(
      /more general range/,
    )
    expect(explain([row], 43, { accuracy: null }).notes.join(' ')).toMatch(/usual one for this kind/)
  })

  it('notes what the surface’s emissivity changed', () => {
    const infrared = {
      position: 'basking-surface',
      instrument: 'infrared-thermometer',
      surface: { material: 'sand', emissivity: 0.9, emissivitySet: 1, surroundings: 25 },
    } as const
    const range = makeRange('row', { position: 'basking-surface', low: 38, high: 46 })
    expect(explain([range], 40, infrared).notes.join(' ')).toMatch(/showed 40 °C; .* that is 41\.5 °C/)
  })
})

describe('cautions in words', () => {
  const page = makeCheckPage({
    physiology: [
      makeCitedPhysiology('s', { meanC: 34 }),
      makeCitedPhysiology('m', { quantity: 'critical-thermal-maximum', meanC: 42 }),
    ],
  })
  const cautionsAt = (value: number) =>
    checkReadings(
      page,
      makeCheckInput([makeReading({ position: 'cool-hide', values: [value] })]),
    ).physiologyCautions.map((caution) => explainPhysiologyCaution(caution, fahrenheit))

  it('name the study, its n and the figure, in the reader’s unit', () => {
    expect(cautionsAt(36)).toEqual([
      expect.stringMatching(/93\.2 °F.*Study 1 2001, n = 12, life stage not stated/),
    ])
    expect(cautionsAt(41)).toEqual([expect.stringMatching(/^Danger: .*107\.6 °F.*n = 12/)])
  })

  it('of a study without n say so', () => {
    const bare = makeCheckPage({ physiology: [makeCitedPhysiology('s', { meanC: 34, n: null })] })
    const result = checkReadings(bare, makeCheckInput([makeReading({ position: 'cool-hide', values: [36] })]))
    const [caution] = result.physiologyCautions
    if (caution === undefined) throw new Error('No caution.')
    expect(explainPhysiologyCaution(caution, celsius)).toContain('number of animals not stated')
  })

  it('of every check are there in words', () => {
    for (const caution of generalCautionSchema.options)
      expect(GENERAL_CAUTIONS[caution]).toMatch(/^[A-Z].*\.$/)
  })
})

describe('a change in words', () => {
  const range = makeRange('row', { position: 'basking-surface', low: 30, high: 34, upperLimit: 60 })
  const changeAt = (value: number, room: number | null, part: Partial<Reading> = {}) => {
    const reading = makeReading({
      position: 'basking-surface',
      values: [value],
      accuracy: { ...u1, absolute: 0.2 },
      ...part,
    })
    const roomTemperature = room === null ? null : ({ value: room, unit: 'degC' } as const)
    const own = makeRange('row', { ...range.row, period: part.period ?? 'day' })
    const change = checkReadings(
      makeCheckPage({ ranges: [own] }),
      makeCheckInput([reading], { roomTemperature }),
    ).firstChange
    if (change === null) throw new Error('Nothing to change.')
    return explainChange(change, celsius)
  }

  it('gives an estimate in per cent and says that it is one', () => {
    const weaker = changeAt(44, 20)
    expect(weaker.advice).toContain('about 50 % of the power')
    expect(weaker.advice).toContain('Aim for 32 °C.')
    expect(weaker).toMatchObject({ isEstimate: true, source: 'common practice, no source' })
    expect(weaker.after).toMatch(/one thing, wait/)
    expect(changeAt(35, 12).advice).toMatch(/^Dim the lamp by about 13 %\./)
  })

  it('gives no number where there is none', () => {
    const less = changeAt(44, null)
    expect(less.isEstimate).toBe(false)
    expect(less.advice).not.toMatch(/\d+ %|\{/)
  })

  it('gives the night floor with the swing it assumes', () => {
    const night = changeAt(20, 15, { period: 'night' })
    expect(night.advice).toMatch(/floor of about 31\.\d °C/)
    expect(night.assumes).toContain('2.0 °C')
  })

  it('past a limit sends the animal out and aims at nothing', () => {
    expect(changeAt(70, 20).advice).toMatch(/take the animal out now\. Put it back only/)
    expect(changeAt(70, 20).advice).not.toContain('Aim')
  })
})

it('asks back in words, with the value as typed', () => {
  expect(explainQuestion('meant-fahrenheit', 95)).toMatch(/Did you mean 95 °F\?/)
  for (const question of questionSchema.options) expect(explainQuestion(question, 95)).toMatch(/\?.*\.$/)
})

it('says by how much two gauges differ, by the factor alone in °F', () => {
  const words = explainGaugeDisagreement(
    { readingIndexes: [0, 1], difference: 5, allowed: 2 },
    { unit: 'degC' },
    fahrenheit,
  )
  expect(words).toMatch(/differ by 9\.0 °F, more than the 3\.6 °F/)
})
