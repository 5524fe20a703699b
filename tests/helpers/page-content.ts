import type { EvidenceRow } from '../../shared/evidence.js'
import type { RangeRow } from '../../shared/ranges.js'
import type { SourceBrief } from '../../shared/sources.js'
import type { CitedRange, SpeciesPage } from '../../shared/species.js'

/** What the lints read of a page. */
export type PageContent = Pick<SpeciesPage, 'classification' | 'ranges' | 'physiology' | 'sources'>

/** A uuid that a test can tell by its number. */
export function testId(number: number): string {
  return `00000000-0000-4000-8000-${String(number).padStart(12, '0')}`
}

export function makeSource(number: number, year = 2020): SourceBrief {
  return {
    id: testId(number),
    kind: 'article',
    doi: null,
    csl: { type: 'article-journal', title: `Study ${number}`, issued: { 'date-parts': [[year]] } },
    asPrinted: null,
    isInvented: true,
  }
}

/** Evidence of a guideline with a locator, an interval in °C, from source 1; change what the test is about. */
export function makeEvidence(itemId: string, part: Partial<EvidenceRow>): CitedRange['evidence'][number] {
  const row: EvidenceRow = {
    sourceId: testId(1),
    kind: 'guideline',
    locator: 'p. 12',
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
  return { itemId, row }
}

/** A range of warm-end air temperature by day without evidence; change what the test is about. */
export function makeRange(
  itemId: string,
  part: Partial<RangeRow>,
  evidence: CitedRange['evidence'] = [],
): CitedRange {
  const row: RangeRow = {
    parameter: 'temperature',
    position: 'warm-end-air',
    period: 'day',
    season: 'any',
    lifeStage: 'any',
    low: null,
    high: null,
    lowerLimit: null,
    upperLimit: null,
    typedUnit: 'degC',
    typed: null,
    uvMeaning: null,
    uvZone: null,
    note: null,
    ...part,
  }
  return { itemId, row, evidence }
}

/** The same with two studies that state exactly the adopted range, so that no lint about evidence has anything to say. */
export function makeSupportedRange(itemId: string, part: Partial<RangeRow>): CitedRange {
  const bare = makeRange(itemId, part)
  const { low, high } = bare.row
  const statement = low === null ? 'at-most' : high === null ? 'at-least' : 'interval'
  const said = { statement, low, high } as const
  return {
    ...bare,
    evidence: [
      makeEvidence(`${itemId}-evidence-1`, { ...said, sourceId: testId(1) }),
      makeEvidence(`${itemId}-evidence-2`, { ...said, sourceId: testId(2) }),
    ],
  }
}

/** A page of sources 1 to 9, all of 2020, with the ranges and physiology given. */
export function makePage(part: Partial<PageContent>): PageContent {
  const numbers = [1, 2, 3, 4, 5, 6, 7, 8, 9]
  return {
    classification: null,
    ranges: [],
    physiology: [],
    sources: Object.fromEntries(numbers.map((number) => [testId(number), makeSource(number)])),
    ...part,
  }
}

/** A cited statement about the body, study mean in °C. */
export function makePhysiology(
  itemId: string,
  part: Partial<Extract<SpeciesPage['physiology'][number]['row'], { form: 'cited' }>>,
): SpeciesPage['physiology'][number] {
  return {
    itemId,
    row: {
      form: 'cited',
      quantity: 'selected-body-temperature',
      lifeStage: 'unspecified',
      sourceId: testId(3),
      locator: 'table 2',
      printed: { low: null, high: null, mean: null, sd: null, unit: 'degC' },
      meanC: null,
      lowC: null,
      highC: null,
      sdC: null,
      n: null,
      note: null,
      ...part,
    },
    dataset: null,
    studies: [],
  }
}
