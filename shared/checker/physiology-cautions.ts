import type { Position } from '../ranges.js'
import type { AskedLifeStage, AskedSeason, CheckPage, NamedStudy, PhysiologyCaution } from './check.js'
import {
  CAUTION_COVERAGE,
  CONTACT_BURN_C,
  CRITICAL_DANGER_MARGIN_C,
  CRITICAL_MAXIMUM_MARGIN_AMPHIBIA_C,
  CRITICAL_MAXIMUM_MARGIN_C,
  NEAR_FREEZING_C,
} from './policy.js'
import type { ReadingPeriod } from './reading.js'
import { COOL_SEASONS, STAGES_ANY_NEVER_COVERS } from './selection.js'
import { findHighest, findLowest, listStudyMeans, speaksForStage } from './studies.js'
import type { LimitAnswer } from './verdict.js'

/** Where an animal can leave the heat, so that a temperature over what its body bears is not yet a danger. */
export const BASKING_POSITIONS: readonly Position[] = ['basking-surface', 'basking-air']
/** Surfaces an animal lies on. */
export const CONTACT_POSITIONS: readonly Position[] = ['basking-surface', 'substrate']

/** A temperature reading as cautions see it. */
export interface TemperatureReading {
  readingIndex: number
  position: Position
  period: ReadingPeriod
  valueC: number
  uncertaintyC: number
  limit: LimitAnswer
}

/** What the animal's body is known to seek and to bear, as far as it bears on one life stage. */
export interface BodyTemperatures {
  /** Highest and lowest study mean of selected body temperature. */
  highestSelected: NamedStudy | null
  lowestSelected: NamedStudy | null
  /** Lowest study-mean critical maximum and highest critical minimum of the stage or of unspecified stage. */
  criticalMaximum: NamedStudy | null
  criticalMinimum: NamedStudy | null
  /** The lowest critical maximum of whatever stage, where none of the asked one is known: for the caution, not for danger. */
  criticalMaximumForCaution: NamedStudy | null
  criticalMaximumMarginC: number
}

/**
 * Studies of the asked stage where there are some; else those of other stages, labelled by their stage, except that egg and
 * larva share nothing with the rest.
 */
function preferStage(studies: readonly NamedStudy[], asked: AskedLifeStage): NamedStudy[] {
  const ofStage = studies.filter((study) => speaksForStage(study.lifeStage, asked))
  if (ofStage.length > 0 || STAGES_ANY_NEVER_COVERS.includes(asked)) return ofStage
  return studies.filter(({ lifeStage }) => !STAGES_ANY_NEVER_COVERS.some((stage) => stage === lifeStage))
}

/** What a page knows of the animal's body for one life stage. */
export function findBodyTemperatures(
  page: Pick<CheckPage, 'physiology' | 'sources' | 'classification'>,
  lifeStage: AskedLifeStage,
): BodyTemperatures {
  const highest = listStudyMeans(page, 'selected-body-temperature', 'highC', 'lowC')
  const lowest = listStudyMeans(page, 'selected-body-temperature', 'lowC', 'lowC')
  const maxima = listStudyMeans(page, 'critical-thermal-maximum', 'lowC', 'lowC')
  const minima = listStudyMeans(page, 'critical-thermal-minimum', 'highC', 'highC')
  const ofStage = (studies: NamedStudy[]) =>
    studies.filter((study) => speaksForStage(study.lifeStage, lifeStage))
  return {
    highestSelected: findHighest(preferStage(highest, lifeStage)),
    lowestSelected: findLowest(preferStage(lowest, lifeStage)),
    criticalMaximum: findLowest(ofStage(maxima)),
    criticalMinimum: findHighest(ofStage(minima)),
    criticalMaximumForCaution: findLowest(preferStage(maxima, lifeStage)),
    criticalMaximumMarginC:
      page.classification?.row.class === 'Amphibia'
        ? CRITICAL_MAXIMUM_MARGIN_AMPHIBIA_C
        : CRITICAL_MAXIMUM_MARGIN_C,
  }
}

type Spot = Pick<TemperatureReading, 'valueC' | 'uncertaintyC'>
type Finding = Omit<PhysiologyCaution, 'readingIndex'>

/** Danger from heat: the reading's upper edge within 3 °C of the lowest critical maximum, or past it. */
function findHeatDanger(spot: Spot, body: BodyTemperatures): Finding | null {
  const study = body.criticalMaximum
  if (study === null) return null
  const thresholdC = study.valueC - CRITICAL_DANGER_MARGIN_C
  if (spot.valueC + CAUTION_COVERAGE * spot.uncertaintyC < thresholdC) return null
  return { level: 'danger', kind: 'near-critical-maximum', thresholdC, study }
}

