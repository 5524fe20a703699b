import { describe, expect, it } from 'vitest'
import { lintCriticalLimits, lintTrapped } from '../../../shared/lints/physiology.js'
import type { ClassificationRow } from '../../../shared/names.js'
import type { RangeRow } from '../../../shared/ranges.js'
import { makeEvidence, makePage, makePhysiology, makeRange, testId } from '../../helpers/page-content.js'

function findIds(lints: readonly { id: string; itemIds: string[] }[]): [string, string[]][] {
  return lints.map(({ id, itemIds }) => [id, itemIds])
}

const selected33 = makePhysiology('selected', { quantity: 'selected-body-temperature', meanC: 33 })
const maximum44 = makePhysiology('maximum', { quantity: 'critical-thermal-maximum', meanC: 44 })
const minimum6 = makePhysiology('minimum', { quantity: 'critical-thermal-minimum', meanC: 6 })

function lintOne(part: Partial<RangeRow>, physiology = [selected33, maximum44, minimum6]) {
  return findIds(lintTrapped(makePage({ ranges: [makeRange('range', part)], physiology })))
}

describe('a place an animal cannot leave', () => {
  it('is warned of above the highest selected temperature', () => {
    expect(lintOne({ low: 30, high: 33.1 })).toEqual([['trapped-in-cautions', ['range', 'selected']]])
    expect(lintOne({ low: 30, high: 33 })).toEqual([])
  })

  it('is warned of within 3 °C of the critical maximum, which goes before the caution', () => {
    expect(lintOne({ low: 30, high: 41 })).toEqual([['trapped-in-cautions', ['range', 'maximum']]])
  })

  it('is warned of within 3 °C of the critical minimum', () => {
    expect(lintOne({ low: 9, high: 20 })).toEqual([['trapped-in-cautions', ['range', 'minimum']]])
    expect(lintOne({ low: 9.1, high: 20 })).toEqual([])
  })

  it('in brumation is warned of near freezing only', () => {
    const brumation = { season: 'brumation', period: 'any' } as const
    expect(lintOne({ ...brumation, low: 5, high: 8 })).toEqual([])
    expect(lintOne({ ...brumation, low: 3, high: 8 })).toEqual([['trapped-in-cautions', ['range']]])
  })

  it('is held against the critical maximum less 10 °C where no selected temperature is known', () => {
    expect(lintOne({ low: 30, high: 34.1 }, [maximum44])).toEqual([
      ['trapped-in-cautions', ['range', 'maximum']],
    ])
    expect(lintOne({ low: 30, high: 34 }, [maximum44])).toEqual([])
  })

  it('is held against the critical maximum less 14 °C for an amphibian', () => {
    const row: ClassificationRow = {
      class: 'Amphibia',
      order: 'Anura',
      suborder: null,
      family: null,
      conservation: null,
      activeTime: null,
      microhabitat: null,
      region: null,
      provenance: 'made for a test',
    }
    const physiology = [makePhysiology('maximum', { quantity: 'critical-thermal-maximum', meanC: 38 })]
    const lint = (high: number) =>
      lintTrapped(
        makePage({
          ranges: [makeRange('range', { low: 20, high })],
          physiology,
          classification: { itemId: 'class', row },
        }),
      )
    expect(findIds(lint(24.5))).toEqual([['trapped-in-cautions', ['range', 'maximum']]])
    expect(lint(24)).toEqual([])
  })

  it.each(['basking-surface', 'basking-air'] as const)('is not a %s', (position) => {
    expect(lintOne({ position, low: 45, high: 50 })).toEqual([])
  })

  it('is not warned of where nothing is known of the body', () => {
    expect(lintOne({ low: 45, high: 50 }, [])).toEqual([])
  })
})

describe('a limit that rests on a critical temperature', () => {
  function lintLimit(part: Partial<RangeRow>, criticalC: number) {
    const evidence = [
      makeEvidence('guideline', { low: 26, high: 30 }),
      makeEvidence('critical', {
        sourceId: testId(3),
        kind: 'tolerance-limit',
        statement: 'value',
        mean: criticalC,
      }),
    ]
    const range = makeRange('range', { low: 26, high: 30, ...part }, evidence)
    const physiology = [selected33, maximum44, minimum6]
    return findIds(lintCriticalLimits(makePage({ ranges: [range], physiology })))
  }

  it('may not reach past the cautions from heat', () => {
    expect(lintLimit({ upperLimit: 41 }, 44)).toEqual([
      ['limit-past-cautions', ['range', 'critical', 'maximum']],
    ])
    expect(lintLimit({ upperLimit: 36 }, 44)).toEqual([
      ['limit-past-cautions', ['range', 'critical', 'selected']],
    ])
    expect(lintLimit({ upperLimit: 33 }, 44)).toEqual([])
  })

  it('may not reach past the cautions from cold', () => {
    expect(lintLimit({ lowerLimit: 8 }, 6)).toEqual([
      ['limit-past-cautions', ['range', 'critical', 'minimum']],
    ])
    expect(lintLimit({ lowerLimit: 9.5 }, 6)).toEqual([])
  })

  it('is only the limit on the side of that temperature', () => {
    expect(lintLimit({ lowerLimit: 9.5, upperLimit: 41 }, 6)).toEqual([])
  })

  it('is none where a guideline states it', () => {
    const range = makeRange('range', { low: 26, high: 30, upperLimit: 41 }, [
      makeEvidence('guideline', { low: 26, high: 30 }),
    ])
    expect(lintCriticalLimits(makePage({ ranges: [range], physiology: [selected33, maximum44] }))).toEqual([])
  })
})
