import { describe, expect, test } from 'vitest'
import type { PhysiologyRecord } from '../../shared/physiology.js'
import { summariseStudies } from '../../shared/study-lines.js'

const SOURCE = '00000000-0000-4000-8000-000000000001'
const OTHER_SOURCE = '00000000-0000-4000-8000-000000000002'

function record(part: Partial<PhysiologyRecord>): PhysiologyRecord {
  return {
    recordId: 'r1',
    nameAsPrinted: 'Testus minimus',
    quantity: 'critical-thermal-maximum',
    lethalPercent: null,
    lifeStage: 'adult',
    meanC: null,
    lowC: null,
    highC: null,
    sdC: null,
    seC: null,
    n: null,
    level: 'study',
    sourceId: SOURCE,
    sourceAsPrinted: 'Tester 2001',
    facts: {},
    ...part,
  }
}

describe('many records of one study', () => {
  test('show as one line with their spread, their mean and all their animals', () => {
    const lines = summariseStudies([
      record({ meanC: 40, n: 10 }),
      record({ meanC: 42, n: 5 }),
      record({ meanC: 38, lowC: 36.5, highC: 39 }),
    ])
    expect(lines).toEqual([
      {
        quantity: 'critical-thermal-maximum',
        lethalPercent: null,
        lifeStage: 'adult',
        sourceId: SOURCE,
        sourceAsPrinted: 'Tester 2001',
        level: 'study',
        records: 3,
        animals: 15,
        meanC: 40,
        lowC: 36.5,
        highC: 42,
        isIndependent: true,
      },
    ])
  })

  test('without means or counts give a spread alone', () => {
    expect(summariseStudies([record({ lowC: 24, highC: 31 })])).toMatchObject([
      { meanC: null, animals: null, lowC: 24, highC: 31 },
    ])
  })

  test('without any number give no line', () => {
    expect(summariseStudies([record({ sdC: 1, n: 4 })])).toEqual([])
  })
})

describe('records stay apart', () => {
  test.each<[string, Partial<PhysiologyRecord>]>([
    ['another source', { sourceId: OTHER_SOURCE }],
    ['another quantity', { quantity: 'critical-thermal-minimum' }],
    ['another life stage', { lifeStage: 'unspecified' }],
    ['another share of deaths', { quantity: 'critical-thermal-maximum', lethalPercent: 50 }],
    ['another level', { level: 'summary' }],
  ])('for %s', (_, part) => {
    expect(summariseStudies([record({ meanC: 40 }), record({ meanC: 41, ...part })])).toHaveLength(2)
  })

  test('for sources that could not be resolved and are printed differently', () => {
    const unresolved = { sourceId: null, meanC: 40 }
    const lines = summariseStudies([
      record({ ...unresolved, sourceAsPrinted: 'Brattstrom 1968' }),
      record({ ...unresolved, sourceAsPrinted: 'Brattstrom 1965' }),
      record({ ...unresolved, sourceAsPrinted: 'Brattstrom 1968' }),
    ])
    expect(lines.map((line) => [line.sourceAsPrinted, line.records])).toEqual([
      ['Brattstrom 1965', 1],
      ['Brattstrom 1968', 2],
    ])
  })
})

describe('a line is independent evidence', () => {
  test('only when it is a study of a known source', () => {
    const independence = (part: Partial<PhysiologyRecord>) =>
      summariseStudies([record({ meanC: 40, ...part })]).map((line) => line.isIndependent)
    expect(independence({})).toEqual([true])
    expect(independence({ level: 'summary' })).toEqual([false])
    expect(independence({ sourceId: null })).toEqual([false])
  })
})

test('lines stand in order of quantity, life stage and source, whatever order the records came in', () => {
  const records = [
    record({ meanC: 1, quantity: 'optimum-temperature' }),
    record({ meanC: 2, lifeStage: 'unspecified' }),
    record({ meanC: 3, lifeStage: 'larva', sourceAsPrinted: 'Z', sourceId: OTHER_SOURCE }),
    record({ meanC: 4, lifeStage: 'larva', sourceAsPrinted: 'A' }),
    record({ meanC: 5, quantity: 'field-body-temperature' }),
  ]
  const order = [5, 4, 3, 2, 1]
  expect(summariseStudies(records).map((line) => line.meanC)).toEqual(order)
  expect(summariseStudies(records.toReversed()).map((line) => line.meanC)).toEqual(order)
})
