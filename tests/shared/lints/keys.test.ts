import { describe, expect, it } from 'vitest'
import { lintDuplicateKeys, lintInheritedLimits, lintJoiningRows } from '../../../shared/lints/keys.js'
import type { CitedRange } from '../../../shared/species.js'
import { makeRange } from '../../helpers/page-content.js'

function findIds(lints: readonly { id: string; itemIds: string[] }[]): [string, string[]][] {
  return lints.map(({ id, itemIds }) => [id, itemIds])
}

function pageOf(...ranges: CitedRange[]) {
  return { ranges, physiology: [] }
}

describe('duplicate keys', () => {
  it('are blocked, all of one key together', () => {
    const ranges = [
      makeRange('a', { low: 20, high: 25 }),
      makeRange('b', { low: 22, high: 27 }),
      makeRange('c', { low: 18, high: 20, period: 'night' }),
    ]
    expect(findIds(lintDuplicateKeys(ranges))).toEqual([['duplicate-key', ['a', 'b']]])
  })

  it('are not seen where one key differs, the meaning of a UV index included', () => {
    const uv = { parameter: 'uv-index', position: 'basking-air' } as const
    const ranges = [
      makeRange('a', { ...uv, uvMeaning: 'typical' }),
      makeRange('b', { ...uv, uvMeaning: 'maximum' }),
      makeRange('c', { lifeStage: 'juvenile' }),
      makeRange('d', {}),
    ]
    expect(lintDuplicateKeys(ranges)).toEqual([])
  })
})

describe('a joining row', () => {
  const anyJuvenile = makeRange('juvenile', { period: 'any', lifeStage: 'juvenile', low: 24, high: 26 })
  const nightAny = makeRange('night', { period: 'night', low: 18, high: 20 })

  it('is asked for where two rows answer and neither is the closer one', () => {
    expect(findIds(lintJoiningRows(pageOf(anyJuvenile, nightAny)))).toEqual([
      ['needs-joining-row', ['juvenile', 'night']],
    ])
  })

  it('settles the question once it is there', () => {
    const joining = makeRange('join', { period: 'night', lifeStage: 'juvenile', low: 19, high: 21 })
    expect(lintJoiningRows(pageOf(anyJuvenile, nightAny, joining))).toEqual([])
  })

  it('is not asked for where one row is closer in every key', () => {
    const dayAny = makeRange('day', { low: 28, high: 30 })
    const dayJuvenile = makeRange('day-juvenile', { lifeStage: 'juvenile', low: 27, high: 29 })
    expect(lintJoiningRows(pageOf(dayAny, dayJuvenile))).toEqual([])
  })

  it('is not asked for between rows that never meet, as "any" covers no brumation', () => {
    const brumation = makeRange('brumation', { period: 'any', season: 'brumation', low: 5, high: 8 })
    expect(lintJoiningRows(pageOf(brumation, nightAny))).toEqual([])
  })

  it('does not join rows with the very same keys; those are duplicates', () => {
    expect(lintJoiningRows(pageOf(nightAny, { ...nightAny, itemId: 'again' }))).toEqual([])
  })
})

describe('a limit that another row lends', () => {
  it('blocks a range that holds it', () => {
    const whole = makeRange('whole', { position: 'whole-enclosure', low: 20, high: 26, upperLimit: 30 })
    const warmEnd = makeRange('warm', { low: 28, high: 31 })
    expect(findIds(lintInheritedLimits(pageOf(whole, warmEnd)))).toEqual([
      ['limit-inside-range', ['warm', 'whole']],
    ])
  })

  it('is let pass outside the range', () => {
    const whole = makeRange('whole', { position: 'whole-enclosure', low: 20, high: 26, upperLimit: 34 })
    const warmEnd = makeRange('warm', { low: 28, high: 31 })
    expect(lintInheritedLimits(pageOf(whole, warmEnd))).toEqual([])
  })

  it('does not reach a basking surface from the whole enclosure', () => {
    const whole = makeRange('whole', { position: 'whole-enclosure', low: 20, high: 26, upperLimit: 34 })
    const basking = makeRange('basking', { position: 'basking-surface', low: 40, high: 45 })
    expect(lintInheritedLimits(pageOf(whole, basking))).toEqual([])
  })
})
