import { describe, expect, it } from 'vitest'
import { INSTRUMENTS } from '../../../shared/checker/instruments.js'
import type { Accuracy, Reading } from '../../../shared/checker/reading.js'
import {
  combine,
  compareGauges,
  fromAccuracy,
  fromLimit,
  fromResolution,
  measureReading,
  standardDeviation,
} from '../../../shared/checker/uncertainty.js'
import { makeReading } from '../../helpers/check-page.js'
import { expectedOf, inputOf, listCheckValues, requireCheckValue } from '../../helpers/check-values.js'

function makeAccuracy(part: Partial<Accuracy>): Accuracy {
  return { form: 'limit', absolute: null, relativePercent: null, combine: 'larger', ...part }
}

function partOf(reading: Reading, from: string) {
  const part = measureReading(reading).parts.find((candidate) => candidate.from === from)
  if (part === undefined) throw new Error(`No part from ${from}.`)
  return part
}

describe('standard uncertainties', () => {
  it.each(listCheckValues('u-type-b-uniform-'))('meets the check value $id ($source)', (value) => {
    expect(fromLimit(inputOf(value, 'input'))).toBeCloseTo(expectedOf(value), 6)
  })

  it('takes a display of 1 % for 0.288675 (JCGM 100:2008)', () => {
    const value = requireCheckValue('u-type-b-resolution-1')
    expect(fromResolution(inputOf(value, 'input'))).toBeCloseTo(expectedOf(value), 6)
  })

  it('combines parts by root sum of squares (JCGM 100:2008, 5.1.2; hand-worked: 3, 4, 12 give 13)', () => {
    expect(combine([3, 4, 12])).toBeCloseTo(13, 12)
  })

  it('takes s with n − 1 (hand-worked: 2, 4, 4, 4, 5, 5, 7, 9 have 32/7 for s²)', () => {
    expect(standardDeviation([2, 4, 4, 4, 5, 5, 7, 9])).toBeCloseTo(Math.sqrt(32 / 7), 12)
  })
})

describe('a stated accuracy', () => {
  it.each([
    ['a limit of ±0.5', makeAccuracy({ absolute: 0.5 }), 30, 0.288675],
    ['a k = 2 uncertainty of 0.5', makeAccuracy({ form: 'expanded', absolute: 0.5 }), 30, 0.25],
    ['2 % of 40', makeAccuracy({ relativePercent: 2 }), 40, 0.46188],
    ['the larger of ±2 and 2 % of 150', makeAccuracy({ absolute: 2, relativePercent: 2 }), 150, 1.732051],
    ['the larger of ±2 and 2 % of 40', makeAccuracy({ absolute: 2, relativePercent: 2 }), 40, 1.154701],
    ['±2 plus 2 % of 50', makeAccuracy({ absolute: 2, relativePercent: 2, combine: 'sum' }), 50, 1.732051],
    ['2 % of −40, as of 40', makeAccuracy({ relativePercent: 2 }), -40, 0.46188],
  ])('gives the hand-worked u of %s', (_, accuracy, value, expected) => {
    expect(fromAccuracy(accuracy, value)).toBeCloseTo(expected, 6)
  })

  it('holds in the instrument’s own unit: 2 % of 104 °F is 1.16 °C, 2 % of 40 °C is 0.8 °C', () => {
    const accuracy = makeAccuracy({ relativePercent: 2 })
    const inF = makeReading({ values: [104], unit: 'degF', accuracy })
    const inC = makeReading({ values: [40], unit: 'degC', accuracy })
    expect(measureReading(inF).value).toBe(measureReading(inC).value)
    expect(partOf(inF, 'accuracy').uncertainty * Math.sqrt(3)).toBeCloseTo(1.1556, 4)
    expect(partOf(inC, 'accuracy').uncertainty * Math.sqrt(3)).toBeCloseTo(0.8, 12)
  })

  it('takes a constant in °F by the factor alone: ±1.8 °F is ±1 °C', () => {
    const reading = makeReading({ values: [90], unit: 'degF', accuracy: makeAccuracy({ absolute: 1.8 }) })
    expect(partOf(reading, 'accuracy').uncertainty).toBeCloseTo(1 / Math.sqrt(3), 12)
  })
})

