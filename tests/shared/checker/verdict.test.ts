import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  compareStandings,
  isGreen,
  judgeLimits,
  judgeRange,
  limitAnswerSchema,
  noRange,
  rangeAnswerSchema,
  standingSchema,
  summarise,
  toStanding,
} from '../../../shared/checker/verdict.js'
import type { LimitsToJudge } from '../../../shared/checker/verdict.js'
import type { Parameter, RangeRow } from '../../../shared/ranges.js'
import { expectedOf, inputOf, requireCheckValue } from '../../helpers/check-values.js'
import { makeRange } from '../../helpers/page-content.js'

const humidity = { parameter: 'relative-humidity', typedUnit: 'percentRh' } as const
const uvIndex = { parameter: 'uv-index', typedUnit: 'uvi', uvMeaning: 'typical' } as const

function judge(value: number, uncertainty: number, row: Partial<RangeRow>) {
  return judgeRange({ value, uncertainty }, makeRange('row', row))
}

function limits(lower: number | null, upper: number | null): LimitsToJudge {
  const hold = (value: number | null) =>
    value === null ? null : { value, range: { itemId: 'row' }, isInherited: false }
  return { lower: hold(lower), upper: hold(upper) }
}

function judgeLimit(
  value: number,
  u: number,
  lower: number | null,
  upper: number | null,
  parameter: Parameter = 'temperature',
) {
  return judgeLimits(parameter, { value, uncertainty: u }, limits(lower, upper))
}

describe('conformance probabilities (JCGM 106:2012, clause 7)', () => {
  it.each([
    ['conf-jcgm-7-4', 5e-4],
    ['conf-range-edge', 1e-6],
    ['conf-temp', 1e-6],
    ['conf-rh', 1e-6],
    ['conf-uvi', 1e-6],
  ])('meet the two-sided check value %s', (id, tolerance) => {
    const value = requireCheckValue(id)
    const row = { low: inputOf(value, 'TL'), high: inputOf(value, 'TU') }
    const found = judge(inputOf(value, 'y'), inputOf(value, 'u'), row).probability?.inside ?? Number.NaN
    expect(Math.abs(found - expectedOf(value))).toBeLessThan(tolerance)
  })

  it('meet the single-sided check values conf-jcgm-upper and conf-jcgm-lower (inputs from memory)', () => {
    const upper = requireCheckValue('conf-jcgm-upper')
    const below = judge(inputOf(upper, 'y'), inputOf(upper, 'u'), { high: inputOf(upper, 'TU') })
    expect(below.probability?.inside).toBeCloseTo(expectedOf(upper), 3)
    const lower = requireCheckValue('conf-jcgm-lower')
    const above = judge(inputOf(lower, 'y'), inputOf(lower, 'u'), { low: inputOf(lower, 'TL') })
    expect(Math.abs((above.probability?.inside ?? 0) - expectedOf(lower))).toBeLessThan(1e-3)
  })

  it.each([
    ['conf-suncal-1', 0.01],
    ['conf-suncal-2', 1e-4],
  ])('meet the specific risk %s of a metrology laboratory’s calculator', (id, tolerance) => {
    const value = requireCheckValue(id)
    const row = { low: inputOf(value, 'TL'), high: inputOf(value, 'TU') }
    const { probability } = judge(inputOf(value, 'y'), inputOf(value, 'u'), row)
    const risk = (probability?.low ?? 0) + (probability?.high ?? 0)
    expect(Math.abs(risk / expectedOf(value) - 1)).toBeLessThan(tolerance)
  })

  it('meet one tail of the same', () => {
    const value = requireCheckValue('conf-suncal-1-tail')
    const { probability } = judge(inputOf(value, 'y'), inputOf(value, 'u'), {
      low: 9,
      high: inputOf(value, 'TU'),
    })
    expect(Math.abs((probability?.high ?? 0) / expectedOf(value) - 1)).toBeLessThan(0.01)
  })
})

