import { describe, expect, it } from 'vitest'
import { checkInputSchema, checkResultSchema } from '../../../shared/checker/check.js'
import { checkReadings } from '../../../shared/checker/check-readings.js'
import type { Reading } from '../../../shared/checker/reading.js'
import type { CitedRange } from '../../../shared/species.js'
import { makeCheckInput, makeCheckPage, makeCitedPhysiology, makeReading } from '../../helpers/check-page.js'
import { makeEvidence, makeRange, testId } from '../../helpers/page-content.js'

const exact = { form: 'expanded', absolute: 0.2, relativePercent: null, combine: 'larger' } as const

function verdictOf(
  ranges: CitedRange[],
  reading: Partial<Reading>,
  part: Parameters<typeof makeCheckInput>[1] = {},
) {
  const [verdict] = checkReadings(
    makeCheckPage({ ranges }),
    makeCheckInput([makeReading(reading)], part),
  ).verdicts
  if (verdict === undefined) throw new Error('A reading without a verdict.')
  return verdict
}

describe('a verdict', () => {
  const day = makeRange('day', { low: 28, high: 32, lowerLimit: 15, upperLimit: 40 }, [
    makeEvidence('evidence', { low: 28, high: 32 }),
  ])

  it('inside the range and clear of the limits is green, and carries the row with its evidence', () => {
    const verdict = verdictOf([day], { values: [30], accuracy: exact })
    expect(verdict).toMatchObject({ standing: 'inside', isGreen: true, limit: { answer: 'clear' } })
    expect(verdict.rows).toEqual([day])
    expect(verdict.range.itemId).toBe('day')
  })

  it('is unclear where the default accuracy of the instrument cannot tell', () => {
    expect(verdictOf([day], { values: [31.5], instrument: 'dial-thermometer' })).toMatchObject({
      standing: 'unclear',
      isGreen: false,
      range: { likeliest: ['inside', 'high'] },
    })
  })

  it('shows a limit although the range is met, and a range although a limit is passed', () => {
    const tight = makeRange('tight', { low: 28, high: 32, upperLimit: 32.1 })
    expect(verdictOf([tight], { values: [31.8], accuracy: exact })).toMatchObject({
      standing: 'near',
      isGreen: false,
      limit: { answer: 'near', side: 'upper' },
    })
    expect(verdictOf([day], { values: [41], accuracy: exact })).toMatchObject({
      standing: 'past',
      limit: { answer: 'past', side: 'upper' },
      range: { answer: 'high' },
    })
  })

  it('judges a limit where no range is cited', () => {
    const limitOnly = makeRange('limit', { upperLimit: 35 })
    expect(verdictOf([limitOnly], { values: [37], accuracy: exact })).toMatchObject({
      standing: 'past',
      range: { answer: 'no-range', itemId: 'limit' },
    })
    expect(verdictOf([limitOnly], { values: [30], accuracy: exact })).toMatchObject({
      standing: 'no-range',
      isGreen: false,
      limit: { answer: 'clear' },
    })
  })

  it('without any row is no range and no limit', () => {
    expect(verdictOf([], {})).toMatchObject({
      standing: 'no-range',
      isGreen: false,
      limit: { answer: 'no-limit' },
      rows: [],
      judgements: [],
    })
  })

  it('for a juvenile without a row stays no range, and neither takes the adult’s limit', () => {
    const adult = makeRange('adult', { lifeStage: 'adult', low: 28, high: 32, upperLimit: 35 })
    expect(verdictOf([adult], { values: [38] }, { lifeStage: 'juvenile' })).toMatchObject({
      standing: 'no-range',
      limit: { answer: 'no-limit' },
      otherRows: [{ itemId: 'adult', differsIn: ['life-stage'] }],
    })
  })

  it('by night in brumation is not judged by the row for any season', () => {
    const any = makeRange('any', { period: 'any', low: 18, high: 24, lowerLimit: 12 })
    const night: Partial<Reading> = { period: 'night', values: [8] }
    expect(verdictOf([any], night, { season: 'brumation' })).toMatchObject({
      standing: 'no-range',
      limit: { answer: 'no-limit' },
      otherRows: [{ itemId: 'any', differsIn: ['season'] }],
    })
  })

  it('of two rows that neither outranks is the worse, with both shown', () => {
    const night = makeRange('night', { period: 'night', low: 20, high: 24 })
    const juvenile = makeRange('juvenile', { period: 'any', lifeStage: 'juvenile', low: 24, high: 30 })
    const verdict = verdictOf(
      [night, juvenile],
      { period: 'night', values: [22], accuracy: exact },
      { lifeStage: 'juvenile' },
    )
    expect(verdict).toMatchObject({ standing: 'low', isGreen: false, range: { itemId: 'juvenile' } })
    expect(verdict.judgements.map(({ itemId, answer }) => [itemId, answer])).toEqual([
      ['juvenile', 'low'],
      ['night', 'inside'],
    ])
    expect(verdict.rows).toHaveLength(2)
  })

  it('by the whole enclosure says so, and a limit of it holds beside a row of the position', () => {
    const whole = makeRange('whole', { position: 'whole-enclosure', low: 22, high: 30, upperLimit: 33 })
    expect(verdictOf([whole], { values: [26], accuracy: exact })).toMatchObject({
      standing: 'inside',
      isByWholeEnclosure: true,
    })
    const own = makeRange('own', { low: 32, high: 36 })
    const verdict = verdictOf([own, whole], { values: [34], accuracy: exact })
    expect(verdict).toMatchObject({
      standing: 'past',
      isGreen: false,
      range: { answer: 'inside' },
      limit: { upper: { itemId: 'whole', isInherited: true } },
    })
    expect(verdict.rows.map(({ itemId }) => itemId)).toEqual(['own', 'whole'])
  })

  it('of a reading in °F on a bound typed in °F lies on it', () => {
    const inF = makeRange('f', { low: ((88 - 32) * 5) / 9, high: ((92 - 32) * 5) / 9, typedUnit: 'degF' })
    expect(verdictOf([inF], { values: [92], unit: 'degF' }).range.onBound).toMatchObject({ bound: 'high' })
  })

  it('of humidity at 100 % in a range up to 100 % is inside', () => {
    const damp = makeRange('damp', {
      parameter: 'relative-humidity',
      position: 'humid-hide',
      low: 80,
      high: 100,
    })
    const reading: Partial<Reading> = {
      parameter: 'relative-humidity',
      position: 'humid-hide',
      unit: 'percentRh',
      instrument: 'capacitive-hygrometer',
      values: [100],
    }
    expect(verdictOf([damp], reading)).toMatchObject({ standing: 'inside', isGreen: true })
  })
})