describe('what is not stated', () => {
  it('is never zero: every kind of instrument has an uncertainty of its own', () => {
    for (const [kind, { parameters }] of Object.entries(INSTRUMENTS)) {
      const instrument = kind as keyof typeof INSTRUMENTS
      const parameter = parameters[0]
      const measured = measureReading(makeReading({ instrument, parameter, values: [0], unit: 'degC' }))
      expect(measured.uncertainty, kind).toBeGreaterThan(0)
    }
  })

  it('is the same for one temperature in °C and in °F', () => {
    const inC = measureReading(makeReading({ values: [35], unit: 'degC' }))
    const inF = measureReading(makeReading({ values: [95], unit: 'degF' }))
    expect(inF.uncertainty).toBeCloseTo(inC.uncertainty, 12)
    expect(inC.parts.every(({ isDefault }) => isDefault)).toBe(true)
  })

  it('gives way to what the keeper states, part by part', () => {
    const reading = makeReading({ accuracy: makeAccuracy({ absolute: 0.2 }), resolution: 0.5 })
    expect(partOf(reading, 'accuracy')).toMatchObject({ isDefault: false })
    expect(partOf(reading, 'resolution').uncertainty).toBeCloseTo(0.5 / (2 * Math.sqrt(3)), 12)
    expect(partOf(reading, 'repeatability')).toMatchObject({ isDefault: true })
  })
})

describe('repeats', () => {
  const repeatability = INSTRUMENTS['probe-thermometer'].repeatability

  it.each([
    [[30], repeatability],
    [[30, 31], repeatability / Math.SQRT2],
    [[30, 31, 35], repeatability / Math.sqrt(3)],
  ])('of %j use the kind’s usual scatter over √n, whatever their own', (values, expected) => {
    const reading = makeReading({ values })
    expect(partOf(reading, 'repeatability').uncertainty).toBeCloseTo(expected, 12)
  })

  it('use their own s from four on (hand-worked: 29, 31, 29, 31 have s = 1.1547)', () => {
    const reading = makeReading({ values: [29, 31, 29, 31] })
    expect(measureReading(reading).value).toBe(30)
    expect(partOf(reading, 'repeatability')).toMatchObject({ isDefault: false })
    expect(partOf(reading, 'repeatability').uncertainty).toBeCloseTo(1.154701 / 2, 6)
  })

  it('turn their scatter in °F into °C by the factor alone', () => {
    const reading = makeReading({ values: [88, 92, 88, 92], unit: 'degF' })
    expect(partOf(reading, 'repeatability').uncertainty).toBeCloseTo((2.309401 / 2) * (5 / 9), 6)
  })

  it('leave accuracy and step in place even when all agree', () => {
    expect(measureReading(makeReading({ values: [30, 30, 30, 30] })).uncertainty).toBeGreaterThan(0.5)
  })
})

describe('an infrared reading', () => {
  const infrared = {
    instrument: 'infrared-thermometer',
    position: 'basking-surface',
    accuracy: makeAccuracy({ absolute: 2 }),
  } as const

  it('of an unnamed surface is left as it is', () => {
    expect(measureReading(makeReading({ ...infrared, values: [40] }))).toMatchObject({
      value: 40,
      uncorrectedValue: null,
    })
  })

  it('of a named surface is corrected, also in °F, and its uncertainty carried along', () => {
    const surface = { material: null, emissivity: 0.9, emissivitySet: 1, surroundings: 77 }
    const reading = makeReading({ ...infrared, values: [104], unit: 'degF', surface })
    const measured = measureReading(reading)
    expect(measured.value).toBeCloseTo(expectedOf(requireCheckValue('ir-correct-40-0.9-25')), 2)
    expect(measured.uncorrectedValue).toBe(40)
    const bare = measureReading({ ...reading, surface: null })
    expect(measured.uncertainty).toBeGreaterThan(bare.uncertainty)
    expect(measured.parts.map(({ from }) => from)).toContain('emissivity')
  })
})

describe('two gauges at one place', () => {
  it.each([
    [1.0, 0.3, 0.4, false],
    [1.001, 0.3, 0.4, true],
    [0, 0, 0, false],
  ])(
    'that differ by %d with u of %d and %d disagree: %s (2·√(u₁² + u₂²))',
    (difference, u1, u2, disagree) => {
      const found = compareGauges({ value: 0, uncertainty: u1 }, { value: difference, uncertainty: u2 })
      expect(found.disagree).toBe(disagree)
    },
  )
})
