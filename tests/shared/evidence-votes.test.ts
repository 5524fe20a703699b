import { describe, expect, it } from 'vitest'
import type { EvidenceKind, EvidenceRow } from '../../shared/evidence.js'
import { collectVotes, findHalfLastDigit, holdsValue, toStatedInterval } from '../../shared/evidence-votes.js'

const A = '00000000-0000-4000-8000-00000000000a'
const B = '00000000-0000-4000-8000-00000000000b'

function evidence(part: Partial<EvidenceRow>): EvidenceRow {
  return {
    sourceId: A,
    kind: 'guideline',
    locator: 'p. 1',
    statement: 'interval',
    printed: { low: null, high: null, mean: null, sd: null, unit: 'degC' },
    low: null,
    high: null,
    mean: null,
    sd: null,
    n: null,
    note: null,
    ...part,
  }
}

function bareValue(text: string, unit: 'degC' | 'degF', canonical: number): EvidenceRow {
  return evidence({
    statement: 'value',
    printed: { low: null, high: null, mean: text, sd: null, unit },
    mean: canonical,
  })
}

describe('the interval of a statement', () => {
  it('is the printed interval as it stands', () => {
    expect(toStatedInterval(evidence({ low: 38, high: 44 }))).toEqual({ low: 38, high: 44 })
  })

  it('puts an interval printed high end first the right way round', () => {
    expect(toStatedInterval(evidence({ low: 44, high: 38 }))).toEqual({ low: 38, high: 44 })
  })

  it('is one standard deviation to each side of a mean', () => {
    expect(toStatedInterval(evidence({ statement: 'mean-sd', mean: 33, sd: 2 }))).toEqual({
      low: 31,
      high: 35,
    })
  })

  it('is the span of the last digit for a mean without a deviation', () => {
    const row = evidence({
      statement: 'mean-sd',
      printed: { low: null, high: null, mean: '33.0', sd: null, unit: 'degC' },
      mean: 33,
    })
    expect(toStatedInterval(row)?.low).toBeCloseTo(32.95, 10)
    expect(toStatedInterval(row)?.high).toBeCloseTo(33.05, 10)
  })

  it.each([
    ['32', 'degC', 32, 31.5, 32.5],
    ['32.5', 'degC', 32.5, 32.45, 32.55],
    ['32,50', 'degC', 32.5, 32.495, 32.505],
    ['−4', 'degC', -4, -4.5, -3.5],
    // 89.5 °F is 31.944 °C and 90.5 °F is 32.5 °C.
    ['90', 'degF', 32.2222222222, 31.9444444444, 32.5],
  ] as const)('is the span of the last printed digit of %s %s', (text, unit, canonical, low, high) => {
    const interval = toStatedInterval(bareValue(text, unit, canonical))
    expect(interval?.low).toBeCloseTo(low, 8)
    expect(interval?.high).toBeCloseTo(high, 8)
  })

  it('is the value alone where the printed text is no plain number', () => {
    expect(toStatedInterval(bareValue('about 32', 'degC', 32))).toEqual({ low: 32, high: 32 })
  })

  it('leaves the other side of a one-sided statement open', () => {
    expect(toStatedInterval(evidence({ statement: 'at-least', low: 60 }))).toEqual({ low: 60, high: null })
    expect(toStatedInterval(evidence({ statement: 'at-most', high: 90 }))).toEqual({ low: null, high: 90 })
  })

  it('is missing where a row holds no number', () => {
    expect(toStatedInterval(evidence({}))).toBeNull()
    expect(toStatedInterval(evidence({ statement: 'value' }))).toBeNull()
  })
})

describe('half a step of the last digit', () => {
  it.each([
    ['7', 'uvi', 0.5],
    ['0.70', 'uvi', 0.005],
    ['12', 'in', 1.27],
  ] as const)('of %s %s is %d', (text, unit, half) => {
    expect(findHalfLastDigit(text, unit)).toBeCloseTo(half, 12)
  })

  it.each(['', 'thirty', '30-32', '3e1', '.'])('is not known for "%s"', (text) => {
    expect(findHalfLastDigit(text, 'degC')).toBeNull()
  })
})

describe('votes', () => {
  it('merge several statements of one source', () => {
    const votes = collectVotes([
      evidence({ low: 20, high: 22 }),
      evidence({ sourceId: B, low: 25, high: 27 }),
      evidence({ low: 28, high: 30 }),
    ])
    expect(votes.map((vote) => vote.sourceId)).toEqual([A, B])
    expect(votes[0]?.intervals).toEqual([
      { low: 20, high: 22 },
      { low: 28, high: 30 },
    ])
    expect(votes[0]?.weight).toBe(1)
  })

  it('weigh as the weightiest kind among the statements of the source', () => {
    const votes = collectVotes([
      evidence({ kind: 'keepers-report', low: 20, high: 22 }),
      evidence({ kind: 'field-site', low: 21, high: 23 }),
    ])
    expect(votes[0]?.weight).toBe(1)
    expect(collectVotes([evidence({ kind: 'keepers-report', low: 20, high: 22 })])[0]?.weight).toBe(0.5)
  })

  it.each<EvidenceKind>(['field-body-temperature', 'selected-in-gradient', 'tolerance-limit'])(
    'are not given to evidence of the kind %s',
    (kind) => {
      expect(collectVotes([evidence({ kind, low: 20, high: 22 })])).toEqual([])
    },
  )

  it('join "at least" and "at most" of one source into one interval', () => {
    const [vote] = collectVotes([
      evidence({ statement: 'at-least', low: 24 }),
      evidence({ statement: 'at-most', high: 30 }),
    ])
    expect(vote).toMatchObject({ intervals: [{ low: 24, high: 30 }], atLeast: null, atMost: null })
  })

  it('keep one-sided statements of different sources apart', () => {
    const votes = collectVotes([
      evidence({ statement: 'at-least', low: 24 }),
      evidence({ sourceId: B, statement: 'at-most', high: 30 }),
    ])
    expect(votes.map((vote) => vote.intervals)).toEqual([[], []])
  })

  it('speak against every value outside their intervals', () => {
    const [vote] = collectVotes([evidence({ low: 20, high: 22 })])
    expect([19.9, 20, 22, 22.1].map((value) => holdsValue(vote!, value))).toEqual([false, true, true, false])
  })

  it('of a bare bound speak against values past it and of nothing else', () => {
    const [vote] = collectVotes([evidence({ statement: 'at-least', low: 24 })])
    expect([23.9, 24, 80].map((value) => holdsValue(vote!, value))).toEqual([false, null, null])
    const [other] = collectVotes([evidence({ statement: 'at-most', high: 30 })])
    expect([30, 30.1].map((value) => holdsValue(other!, value))).toEqual([null, false])
  })
})
