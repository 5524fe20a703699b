import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { selectRanges } from '../../../shared/checker/selection.js'
import type { Asked } from '../../../shared/checker/selection.js'
import { lifeStageSchema, periodSchema, positionSchema, seasonSchema } from '../../../shared/ranges.js'
import { makeRange } from '../../helpers/page-content.js'

function ask(part: Partial<Asked>): Asked {
  return {
    parameter: 'temperature',
    position: 'warm-end-air',
    period: 'day',
    season: 'active',
    lifeStage: 'adult',
    uvMeaning: null,
    ...part,
  }
}

const ids = (ranges: { itemId: string }[]) => ranges.map(({ itemId }) => itemId)

describe('which rows match', () => {
  it('needs the position, and each other key equal or any', () => {
    const ranges = [
      makeRange('right', { lifeStage: 'adult', low: 28, high: 32 }),
      makeRange('night', { period: 'night', low: 20, high: 24 }),
      makeRange('elsewhere', { position: 'warm-hide', low: 28, high: 30 }),
      makeRange('humidity', { parameter: 'relative-humidity', low: 40, high: 60 }),
      makeRange('juvenile', { lifeStage: 'juvenile', low: 30, high: 33 }),
    ]
    expect(ids(selectRanges(ranges, ask({})).judged)).toEqual(['right'])
  })

  it.each([
    ['egg', { lifeStage: 'egg' }],
    ['larva', { lifeStage: 'larva' }],
    ['brumation', { season: 'brumation' }],
  ] as const)('never lets a row for any cover %s, nor lend it a limit', (_, part) => {
    const ranges = [makeRange('any', { low: 28, high: 32, lowerLimit: 10, upperLimit: 40 })]
    const selection = selectRanges(ranges, ask(part))
    expect(selection.judged).toEqual([])
    expect([selection.lower, selection.upper]).toEqual([null, null])
    expect(selection.others.map(({ range }) => range.itemId)).toEqual(['any'])
  })

  it.each(['metamorph', 'hatchling', 'juvenile', 'adult', 'gravid'] as const)(
    'lets a row for any stage cover %s',
    (lifeStage) => {
      expect(selectRanges([makeRange('any', { low: 28 })], ask({ lifeStage })).judged).toHaveLength(1)
    },
  )

  it('finds a brumation night only in a row for brumation', () => {
    const ranges = [
      makeRange('any', { period: 'any', low: 20, high: 24 }),
      makeRange('cool', { period: 'any', season: 'brumation', low: 5, high: 10, lowerLimit: 2 }),
    ]
    const selection = selectRanges(ranges, ask({ season: 'brumation', period: 'night' }))
    expect(ids(selection.judged)).toEqual(['cool'])
    expect(selection.lower?.value).toBe(2)
  })
})

describe('which matching row is judged by', () => {
  it('is the most specific one', () => {
    const ranges = [
      makeRange('any', { period: 'any', low: 20 }),
      makeRange('day', { low: 24 }),
      makeRange('adult-day', { lifeStage: 'adult', low: 26 }),
      makeRange('adult-day-active', { lifeStage: 'adult', season: 'active', low: 28 }),
    ]
    expect(ids(selectRanges(ranges, ask({})).judged)).toEqual(['adult-day-active'])
  })

  it('is each of several when none outranks the others', () => {
    const ranges = [
      makeRange('night', { period: 'night', low: 20, high: 24 }),
      makeRange('juvenile', { period: 'any', lifeStage: 'juvenile', low: 22, high: 26 }),
      makeRange('all', { period: 'any', low: 10, high: 40 }),
    ]
    const asked = ask({ period: 'night', lifeStage: 'juvenile' })
    expect(ids(selectRanges(ranges, asked).judged)).toEqual(['night', 'juvenile'])
    const joined = [...ranges, makeRange('joint', { period: 'night', lifeStage: 'juvenile', low: 23 })]
    expect(ids(selectRanges(joined, asked).judged)).toEqual(['joint'])
  })

  it('is both of two rows with the same keys, rather than neither', () => {
    const ranges = [makeRange('a', { low: 20 }), makeRange('b', { low: 22 })]
    expect(ids(selectRanges(ranges, ask({})).judged)).toEqual(['a', 'b'])
  })

  it('is none for a juvenile without a row, whose other stages are shown with what they differ in', () => {
    const ranges = [
      makeRange('adult', { lifeStage: 'adult', low: 28, high: 32, upperLimit: 40 }),
      makeRange('adult-brumation', { lifeStage: 'adult', season: 'brumation', low: 5, high: 10 }),
      makeRange('adult-night', { lifeStage: 'adult', period: 'night', low: 20, high: 24 }),
    ]
    const selection = selectRanges(ranges, ask({ lifeStage: 'juvenile' }))
    expect(selection.judged).toEqual([])
    expect(selection.upper).toBeNull()
    expect(selection.others.map(({ range, differsIn }) => [range.itemId, differsIn])).toEqual([
      ['adult', ['life-stage']],
      ['adult-brumation', ['life-stage', 'season']],
    ])
  })
})

