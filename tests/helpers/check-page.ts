import type { CheckInput, CheckPage } from '../../shared/checker/check.js'
import type { Reading } from '../../shared/checker/reading.js'
import type { PhysiologyRow, StudyLine } from '../../shared/physiology.js'
import type { CitedRange } from '../../shared/species.js'
import { makeSource, testId } from './page-content.js'

type CitedPhysiology = Extract<PhysiologyRow, { form: 'cited' }>

/** A page of an invented lizard with the given ranges and physiology, at revision 2 of 2. */
export function makeCheckPage(part: {
  ranges?: CitedRange[]
  physiology?: CheckPage['physiology']
  class?: string
}): CheckPage {
  return {
    species: {
      id: testId(100),
      slug: 'invented-lizard',
      scientificName: 'Lacerta inventa',
      isInvented: true,
    },
    revision: {
      id: testId(102),
      number: 2,
      publishedAt: '2026-01-02T00:00:00Z',
      summary: 'Second',
      broughtBy: { form: 'demonstration' },
    },
    currentRevisionNumber: 2,
    classification: {
      itemId: testId(103),
      row: {
        class: part.class ?? 'Reptilia',
        order: null,
        suborder: null,
        family: null,
        conservation: null,
        activeTime: null,
        microhabitat: null,
        region: null,
        provenance: 'invented',
      },
    },
    ranges: part.ranges ?? [],
    physiology: part.physiology ?? [],
    sources: { [testId(1)]: makeSource(1, 2001), [testId(2)]: makeSource(2, 2002) },
  }
}

/** A cited statement about the body: a mean of 12 animals of unspecified stage from source 1. */
export function makeCitedPhysiology(
  itemId: string,
  part: Partial<CitedPhysiology>,
): CheckPage['physiology'][number] {
  const row: CitedPhysiology = {
    form: 'cited',
    quantity: 'selected-body-temperature',
    lifeStage: 'unspecified',
    sourceId: testId(1),
    locator: null,
    printed: { low: null, high: null, mean: null, sd: null, unit: 'degC' },
    meanC: null,
    lowC: null,
    highC: null,
    sdC: null,
    n: 12,
    note: null,
    ...part,
  }
  return { itemId, row, dataset: null, studies: [] }
}

/** A dataset's item with the given study lines. */
export function makeDatasetPhysiology(
  itemId: string,
  lines: Partial<StudyLine>[],
): CheckPage['physiology'][number] {
  const studies = lines.map((line): StudyLine => ({
    quantity: 'selected-body-temperature',
    lethalPercent: null,
    lifeStage: 'unspecified',
    sourceId: null,
    sourceAsPrinted: 'Nobody 1999',
    level: 'study',
    records: 1,
    animals: 7,
    meanC: null,
    lowC: 0,
    highC: 50,
    isIndependent: true,
    ...line,
  }))
  return {
    itemId,
    row: { form: 'dataset', datasetId: 'invented', recordSetHash: '0'.repeat(64) },
    dataset: null,
    studies,
  }
}

/** A probe's single reading of warm-end air by day in °C; change what the test is about. */
export function makeReading(part: Partial<Reading>): Reading {
  return {
    parameter: 'temperature',
    position: 'warm-end-air',
    period: 'day',
    values: [30],
    unit: 'degC',
    instrument: 'probe-thermometer',
    accuracy: null,
    resolution: null,
    uvMeaning: null,
    surface: null,
    ...part,
  }
}

/** A check of an active adult with no room temperature. */
export function makeCheckInput(readings: Reading[], part: Partial<CheckInput> = {}): CheckInput {
  return {
    slug: 'invented-lizard',
    revision: null,
    season: 'active',
    lifeStage: 'adult',
    roomTemperature: null,
    readings,
    ...part,
  }
}
