import { formatNumber, toReaderUnit } from '../format.js'
import type { ReaderUnits } from '../format.js'
import { UNIT_LABELS } from '../labels.js'
import { differenceFromCanonical, fromCanonical } from '../units.js'
import { AFTER_A_CHANGE, requireChangeRule } from './change-rules.js'
import type {
  FirstChange,
  GaugeDisagreement,
  GeneralCaution,
  Measured,
  NamedStudy,
  PhysiologyCaution,
  Question,
} from './check.js'
import { writeValue } from './explain-value.js'
import { THERMOSTAT_SWING_C } from './policy.js'

function writeTemperature(temperatureC: number, units: ReaderUnits): string {
  return writeValue(temperatureC, units.temperature)
}

/** What to ask the person about a reading that looks like a slip. `value` is the reading as typed. */
export function explainQuestion(question: Question, value: number): string {
  switch (question) {
    case 'meant-fahrenheit':
      return `Did you mean ${formatNumber(value, 1).replace(/\.0$/, '')} °F? Over 60 °C no animal lives in this place.`
    case 'temperature-very-high':
      return 'Is this right? Over 140 °F (60 °C) no animal lives in this place.'
    case 'uv-index-very-high':
      return 'Is this a UV index? Over 15 is more than the sun gives almost anywhere on Earth.'
    case 'instrument-does-not-fit-position':
      return 'Is this the right instrument? This kind does not read well at this position: an infrared thermometer reads surfaces and not air, and a dial thermometer reads air and not surfaces.'
  }
}

/** Two gauges at one place that differ by more than their uncertainties allow. */
export function explainGaugeDisagreement(
  disagreement: GaugeDisagreement,
  measured: Pick<Measured, 'unit'>,
  units: ReaderUnits,
): string {
  const shown = toReaderUnit(measured.unit, units)
  const write = (difference: number) =>
    `${formatNumber(differenceFromCanonical(difference, shown), 1)} ${UNIT_LABELS[shown]}`
  const { difference, allowed } = disagreement
  return `These two gauges are at one place and differ by ${write(difference)}, more than the ${write(allowed)} their uncertainties allow. At least one is off, or they do not read the same spot.`
}

function nameStudy(study: NamedStudy): string {
  const stage =
    study.lifeStage === 'unspecified'
      ? 'life stage not stated'
      : study.lifeStage === 'any'
        ? null
        : study.lifeStage
  const animals = study.n === null ? 'number of animals not stated' : `n = ${study.n}`
  const basis = study.basis === 'span-without-mean' ? 'an end of its span, for want of a mean' : null
  return [study.name, animals, stage, basis].filter((text) => text !== null).join(', ')
}

/** A physiology caution in words, with the study it rests on. */
export function explainPhysiologyCaution(caution: PhysiologyCaution, units: ReaderUnits): string {
  const threshold = writeTemperature(caution.thresholdC, units)
  const { study } = caution
  const known = study === null ? '' : writeTemperature(study.valueC, units)
  const named = study === null ? '' : ` (${nameStudy(study)})`
  const trapped = 'an animal that cannot leave this place'
  switch (caution.kind) {
    case 'near-critical-maximum':
      return `Danger: with its uncertainty this place may be at ${threshold} or warmer, close to or past the critical maximum of ${known}${named}, where ${trapped} loses control of its body. That is borne for minutes, never for hours.`
    case 'near-critical-minimum':
      return `Danger: with its uncertainty this place may be at ${threshold} or colder, close to or past the critical minimum of ${known}${named}, where ${trapped} can no longer move.`
    case 'near-freezing':
      return `Danger: with its uncertainty this place may be at ${threshold} or colder, near freezing, for ${trapped}.`
    case 'above-selected-temperature':
      return `With its uncertainty this place may be warmer than the ${threshold} that animals selected in the study with the highest mean${named}. The check shows no way for an animal here to cool down.`
    case 'above-share-of-critical-maximum':
      return `With its uncertainty this place may be warmer than ${threshold}. No selected temperature is known; the lowest critical maximum is ${known}${named}, and what is borne for hours lies far below it. The check shows no way for an animal here to cool down.`
    case 'selected-temperature-not-reached':
      return `No place in this check reaches the ${threshold} that animals selected${named}.`
    case 'contact-burn':
      return `From ${threshold} on, a surface that an animal lies on can burn it (from memory, no source).`
  }
}

/** What to change first, in words, with what it assumes and rests on. */
export interface ExplainedChange {
  advice: string
  isEstimate: boolean
  assumes: string
  source: string
  /** What follows every change. */
  after: string
}

/** A change in words, in the reader's units. */
export function explainChange(change: FirstChange, units: ReaderUnits): ExplainedChange {
  const rule = requireChangeRule(change.ruleId)
  const { powerRatio, thermostatFloorC, targetC } = change
  const percent = (share: number) => `${Math.round(share * 100)} %`
  const floor =
    thermostatFloorC === null
      ? 'the night low and a margin'
      : `about ${formatNumber(fromCanonical(thermostatFloorC, units.temperature), 1)} ${UNIT_LABELS[units.temperature]}`
  const advice = rule.advice
    .replace('{ratio}', powerRatio === null ? '' : percent(powerRatio))
    .replace('{dim}', powerRatio === null ? '' : percent(1 - powerRatio))
    .replace('{floor}', floor)
  const aim = targetC === null || rule.isUrgent ? '' : ` Aim for ${writeTemperature(targetC, units)}.`
  const swing = `${formatNumber(differenceFromCanonical(THERMOSTAT_SWING_C, units.temperature), 1)} ${UNIT_LABELS[units.temperature]}`
  const assumed = thermostatFloorC === null ? '' : ` A swing of ${swing} is assumed.`
  return {
    advice: `${advice}${aim}`,
    isEstimate: powerRatio !== null || thermostatFloorC !== null,
    assumes: `${rule.assumes}${assumed}`,
    source: rule.source,
    after: AFTER_A_CHANGE,
  }
}

/** The cautions that stand beside every check. */
export const GENERAL_CAUTIONS: Readonly<Record<GeneralCaution, string>> = {
  'heat-burns':
    'Heat sources burn animals and people and start fires. Run each under a thermostat, behind a guard, and away from anything that burns.',
  'uv-harms': 'Too much UV blinds and burns, people too. Do not look into a lamp, and keep to its distance.',
  'no-veterinary-advice':
    'This is no veterinary advice. Take an animal that seems unwell to a vet who knows its kind, whatever the readings say.',
  'local-law':
    'Local law and codes decide on electrics and on keeping the species. Leave mains wiring to a licensed person.',
}
