import { describe, expect, it } from 'vitest'
import { lintAir } from '../../../shared/lints/air.js'
import type { Position } from '../../../shared/ranges.js'
import type { CitedRange } from '../../../shared/species.js'
import { makeRange } from '../../helpers/page-content.js'

function findIds(lints: readonly { id: string; itemIds: string[] }[]): [string, string[]][] {
  return lints.map(({ id, itemIds }) => [id, itemIds])
}

function place(position: Position, low: number, high: number, lowRh: number, highRh: number): CitedRange[] {
  return [
    makeRange(`${position} °C`, { position, low, high }),
    makeRange(`${position} %`, { position, parameter: 'relative-humidity', low: lowRh, high: highRh }),
  ]
}

describe('humidity that one air cannot do', () => {
  it('is a cool end that allows less vapour than the warm end asks for', () => {
    // Pa by ASHRAE 2017, table 3: at most 0.70 × 2063 (18 °C) = 1444 here, at least 0.85 × 2487 (21 °C) = 2114 there.
    const ranges = [...place('cool-end-air', 15, 18, 60, 70), ...place('warm-end-air', 21, 24, 85, 95)]
    expect(findIds(lintAir({ ranges, physiology: [] }))).toEqual([
      [
        'humidity-one-air-cannot-do',
        ['warm-end-air °C', 'warm-end-air %', 'cool-end-air °C', 'cool-end-air %'],
      ],
    ])
  })

  it('is one humidity asked of a whole enclosure with a steep gradient', () => {
    const ranges = [
      makeRange('cool', { position: 'cool-end-air', low: 22, high: 24 }),
      makeRange('warm', { position: 'basking-air', low: 38, high: 42 }),
      makeRange('rh', { position: 'whole-enclosure', parameter: 'relative-humidity', low: 50, high: 60 }),
    ]
    expect(findIds(lintAir({ ranges, physiology: [] }))).toEqual([
      ['humidity-one-air-cannot-do', ['warm', 'rh', 'cool']],
    ])
  })
})

describe('humidity that one air can do', () => {
  it('falls towards the warm end', () => {
    // 80 % at 15 to 18 °C is 1364 to 1650 Pa; 55 to 75 % at 21 to 24 °C is 1368 to 2238 Pa.
    const ranges = [...place('cool-end-air', 15, 18, 80, 80), ...place('warm-end-air', 21, 24, 55, 75)]
    expect(lintAir({ ranges, physiology: [] })).toEqual([])
  })

  it('is not asked of hides, which keep their own damp', () => {
    const ranges = [...place('humid-hide', 26, 30, 90, 100), ...place('cool-end-air', 22, 24, 20, 30)]
    expect(lintAir({ ranges, physiology: [] })).toEqual([])
  })

  it('is not asked between day and night', () => {
    const night = place('cool-end-air', 10, 12, 30, 40).map((range) => ({
      ...range,
      row: { ...range.row, period: 'night' as const },
    }))
    const ranges = [...night, ...place('warm-end-air', 30, 32, 60, 80)]
    expect(lintAir({ ranges, physiology: [] })).toEqual([])
  })

  it('is not computed for temperatures out of this world', () => {
    const ranges = [...place('cool-end-air', 900, 950, 60, 70), ...place('warm-end-air', 21, 24, 85, 95)]
    expect(lintAir({ ranges, physiology: [] })).toEqual([])
  })
})
