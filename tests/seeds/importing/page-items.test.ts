import { describe, expect, it } from 'vitest'
import type { EvidenceRow } from '../../../shared/evidence.js'
import type { RangeRow } from '../../../shared/ranges.js'
import type { PageItem } from '../../../shared/revisions.js'
import { bringUpToDate } from '../../../seeds/importing/page-items.js'
import { makeEvidence, makeRange, testId } from '../../helpers/page-content.js'

const OWN = testId(50)
const OTHER = testId(51)
const hash = (digit: string) => digit.repeat(64)

const toItem = (number: number, row: RangeRow): PageItem => ({
  itemId: testId(number),
  parentItemId: null,
  kind: 'range',
  row,
})
const toEvidenceItem = (number: number, range: number, row: EvidenceRow): PageItem => ({
  itemId: testId(number),
  parentItemId: testId(range),
  kind: 'evidence',
  row,
})
const recordItem = (number: number, datasetId: string, recordSetHash: string): PageItem => ({
  itemId: testId(number),
  parentItemId: null,
  kind: 'physiology',
  row: { form: 'dataset', datasetId, recordSetHash },
})
const rangeRow = (low: number, part: Partial<RangeRow> = {}) => makeRange('', { low, high: 30, ...part }).row
const evidenceRow = (sourceId: string, low: number) => makeEvidence('', { sourceId, low, high: 30 }).row
const nothing = { recordSetHash: null, ranges: [] }

describe('the record set of a dataset on a page', () => {
  const others = [recordItem(1, 'other', hash('a')), recordItem(2, 'own', hash('b'))]

  it('is replaced under the id it has', () => {
    expect(bringUpToDate(others, 'own', null, { ...nothing, recordSetHash: hash('c') })).toEqual([
      others[0],
      recordItem(2, 'own', hash('c')),
    ])
  })

  it('is added behind what is there', () => {
    const items = bringUpToDate(others, 'third', null, { ...nothing, recordSetHash: hash('c') })
    expect(items.slice(0, 2)).toEqual(others)
    expect(items[2]).toMatchObject({ row: { datasetId: 'third', recordSetHash: hash('c') } })
  })

  it('goes where the dataset has no record any more', () => {
    expect(bringUpToDate(others, 'own', null, nothing)).toEqual([others[0]])
  })
})

describe('the ranges of a dataset on a page', () => {
  const own = [toItem(1, rangeRow(20)), toEvidenceItem(2, 1, evidenceRow(OWN, 20))]
  const wanted = (low: number, part: Partial<RangeRow> = {}) => ({
    recordSetHash: null,
    ranges: [{ range: rangeRow(low, part), evidence: evidenceRow(OWN, low) }],
  })

  it('keep their ids when their numbers change', () => {
    expect(bringUpToDate(own, 'own', OWN, wanted(22))).toEqual([
      toItem(1, rangeRow(22)),
      toEvidenceItem(2, 1, evidenceRow(OWN, 22)),
    ])
  })

  it('stay as they are when nothing changed', () => {
    expect(bringUpToDate(own, 'own', OWN, wanted(20))).toEqual(own)
  })

  it('give way to a range with other keys', () => {
    const items = bringUpToDate(own, 'own', OWN, wanted(20, { period: 'night' }))
    expect(items.map(({ kind }) => kind)).toEqual(['range', 'evidence'])
    expect(items[0]?.itemId).not.toBe(testId(1))
    expect(items[1]?.parentItemId).toBe(items[0]?.itemId)
  })

  it('go with their evidence when the dataset has them no longer', () => {
    expect(bringUpToDate(own, 'own', OWN, nothing)).toEqual([])
  })

  it('of other sources stay untouched, and get the dataset’s evidence under them where the keys are the same', () => {
    const others = [toItem(1, rangeRow(24)), toEvidenceItem(2, 1, evidenceRow(OTHER, 24))]
    const items = bringUpToDate(others, 'own', OWN, wanted(20))
    expect(items.slice(0, 2)).toEqual(others)
    expect(items[2]).toMatchObject({ kind: 'evidence', parentItemId: testId(1), row: evidenceRow(OWN, 20) })
  })

  it('that others support too lose only the dataset’s evidence', () => {
    const others = toEvidenceItem(3, 1, evidenceRow(OTHER, 24))
    expect(bringUpToDate([...own, others], 'own', OWN, nothing)).toEqual([own[0], others])
  })

  it('of a dataset without a source of its own leave the page’s ranges alone', () => {
    expect(bringUpToDate(own, 'own', null, nothing)).toEqual(own)
  })
})
