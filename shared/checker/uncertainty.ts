import { UNITS_OF_PARAMETER } from './reading.js'
import type { Accuracy, Reading } from './reading.js'
import { differenceToCanonical, toCanonical } from '../units.js'
import { correctForEmissivity } from './emissivity.js'
import { INSTRUMENTS, defaultAccuracy } from './instruments.js'
import { EMISSIVITY_HALF_SPREAD, GAUGE_DISAGREEMENT_FACTOR, REPEATS_FOR_OWN_SPREAD } from './policy.js'
import type { Measured } from './check.js'

type Part = Measured['parts'][number]

/** Arithmetic mean of one or more numbers. */
export function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length
}

/** Experimental standard deviation s of two or more repeats, n − 1 in the denominator (JCGM 100:2008, 4.2.2). */
export function standardDeviation(values: readonly number[]): number {
  const middle = mean(values)
  const squares = values.reduce((sum, value) => sum + (value - middle) ** 2, 0)
  return Math.sqrt(squares / (values.length - 1))
}

/** Standard uncertainty of a rectangular ±a: a/√3 (JCGM 100:2008, 4.3.7). */
export function fromLimit(halfWidth: number): number {
  return halfWidth / Math.sqrt(3)
}

/** Standard uncertainty of a stated k = 2 uncertainty: a/2 (JCGM 100:2008, 4.3.3). */
export function fromExpanded(expanded: number): number {
  return expanded / 2
}

/** Standard uncertainty of a display that steps by δ: δ/(2√3) (JCGM 100:2008, F.2.2.1). */
export function fromResolution(step: number): number {
  return step / (2 * Math.sqrt(3))
}

/** Root sum of squares of independent parts (JCGM 100:2008, 5.1.2). */
export function combine(parts: readonly number[]): number {
  return Math.hypot(...parts)
}

/** Standard uncertainty of a stated accuracy at a reading, both in the instrument's own unit. */
export function fromAccuracy(accuracy: Accuracy, value: number): number {
  const absolute = accuracy.absolute ?? 0
  const relative = (Math.abs(value) * (accuracy.relativePercent ?? 0)) / 100
  const a = accuracy.combine === 'sum' ? absolute + relative : Math.max(absolute, relative)
  return accuracy.form === 'limit' ? fromLimit(a) : fromExpanded(a)
}

/** The part that scatter adds: the kind's usual repeatability over √n, from four repeats on the readings' own s over √n. */
function findScatter(reading: Reading): Part {
  const n = reading.values.length
  if (n >= REPEATS_FOR_OWN_SPREAD) {
    const s = differenceToCanonical(standardDeviation(reading.values), reading.unit)
    return { from: 'repeatability', uncertainty: s / Math.sqrt(n), isDefault: false }
  }
  const uncertainty = INSTRUMENTS[reading.instrument].repeatability / Math.sqrt(n)
  return { from: 'repeatability', uncertainty, isDefault: true }
}

/**
 * What a reading says, in canonical units: the mean of its repeats, corrected for the surface where an infrared
 * thermometer read a named one, and its standard uncertainty by JCGM 100:2008. What is unstated is never zero: the
 * instrument kind's default stands in.
 */
export function measureReading(reading: Reading): Measured {
  const { unit, values } = reading
  const shown = mean(values)
  const value = toCanonical(shown, unit)
  const instrument = INSTRUMENTS[reading.instrument]
  const accuracy = reading.accuracy ?? defaultAccuracy(reading.instrument, unit)
  const resolution =
    reading.resolution === null ? instrument.resolution : differenceToCanonical(reading.resolution, unit)
  const parts: Part[] = [
    {
      from: 'accuracy',
      uncertainty: differenceToCanonical(fromAccuracy(accuracy, shown), unit),
      isDefault: reading.accuracy === null,
    },
    { from: 'resolution', uncertainty: fromResolution(resolution), isDefault: reading.resolution === null },
    findScatter(reading),
  ]
  const canonicalUnit = UNITS_OF_PARAMETER[reading.parameter][0]
  const measured = { unit: canonicalUnit, repeats: values.length }
  const surface = findSurface(reading, value)
  if (surface === null) {
    const uncertainty = combine(parts.map((part) => part.uncertainty))
    return { ...measured, value, uncertainty, parts, uncorrectedValue: null }
  }
  const carried = parts.map((part) => ({ ...part, uncertainty: part.uncertainty * surface.perReading }))
  carried.push({
    from: 'emissivity',
    uncertainty: fromLimit(EMISSIVITY_HALF_SPREAD) * Math.abs(surface.perEmissivityC),
    isDefault: true,
  })
  const uncertainty = combine(carried.map((part) => part.uncertainty))
  return { ...measured, value: surface.surfaceC, uncertainty, parts: carried, uncorrectedValue: value }
}

function findSurface(reading: Reading, readC: number) {
  if (reading.surface === null) return null
  const { emissivity, emissivitySet, surroundings } = reading.surface
  const surroundingsC = toCanonical(surroundings, reading.unit)
  return correctForEmissivity({ readC, emissivitySet, emissivity, surroundingsC })
}

/** Whether two gauges at one place differ by more than 2·√(u₁² + u₂²); the difference and what would be allowed. */
export function compareGauges(
  first: Pick<Measured, 'value' | 'uncertainty'>,
  second: Pick<Measured, 'value' | 'uncertainty'>,
): { disagree: boolean; difference: number; allowed: number } {
  const difference = Math.abs(first.value - second.value)
  const allowed = GAUGE_DISAGREEMENT_FACTOR * combine([first.uncertainty, second.uncertainty])
  return { disagree: difference > allowed, difference, allowed }
}