describe('the whole enclosure', () => {
  const whole = makeRange('whole', {
    position: 'whole-enclosure',
    period: 'any',
    low: 22,
    high: 27,
    lowerLimit: 15,
    upperLimit: 33,
  })

  it.each(['basking-air', 'warm-end-air', 'warm-hide', 'cool-end-air', 'cool-hide', 'humid-hide'] as const)(
    'serves %s when it has no row of its own',
    (position) => {
      const selection = selectRanges([whole], ask({ position }))
      expect(ids(selection.judged)).toEqual(['whole'])
      expect(selection.isByWholeEnclosure).toBe(true)
      expect(selection.upper).toMatchObject({ value: 33, isInherited: false })
    },
  )

  it.each(['basking-surface', 'substrate', 'water', 'shade'] as const)('does not serve %s', (position) => {
    const selection = selectRanges([whole], ask({ position }))
    expect(selection.judged).toEqual([])
    expect(selection.upper).toBeNull()
  })

  it('stands back for a row of the position, while its limits hold there all the same', () => {
    const own = makeRange('own', { low: 28, high: 31, upperLimit: 40 })
    const selection = selectRanges([own, whole], ask({}))
    expect(ids(selection.judged)).toEqual(['own'])
    expect(selection.isByWholeEnclosure).toBe(false)
    expect(selection.upper).toMatchObject({ value: 33, isInherited: true })
    expect(selection.lower).toMatchObject({ value: 15, isInherited: true })
  })

  it('does not loosen a stricter limit of the position', () => {
    const own = makeRange('own', { low: 24, high: 28, upperLimit: 30 })
    expect(selectRanges([own, whole], ask({})).upper).toMatchObject({ value: 30, isInherited: false })
  })

  it('serves a night for which the position has only a day row', () => {
    const day = makeRange('day', { low: 28, high: 31 })
    expect(ids(selectRanges([day, whole], ask({ period: 'night' })).judged)).toEqual(['whole'])
  })
})

describe('limits', () => {
  it('a side without one takes the strictest of the rows that match', () => {
    const ranges = [
      makeRange('own', { lifeStage: 'adult', low: 28, high: 32, lowerLimit: 12 }),
      makeRange('day', { low: 26, high: 33, lowerLimit: 18, upperLimit: 42 }),
      makeRange('any', { period: 'any', low: 20, high: 34, upperLimit: 39 }),
    ]
    const selection = selectRanges(ranges, ask({}))
    expect(ids(selection.judged)).toEqual(['own'])
    expect(selection.lower).toMatchObject({ value: 12, isInherited: false })
    expect(selection.upper).toMatchObject({ value: 39, isInherited: true })
  })

  it('never come from a row of another stage', () => {
    const ranges = [
      makeRange('own', { lifeStage: 'adult', low: 28, high: 32 }),
      makeRange('juvenile', { lifeStage: 'juvenile', low: 28, high: 32, upperLimit: 36 }),
    ]
    expect(selectRanges(ranges, ask({})).upper).toBeNull()
  })

  it('of several judged rows, the strictest holds', () => {
    const ranges = [
      makeRange('night', { period: 'night', low: 20, high: 24, upperLimit: 30 }),
      makeRange('juvenile', { period: 'any', lifeStage: 'juvenile', low: 22, high: 26, upperLimit: 28 }),
    ]
    const selection = selectRanges(ranges, ask({ period: 'night', lifeStage: 'juvenile' }))
    expect(selection.upper).toMatchObject({ value: 28, range: { itemId: 'juvenile' } })
  })
})

