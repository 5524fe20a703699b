import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  celsiusToFahrenheit,
  differenceFromCanonical,
  differenceToCanonical,
  fahrenheitToCelsius,
  fromCanonical,
  inchesToCentimetres,
  toCanonical,
  UNITS,
} from '../../shared/units.js'
import { expectedOf, inputOf, listCheckValues, requireCheckValue } from '../helpers/check-values.js'

describe('temperatures (NIST SP 811; formula from memory)', () => {
  it.each(listCheckValues('unit-F-'))('turns °F into °C as in $id', (value) => {
    expect(fahrenheitToCelsius(inputOf(value, 't_F'))).toBeCloseTo(expectedOf(value), 6)
  })

  it.each(listCheckValues('unit-C-'))('turns °C into °F as in $id', (value) => {
    expect(celsiusToFahrenheit(inputOf(value, 't_C'))).toBeCloseTo(expectedOf(value), 6)
  })

  it('meets whole degrees exactly, so that 95 °F lies on a bound of 35 °C and not beside it', () => {
    expect([95, 104, 140, 50].map(fahrenheitToCelsius)).toEqual([35, 40, 60, 10])
  })
})

describe('differences of temperatures', () => {
  it('convert by the factor alone: 10 °F apart is 5.56 °C apart (NIST SP 811)', () => {
    const value = requireCheckValue('unit-dF')
    expect(differenceToCanonical(inputOf(value, 'd_F'), 'degF')).toBeCloseTo(expectedOf(value), 6)
  })

  it('make 90 °F and 73 °F a gradient of 17 °F, 9.4 °C and not −8.3 (common practice, no source)', () => {
    expect(differenceToCanonical(90 - 73, 'degF')).toBeCloseTo(9.44, 2)
    expect(fahrenheitToCelsius(90) - fahrenheitToCelsius(73)).toBeCloseTo(9.44, 2)
  })
})

it('takes an inch for 25.4 mm (international yard and pound agreement, 1959)', () => {
  expect(inchesToCentimetres(1) * 10).toBe(expectedOf(requireCheckValue('unit-inch')))
})

it('brings every value and difference back from its canonical unit', () => {
  const units = fc.constantFrom(...UNITS)
  const values = fc.double({ min: -500, max: 500, noNaN: true })
  fc.assert(
    fc.property(units, values, (unit, value) => {
      expect(fromCanonical(toCanonical(value, unit), unit)).toBeCloseTo(value, 9)
      expect(differenceFromCanonical(differenceToCanonical(value, unit), unit)).toBeCloseTo(value, 9)
    }),
  )
})
