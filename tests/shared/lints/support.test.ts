import { describe, expect, it } from 'vitest'
import type { EvidenceRow } from '../../../shared/evidence.js'
import {
  lintAge,
  lintEnvelope,
  lintIndependence,
  lintLocators,
  lintMissingEvidence,
} from '../../../shared/lints/support.js'
import type { RangeRow } from '../../../shared/ranges.js'
import {
  makeEvidence,
  makePage,
  makePhysiology,
  makeRange,
  makeSource,
  makeSupportedRange,
  testId,
} from '../../helpers/page-content.js'

function findIds(lints: readonly { id: string; itemIds: string[] }[]): [string, string[]][] {
  return lints.map(({ id, itemIds }) => [id, itemIds])
}

describe('a range without evidence', () => {
  it('is warned of', () => {
    expect(findIds(lintMissingEvidence([makeRange('a', { low: 20, high: 30 })]))).toEqual([
      ['no-evidence', ['a']],
    ])
  })

  it('is one with nothing but physiology behind it', () => {
    const range = makeRange('a', { low: 20, high: 30 }, [
      makeEvidence('b', { kind: 'selected-in-gradient', low: 20, high: 30 }),
    ])
    expect(findIds(lintMissingEvidence([range]))).toEqual([['no-evidence', ['a']]])
  })

  it('is not one that a source supports', () => {
    expect(lintMissingEvidence([makeSupportedRange('a', { low: 20, high: 30 })])).toEqual([])
  })
})

describe('the envelope', () => {
  const between20And30 = [makeEvidence('b', { low: 20, high: 28 }), makeEvidence('c', { low: 24, high: 30 })]

  it.each<Partial<RangeRow>>([
    { low: 19, high: 25 },
    { low: 22, high: 31 },
    { low: 22, high: 30.06 },
  ])('is warned of where a range leaves it: %o', (part) => {
    expect(findIds(lintEnvelope([makeRange('a', part, between20And30)]))).toEqual([
      ['outside-envelope', ['a', 'b', 'c']],
    ])
  })

  it.each<Partial<RangeRow>>([
    { low: 20, high: 30 },
    { low: 22, high: null },
    // 68 °F is 20.0 °C; a source’s 67.9 °F rounded to a tenth is not a wider range.
    { low: 19.95, high: 30.05 },
  ])('holds a range within it: %o', (part) => {
    expect(lintEnvelope([makeRange('a', part, between20And30)])).toEqual([])
  })

  it('has no upper end where every source only says "at least"', () => {
    const evidence = [makeEvidence('b', { statement: 'at-least', low: 70 })]
    const humidity = { parameter: 'relative-humidity', position: 'humid-hide', low: 70 } as const
    expect(findIds(lintEnvelope([makeRange('a', { ...humidity, high: 90 }, evidence)]))).toEqual([
      ['outside-envelope', ['a', 'b']],
    ])
    expect(lintEnvelope([makeRange('a', { ...humidity, high: null }, evidence)])).toEqual([])
    expect(lintEnvelope([makeRange('a', { ...humidity, high: 100 }, evidence)])).toEqual([])
  })

  it('does not stretch to a statement about the body', () => {
    const evidence = [
      makeEvidence('b', { low: 20, high: 28 }),
      makeEvidence('c', { kind: 'tolerance-limit', statement: 'at-most', high: 40 }),
    ]
    expect(findIds(lintEnvelope([makeRange('a', { low: 20, high: 35 }, evidence)]))).toEqual([
      ['outside-envelope', ['a', 'b']],
    ])
  })

  it('is not asked for where there is no evidence at all', () => {
    expect(lintEnvelope([makeRange('a', { low: 20, high: 30 })])).toEqual([])
  })
})

describe('a locator', () => {
  it('is missed in evidence, once for each range, and in cited physiology', () => {
    const range = makeRange('a', { low: 20, high: 30 }, [
      makeEvidence('b', { locator: null, low: 20, high: 30 }),
      makeEvidence('c', { locator: 'p. 3', low: 20, high: 30 }),
      makeEvidence('d', { locator: '  ', low: 20, high: 30 }),
    ])
    const page = { ranges: [range], physiology: [makePhysiology('e', { locator: null, meanC: 30 })] }
    expect(findIds(lintLocators(page))).toEqual([
      ['locator-missing', ['a', 'b', 'd']],
      ['locator-missing', ['e']],
    ])
  })

  it('is not missed where it stands', () => {
    const page = {
      ranges: [makeSupportedRange('a', { low: 20, high: 30 })],
      physiology: [makePhysiology('e', { meanC: 30 })],
    }
    expect(lintLocators(page)).toEqual([])
  })
})

describe('independence', () => {
  const report: Partial<EvidenceRow> = { kind: 'keepers-report', low: 20, high: 30 }

  it('is missed behind a single study, however often it speaks', () => {
    const range = makeRange('a', { low: 20, high: 30 }, [
      makeEvidence('b', { low: 20, high: 25 }),
      makeEvidence('c', { low: 24, high: 30 }),
    ])
    expect(findIds(lintIndependence([range]))).toEqual([['one-study-only', ['a', 'b', 'c']]])
  })

  it('is missed behind keepers’ reports alone', () => {
    const range = makeRange('a', { low: 20, high: 30 }, [
      makeEvidence('b', report),
      makeEvidence('c', { ...report, sourceId: testId(2) }),
    ])
    expect(findIds(lintIndependence([range]))).toEqual([['keepers-reports-only', ['a', 'b', 'c']]])
  })

  it('is missed twice behind one keepers’ report', () => {
    const range = makeRange('a', { low: 20, high: 30 }, [makeEvidence('b', report)])
    expect(findIds(lintIndependence([range])).map(([id]) => id)).toEqual([
      'one-study-only',
      'keepers-reports-only',
    ])
  })

  it('is there with two studies of which one is more than a report', () => {
    const range = makeRange('a', { low: 20, high: 30 }, [
      makeEvidence('b', report),
      makeEvidence('c', { sourceId: testId(2), low: 20, high: 30 }),
    ])
    expect(lintIndependence([range])).toEqual([])
  })

  it('is no question where nothing stands behind the range', () => {
    expect(lintIndependence([makeRange('a', { low: 20, high: 30 })])).toEqual([])
  })
})

describe('the age of evidence', () => {
  const page = (issued: number) =>
    makePage({
      ranges: [makeRange('a', {}, [makeEvidence('b', {}), makeEvidence('c', { sourceId: testId(2) })])],
      sources: { [testId(1)]: makeSource(1, issued), [testId(2)]: makeSource(2, 2020) },
    })

  it('is pointed out from the thirty-first year on', () => {
    expect(findIds(lintAge(page(1995), 2026))).toEqual([['evidence-over-30-years', ['a', 'b']]])
    expect(lintAge(page(1996), 2026)).toEqual([])
  })

  it('is not guessed where a source has no year', () => {
    const content = page(1990)
    content.sources[testId(1)] = { ...makeSource(1), csl: { type: 'article-journal' } }
    expect(lintAge(content, 2026)).toEqual([])
  })
})
