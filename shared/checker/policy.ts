/**
 * Every number of the checker that we chose, each in one place. The method page lists them from here with their reasons.
 */

/** Probability of lying past a limit from which a reading counts as past it. */
export const LIMIT_PAST_PROBABILITY = 0.5
/** Probability of lying past a limit from which a reading counts as near it. */
export const LIMIT_NEAR_PROBABILITY = 0.05
/** Probability from which one answer about a range is given. */
export const RANGE_SURE_PROBABILITY = 0.95
/** A range narrower than this many standard uncertainties can confirm nothing: 2 × 1.96. */
export const NARROW_RANGE_FACTOR = 3.92
/** The ±limit, as a share of the range's width, of an instrument that could confirm it: √3 / 3.92. */
export const NEEDED_ACCURACY_SHARE = 0.44
/** Repeats from which a reading's own spread replaces the kind's usual one. */
export const REPEATS_FOR_OWN_SPREAD = 4
/** Two gauges at one place disagree beyond this many standard uncertainties of their difference. */
export const GAUGE_DISAGREEMENT_FACTOR = 2
/** Half of the span by which emissivity tables differ for one material. */
export const EMISSIVITY_HALF_SPREAD = 0.05

/** An air, hide or water temperature above this is asked back. */
export const ASKED_BACK_TEMPERATURE_C = 60
/** A UV index above this is asked back. */
export const ASKED_BACK_UV_INDEX = 15

/** One-sided 95 % point of the normal distribution, used for cautions. */
export const CAUTION_COVERAGE = 1.645
/** Margin under the lowest critical maximum where no selected temperature is known. */
export const CRITICAL_MAXIMUM_MARGIN_C = 10
/** The same for amphibians. */
export const CRITICAL_MAXIMUM_MARGIN_AMPHIBIA_C = 14
/** Closer than this to a critical temperature is danger. */
export const CRITICAL_DANGER_MARGIN_C = 3
/** In a cool season, colder than this is near freezing. */
export const NEAR_FREEZING_C = 3
/** From here on, contact with a surface can burn. */
export const CONTACT_BURN_C = 45

/** The excess over the room is not estimated where it is this many standard uncertainties or less. */
export const RATIO_DIFFERENCE_FACTOR = 2
/** A halogen is not dimmed below this share of its power. */
export const DIM_RATIO_MIN = 0.85
/** Swing of an on-off thermostat where the keeper's own is not known. */
export const THERMOSTAT_SWING_C = 2
