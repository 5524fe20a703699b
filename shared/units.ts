/**
 * Units a value may be typed or printed in. Names follow UCUM where it has one (Cel, [degF], %, h, cm, [in_i]),
 * written here as plain words. Canonical units: degC, percentRh, uvi, h, cm. Their schemas stand in a file of their own,
 * so that a page which only converts carries no schema library.
 */
export const UNITS = ['degC', 'degF', 'percentRh', 'uvi', 'h', 'cm', 'in'] as const
export type Unit = (typeof UNITS)[number]

export const TEMPERATURE_UNITS = ['degC', 'degF'] as const
export type TemperatureUnit = (typeof TEMPERATURE_UNITS)[number]

export type LengthUnit = 'cm' | 'in'

/** Exact: 5 °C apart is 9 °F apart (NIST SP 811, appendix B). Two whole numbers round less often than the factor 1.8. */
const DEGF_STEPS = 9
const DEGC_STEPS = 5
/** Exact: the zero of the Celsius scale reads 32 on the Fahrenheit scale. */
const DEGF_AT_ZERO_C = 32
/** Exact: 1 in = 25.4 mm (international yard and pound agreement, 1959). */
const CM_PER_INCH = 2.54

/** A temperature in °F as °C, t/°C = (t/°F − 32)/1.8 (NIST SP 811). */
export function fahrenheitToCelsius(temperatureF: number): number {
  return ((temperatureF - DEGF_AT_ZERO_C) * DEGC_STEPS) / DEGF_STEPS
}

/** A temperature in °C as °F, t/°F = 1.8 t/°C + 32 (NIST SP 811). */
export function celsiusToFahrenheit(temperatureC: number): number {
  return (temperatureC * DEGF_STEPS) / DEGC_STEPS + DEGF_AT_ZERO_C
}

/** A length in inches as centimetres. */
export function inchesToCentimetres(lengthIn: number): number {
  return lengthIn * CM_PER_INCH
}

/** A length in centimetres as inches. */
export function centimetresToInches(lengthCm: number): number {
  return lengthCm / CM_PER_INCH
}

/** A value typed in `unit` in its canonical unit (degC, percentRh, uvi, h, cm). */
export function toCanonical(value: number, unit: Unit): number {
  if (unit === 'degF') return fahrenheitToCelsius(value)
  if (unit === 'in') return inchesToCentimetres(value)
  return value
}

/** A canonical value in `unit`, the inverse of `toCanonical`. */
export function fromCanonical(value: number, unit: Unit): number {
  if (unit === 'degF') return celsiusToFahrenheit(value)
  if (unit === 'in') return centimetresToInches(value)
  return value
}

/** A difference, tolerance or uncertainty in `unit` in its canonical unit: by the factor alone, never the offset. */
export function differenceToCanonical(difference: number, unit: Unit): number {
  if (unit === 'degF') return (difference * DEGC_STEPS) / DEGF_STEPS
  if (unit === 'in') return inchesToCentimetres(difference)
  return difference
}

/** A canonical difference in `unit`, the inverse of `differenceToCanonical`. */
export function differenceFromCanonical(difference: number, unit: Unit): number {
  if (unit === 'degF') return (difference * DEGF_STEPS) / DEGC_STEPS
  if (unit === 'in') return centimetresToInches(difference)
  return difference
}
