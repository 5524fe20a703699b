import { describe, expect, it } from 'vitest'
import { checkReadings } from '../../../../shared/checker/check-readings.js'
import type { Reading } from '../../../../shared/checker/reading.js'
import { landReadings } from '../../../../src/components/checker/check-targets.js'
import { makeCheckInput, makeReading } from '../../../helpers/check-page.js'
import { makeRange, makeSpeciesPage } from '../../../helpers/species-page.js'

const CELSIUS = { temperature: 'degC', length: 'cm' } as const
const uv = { parameter: 'uv-index', position: 'basking-air', typedUnit: 'uvi' } as const
const page = makeSpeciesPage({
  ranges: [
    makeRange({}),
    makeRange({ ...uv, low: 3, high: 5, uvMeaning: 'typical' }),
    makeRange({ ...uv, low: 4, high: 7, uvMeaning: 'maximum' }),
  ],
})

function land(readings: Reading[], period: 'day' | 'night' = 'day') {
  const { verdicts } = checkReadings(page, makeCheckInput(readings))
  const landed = readings.map((reading, index) => ({
    reading,
    verdict: verdicts[index]!,
    address: `#r${index}`,
  }))
  const asked = { lifeStage: 'adult', season: 'active', period } as const
  return landReadings(page.ranges, asked, landed, CELSIUS).map(({ position, lines }) => [
    position,
    ...lines.map(({ text, standing }) => [text.replaceAll('\u00a0', ' '), standing]),
  ])
}

describe('readings on the drawn enclosure', () => {
  it('stand in the place of the target they were held against, and of no other', () => {
    const typical = makeReading({
      parameter: 'uv-index',
      position: 'basking-air',
      values: [4],
      unit: 'uvi',
      instrument: 'uv-index-meter',
      uvMeaning: 'typical',
    })
    expect(land([typical])).toEqual([
      ['basking-surface', ['40 – 46 °C', null]],
      ['basking-air', ['read 4.0 UVI', 'inside'], ['4.0 – 7.0 UVI peak', null]],
    ])
  })

  it('get a place of their own where the page has no target', () => {
    expect(land([makeReading({ position: 'water', values: [25] })]).at(-1)).toEqual([
      'water',
      ['read 25 °C', 'no-range'],
    ])
  })

  it('stand worst first where two gauges read one place', () => {
    const at = (value: number) => makeReading({ position: 'basking-surface', values: [value] })
    expect(land([at(43), at(52)])[0]).toEqual([
      'basking-surface',
      ['read 52 °C', 'high'],
      ['read 43 °C', 'inside'],
    ])
  })

  it('leave the other half of the day alone', () => {
    expect(land([makeReading({ position: 'basking-surface', values: [43] })], 'night')).toEqual([])
  })
})
