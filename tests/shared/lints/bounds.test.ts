import { describe, expect, it } from 'vitest'
import { lintBoundOrder, lintImpossible, lintOwnLimits, lintZones } from '../../../shared/lints/bounds.js'
import type { RangeRow } from '../../../shared/ranges.js'
import { makeEvidence, makePhysiology, makeRange } from '../../helpers/page-content.js'

function findIds(lints: readonly { id: string; itemIds: string[] }[]): [string, string[]][] {
  return lints.map(({ id, itemIds }) => [id, itemIds])
}

describe('the order of bounds', () => {
  it.each<Partial<RangeRow>>([
    { low: 30, high: 29 },
    { low: 20, high: 25, lowerLimit: 40, upperLimit: 10 },
  ])('is blocked when wrong: %o', (part) => {
    expect(findIds(lintBoundOrder([makeRange('a', part)]))).toEqual([['low-over-high', ['a']]])
  })

  it.each<Partial<RangeRow>>([
    { low: 29, high: 30 },
    { low: 30, high: 30 },
    { low: 30, high: null },
    { low: null, high: 30 },
  ])('is let pass when right or open: %o', (part) => {
    expect(lintBoundOrder([makeRange('a', part)])).toEqual([])
  })
})

describe('a limit', () => {
  it.each<Partial<RangeRow>>([
    { low: 20, high: 30, upperLimit: 29 },
    { low: 20, high: 30, upperLimit: 30 },
    { low: 20, high: 30, lowerLimit: 20 },
    { low: 20, high: 30, lowerLimit: 35 },
    { low: 20, high: null, upperLimit: 18 },
    { low: null, high: 30, lowerLimit: 31 },
  ])('may not lie in its range, on its bound or beyond: %o', (part) => {
    expect(findIds(lintOwnLimits([makeRange('a', part)]))).toEqual([['limit-inside-range', ['a']]])
  })

  it.each<Partial<RangeRow>>([
    { low: 20, high: 30, lowerLimit: 19.9, upperLimit: 30.1 },
    { low: 20, high: 30 },
    { low: null, high: null, lowerLimit: 5, upperLimit: 40 },
    { low: 20, high: null, upperLimit: 40 },
  ])('outside it is let pass: %o', (part) => {
    expect(lintOwnLimits([makeRange('a', part)])).toEqual([])
  })
})

describe('an exposure zone', () => {
  it.each([0, 5, 7, 2.5])('%d is blocked', (uvZone) => {
    const lints = lintZones([{ itemId: 'a', row: { parameter: 'uv-index', uvZone } }])
    expect(findIds(lints)).toEqual([['zone-outside-1-to-4', ['a']]])
  })

  it.each([1, 2, 3, 4, null])('%s is let pass', (uvZone) => {
    expect(lintZones([{ itemId: 'a', row: { parameter: 'uv-index', uvZone } }])).toEqual([])
  })
})

describe('a value nature does not know', () => {
  it.each<Partial<RangeRow>>([
    { low: -300, high: 20 },
    { parameter: 'relative-humidity', low: 60, high: 101 },
    { parameter: 'relative-humidity', low: -1, high: 60 },
    { parameter: 'uv-index', uvMeaning: 'typical', low: -0.1, high: 1 },
    { parameter: 'photoperiod', low: 12, high: 25 },
    { parameter: 'basking-heat-hours', low: 4, high: 8, upperLimit: 30 },
    { low: Number.NaN, high: 20 },
  ])('is blocked as bound or limit: %o', (part) => {
    const page = { ranges: [makeRange('a', part)], physiology: [] }
    expect(findIds(lintImpossible(page))).toEqual([['physically-impossible', ['a']]])
  })

  it('is blocked as a relative humidity under water', () => {
    const range = makeRange('a', { parameter: 'relative-humidity', position: 'water', low: 90, high: 100 })
    expect(findIds(lintImpossible({ ranges: [range], physiology: [] }))).toEqual([
      ['physically-impossible', ['a']],
    ])
  })

  it('is blocked in evidence and in physiology', () => {
    const range = makeRange('a', { parameter: 'relative-humidity', low: 60, high: 80 }, [
      makeEvidence('b', { low: 60, high: 800 }),
    ])
    const physiology = makePhysiology('c', { meanC: -400 })
    expect(findIds(lintImpossible({ ranges: [range], physiology: [physiology] }))).toEqual([
      ['physically-impossible', ['a', 'b']],
      ['physically-impossible', ['c']],
    ])
  })

  it.each<Partial<RangeRow>>([
    { low: -5, high: 60 },
    { parameter: 'relative-humidity', low: 0, high: 100 },
    { parameter: 'uv-index', uvMeaning: 'maximum', low: 0, high: 12 },
    { parameter: 'photoperiod', low: 0, high: 24 },
  ])('is not seen in the ends of what it knows: %o', (part) => {
    expect(lintImpossible({ ranges: [makeRange('a', part)], physiology: [] })).toEqual([])
  })
})
