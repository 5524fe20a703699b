import type { PolicyNumber } from '../checker/method.js'
import { ASKED_BACK_TEMPERATURE_C, ASKED_BACK_UV_INDEX } from '../checker/policy.js'

/** Evidence older than this many years is pointed out. */
export const OLD_EVIDENCE_YEARS = 30
/** Ranges are adopted to a tenth at the finest; half of that is rounding, not reach past the evidence. */
export const ENVELOPE_ROUNDING = 0.05

/** A °C value over this looks like °F ("90" for a warm end), as in a reading that is asked back. */
export const LOOKS_LIKE_DEGF_OVER_C = ASKED_BACK_TEMPERATURE_C
/** The same for a basking surface, since stones under a lamp really get hotter than air. */
export const LOOKS_LIKE_DEGF_OVER_C_BASKING = 70
/** The same in a cool season, when nothing is warm. */
export const LOOKS_LIKE_DEGF_OVER_C_COOL = 35
/** A °F value below this looks like °C ("28" for a cool end). */
export const LOOKS_LIKE_DEGC_UNDER_F = 45
/** The same in a cool season, when 40 °F is right and only frost is not. */
export const LOOKS_LIKE_DEGC_UNDER_F_COOL = 32
/** A humidity in % up to this looks like a fraction ("0.6" for 60 %). */
export const LOOKS_LIKE_FRACTION_UP_TO = 1
/** A UV index over this looks like an irradiance in µW/cm², as in a reading that is asked back. */
export const LOOKS_LIKE_IRRADIANCE_OVER = ASKED_BACK_UV_INDEX

/** Every number of the lints that we chose, for the method page. */
export const LINT_POLICY_NUMBERS: readonly PolicyNumber[] = [
  {
    id: 'old-evidence',
    name: 'Evidence is pointed out as old from more than',
    value: OLD_EVIDENCE_YEARS,
    unit: 'years',
    reason: 'Instruments and names have changed since; the source may still be right.',
  },
  {
    id: 'envelope-rounding',
    name: 'A bound counts as outside the envelope from more than',
    value: ENVELOPE_ROUNDING,
    unit: 'of its unit',
    reason: 'Half of the finest step in which ranges are adopted: rounding, not reach.',
  },
  {
    id: 'looks-like-degf',
    name: 'A temperature in °C looks like one in °F above',
    value: LOOKS_LIKE_DEGF_OVER_C,
    unit: '°C',
    reason: 'No air, hide or water is kept so hot.',
  },
  {
    id: 'looks-like-degf-basking',
    name: 'The same for a basking surface above',
    value: LOOKS_LIKE_DEGF_OVER_C_BASKING,
    unit: '°C',
    reason: 'Stones under a lamp get hotter than the air around them.',
  },
  {
    id: 'looks-like-degf-cool',
    name: 'The same in brumation above',
    value: LOOKS_LIKE_DEGF_OVER_C_COOL,
    unit: '°C',
    reason: 'Nothing is warm in a cool season.',
  },
  {
    id: 'looks-like-degc',
    name: 'A temperature in °F looks like one in °C below',
    value: LOOKS_LIKE_DEGC_UNDER_F,
    unit: '°F',
    reason: 'Outside a cool season hardly anything is kept at 7 °C.',
  },
  {
    id: 'looks-like-degc-cool',
    name: 'The same in brumation below',
    value: LOOKS_LIKE_DEGC_UNDER_F_COOL,
    unit: '°F',
    reason: 'Water freezes there.',
  },
  {
    id: 'looks-like-fraction',
    name: 'A humidity looks like a fraction up to',
    value: LOOKS_LIKE_FRACTION_UP_TO,
    unit: '%',
    reason: 'No enclosure is that dry.',
  },
  {
    id: 'looks-like-irradiance',
    name: 'A UV index looks like an irradiance above',
    value: LOOKS_LIKE_IRRADIANCE_OVER,
    unit: null,
    reason:
      'Hardly any place on Earth has so high an index; meters of irradiance show such numbers. From memory.',
  },
]
