import * as policy from './policy.js'

/** One formula the checker uses. */
export interface Formula {
  id: string
  title: string
  formula: string
  usedFor: string
  source: string
}

/** One number that we chose. */
export interface PolicyNumber {
  id: string
  name: string
  value: number
  unit: string | null
  reason: string
}

/** Every formula of the checker, for the method page. */
export const FORMULAS: readonly Formula[] = [
  {
    id: 'fahrenheit',
    title: 'Fahrenheit and Celsius',
    formula: 't/°C = (t/°F − 32) · 5/9; a difference by the factor 5/9 alone',
    usedFor: 'Values typed or printed in °F. A tolerance or an uncertainty is a difference.',
    source: 'NIST SP 811, appendix B; formula from memory',
  },
  {
    id: 'inch',
    title: 'Inches and centimetres',
    formula: '1 in = 2.54 cm, exact',
    usedFor: 'Lengths',
    source: 'International yard and pound agreement 1959; NIST SP 811',
  },
  {
    id: 'limit-accuracy',
    title: 'Accuracy given as a limit ±a',
    formula: 'u = a/√3',
    usedFor:
      'What an instrument’s papers state as “±”; defaults too. A part of the reading counts in the unit of the instrument.',
    source: 'JCGM 100:2008, 4.3.7',
  },
  {
    id: 'expanded-accuracy',
    title: 'Accuracy given as an uncertainty with k = 2',
    formula: 'u = a/2',
    usedFor: 'Calibration certificates',
    source: 'JCGM 100:2008, 4.3.3',
  },
  {
    id: 'resolution',
    title: 'Step of the display δ',
    formula: 'u = δ/(2√3)',
    usedFor: 'Every reading',
    source: 'JCGM 100:2008, F.2.2.1',
  },
  {
    id: 'repeats',
    title: 'Scatter of n repeats',
    formula: `u = s/√n; s is the usual repeatability of the kind of instrument, from n = ${policy.REPEATS_FOR_OWN_SPREAD} the readings’ own`,
    usedFor: 'Every reading; its value is the mean of the repeats',
    source: 'JCGM 100:2008, 4.2',
  },
  {
    id: 'combine',
    title: 'Combined standard uncertainty',
    formula: 'u = √(u₁² + u₂² + …)',
    usedFor: 'Every reading',
    source: 'JCGM 100:2008, 5.1.2',
  },
  {
    id: 'gauges',
    title: 'Two gauges at one place',
    formula: `they disagree when |x₁ − x₂| > ${policy.GAUGE_DISAGREEMENT_FACTOR}·√(u₁² + u₂²)`,
    usedFor: 'Two readings of one parameter, position and period',
    source: 'JCGM 100:2008, 5.1.2, for the difference of two values',
  },
  {
    id: 'emissivity',
    title: 'Surface temperature from an infrared thermometer',
    formula: 'ε_set·T_read⁴ + (1 − ε_set)·T_r⁴ = ε·T⁴ + (1 − ε)·T_r⁴, in kelvin',
    usedFor:
      'Infrared readings whose surface is named. An approximation: it takes all radiation together, the instrument a band of it.',
    source: 'Stefan-Boltzmann balance; formula from memory',
  },
  {
    id: 'limit-probability',
    title: 'Probability of lying past a limit',
    formula: 'lower: Φ((limit − x)/u); upper: 1 − Φ((limit − x)/u)',
    usedFor: 'Past, near or clear of a limit; each limit alone',
    source: 'JCGM 106:2012 (ISO/IEC Guide 98-4), clause 7',
  },
  {
    id: 'range-probability',
    title: 'Probability of lying in a range from L to U',
    formula: 'p_low = Φ((L − x)/u), p_high = 1 − Φ((U − x)/u), p_in the rest',
    usedFor: 'Inside, low, high or unclear',
    source: 'JCGM 106:2012 (ISO/IEC Guide 98-4), clause 7',
  },
  {
    id: 'normal',
    title: 'Normal distribution Φ',
    formula: 'Φ(z) = erfc(−z/√2)/2',
    usedFor: 'Both probabilities',
    source: 'W. J. Cody, Mathematics of Computation 23 (1969) 631–637',
  },
  {
    id: 'narrow-range',
    title: 'A range the instrument cannot confirm',
    formula: `U − L < ${policy.NARROW_RANGE_FACTOR}·u; an instrument of ±${policy.NEEDED_ACCURACY_SHARE}·(U − L) could`,
    usedFor: 'Verdicts that are not inside',
    source: 'From the range probability: 2 · 1.96 standard uncertainties; 0.44 is √3/3.92',
  },
  {
    id: 'power-ratio',
    title: 'Share of a lamp’s power',
    formula: `r = (T_target − T_room)/(T_read − T_room); not given when either difference is ${policy.RATIO_DIFFERENCE_FACTOR}·u or less`,
    usedFor: 'What to change first. The target is the middle of the range.',
    source:
      'The excess over the room taken as proportional to the power: an estimate, common practice, no source',
  },
  {
    id: 'thermostat-floor',
    title: 'Night floor of a thermostat',
    formula: 'floor = night low + swing/2 + 2·u',
    usedFor: 'What to change first at night',
    source: 'Common practice, no source',
  },
]

