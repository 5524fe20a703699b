import { describe, expect, test } from 'vitest'
import { chooseAxis } from '../../../../src/components/marks/axis.js'
import { assignLanes, spreadLanes } from '../../../../src/components/marks/lanes.js'

const axis = chooseAxis([], 'percentRh')

describe('lanes of evidence', () => {
  test('lines that stand clear share a lane, lines that overlap do not', () => {
    const lanes = assignLanes(axis, [
      { low: 10, high: 20 },
      { low: 30, high: 40 },
      { low: 15, high: 35 },
    ])
    expect(lanes).toEqual([0, 0, 1])
  })

  test('an open side reaches to the end of the axis', () => {
    const lanes = assignLanes(axis, [
      { low: 60, high: null },
      { low: 90, high: 95 },
      { low: null, high: 30 },
    ])
    expect(lanes).toEqual([0, 1, 0])
  })

  test('lanes stay inside their height however many there are', () => {
    const heights = spreadLanes(40, 4, 20, 5)
    expect(Math.min(...heights)).toBeGreaterThanOrEqual(4)
    expect(Math.max(...heights)).toBeLessThanOrEqual(24)
    expect(new Set(heights).size).toBe(40)
  })

  test('few lanes stand at the foot, next to the bar', () => {
    expect(spreadLanes(2, 4, 20, 5)).toEqual([19, 24])
    expect(spreadLanes(0, 4, 20, 5)).toEqual([])
  })
})
