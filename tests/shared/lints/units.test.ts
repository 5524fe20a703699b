import { describe, expect, it } from 'vitest'
import { lintUnits } from '../../../shared/lints/units.js'
import type { RangeRow } from '../../../shared/ranges.js'
import { makeEvidence, makePhysiology, makeRange } from '../../helpers/page-content.js'

function findItems(ranges: Parameters<typeof lintUnits>[0]['ranges']): string[][] {
  const lints = lintUnits({ ranges, physiology: [] })
  expect(lints.every(({ id }) => id === 'looks-like-other-unit')).toBe(true)
  return lints.map(({ itemIds }) => itemIds)
}

describe('a range that looks like one in another unit', () => {
  it.each<[string, Partial<RangeRow>]>([
    ['90 to 95 at the warm end, in °C', { low: 90, high: 95 }],
    ['a limit of 104 °C', { low: 28, high: 32, upperLimit: 104 }],
    ['95 to 110 on the basking surface, in °C', { position: 'basking-surface', low: 95, high: 110 }],
    // 28 °F and 32 °F.
    ['28 to 32, in °F', { typedUnit: 'degF', low: -2.2222, high: 0 }],
    ['50 to 55 in brumation, in °C', { season: 'brumation', low: 50, high: 55 }],
    // 8 °F.
    ['8 to 40 in brumation, in °F', { season: 'brumation', typedUnit: 'degF', low: -13.333, high: 4.444 }],
    [
      '0.6 to 0.8 % humidity',
      { parameter: 'relative-humidity', typedUnit: 'percentRh', low: 0.6, high: 0.8 },
    ],
  ])('is %s', (_, part) => {
    expect(findItems([makeRange('a', part)])).toEqual([['a']])
  })

  it.each<[string, Partial<RangeRow>]>([
    ['28 to 32 °C with a lower limit near freezing', { low: 28, high: 32, lowerLimit: 2 }],
    ['60 to 68 °C on the basking surface', { position: 'basking-surface', low: 60, high: 68 }],
    // 85 to 90 °F with a lower limit of 41 °F.
    ['85 to 90 °F', { typedUnit: 'degF', low: 29.444, high: 32.222, lowerLimit: 5 }],
    // 40 to 50 °F.
    ['40 to 50 °F in brumation', { season: 'brumation', typedUnit: 'degF', low: 4.444, high: 10 }],
    ['0 to 40 % humidity', { parameter: 'relative-humidity', typedUnit: 'percentRh', low: 0, high: 40 }],
    [
      'a UV index of 0 to 0.7',
      { parameter: 'uv-index', uvMeaning: 'typical', typedUnit: 'uvi', low: 0, high: 0.7 },
    ],
    ['no bound at all', {}],
  ])('is not %s', (_, part) => {
    expect(findItems([makeRange('a', part)])).toEqual([])
  })
})

describe('evidence that looks like evidence in another unit', () => {
  it('is hot air in °C', () => {
    expect(findItems([makeRange('a', {}, [makeEvidence('b', { low: 85, high: 90 })])])).toEqual([['a', 'b']])
  })

  it('is a °F number taken over unconverted', () => {
    const printed = { low: '50', high: '55', mean: null, sd: null, unit: 'degF' } as const
    const unconverted = makeEvidence('b', { printed, low: 50, high: 55 })
    expect(findItems([makeRange('a', {}, [unconverted])])).toEqual([['a', 'b']])
    const converted = makeEvidence('b', { printed, low: 10, high: 12.7777777778 })
    expect(findItems([makeRange('a', {}, [converted])])).toEqual([])
  })
})

describe('physiology that looks like physiology in another unit', () => {
  it('is a body at 95 °C, or 95 °F left as it stood', () => {
    const printed = { low: null, high: null, mean: '50', sd: null, unit: 'degF' } as const
    const lints = lintUnits({
      ranges: [],
      physiology: [
        makePhysiology('a', { meanC: 95 }),
        makePhysiology('b', { meanC: 50, printed }),
        makePhysiology('c', { meanC: 38.2 }),
      ],
    })
    expect(lints.map(({ itemIds }) => itemIds)).toEqual([['a'], ['b']])
  })
})