/** Every number of the checker that is our choice, for the method page. */
export const POLICY_NUMBERS: readonly PolicyNumber[] = [
  {
    id: 'limit-past',
    name: 'Past a limit from a probability of',
    value: policy.LIMIT_PAST_PROBABILITY,
    unit: null,
    reason: 'As likely as not is too likely where harm is.',
  },
  {
    id: 'limit-near',
    name: 'Near a limit from a probability of',
    value: policy.LIMIT_NEAR_PROBABILITY,
    unit: null,
    reason: 'One chance in twenty of harm is worth a warning.',
  },
  {
    id: 'range-sure',
    name: 'One answer about a range from a probability of',
    value: policy.RANGE_SURE_PROBABILITY,
    unit: null,
    reason:
      'The level commonly used for decisions of this kind; below it the two likeliest answers are given.',
  },
  {
    id: 'narrow-range',
    name: 'Width of a range, in standard uncertainties, below which nothing is confirmed',
    value: policy.NARROW_RANGE_FACTOR,
    unit: null,
    reason: 'Even a reading in the middle of a narrower range is inside with less than 0.95.',
  },
  {
    id: 'needed-accuracy',
    name: 'Accuracy that could confirm a range, as a share of its width',
    value: policy.NEEDED_ACCURACY_SHARE,
    unit: null,
    reason: 'A limit ±a has u = a/√3, and √3/3.92 is 0.44.',
  },
  {
    id: 'own-spread',
    name: 'Repeats from which their own spread counts',
    value: policy.REPEATS_FOR_OWN_SPREAD,
    unit: null,
    reason: 'The spread of two or three repeats says little.',
  },
  {
    id: 'gauges',
    name: 'Gauges disagree beyond, in standard uncertainties of their difference',
    value: policy.GAUGE_DISAGREEMENT_FACTOR,
    unit: null,
    reason: 'Two good gauges differ by more about once in twenty times.',
  },
  {
    id: 'emissivity-spread',
    name: 'Half of the span of emissivity tables',
    value: policy.EMISSIVITY_HALF_SPREAD,
    unit: null,
    reason: 'Tables of instrument handbooks differ by up to 0.1 for one material.',
  },
  {
    id: 'asked-back-temperature',
    name: 'Temperature of air, hide or water that is asked back, above',
    value: policy.ASKED_BACK_TEMPERATURE_C,
    unit: '°C',
    reason: 'It is most likely a value in °F.',
  },
  {
    id: 'asked-back-uv-index',
    name: 'UV index that is asked back, above',
    value: policy.ASKED_BACK_UV_INDEX,
    unit: null,
    reason: 'It is most likely another scale.',
  },
  {
    id: 'caution-coverage',
    name: 'Standard uncertainties added before a caution is judged',
    value: policy.CAUTION_COVERAGE,
    unit: null,
    reason: 'The one-sided 95 % point of the normal distribution: a caution errs towards warning.',
  },
  {
    id: 'critical-maximum-margin',
    name: 'Caution below the lowest critical maximum, by',
    value: policy.CRITICAL_MAXIMUM_MARGIN_C,
    unit: '°C',
    reason:
      'In the open data behind this reference it lies a median 10.1 °C over the selected temperature in 177 reptiles.',
  },
  {
    id: 'critical-maximum-margin-amphibia',
    name: 'The same for amphibians',
    value: policy.CRITICAL_MAXIMUM_MARGIN_AMPHIBIA_C,
    unit: '°C',
    reason: 'A median 14.4 °C in 100 amphibians of the same data.',
  },
  {
    id: 'critical-danger-margin',
    name: 'Danger within this of a critical temperature',
    value: policy.CRITICAL_DANGER_MARGIN_C,
    unit: '°C',
    reason:
      'Critical temperatures are acute figures of fast trials; what is borne for hours lies inside them.',
  },
  {
    id: 'near-freezing',
    name: 'Near freezing in a cool season, from this down',
    value: policy.NEAR_FREEZING_C,
    unit: '°C',
    reason: 'Colder spots and swings of a cooler reach 0 °C from here.',
  },
  {
    id: 'contact-burn',
    name: 'Contact with a surface can burn from',
    value: policy.CONTACT_BURN_C,
    unit: '°C',
    reason: 'From memory, no source looked up.',
  },
  {
    id: 'ratio-difference',
    name: 'No power share is estimated where a difference is at most this many standard uncertainties',
    value: policy.RATIO_DIFFERENCE_FACTOR,
    unit: null,
    reason: 'The ratio of two differences that small says nothing.',
  },
  {
    id: 'dim-ratio',
    name: 'Least share of its power that a halogen is dimmed to',
    value: policy.DIM_RATIO_MIN,
    unit: null,
    reason: 'Dimmed by more than 15 % it leaves its working band: common practice, no source.',
  },
  {
    id: 'thermostat-swing',
    name: 'Swing of a thermostat that is assumed',
    value: policy.THERMOSTAT_SWING_C,
    unit: '°C',
    reason: 'Usual for on-off thermostats: common practice, no source.',
  },
]
