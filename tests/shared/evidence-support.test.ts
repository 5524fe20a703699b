import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { EvidenceKind, EvidenceRow } from '../../shared/evidence.js'
import { CORE_SUPPORT, EVIDENCE_WEIGHTS } from '../../shared/evidence-policy.js'
import { findSupport, summariseEvidence } from '../../shared/evidence-support.js'

function sourceId(number: number): string {
  return `00000000-0000-4000-8000-${String(number).padStart(12, '0')}`
}

function row(source: number, kind: EvidenceKind, part: Partial<EvidenceRow>): EvidenceRow {
  return {
    sourceId: sourceId(source),
    kind,
    locator: null,
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

const open = { low: null, high: null }

describe('support, worked by hand', () => {
  // Weights 1, 1 and 0.5: 2.5 in all. 30-34 and 31-35 share 31-34, the keepers' report stands apart.
  const rows = [
    row(1, 'guideline', { low: 30, high: 34 }),
    row(2, 'field-site', { statement: 'mean-sd', mean: 33, sd: 2 }),
    row(3, 'keepers-report', { low: 36, high: 40 }),
  ]
  const summary = summariseEvidence({ low: 31, high: 35 }, rows)

  it('is the share of the weight that holds the value', () => {
    const at = (value: number) => findSupport(summary.votes, value)
    expect([29.9, 30, 31, 34, 34.5, 35.5, 38, 41].map(at)).toEqual([0, 0.4, 0.8, 0.8, 0.4, 0, 0.2, 0])
  })

  it('changes at stated ends only', () => {
    expect(summary.stretches).toEqual([
      { low: 30, high: 31, support: 0.4 },
      { low: 31, high: 34, support: 0.8 },
      { low: 34, high: 35, support: 0.4 },
      { low: 35, high: 36, support: 0 },
      { low: 36, high: 40, support: 0.2 },
    ])
  })

  it('gives core, envelope and number of studies', () => {
    expect(summary.core).toEqual([{ low: 31, high: 34 }])
    expect(summary.envelope).toEqual({ low: 30, high: 40 })
    expect(summary.studies).toBe(3)
  })

  it('averages over the adopted range', () => {
    // Three degrees at 0.8 and one at 0.4.
    expect(summary.agreement).toBeCloseTo(0.7, 12)
  })

  it('counts nothing outside every interval', () => {
    // One of two degrees at 0.4, the other unsupported.
    expect(summariseEvidence({ low: 34, high: 36 }, rows).agreement).toBeCloseTo(0.2, 12)
  })
})

describe('the core', () => {
  it('may be several pieces', () => {
    const { core } = summariseEvidence(open, [
      row(1, 'guideline', { low: 20, high: 22 }),
      row(1, 'guideline', { low: 28, high: 30 }),
      row(2, 'keepers-report', { low: 10, high: 12 }),
    ])
    expect(core).toEqual([
      { low: 20, high: 22 },
      { low: 28, high: 30 },
    ])
  })

  it('may be empty', () => {
    const { core, envelope } = summariseEvidence(open, [
      row(1, 'guideline', { low: 20, high: 22 }),
      row(2, 'guideline', { low: 24, high: 26 }),
    ])
    expect(core).toEqual([])
    expect(envelope).toEqual({ low: 20, high: 26 })
  })

  it('needs more than one half, not one half', () => {
    const { core } = summariseEvidence(open, [
      row(1, 'guideline', { low: 20, high: 22 }),
      row(2, 'guideline', { low: 30, high: 32 }),
      row(3, 'review', { low: 20, high: 22 }),
      row(4, 'keepers-report', { low: 30, high: 32 }),
    ])
    expect(core).toEqual([])
  })

  it('may be the one value where intervals touch', () => {
    const { core, stretches } = summariseEvidence(open, [
      row(1, 'guideline', { low: 20, high: 24 }),
      row(2, 'guideline', { low: 24, high: 28 }),
    ])
    expect(core).toEqual([{ low: 24, high: 24 }])
    expect(stretches).toEqual([
      { low: 20, high: 24, support: 0.5 },
      { low: 24, high: 24, support: 1 },
      { low: 24, high: 28, support: 0.5 },
    ])
  })

  it('joins pieces of different support that touch', () => {
    const { core } = summariseEvidence(open, [
      row(1, 'guideline', { low: 20, high: 30 }),
      row(2, 'keepers-report', { low: 24, high: 26 }),
    ])
    expect(core).toEqual([{ low: 20, high: 30 }])
  })
})

describe('one-sided statements', () => {
  it('speak against values past their bound and leave the rest to the others', () => {
    const { stretches, core, envelope } = summariseEvidence({ low: 70, high: 80 }, [
      row(1, 'keepers-report', { low: 60, high: 80 }),
      row(2, 'guideline', { statement: 'at-least', low: 70 }),
    ])
    expect(stretches).toEqual([
      { low: 60, high: 70, support: 0.5 / 1.5 },
      { low: 70, high: 80, support: 1 },
    ])
    expect(core).toEqual([{ low: 70, high: 80 }])
    expect(envelope).toEqual({ low: 60, high: 80 })
  })

  it('never support a value however far from their bound', () => {
    const summary = summariseEvidence(open, [row(1, 'guideline', { statement: 'at-least', low: 30 })])
    expect(findSupport(summary.votes, 80)).toBe(0)
    expect(summary.core).toEqual([])
    expect(summary.envelope).toEqual({ low: 30, high: null })
    expect(summary.agreement).toBeNull()
  })

  it('take their bound into the envelope', () => {
    const { envelope } = summariseEvidence(open, [
      row(1, 'guideline', { low: 20, high: 25 }),
      row(2, 'guideline', { statement: 'at-most', high: 28 }),
    ])
    expect(envelope).toEqual({ low: 20, high: 28 })
  })
})

describe('agreement', () => {
  const rows = [row(1, 'guideline', { low: 20, high: 25 }), row(2, 'review', { low: 24, high: 30 })]

  it('with one bound, or one value, is the support there', () => {
    expect(summariseEvidence({ low: 24.5, high: null }, rows).agreement).toBe(1)
    expect(summariseEvidence({ low: null, high: 22 }, rows).agreement).toBeCloseTo(1 / 1.5, 12)
    expect(summariseEvidence({ low: 28, high: 28 }, rows).agreement).toBeCloseTo(0.5 / 1.5, 12)
  })

  it('is not known without a bound or without evidence', () => {
    expect(summariseEvidence(open, rows).agreement).toBeNull()
    expect(summariseEvidence({ low: 20, high: 25 }, []).agreement).toBeNull()
  })
})

const kinds = fc.constantFrom(...(Object.keys(EVIDENCE_WEIGHTS) as EvidenceKind[]))
// Tenths, as sources print them.
const tenth = fc.integer({ min: -100, max: 600 }).map((tenths) => tenths / 10)
const anyRow = fc
  .record({
    source: fc.integer({ min: 1, max: 5 }),
    kind: kinds,
    statement: fc.constantFrom('interval', 'mean-sd', 'value', 'at-least', 'at-most'),
    first: tenth,
    second: tenth,
    sd: fc.integer({ min: 0, max: 50 }).map((tenths) => tenths / 10),
  })
  .map(({ source, kind, statement, first, second, sd }) =>
    row(source, kind, {
      statement,
      low: Math.min(first, second),
      high: Math.max(first, second),
      mean: first,
      sd,
      printed: { low: null, high: null, mean: first.toFixed(1), sd: null, unit: 'degC' },
    }),
  )
const anyRows = fc.array(anyRow, { maxLength: 12 })

describe('properties of support', () => {
  it('lies between none and all', () => {
    fc.assert(
      fc.property(anyRows, tenth, (rows, value) => {
        const support = findSupport(summariseEvidence(open, rows).votes, value)
        return support >= 0 && support <= 1
      }),
    )
  })

  it('does not depend on the order of the evidence', () => {
    fc.assert(
      fc.property(anyRows, (rows) => {
        const forward = summariseEvidence({ low: 10, high: 20 }, rows)
        const backward = summariseEvidence({ low: 10, high: 20 }, [...rows].reverse())
        expect(backward.envelope).toEqual(forward.envelope)
        expect(backward.core).toEqual(forward.core)
      }),
    )
  })

  it('is what the stretches say at every value, and nothing outside them', () => {
    fc.assert(
      fc.property(anyRows, fc.double({ min: -20, max: 70, noNaN: true }), (rows, value) => {
        const { votes, stretches } = summariseEvidence(open, rows)
        const here = stretches.filter(({ low, high }) => low <= value && value <= high)
        const said = here.length === 0 ? 0 : Math.max(...here.map(({ support }) => support))
        expect(findSupport(votes, value)).toBeCloseTo(said, 12)
      }),
    )
  })

  it('runs without a gap from end to end', () => {
    fc.assert(
      fc.property(anyRows, (rows) => {
        const { stretches } = summariseEvidence(open, rows)
        stretches.slice(1).forEach((stretch, index) => expect(stretch.low).toBe(stretches[index]?.high))
      }),
    )
  })

  it('keeps the core inside the envelope and over one half', () => {
    fc.assert(
      fc.property(anyRows, (rows) => {
        const { votes, core, envelope } = summariseEvidence(open, rows)
        for (const { low, high } of core) {
          expect(low).toBeGreaterThanOrEqual(envelope.low ?? Infinity)
          expect(high).toBeLessThanOrEqual(envelope.high ?? -Infinity)
          for (const value of [low, (low + high) / 2, high]) {
            expect(findSupport(votes, value)).toBeGreaterThan(CORE_SUPPORT)
          }
        }
      }),
    )
  })

  it('counts a source once however often it speaks', () => {
    fc.assert(
      fc.property(anyRows, (rows) => {
        const once = summariseEvidence({ low: 10, high: 20 }, rows)
        expect(summariseEvidence({ low: 10, high: 20 }, [...rows, ...rows])).toMatchObject({
          studies: once.studies,
          core: once.core,
          agreement: once.agreement,
        })
      }),
    )
  })

  it('never falls where a new study agrees', () => {
    fc.assert(
      fc.property(anyRows, tenth, tenth, (rows, value, width) => {
        const before = findSupport(summariseEvidence(open, rows).votes, value)
        const agreeing = row(99, 'guideline', { low: value - Math.abs(width), high: value + 1 })
        const after = findSupport(summariseEvidence(open, [...rows, agreeing]).votes, value)
        expect(after).toBeGreaterThanOrEqual(before)
      }),
    )
  })

  it('lets agreement reach all only where every study holds the whole range', () => {
    fc.assert(
      fc.property(
        tenth,
        fc.integer({ min: 1, max: 100 }),
        fc.integer({ min: 1, max: 5 }),
        (low, width, studies) => {
          const range = { low, high: low + width / 10 }
          const agreeing = Array.from({ length: studies }, (_, n) => row(n, 'guideline', range))
          expect(summariseEvidence(range, agreeing).agreement).toBeCloseTo(1, 9)
          const apart = row(50, 'guideline', { low: range.high + 1, high: range.high + 2 })
          expect(summariseEvidence(range, [...agreeing, apart]).agreement).toBeCloseTo(
            studies / (studies + 1),
            9,
          )
        },
      ),
    )
  })
})
