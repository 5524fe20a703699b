import { describe, expect, it } from 'vitest'
import { isWarmer, lintCoolEnd, lintHides, lintNights } from '../../../shared/lints/gradient.js'
import type { CitedRange } from '../../../shared/species.js'
import { makeRange } from '../../helpers/page-content.js'

function findIds(lints: readonly { id: string; itemIds: string[] }[]): [string, string[]][] {
  return lints.map(({ id, itemIds }) => [id, itemIds])
}

function pageOf(...ranges: CitedRange[]) {
  return { ranges, physiology: [] }
}

describe('warmer', () => {
  it.each([
    [{ low: 24, high: 30 }, { low: 22, high: 30 }, true],
    [{ low: 22, high: 30 }, { low: 24, high: 28 }, false],
    [{ low: 24, high: null }, { low: 22, high: 40 }, true],
    [{ low: null, high: 30 }, { low: 10, high: 31 }, false],
    [{ low: 24, high: null }, { low: null, high: 20 }, false],
  ])('is judged by the middle or by the shared bound: %o than %o is %s', (one, other, expected) => {
    expect(isWarmer(one, other)).toBe(expected)
  })
})

describe('the cool end', () => {
  it('is warned of where it is warmer than the warm end at the same time', () => {
    const page = pageOf(
      makeRange('cool', { position: 'cool-end-air', period: 'day', low: 30, high: 34 }),
      makeRange('warm', { position: 'warm-end-air', period: 'day', low: 22, high: 26 }),
    )
    expect(findIds(lintCoolEnd(page))).toEqual([['cool-end-warmer', ['cool', 'warm']]])
  })

  it('is warned of for the life stage it is wrong for', () => {
    const page = pageOf(
      makeRange('cool', { position: 'cool-hide', low: 22, high: 24 }),
      makeRange('warm', { position: 'warm-hide', low: 28, high: 30 }),
      makeRange('cool-juvenile', { position: 'cool-hide', lifeStage: 'juvenile', low: 31, high: 33 }),
    )
    expect(findIds(lintCoolEnd(page))).toEqual([['cool-end-warmer', ['cool-juvenile', 'warm']]])
  })

  it('may be as warm as the warm end, and warmer by day than that is by night', () => {
    const page = pageOf(
      makeRange('cool', { position: 'cool-end-air', period: 'any', low: 22, high: 24 }),
      makeRange('warm-day', { position: 'warm-end-air', period: 'day', low: 28, high: 30 }),
      makeRange('warm-night', { position: 'warm-end-air', period: 'night', low: 22, high: 24 }),
    )
    expect(lintCoolEnd(page)).toEqual([])
  })

  it('is no question where one row serves the whole enclosure', () => {
    expect(
      lintCoolEnd(pageOf(makeRange('whole', { position: 'whole-enclosure', low: 22, high: 24 }))),
    ).toEqual([])
  })
})

describe('a night', () => {
  it('warmer than the day is told', () => {
    const page = pageOf(
      makeRange('day', { period: 'day', low: 20, high: 22 }),
      makeRange('night', { period: 'night', low: 26, high: 28 }),
    )
    expect(findIds(lintNights(page))).toEqual([['night-warmer-than-day', ['night', 'day']]])
  })

  it('cooler than the day, or the same by one row, is not', () => {
    const page = pageOf(
      makeRange('day', { period: 'day', low: 26, high: 28 }),
      makeRange('night', { period: 'night', low: 20, high: 22 }),
      makeRange('water', { position: 'water', period: 'any', low: 24, high: 26 }),
    )
    expect(lintNights(page)).toEqual([])
  })
})

describe('a hide', () => {
  it('warmer than the basking surface by day is told', () => {
    const page = pageOf(
      makeRange('basking', { position: 'basking-surface', low: 30, high: 33 }),
      makeRange('hide', { position: 'warm-hide', low: 36, high: 38 }),
    )
    expect(findIds(lintHides(page))).toEqual([['hide-warmer-than-basking', ['hide', 'basking']]])
  })

  it('is held against the basking air where no surface is cited', () => {
    const page = pageOf(
      makeRange('basking', { position: 'basking-air', low: 30, high: 33 }),
      makeRange('hide', { position: 'humid-hide', low: 36, high: 38 }),
    )
    expect(findIds(lintHides(page))).toEqual([['hide-warmer-than-basking', ['hide', 'basking']]])
  })

  it('is warmer than the basking surface by night without a word', () => {
    const page = pageOf(
      makeRange('basking-day', { position: 'basking-surface', period: 'day', low: 40, high: 44 }),
      makeRange('basking-night', { position: 'basking-surface', period: 'night', low: 18, high: 22 }),
      makeRange('hide', { position: 'warm-hide', period: 'any', low: 28, high: 30 }),
    )
    expect(lintHides(page)).toEqual([])
  })
})
