import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { lintIdSchema, lintSchema } from '../../../shared/lints/lint.js'
import { lintPage } from '../../../shared/lints/lint-page.js'
import { LINTS } from '../../../shared/lints/lint-table.js'
import {
  lifeStageSchema,
  parameterSchema,
  periodSchema,
  positionSchema,
  seasonSchema,
} from '../../../shared/ranges.js'
import {
  makeEvidence,
  makePage,
  makePhysiology,
  makeRange,
  makeSupportedRange,
} from '../../helpers/page-content.js'

describe('the lint table', () => {
  it('lists what blocks before what warns before what informs', () => {
    const levels = lintIdSchema.options.map((id) => LINTS[id].level)
    const order = ['blocks', 'warns', 'informs']
    expect(levels).toEqual([...levels].sort((a, b) => order.indexOf(a) - order.indexOf(b)))
    expect(Object.keys(LINTS)).toEqual(lintIdSchema.options)
  })

  it('says each in plain sentences', () => {
    for (const { sentence } of Object.values(LINTS)) {
      expect(sentence).toMatch(/^[A-Z].*\.$/)
      expect(sentence).not.toContain('!')
    }
  })
})

describe('the lints of a page', () => {
  it('are none on a sound page', () => {
    const page = makePage({
      ranges: [
        makeSupportedRange('basking', { position: 'basking-surface', low: 38, high: 42, upperLimit: 48 }),
        makeSupportedRange('warm', { low: 28, high: 31, lowerLimit: 15, upperLimit: 36 }),
        makeSupportedRange('cool', { position: 'cool-end-air', low: 22, high: 25 }),
        makeSupportedRange('night', { period: 'night', low: 18, high: 22 }),
        makeSupportedRange('damp', {
          position: 'humid-hide',
          parameter: 'relative-humidity',
          low: 70,
          high: 85,
        }),
      ],
      physiology: [makePhysiology('selected', { meanC: 33 })],
    })
    expect(lintPage(page, 2026)).toEqual([])
  })

  it('come worst first', () => {
    const page = makePage({
      ranges: [
        makeRange('one', { low: 22, high: 20 }, [makeEvidence('e', { low: 20, high: 22, locator: null })]),
        makeRange('two', { position: 'cool-end-air', low: 20, high: 22 }),
      ],
    })
    const lints = lintPage(page, 2026)
    expect(lints.map(({ id }) => id)).toEqual([
      'low-over-high',
      'no-evidence',
      'locator-missing',
      'one-study-only',
    ])
    expect(lints.every((lint) => lintSchema.safeParse(lint).success)).toBe(true)
  })

  it('never fail, whatever is typed', () => {
    const bound = fc.oneof(
      fc.constant(null),
      fc.integer({ min: -20, max: 120 }),
      fc.double({ noNaN: false, noDefaultInfinity: false }),
    )
    const row = fc.record({
      parameter: fc.constantFrom(...parameterSchema.options),
      position: fc.constantFrom(...positionSchema.options),
      period: fc.constantFrom(...periodSchema.options),
      season: fc.constantFrom(...seasonSchema.options),
      lifeStage: fc.constantFrom(...lifeStageSchema.options),
      low: bound,
      high: bound,
      lowerLimit: bound,
      upperLimit: bound,
    })
    fc.assert(
      fc.property(fc.array(row, { maxLength: 6 }), (rows) => {
        const ranges = rows.map((part, index) =>
          makeRange(`range-${index}`, part, [
            makeEvidence(`evidence-${index}`, { low: part.low, high: part.high }),
          ]),
        )
        const ids = new Set(
          ranges.flatMap(({ itemId, evidence }) => [itemId, ...evidence.map((e) => e.itemId)]),
        )
        for (const lint of lintPage(makePage({ ranges }), 2026)) {
          expect(lintSchema.safeParse(lint).success).toBe(true)
          expect(lint.itemIds.every((itemId) => ids.has(itemId))).toBe(true)
        }
      }),
    )
  })
})
