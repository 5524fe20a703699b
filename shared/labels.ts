import type { Standing } from './checker/verdict.js'
import type { EvidenceKind } from './evidence.js'
import type { Quantity } from './physiology.js'
import type { Parameter, Period, Position, RecordLifeStage, Season, UvMeaning } from './ranges.js'
import type { SourceKind } from './sources.js'
import type { Unit } from './units.js'

/** Words for what a range measures. */
export const PARAMETER_LABELS: Record<Parameter, string> = {
  temperature: 'Temperature',
  'relative-humidity': 'Relative humidity',
  'uv-index': 'UV index',
  photoperiod: 'Photoperiod',
  'basking-heat-hours': 'Hours of basking heat',
}

/** The same in as few letters as a label in a drawing has room for. */
export const PARAMETER_SHORT_LABELS: Record<Parameter, string> = {
  temperature: 'Temperature',
  'relative-humidity': 'Humidity',
  'uv-index': 'UV index',
  photoperiod: 'Light',
  'basking-heat-hours': 'Basking heat',
}

/** Words for where in the enclosure something is measured. */
export const POSITION_LABELS: Record<Position, string> = {
  'basking-surface': 'Basking surface',
  'basking-air': 'Basking air',
  'warm-end-air': 'Warm-end air',
  'warm-hide': 'Warm hide',
  'cool-end-air': 'Cool-end air',
  'cool-hide': 'Cool hide',
  'humid-hide': 'Humid hide',
  shade: 'Shade',
  substrate: 'Substrate',
  water: 'Water',
  'whole-enclosure': 'Whole enclosure',
}

export const PERIOD_LABELS: Record<Period, string> = {
  day: 'Lights on',
  night: 'Lights off',
  any: 'Day and night',
}

export const SEASON_LABELS: Record<Season, string> = {
  active: 'Active',
  brumation: 'Brumation',
  aestivation: 'Aestivation',
  any: 'Any season',
}

/** Words for a life stage; "not stated" is what a study leaves unsaid, which is not the same as any stage. */
export const LIFE_STAGE_LABELS: Record<RecordLifeStage, string> = {
  egg: 'Egg',
  larva: 'Larva',
  metamorph: 'Metamorph',
  hatchling: 'Hatchling',
  juvenile: 'Juvenile',
  adult: 'Adult',
  gravid: 'Gravid',
  any: 'Any stage',
  unspecified: 'Stage not stated',
}

export const UV_MEANING_LABELS: Record<UvMeaning, string> = {
  typical: 'Typical exposure',
  maximum: 'Maximum exposure',
}

export const EVIDENCE_KIND_LABELS: Record<EvidenceKind, string> = {
  guideline: 'Recommended by a guideline',
  'keepers-report': 'Recommended by keepers’ report',
  'field-site': 'Measured at field sites',
  'field-body-temperature': 'Body temperature in the field',
  'selected-in-gradient': 'Selected in a thermal gradient',
  'tolerance-limit': 'Tolerance limit',
  review: 'Review or compilation',
}

/** Words for what is known of the animal's body. */
export const QUANTITY_LABELS: Record<Quantity, string> = {
  'field-body-temperature': 'Body temperature in the field',
  'selected-body-temperature': 'Selected body temperature',
  'critical-thermal-minimum': 'Critical thermal minimum',
  'critical-thermal-maximum': 'Critical thermal maximum',
  'lethal-minimum': 'Lethal minimum',
  'lethal-maximum': 'Lethal maximum',
  'supercooling-point': 'Supercooling point',
  'optimum-temperature': 'Optimum temperature',
}

/** One sentence on what a quantity is, for somebody who meets the word for the first time. */
export const QUANTITY_EXPLANATIONS: Record<Quantity, string> = {
  'field-body-temperature': 'What active animals measured in the wild were at.',
  'selected-body-temperature': 'The body temperature animals chose where a gradient let them choose.',
  'critical-thermal-minimum': 'Cooled step by step, the animal loses control of its movements here.',
  'critical-thermal-maximum': 'Warmed step by step, the animal loses control of its movements here.',
  'lethal-minimum': 'Cold that killed the stated share of the animals.',
  'lethal-maximum': 'Heat that killed the stated share of the animals.',
  'supercooling-point': 'Body fluids begin to freeze here.',
  'optimum-temperature': 'The body temperature of the best measured performance, mostly of running speed.',
}

export const SOURCE_KIND_LABELS: Record<SourceKind, string> = {
  article: 'Article',
  book: 'Book',
  thesis: 'Thesis',
  report: 'Report',
  dataset: 'Dataset',
  law: 'Law or code',
  'web-page': 'Web page',
  other: 'Other',
}

/** How a unit is written behind a number. A UV index has no unit; the letters say which scale it is. */
export const UNIT_LABELS: Record<Unit, string> = {
  degC: '°C',
  degF: '°F',
  percentRh: '%',
  uvi: 'UVI',
  h: 'h',
  cm: 'cm',
  in: 'in',
}

/** The word beside each verdict's mark, worst first. */
export const VERDICT_LABELS: Record<Standing, string> = {
  past: 'Past a limit',
  near: 'Near a limit',
  high: 'High',
  low: 'Low',
  unclear: 'Can’t tell',
  'no-range': 'No cited range',
  'not-low': 'Not too low',
  'not-high': 'Not too high',
  inside: 'Inside',
}

/** The instrument that answers best at a position (common practice, no source). */
export function describeMeasuring(
  parameter: Parameter,
  position: Position,
  uvMeaning: UvMeaning | null,
): string | null {
  switch (parameter) {
    case 'temperature':
      if (position === 'basking-surface') return 'infrared thermometer'
      if (position === 'basking-air') return 'probe at the animal’s back'
      if (position === 'substrate') return 'probe in the ground'
      if (position === 'water') return 'probe in the water'
      if (position.endsWith('hide')) return 'probe inside'
      if (position === 'whole-enclosure') return 'probe, anywhere in it'
      return 'probe in shade'
    case 'relative-humidity':
      return position.endsWith('hide') ? 'hygrometer inside' : 'hygrometer'
    case 'uv-index':
      return uvMeaning === null
        ? 'UV meter'
        : uvMeaning === 'typical'
          ? 'typical, at the back'
          : 'maximum, at the back'
    case 'photoperiod':
    case 'basking-heat-hours':
      return 'hours in a day'
  }
}
