import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { erfc, normalAbove, normalBelow, normalBetween } from '../../../shared/checker/normal.js'
import { expectedOf, inputOf, listCheckValues } from '../../helpers/check-values.js'

/**
 * Abramowitz & Stegun, Handbook of Mathematical Functions (1964), table 26.1, P(x) to 15 decimals. Entered from memory;
 * each was worked out again to 40 digits with the mpmath library and agrees.
 */
const TABLE_26_1: [z: number, below: number][] = [
  [0.5, 0.691462461274013],
  [1, 0.841344746068543],
  [1.5, 0.933192798731142],
  [2, 0.977249868051821],
  [2.5, 0.993790334674224],
  [3, 0.99865010196837],
]

/** Upper tails, worked out to 40 digits with the mpmath library 1.3.0 (ncdf). */
const TAILS: [z: number, above: number][] = [
  [5, 2.86651571879194e-7],
  [8, 6.2209605742718e-16],
  [10, 7.6198530241605e-24],
  [20, 2.7536241186062e-89],
  [37, 5.7255712225246e-300],
]

/** Quantiles: Abramowitz & Stegun, table 26.5, from memory. */
const QUANTILES: [probability: number, z: number][] = [
  [0.9, 1.2815515655446],
  [0.95, 1.64485362695147],
  [0.975, 1.95996398454005],
  [0.99, 2.32634787404084],
  [0.995, 2.5758293035489],
  [0.999, 3.09023230616781],
]

describe('the normal distribution', () => {
  it.each(listCheckValues('phi-'))('meets the check value $id ($source)', (value) => {
    expect(Math.abs(normalBelow(inputOf(value, 'z')) - expectedOf(value))).toBeLessThan(1e-6)
  })

  it.each(listCheckValues('guard-'))('meets the check value $id ($source)', (value) => {
    expect(Math.abs(normalAbove(inputOf(value, 'guard_band_over_u')) - expectedOf(value))).toBeLessThan(1e-5)
  })

  it.each(TABLE_26_1)('meets the table at %d to 1e-12', (z, below) => {
    expect(Math.abs(normalBelow(z) - below)).toBeLessThan(1e-12)
    expect(Math.abs(normalAbove(-z) - below)).toBeLessThan(1e-12)
  })

  it.each(TAILS)('keeps the digits of the tail past %d', (z, above) => {
    expect(Math.abs(normalAbove(z) / above - 1)).toBeLessThan(1e-12)
    expect(Math.abs(normalBelow(-z) / above - 1)).toBeLessThan(1e-12)
  })

  it.each(QUANTILES)('returns %d at its quantile', (probability, z) => {
    expect(Math.abs(normalBelow(z) - probability)).toBeLessThan(1e-12)
  })

  it('is exactly one half in the middle, and 0 and 1 at the ends', () => {
    expect(normalBelow(0)).toBe(0.5)
    expect([normalBelow(-Infinity), normalBelow(Infinity), normalAbove(Infinity)]).toEqual([0, 1, 0])
    expect(erfc(Number.NaN)).toBeNaN()
  })

  it('joins its three approximations without a step', () => {
    for (const seam of [0.46875, 4]) {
      const step = Math.abs(erfc(seam * (1 + 1e-15)) - erfc(seam * (1 - 1e-15)))
      expect(step / erfc(seam)).toBeLessThan(1e-12)
    }
  })

  it('gives tails that add up to one and never falls', () => {
    const z = fc.double({ min: -40, max: 40, noNaN: true })
    fc.assert(
      fc.property(z, z, (a, b) => {
        const [low, high] = a < b ? [a, b] : [b, a]
        expect(normalBelow(a) + normalAbove(a)).toBeCloseTo(1, 14)
        expect(normalBelow(low)).toBeLessThanOrEqual(normalBelow(high))
        expect(normalBelow(low) + normalBetween(low, high) + normalAbove(high)).toBeCloseTo(1, 13)
      }),
    )
  })
})
