import { describe, expect, test } from 'vitest'
import {
  formatBounds,
  formatCount,
  formatDate,
  formatExact,
  formatIsoDate,
  formatNumber,
  formatPlural,
  formatRowBounds,
  formatRowLimit,
  formatValue,
  speakBounds,
  writeBoundsWithUnit,
  writePrinted,
} from '../../shared/format.js'
import type { RangeRow } from '../../shared/ranges.js'

const celsius = { temperature: 'degC', length: 'cm' } as const
const fahrenheit = { temperature: 'degF', length: 'in' } as const
const plain = (text: string | null) => text?.replaceAll('\u00a0', ' ')

function row(over: Partial<RangeRow>): RangeRow {
  return {
    parameter: 'temperature',
    position: 'basking-surface',
    period: 'day',
    season: 'any',
    lifeStage: 'adult',
    low: 40,
    high: 46,
    lowerLimit: null,
    upperLimit: null,
    typedUnit: 'degC',
    typed: null,
    uvMeaning: null,
    uvZone: null,
    note: null,
    ...over,
  }
}

describe('numbers', () => {
  test('a negative number has a real minus sign and zero has none', () => {
    expect(formatNumber(-3.25, 1)).toBe('−3.3')
    expect(formatNumber(-0.04, 1)).toBe('0.0')
  })

  test('thousands are grouped', () => {
    expect(plain(formatCount(9630))).toBe('9 630')
    expect(formatCount(630)).toBe('630')
  })

  test('one thing is singular', () => {
    expect(plain(formatPlural(1, 'study', 'studies'))).toBe('1 study')
    expect(plain(formatPlural(28, 'study', 'studies'))).toBe('28 studies')
  })

  test('a UV index keeps one decimal, a whole temperature none', () => {
    expect(plain(formatValue(3, 'uvi'))).toBe('3.0 UVI')
    expect(plain(formatValue(40, 'degC'))).toBe('40 °C')
    expect(plain(formatValue(38.6749, 'degC'))).toBe('38.7 °C')
  })

  test('a stored number in full keeps what the data print', () => {
    expect(plain(formatExact(38.6749, 'degC'))).toBe('38.6749 °C')
    expect(plain(formatExact(41.8, 'degC'))).toBe('41.8 °C')
    expect(plain(formatExact(40, 'degF'))).toBe('104.0 °F')
  })
})

test('a number never parts from its unit at the end of a line', () => {
  expect(formatValue(40, 'degC')).toBe('40\u00a0°C')
  expect(writeBoundsWithUnit(formatBounds(40, 46, 'degC'))).not.toContain(' ')
})

describe('ranges', () => {
  test('both bounds have the same count of decimals', () => {
    expect(plain(writeBoundsWithUnit(formatBounds(38.5, 42, 'degC')))).toBe('38.5 – 42.0 °C')
  })

  test('an open side is said in words', () => {
    expect(plain(writeBoundsWithUnit(formatBounds(null, 25, 'degC')))).toBe('at most 25 °C')
    expect(plain(writeBoundsWithUnit(formatBounds(20, null, 'degC')))).toBe('at least 20 °C')
  })

  test('equal bounds are one number', () => {
    expect(plain(writeBoundsWithUnit(formatBounds(12, 12, 'h')))).toBe('12 h')
  })

  test('a sentence says "to"', () => {
    expect(plain(speakBounds(formatBounds(40, 46, 'degC')))).toBe('40 to 46 °C')
    expect(plain(speakBounds(formatBounds(null, 46, 'degC')))).toBe('at most 46 °C')
  })

  test('a range is shown in the unit of the reader', () => {
    expect(plain(writeBoundsWithUnit(formatRowBounds(row({}), celsius)))).toBe('40 – 46 °C')
    expect(plain(writeBoundsWithUnit(formatRowBounds(row({}), fahrenheit)))).toBe('104 – 115 °F')
  })

  test('bounds typed in the unit of the reader are shown as typed', () => {
    const typed = row({
      low: (73 - 32) / 1.8,
      high: (90.5 - 32) / 1.8,
      typedUnit: 'degF',
      typed: { low: '73', high: '90.5', lowerLimit: null, upperLimit: null },
    })
    expect(plain(writeBoundsWithUnit(formatRowBounds(typed, fahrenheit)))).toBe('73.0 – 90.5 °F')
    expect(plain(writeBoundsWithUnit(formatRowBounds(typed, celsius)))).toBe('22.8 – 32.5 °C')
  })

  test('a limit is shown with its unit, or is absent', () => {
    expect(formatRowLimit(row({}), 'upperLimit', celsius)).toBeNull()
    expect(plain(formatRowLimit(row({ upperLimit: 54 }), 'upperLimit', celsius))).toBe('54 °C')
    expect(plain(formatRowLimit(row({ upperLimit: 54 }), 'upperLimit', fahrenheit))).toBe('129 °F')
  })
})

describe('printed numbers', () => {
  const none = { low: null, high: null, mean: null, sd: null }

  test('are written as their source prints them, in its unit', () => {
    expect(plain(writePrinted({ ...none, low: '38', high: '44.0', unit: 'degC' }, 'interval'))).toBe(
      '38 – 44.0 °C',
    )
    expect(plain(writePrinted({ ...none, mean: '95.2', sd: '1.4', unit: 'degF' }, 'mean-sd'))).toBe(
      '95.2 ± 1.4 °F',
    )
    expect(plain(writePrinted({ ...none, mean: '43', unit: 'degC' }, 'value'))).toBe('43 °C')
    expect(plain(writePrinted({ ...none, low: '70', unit: 'percentRh' }, 'at-least'))).toBe('at least 70 %')
    expect(plain(writePrinted({ ...none, high: '7', unit: 'uvi' }, 'at-most'))).toBe('at most 7 UVI')
  })
})

test('a date is the day in UTC, in the words of the locale', () => {
  expect(formatDate('2026-10-03T23:30:00.000Z', 'en-GB')).toBe('3 October 2026')
  expect(formatIsoDate('2026-10-03T23:30:00.000Z')).toBe('2026-10-03')
})
