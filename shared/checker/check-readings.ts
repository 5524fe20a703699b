import { generalCautionSchema } from './check.js'
import type { CheckInput, CheckPage, CheckResult, GaugeDisagreement, ReadingVerdict } from './check.js'
import { askBack } from './ask-back.js'
import { toCanonical } from '../units.js'
import { findFirstChange } from './change-first.js'
import { BASKING_POSITIONS, findPhysiologyCautions } from './physiology-cautions.js'
import type { Reading } from './reading.js'
import { selectRanges } from './selection.js'
import { compareGauges, measureReading } from './uncertainty.js'
import {
  compareStandings,
  isGreen,
  judgeLimits,
  judgeRange,
  noRange,
  summarise,
  toStanding,
} from './verdict.js'

function judgeReading(
  page: Pick<CheckPage, 'ranges' | 'revision'>,
  asked: Pick<CheckInput, 'season' | 'lifeStage'>,
  reading: Reading,
  readingIndex: number,
): ReadingVerdict {
  const { parameter, position, period, uvMeaning } = reading
  const { season, lifeStage } = asked
  const measured = measureReading(reading)
  const selection = selectRanges(page.ranges, { parameter, position, period, season, lifeStage, uvMeaning })
  const limit = judgeLimits(parameter, measured, selection)
  const judgements = selection.judged
    .map((range) => judgeRange(measured, range))
    .sort((a, b) => compareStandings(a.answer, b.answer))
  const range = judgements[0] ?? noRange(null)
  const lending = [selection.lower?.range, selection.upper?.range].filter((row) => row !== undefined)
  return {
    readingIndex,
    revisionNumber: page.revision.number,
    measured,
    standing: toStanding(limit, range),
    isGreen: isGreen(limit, range),
    limit,
    range,
    judgements,
    rows: [...new Set([...selection.judged, ...lending])],
    isByWholeEnclosure: selection.isByWholeEnclosure,
    otherRows: selection.others.map(({ range: { itemId }, differsIn }) => ({ itemId, differsIn })),
    questions: askBack(reading),
  }
}

function findGaugeDisagreements(
  readings: readonly Reading[],
  verdicts: readonly ReadingVerdict[],
): GaugeDisagreement[] {
  const isSamePlace = (a: Reading, b: Reading) =>
    a.parameter === b.parameter &&
    a.position === b.position &&
    a.period === b.period &&
    a.uvMeaning === b.uvMeaning
  const found: GaugeDisagreement[] = []
  verdicts.forEach((second, secondIndex) => {
    verdicts.slice(0, secondIndex).forEach((first, firstIndex) => {
      const [a, b] = [readings[firstIndex], readings[secondIndex]]
      if (a === undefined || b === undefined || !isSamePlace(a, b)) return
      const { disagree, difference, allowed } = compareGauges(first.measured, second.measured)
      if (disagree) found.push({ readingIndexes: [firstIndex, secondIndex], difference, allowed })
    })
  })
  return found
}

/**
 * Holds readings against a page at one revision. Pure, the same in browser, server and tests. The input has passed
 * `checkInputSchema`; whoever calls has fetched the revision it names.
 */
export function checkReadings(page: CheckPage, input: CheckInput): CheckResult {
  const { season, lifeStage, readings, roomTemperature } = input
  const judge = (reading: Reading, index: number) => judgeReading(page, input, reading, index)
  const verdicts = readings.map(judge)
  const judged = verdicts.flatMap((verdict, index) => {
    const reading = readings[index]
    return reading === undefined ? [] : [{ ...verdict, ...verdict.measured, reading }]
  })
  const temperatures = judged
    .filter(({ reading }) => reading.parameter === 'temperature')
    .map(({ readingIndex, reading: { position, period }, value, uncertainty, limit }) => ({
      readingIndex,
      position,
      period,
      valueC: value,
      uncertaintyC: uncertainty,
      limit: limit.answer,
    }))
  const physiologyCautions = findPhysiologyCautions(page, { lifeStage, season }, temperatures)
  // A basking place may only seem to have no refuge, because the cooler places were not read.
  const isHeatDanger = (index: number, reading: Reading) =>
    !BASKING_POSITIONS.includes(reading.position) &&
    physiologyCautions.some((found) => found.kind === 'near-critical-maximum' && found.readingIndex === index)
  const roomC = roomTemperature && toCanonical(roomTemperature.value, roomTemperature.unit)
  const { slug, scientificName, isInvented } = page.species
  const { id, number, publishedAt } = page.revision
  return {
    species: { slug, scientificName, isInvented },
    revision: { id, number, publishedAt, currentNumber: page.currentRevisionNumber },
    season,
    lifeStage,
    verdicts,
    summary: summarise(verdicts.map(({ standing }) => standing)),
    gaugeDisagreements: findGaugeDisagreements(readings, verdicts),
    physiologyCautions,
    firstChange: findFirstChange(
      judged.map((entry) => ({
        readingIndex: entry.readingIndex,
        parameter: entry.reading.parameter,
        period: entry.reading.period,
        value: entry.value,
        uncertainty: entry.uncertainty,
        standing: entry.standing,
        limit: entry.limit,
        range: entry.range,
        isHeatDanger: isHeatDanger(entry.readingIndex, entry.reading),
      })),
      roomC,
    ),
    // Every check carries every caution, whatever it found.
    generalCautions: [...generalCautionSchema.options],
  }
}
