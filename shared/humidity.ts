import psychrolib from 'psychrolib'

// The library computes nothing before it knows the unit system.
psychrolib.SetUnitSystem(psychrolib.SI)

/** Where the library's formula holds. */
const COLDEST_C = -100
const HOTTEST_C = 200

/** What one position of the enclosure is meant to read: °C and % relative humidity; a null side is open. */
export interface AirTarget {
  lowC: number | null
  highC: number | null
  lowRh: number | null
  highRh: number | null
}

/** Vapour pressures in Pa that suit a position or several; `highPa` is infinite where nothing bounds it. */
export interface VapourPressures {
  lowPa: number
  highPa: number
}

/** Whether the formula of the saturation vapour pressure holds at a temperature: −100 to 200 °C. */
export function hasSaturationPressure(temperatureC: number): boolean {
  return temperatureC >= COLDEST_C && temperatureC <= HOTTEST_C
}

/**
 * Saturation vapour pressure over water in Pa at a temperature in °C: ASHRAE Handbook Fundamentals 2017, chapter 1, equation 6
 * (Hyland and Wexler), by psychrolib; at and below 0.01 °C that over ice, equation 5. Throws a RangeError outside −100 to 200 °C.
 */
export function findSaturationPressurePa(temperatureC: number): number {
  if (!hasSaturationPressure(temperatureC)) {
    throw new RangeError(`No saturation vapour pressure is known at ${temperatureC} °C.`)
  }
  return psychrolib.GetSatVapPres(temperatureC)
}

/**
 * The vapour pressures a position allows, from RH_low · e_s(T_low) to RH_high · e_s(T_high). An open low side allows any dry
 * air; an open humidity above means 100 %; an open temperature above leaves the pressure unbounded.
 */
export function findAllowedVapour(target: AirTarget): VapourPressures {
  const { lowC, highC, lowRh, highRh } = target
  return {
    lowPa: lowC === null || lowRh === null ? 0 : (lowRh / 100) * findSaturationPressurePa(lowC),
    highPa: highC === null ? Infinity : ((highRh ?? 100) / 100) * findSaturationPressurePa(highC),
  }
}

/**
 * The vapour pressures that suit every position at once, as one air mass has the same everywhere; null when there are none,
 * so that some position needs a wet spot or ventilation of its own.
 */
export function intersectVapour(positions: readonly VapourPressures[]): VapourPressures | null {
  const lowPa = Math.max(0, ...positions.map((position) => position.lowPa))
  const highPa = Math.min(Infinity, ...positions.map((position) => position.highPa))
  return lowPa <= highPa ? { lowPa, highPa } : null
}
