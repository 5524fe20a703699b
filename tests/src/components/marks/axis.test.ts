import { describe, expect, test } from 'vitest'
import {
  chooseAxis,
  isOnAxis,
  toPercent,
  toPercentWidth,
  toShare,
} from '../../../../src/components/marks/axis.js'
import type { Unit } from '../../../../shared/units.js'

describe('the axis', () => {
  test.each<[string, number[], Unit, number, number]>([
    ['holds every value with round ends', [12, 40, 46, 54], 'degC', 0, 60],
    ['does not start below what it needs', [22, 26], 'degC', 18, 30],
    ['goes below zero where the values do', [-6, 4], 'degC', -8, 6],
    ['widens a single value to something that can be drawn', [25], 'degC', 20, 30],
    ['starts a UV index at zero', [4, 4.5], 'uvi', 0, 5],
    ['shows the whole of humidity', [70, 85], 'percentRh', 0, 100],
    ['shows the whole day', [12, 14], 'h', 0, 24],
    ['has a scale without any value', [], 'degC', 0, 8],
  ])('%s', (_title, values, unit, min, max) => {
    const axis = chooseAxis(values, unit)
    expect([axis.min, axis.max]).toEqual([min, max])
  })

  test('marks both ends and has between three and nine ticks', () => {
    for (const values of [
      [1, 2],
      [0, 100],
      [-17.3, 44.9],
      [38.2, 41.7],
      [100, 140],
    ]) {
      const axis = chooseAxis(values, 'degC')
      expect(axis.ticks.length).toBeGreaterThanOrEqual(3)
      expect(axis.ticks.length).toBeLessThanOrEqual(9)
      expect(axis.ticks[0]).toBeCloseTo(axis.min, 9)
      expect(axis.ticks.at(-1)).toBeCloseTo(axis.max, 9)
    }
  })

  test('a near look at humidity never leaves its scale', () => {
    const axis = chooseAxis([80, 100], 'percentRh', true)
    expect(axis.max).toBe(100)
    expect(axis.min).toBeGreaterThan(50)
  })

  test('a value is a share of it, one off its end stays on the end', () => {
    const axis = chooseAxis([0, 50], 'percentRh')
    expect(toShare(axis, 25)).toBe(0.25)
    expect(toPercent(axis, 33.333)).toBe('33.33%')
    expect(toPercentWidth(axis, 70, 85)).toBe('15%')
    expect(toPercent(axis, 140)).toBe('100%')
    expect(isOnAxis(axis, 140)).toBe(false)
    expect(isOnAxis(axis, 100)).toBe(true)
  })
})
