import { encodeCheck } from '../../../shared/checker/check-link.js'
import type { CheckInput } from '../../../shared/checker/check.js'
import type { Reading } from '../../../shared/checker/reading.js'
import { BASKER } from './species.js'

/** A thermometer's reading by day with the accuracy its kind usually has; change what the check is about. */
function makeReading(part: Partial<Reading>): Reading {
  return {
    parameter: 'temperature',
    position: 'basking-surface',
    period: 'day',
    values: [46],
    unit: 'degC',
    instrument: 'probe-thermometer',
    accuracy: { form: 'limit', absolute: 0.5, relativePercent: null, combine: 'larger' },
    resolution: 0.1,
    uvMeaning: null,
    surface: null,
    ...part,
  }
}

/** The readings of the journey, each with what it is: the page's revision 4 asks 44 to 50 °C of the slab, with 58 as limit. */
export const JOURNEY_READINGS = {
  /** 53.5 ± 0.5: past the range, short of the limit of 58. */
  hot: makeReading({ values: [53.5] }),
  /** 35.0 ± 2 where 31 to 35 is asked: on the bound. */
  unclear: makeReading({
    position: 'warm-end-air',
    values: [35],
    instrument: 'dial-thermometer',
    accuracy: { form: 'limit', absolute: 2, relativePercent: null, combine: 'larger' },
    resolution: 1,
  }),
  /** Nobody has cited a range for water on this page. */
  uncited: makeReading({ position: 'water', values: [22] }),
  /** 34.8 ± 0.5 at the cool end, whose upper limit is 35. */
  near: makeReading({ position: 'cool-end-air', values: [34.8] }),
  /** 42 ± 0.5 in the warm hide, whose upper limit is 40. */
  past: makeReading({ position: 'warm-hide', values: [42] }),
} as const

export const JOURNEY_CHECK: CheckInput = {
  slug: BASKER.slug,
  revision: 4,
  season: 'active',
  lifeStage: 'adult',
  roomTemperature: { value: 22, unit: 'degC' },
  readings: Object.values(JOURNEY_READINGS),
}

/** The address of a check. */
export function toCheckAddress({ slug, ...check }: CheckInput): string {
  return `/species/${slug}/check?c=${encodeCheck(check)}`
}