describe('a range from 24 to 28 °C (hand-worked)', () => {
  const row = { low: 24, high: 28 }

  it.each([
    ['in the middle', 26, 0.5, 'inside'],
    ['1.64 u inside the upper bound', 28 - 1.64 * 0.5, 0.5, 'unclear'],
    ['1.65 u inside the upper bound', 28 - 1.65 * 0.5, 0.5, 'inside'],
    ['1.64 u over', 28 + 1.64 * 0.5, 0.5, 'unclear'],
    ['1.65 u over', 28 + 1.65 * 0.5, 0.5, 'high'],
    ['1.64 u under', 24 - 1.64 * 0.5, 0.5, 'unclear'],
    ['1.65 u under', 24 - 1.65 * 0.5, 0.5, 'low'],
    ['far over', 60, 0.5, 'high'],
    ['far under', -20, 0.5, 'low'],
  ])('a reading %s is judged so', (_, value, u, answer) => {
    expect(judge(value, u, row).answer).toBe(answer)
  })

  it('names the two likeliest answers when unclear, likelier first', () => {
    expect(judge(28.2, 0.5, row).likeliest).toEqual(['high', 'inside'])
    expect(judge(27.8, 0.5, row).likeliest).toEqual(['inside', 'high'])
    expect(judge(24.2, 0.5, row).likeliest).toEqual(['inside', 'low'])
  })

  it.each([
    ['below', 23.9, 'low'],
    ['on the lower bound', 24, 'inside'],
    ['within', 25, 'inside'],
    ['on the upper bound', 28, 'inside'],
    ['above', 28.1, 'high'],
  ])('with u = 0 is closed: %s', (_, value, answer) => {
    const verdict = judge(value, 0, row)
    expect(verdict.answer).toBe(answer)
    expect(Object.values(verdict.probability ?? {}).toSorted()).toEqual([0, 0, 1])
  })

  it('a reading on a bound is settled by no instrument, and the way into the range is safer', () => {
    expect(judge(28, 0.01, row)).toMatchObject({
      answer: 'unclear',
      onBound: { bound: 'high', saferWay: 'lower' },
    })
    expect(judge(24, 3, row).onBound).toEqual({ bound: 'low', saferWay: 'higher' })
    expect(judge(27.9, 0.5, row).onBound).toBeNull()
  })

  it('a reading that lands on a bound by a change of unit lies on it', () => {
    expect(judge(((82.4 - 32) * 5) / 9, 0.3, row).onBound).toMatchObject({ bound: 'high' })
  })
})

describe('a range that the instrument cannot confirm', () => {
  it('is narrower than 3.92 u, and would want ±0.44 of its width', () => {
    const verdict = judge(25, 0.52, { low: 24, high: 26 })
    expect(verdict.answer).toBe('unclear')
    expect(verdict.cannotConfirm?.neededAccuracy).toBeCloseTo(0.88, 12)
    expect(judge(25, 0.5, { low: 24, high: 26 })).toMatchObject({ answer: 'inside', cannotConfirm: null })
  })

  it('may still be ruled out', () => {
    expect(judge(40, 3, { low: 24, high: 26 })).toMatchObject({
      answer: 'high',
      cannotConfirm: { neededAccuracy: 0.88 },
    })
  })

  it('is not named beside an inside, which 3.92 in place of 3.919928 would allow by a hair', () => {
    expect(judge(0, 1, { low: -1.959975, high: 1.959975 })).toMatchObject({
      answer: 'inside',
      cannotConfirm: null,
    })
  })

  it('of no width wants an instrument that does not exist', () => {
    expect(judge(25, 0.1, { low: 25, high: 25 }).cannotConfirm).toEqual({ neededAccuracy: 0 })
  })

  it('an instrument of the accuracy asked for can be inside it', () => {
    expect(judge(25, 0.88 / Math.sqrt(3), { low: 24, high: 26 }).answer).toBe('inside')
  })

  it('is not said of a range with a physical bound, which one side alone decides', () => {
    expect(judge(97, 6, { ...humidity, low: 80, high: 100 })).toMatchObject({
      answer: 'inside',
      cannotConfirm: null,
    })
  })
})