describe('a UV index', () => {
  const uv = { parameter: 'uv-index', position: 'basking-air', typedUnit: 'uvi' } as const
  const ranges = [
    makeRange('typical', { ...uv, uvMeaning: 'typical', low: 1, high: 2.6 }),
    makeRange('maximum', { ...uv, uvMeaning: 'maximum', low: 2.9, high: 7.4, upperLimit: 8 }),
  ]

  it.each(['typical', 'maximum'] as const)(
    'read as %s is judged by the range of that meaning',
    (uvMeaning) => {
      const selection = selectRanges(ranges, ask({ ...uv, uvMeaning }))
      expect(ids(selection.judged)).toEqual([uvMeaning])
      expect(selection.upper?.value).toBe(8)
    },
  )

  it('keeps the limit of the row judged by, although a closer row of the other meaning has a laxer one', () => {
    const rows = [
      makeRange('typical adult', {
        ...uv,
        lifeStage: 'adult',
        uvMeaning: 'typical',
        low: 1,
        high: 3,
        upperLimit: 8,
      }),
      makeRange('maximum any', { ...uv, uvMeaning: 'maximum', low: 2, high: 4, upperLimit: 5 }),
    ]
    const selection = selectRanges(rows, ask({ ...uv, uvMeaning: 'maximum' }))
    expect(ids(selection.judged)).toEqual(['maximum any'])
    expect(selection.upper?.value).toBe(5)
  })

  it('is not judged by the other meaning, whose limit still holds', () => {
    const selection = selectRanges(ranges.slice(1), ask({ ...uv, uvMeaning: 'typical' }))
    expect(selection.judged).toEqual([])
    expect(selection.upper).toMatchObject({ value: 8, isInherited: true })
  })
})

it('gives limits no looser than those of any judged row, and only of rows that match', () => {
  const bound = fc.option(fc.integer({ min: 0, max: 60 }), { nil: null })
  const range = fc
    .record({
      position: fc.constantFrom(...positionSchema.options),
      period: fc.constantFrom(...periodSchema.options),
      season: fc.constantFrom(...seasonSchema.options),
      lifeStage: fc.constantFrom(...lifeStageSchema.options),
      upperLimit: bound,
    })
    .map((row) => makeRange('x', { ...row, low: 20, high: 30 }))
  const asked = fc.record({
    position: fc.constantFrom(...positionSchema.options),
    period: fc.constantFrom('day' as const, 'night' as const),
    season: fc.constantFrom(...seasonSchema.exclude(['any']).options),
    lifeStage: fc.constantFrom(...lifeStageSchema.exclude(['any']).options),
  })
  fc.assert(
    fc.property(fc.array(range, { maxLength: 12 }), asked, (ranges, part) => {
      const { judged, upper } = selectRanges(ranges, ask(part))
      for (const { row } of judged) {
        expect([part.position, 'whole-enclosure']).toContain(row.position)
        expect([part.period, 'any']).toContain(row.period)
        expect([part.season, 'any']).toContain(row.season)
        expect([part.lifeStage, 'any']).toContain(row.lifeStage)
        if (row.upperLimit !== null) expect(upper?.value).toBeLessThanOrEqual(row.upperLimit)
      }
      if (upper !== null) {
        const { row } = upper.range
        expect([part.lifeStage, 'any']).toContain(row.lifeStage)
        if (part.lifeStage === 'egg' || part.lifeStage === 'larva') expect(row.lifeStage).toBe(part.lifeStage)
        if (part.season === 'brumation') expect(row.season).toBe('brumation')
      }
    }),
  )
})