describe('a check', () => {
  const page = makeCheckPage({
    ranges: [
      makeRange(testId(11), { position: 'basking-surface', low: 40, high: 46, upperLimit: 54 }),
      makeRange(testId(12), { position: 'cool-end-air', low: 22, high: 26, upperLimit: 33 }),
      makeRange(testId(13), { period: 'night', low: 18, high: 22, lowerLimit: 10 }),
    ],
    physiology: [makeCitedPhysiology('s', { meanC: 34 })],
  })
  const input = makeCheckInput(
    [
      makeReading({
        position: 'basking-surface',
        instrument: 'infrared-thermometer',
        values: [49.5],
        accuracy: exact,
      }),
      makeReading({ position: 'cool-end-air', values: [25.9], accuracy: exact }),
      makeReading({ position: 'substrate', values: [30], accuracy: exact }),
      makeReading({ position: 'cool-end-air', values: [32.8], accuracy: exact }),
      makeReading({ position: 'cool-end-air', values: [34], accuracy: exact }),
      makeReading({ period: 'night', values: [20], accuracy: exact }),
    ],
    { roomTemperature: { value: 68, unit: 'degF' } },
  )
  const result = checkReadings(page, input)

  it('is answered reading by reading, in order', () => {
    expect(result.verdicts.map(({ standing }) => standing)).toEqual([
      'high',
      'unclear',
      'no-range',
      'near',
      'past',
      'inside',
    ])
    expect(result.verdicts.map(({ readingIndex }) => readingIndex)).toEqual([0, 1, 2, 3, 4, 5])
    expect(result.verdicts.filter((verdict) => verdict.isGreen)).toHaveLength(1)
  })

  it('is summed up as its worst and the count of each', () => {
    expect(result.summary.worst).toBe('past')
    expect(result.summary.counts).toMatchObject({
      past: 1,
      near: 1,
      high: 1,
      unclear: 1,
      'no-range': 1,
      inside: 1,
    })
  })

  it('says that gauges at one place disagree', () => {
    expect(result.gaugeDisagreements.map(({ readingIndexes }) => readingIndexes)).toEqual([
      [1, 3],
      [1, 4],
      [3, 4],
    ])
  })

  it('says what to change first, and carries every general caution', () => {
    expect(result.firstChange).toMatchObject({ ruleId: 'past-upper-limit', readingIndex: 4, isUrgent: true })
    expect(result.generalCautions).toEqual(['heat-burns', 'uv-harms', 'no-veterinary-advice', 'local-law'])
  })

  it('names the revision it rests on and the current one', () => {
    const older = checkReadings({ ...page, currentRevisionNumber: 5 }, input)
    expect(older.revision).toMatchObject({ id: testId(102), number: 2, currentNumber: 5 })
  })

  it('takes the room in the unit it was typed in', () => {
    const only = makeCheckInput(input.readings.slice(0, 1), { roomTemperature: { value: 68, unit: 'degF' } })
    const change = checkReadings(page, only).firstChange
    expect(change).toMatchObject({ ruleId: 'weaker-lamp', targetC: 43 })
    expect(change?.powerRatio).toBeCloseTo(23 / 29.5, 12)
  })

  it('has the form that the API promises, also after a trip through JSON', () => {
    expect(checkResultSchema.parse(JSON.parse(JSON.stringify(result)))).toEqual(result)
  })

  it('changes neither the page nor the input, and answers the same twice', () => {
    const before = JSON.stringify([page, input])
    expect(checkReadings(page, input)).toEqual(result)
    expect(JSON.stringify([page, input])).toBe(before)
  })
})