describe('one bound only', () => {
  it.each([
    ['well over a lower bound', 30, { low: 24 }, 'not-low'],
    ['well under it', 20, { low: 24 }, 'low'],
    ['at it', 24.3, { low: 24 }, 'unclear'],
    ['well under an upper bound', 20, { high: 28 }, 'not-high'],
    ['well over it', 32, { high: 28 }, 'high'],
  ])('a reading %s', (_, value, row, answer) => {
    expect(judge(value, 0.5, row).answer).toBe(answer)
  })

  it('is never inside, and never green', () => {
    const verdict = judge(30, 0, { low: 24 })
    expect(verdict.answer).toBe('not-low')
    expect(isGreen(judgeLimit(30, 0, null, null), verdict)).toBe(false)
  })

  it('has its own two likeliest answers', () => {
    expect(judge(24.3, 0.5, { low: 24 }).likeliest).toEqual(['not-low', 'low'])
    expect(judge(28.3, 0.5, { high: 28 }).likeliest).toEqual(['high', 'not-high'])
  })
})

describe('bounds set by nature', () => {
  it.each([
    ['RH 100 in 80 to 100 %', 100, 2.5, { ...humidity, low: 80, high: 100 }, 'inside'],
    ['RH 0 in 0 to 20 %', 0, 2.5, { ...humidity, low: 0, high: 20 }, 'inside'],
    ['UVI 0 in 0 to 0.7', 0, 0.1, { ...uvIndex, low: 0, high: 0.7 }, 'inside'],
    ['UVI 0 with u = 0', 0, 0, { ...uvIndex, low: 0, high: 0.7 }, 'inside'],
    ['RH 81 in 80 to 100 %', 81, 2.5, { ...humidity, low: 80, high: 100 }, 'unclear'],
    ['RH 50 in 0 to 100 %', 50, 2.5, { ...humidity, low: 0, high: 100 }, 'inside'],
    ['0 °C in 0 to 10 °C, which is no such bound', 0, 0.5, { low: 0, high: 10 }, 'unclear'],
    ['RH 60 in 60 to 80 %', 60, 2.5, { ...humidity, low: 60, high: 80 }, 'unclear'],
  ])('%s', (_, value, u, row, answer) => {
    expect(judge(value, u, row).answer).toBe(answer)
  })

  it('are no bound a reading could lie on', () => {
    expect(judge(100, 2.5, { ...humidity, low: 80, high: 100 }).onBound).toBeNull()
  })

  it('are no limit that could be passed', () => {
    expect(judgeLimit(100, 2, null, 100, 'relative-humidity').answer).toBe('clear')
    expect(judgeLimit(0, 0.1, 0, null, 'uv-index').answer).toBe('clear')
  })
})

it('has no range where none is cited or neither bound is', () => {
  expect(noRange(null).answer).toBe('no-range')
  expect(judge(26, 0.5, { lowerLimit: 10, upperLimit: 40 })).toMatchObject({
    answer: 'no-range',
    itemId: 'row',
  })
})

describe('limits at 10 and 40 °C (hand-worked)', () => {
  it.each([
    ['in the middle', 25, 0.5, 'clear', null],
    ['1.65 u short of the upper', 40 - 1.65 * 0.5, 0.5, 'clear', null],
    ['1.64 u short of the upper', 40 - 1.64 * 0.5, 0.5, 'near', 'upper'],
    ['just short of the upper', 39.99, 0.5, 'near', 'upper'],
    ['on the upper', 40, 0.5, 'past', 'upper'],
    ['over the upper', 41, 0.5, 'past', 'upper'],
    ['1.64 u over the lower', 10 + 1.64 * 0.5, 0.5, 'near', 'lower'],
    ['on the lower', 10, 0.5, 'past', 'lower'],
    ['under the lower', 9, 0.5, 'past', 'lower'],
    ['short of the upper, u = 0', 39.999, 0, 'clear', null],
    ['on the upper, u = 0', 40, 0, 'past', 'upper'],
    ['on the lower, u = 0', 10, 0, 'past', 'lower'],
    ['over the upper, u = 0', 40.001, 0, 'past', 'upper'],
  ])('a reading %s', (_, value, u, answer, side) => {
    expect(judgeLimit(value, u, 10, 40)).toMatchObject({ answer, side })
  })

  it('are each tested alone, one missing changing nothing for the other', () => {
    expect(judgeLimit(5, 0.5, null, 40).answer).toBe('clear')
    expect(judgeLimit(45, 0.5, 10, null).answer).toBe('clear')
    expect(judgeLimit(45, 0.5, null, null).answer).toBe('no-limit')
  })
})