/** Caution from heat: the upper edge above the highest selected temperature or, where none is known, near the critical maximum. */
function findHeatCaution(spot: Spot, body: BodyTemperatures): Finding | null {
  const upperEdgeC = spot.valueC + CAUTION_COVERAGE * spot.uncertaintyC
  const { highestSelected, criticalMaximumForCaution, criticalMaximumMarginC } = body
  if (highestSelected !== null) {
    const thresholdC = highestSelected.valueC
    if (upperEdgeC <= thresholdC) return null
    return { level: 'caution', kind: 'above-selected-temperature', thresholdC, study: highestSelected }
  }
  if (criticalMaximumForCaution === null) return null
  const thresholdC = criticalMaximumForCaution.valueC - criticalMaximumMarginC
  if (upperEdgeC <= thresholdC) return null
  return {
    level: 'caution',
    kind: 'above-share-of-critical-maximum',
    thresholdC,
    study: criticalMaximumForCaution,
  }
}

/** Danger from cold: in a cool season near freezing, else within 3 °C of the highest critical minimum. */
function findColdDanger(spot: Spot, body: BodyTemperatures, season: AskedSeason): Finding | null {
  const lowerEdgeC = spot.valueC - CAUTION_COVERAGE * spot.uncertaintyC
  if (COOL_SEASONS.includes(season)) {
    if (lowerEdgeC > NEAR_FREEZING_C) return null
    return { level: 'danger', kind: 'near-freezing', thresholdC: NEAR_FREEZING_C, study: null }
  }
  const study = body.criticalMinimum
  if (study === null) return null
  const thresholdC = study.valueC + CRITICAL_DANGER_MARGIN_C
  if (lowerEdgeC > thresholdC) return null
  return { level: 'danger', kind: 'near-critical-minimum', thresholdC, study }
}

/**
 * What a temperature means to an animal that cannot leave it: danger near a critical temperature, else caution above what
 * animals select. The measure for trapped positions, for checks and lints alike.
 */
export function cautionTrapped(spot: Spot, body: BodyTemperatures, season: AskedSeason): Finding[] {
  const heat = findHeatDanger(spot, body) ?? findHeatCaution(spot, body)
  const cold = findColdDanger(spot, body, season)
  return [heat, cold].filter((finding) => finding !== null)
}

/** Whether the same check shows a place, at the same time, that is cooler than this one and tolerable. */
function showsRefuge(
  from: TemperatureReading,
  readings: readonly TemperatureReading[],
  body: BodyTemperatures,
  season: AskedSeason,
): boolean {
  return readings.some(
    (place) =>
      place.period === from.period &&
      !BASKING_POSITIONS.includes(place.position) &&
      place.valueC < from.valueC &&
      place.limit !== 'past' &&
      place.limit !== 'near' &&
      cautionTrapped(place, body, season).length === 0,
  )
}

const LEVEL_ORDER = ['danger', 'caution', 'inform'] as const

/**
 * Cautions from what is known of the animal's body, worst first, each with its study. Body temperature is not enclosure
 * temperature: a basking surface may be hotter than the critical maximum, because the animal leaves it. So basking
 * positions are judged only when the same check shows no cooler, tolerable place.
 */
export function findPhysiologyCautions(
  page: Pick<CheckPage, 'physiology' | 'sources' | 'classification'>,
  asked: { lifeStage: AskedLifeStage; season: AskedSeason },
  readings: readonly TemperatureReading[],
): PhysiologyCaution[] {
  const body = findBodyTemperatures(page, asked.lifeStage)
  const cautions: PhysiologyCaution[] = []
  for (const reading of readings) {
    const { readingIndex, position, valueC } = reading
    const canLeave =
      BASKING_POSITIONS.includes(position) && showsRefuge(reading, readings, body, asked.season)
    if (!canLeave) {
      const findings = cautionTrapped(reading, body, asked.season)
      cautions.push(...findings.map((finding) => ({ ...finding, readingIndex })))
    }
    if (CONTACT_POSITIONS.includes(position) && valueC >= CONTACT_BURN_C) {
      cautions.push({
        level: 'inform',
        kind: 'contact-burn',
        readingIndex,
        thresholdC: CONTACT_BURN_C,
        study: null,
      })
    }
  }
  const selected = body.lowestSelected
  const byDay = readings.filter(({ period }) => period === 'day')
  const isWarmSeason = !COOL_SEASONS.includes(asked.season)
  const isReached = ({ valueC, uncertaintyC }: TemperatureReading) =>
    selected !== null && valueC + CAUTION_COVERAGE * uncertaintyC >= selected.valueC
  if (selected !== null && isWarmSeason && byDay.length > 0 && !byDay.some(isReached)) {
    const thresholdC = selected.valueC
    cautions.push({
      level: 'inform',
      kind: 'selected-temperature-not-reached',
      readingIndex: null,
      thresholdC,
      study: selected,
    })
  }
  return cautions.sort((a, b) => LEVEL_ORDER.indexOf(a.level) - LEVEL_ORDER.indexOf(b.level))
}