describe('what a check may ask', () => {
  const good = makeCheckInput([makeReading({})])

  it.each([
    ['no readings', { ...good, readings: [] }],
    ['more than forty readings', { ...good, readings: Array.from({ length: 41 }, () => makeReading({})) }],
    ['any life stage', { ...good, lifeStage: 'any' }],
    ['any season', { ...good, season: 'any' }],
    ['any period', { ...good, readings: [{ ...makeReading({}), period: 'any' }] }],
    ['a value that is text', { ...good, readings: [{ ...makeReading({}), values: ['30'] }] }],
    ['a missing value', { ...good, readings: [{ ...makeReading({}), values: [null] }] }],
    ['a room below absolute zero', { ...good, roomTemperature: { value: -500, unit: 'degF' } }],
    ['a field nobody knows', { ...good, zone: 3 }],
  ])('is not %s', (_, input) => {
    expect(checkInputSchema.safeParse(input).success).toBe(false)
  })

  it('is this', () => {
    expect(checkInputSchema.parse(good)).toEqual(good)
  })
})

describe('danger to the body', () => {
  const page = makeCheckPage({
    physiology: [makeCitedPhysiology('maximum', { quantity: 'critical-thermal-maximum', meanC: 44 })],
  })

  it('is what to change first in a hide, although no range is cited', () => {
    const hide = makeReading({ position: 'warm-hide', values: [43] })
    expect(checkReadings(page, makeCheckInput([hide])).firstChange).toMatchObject({
      ruleId: 'body-heat-danger',
      readingIndex: 0,
    })
  })

  it('changes nothing under a basking lamp, which the animal can leave by places that were not read', () => {
    const basking = makeReading({ position: 'basking-surface', values: [43] })
    expect(checkReadings(page, makeCheckInput([basking])).firstChange).toBeNull()
  })
})