describe('both answers together', () => {
  const inside = judge(26, 0.1, { low: 20, high: 30 })

  it.each([
    ['past', judgeLimit(26, 0.1, null, 25), false],
    ['near', judgeLimit(26, 0.1, null, 26.1), false],
    ['inside', judgeLimit(26, 0.1, null, 40), true],
    ['inside', judgeLimit(26, 0.1, null, null), true],
  ] as const)('inside a range stand as %s', (standing, limit, green) => {
    expect(toStanding(limit, inside)).toBe(standing)
    expect(isGreen(limit, inside)).toBe(green)
  })

  it('are green for inside with clear or no limit alone, of all combinations', () => {
    const green = limitAnswerSchema.options.flatMap((limit) =>
      rangeAnswerSchema.options
        .filter((range) =>
          isGreen({ ...judgeLimit(0, 1, null, null), answer: limit }, { ...inside, answer: range }),
        )
        .map((range) => [limit, range]),
    )
    expect(green).toEqual([
      ['clear', 'inside'],
      ['no-limit', 'inside'],
    ])
  })

  it('are ordered worst first', () => {
    const sorted = standingSchema.options.toReversed().toSorted(compareStandings)
    expect(sorted[0]).toBe('past')
    expect(sorted[1]).toBe('near')
    expect(new Set(sorted.slice(2, 4))).toEqual(new Set(['high', 'low']))
    expect(sorted.slice(4, 6)).toEqual(['unclear', 'no-range'])
    expect(new Set(sorted.slice(6, 8))).toEqual(new Set(['not-low', 'not-high']))
    expect(sorted[8]).toBe('inside')
  })

  it('are summed up as the worst and the count of each', () => {
    const { worst, counts } = summarise(['inside', 'no-range', 'high', 'inside'])
    expect(worst).toBe('high')
    expect(counts).toMatchObject({ inside: 2, 'no-range': 1, high: 1, past: 0, near: 0 })
  })
})

describe('for any reading', () => {
  const number = fc.double({ min: -50, max: 150, noNaN: true })
  const u = fc.oneof(fc.constant(0), fc.double({ min: 1e-6, max: 50, noNaN: true }))
  const bound = fc.option(fc.double({ min: -20, max: 120, noNaN: true }), { nil: null })

  it('the probabilities add up to one', () => {
    fc.assert(
      fc.property(number, u, bound, bound, (value, uncertainty, a, b) => {
        const [low, high] = a !== null && b !== null && a > b ? [b, a] : [a, b]
        const { probability } = judge(value, uncertainty, { low, high })
        fc.pre(probability !== null)
        expect(probability.low + probability.inside + probability.high).toBeCloseTo(1, 12)
      }),
    )
  })

  it('a wider range never makes it less likely to be inside', () => {
    const more = fc.double({ min: 0, max: 30, noNaN: true })
    fc.assert(
      fc.property(number, u, number, more, more, more, (value, uncertainty, low, width, down, up) => {
        const narrow = judge(value, uncertainty, { low, high: low + width })
        const wide = judge(value, uncertainty, { low: low - down, high: low + width + up })
        expect(wide.probability?.inside).toBeGreaterThanOrEqual((narrow.probability?.inside ?? 2) - 1e-12)
      }),
    )
  })

  it('a stricter limit never makes the answer better', () => {
    const order = limitAnswerSchema.options
    const less = fc.double({ min: 0, max: 30, noNaN: true })
    fc.assert(
      fc.property(number, u, number, less, (value, uncertainty, upper, stricter) => {
        const loose = judgeLimit(value, uncertainty, null, upper)
        const strict = judgeLimit(value, uncertainty, null, upper - stricter)
        expect(order.indexOf(strict.answer)).toBeLessThanOrEqual(order.indexOf(loose.answer))
      }),
    )
  })

  it('it is never both inside and beyond confirming', () => {
    fc.assert(
      fc.property(
        number,
        u,
        number,
        fc.double({ min: 0, max: 20, noNaN: true }),
        (value, uncertainty, low, width) => {
          const verdict = judge(value, uncertainty, { low, high: low + width })
          if (verdict.cannotConfirm !== null) expect(verdict.answer).not.toBe('inside')
        },
      ),
    )
  })
})
