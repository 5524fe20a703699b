import { describe, expect, it } from 'vitest'
import { findAllowedVapour, findSaturationPressurePa, intersectVapour } from '../../shared/humidity.js'

describe('saturation vapour pressure', () => {
  // ASHRAE Handbook Fundamentals 2017, chapter 1, table 3, as quoted in psychrolib's own tests: relative 0.0003.
  it.each([
    [5, 872.6],
    [25, 3169.7],
    [50, 12351.3],
    [100, 101418],
    [-5, 401.74],
    [-20, 103.24],
  ])('at %d °C is the table’s %d Pa', (temperatureC, pressurePa) => {
    const found = findSaturationPressurePa(temperatureC)
    expect(Math.abs(found - pressurePa)).toBeLessThan(pressurePa * 0.0003)
  })

  // IAPWS-IF97, table 35: 3536.58941 Pa at 300 K. Another formula of the same quantity, so to 0.03 % only.
  it('at 300 K is close to the industrial formulation’s 3536.59 Pa', () => {
    expect(Math.abs(findSaturationPressurePa(26.85) - 3536.58941)).toBeLessThan(3536.58941 * 0.0003)
  })

  // Murphy and Koop 2005, over liquid water: an independent formula, to 0.1 %.
  it.each([
    [10, 1228.26],
    [20, 2339.4],
    [30, 4246.81],
    [40, 7384.31],
  ])('at %d °C is within a thousandth of Murphy and Koop’s %d Pa', (temperatureC, pressurePa) => {
    const found = findSaturationPressurePa(temperatureC)
    expect(Math.abs(found - pressurePa)).toBeLessThan(pressurePa * 0.001)
  })

  it.each([-100.1, 200.1, Number.NaN])('is refused at %d °C', (temperatureC) => {
    expect(() => findSaturationPressurePa(temperatureC)).toThrow(RangeError)
  })
})

describe('what the air must be', () => {
  it('carries the vapour of 60 % at 20 °C, which is 33.05 % at 30 °C', () => {
    // Constant vapour pressure: 1403.28 Pa (check value computed with the library, relation RH₂ = RH₁·e_s(T₁)/e_s(T₂)).
    const { lowPa } = findAllowedVapour({ lowC: 20, highC: 22, lowRh: 60, highRh: 70 })
    expect(lowPa).toBeCloseTo(1403.28, 1)
    expect((100 * lowPa) / findSaturationPressurePa(30)).toBeCloseTo(33.05, 1)
  })

  it('runs from the driest at the coldest to the wettest at the warmest', () => {
    const { lowPa, highPa } = findAllowedVapour({ lowC: 25, highC: 50, lowRh: 50, highRh: 100 })
    // ASHRAE table 3: half of 3169.7 Pa, all of 12351.3 Pa.
    expect(lowPa).toBeCloseTo(1584.8, -1)
    expect(highPa).toBeCloseTo(12351, -1)
  })

  it('is unbounded on an open side', () => {
    expect(findAllowedVapour({ lowC: null, highC: null, lowRh: 40, highRh: 60 })).toEqual({
      lowPa: 0,
      highPa: Infinity,
    })
    const open = findAllowedVapour({ lowC: 20, highC: 25, lowRh: null, highRh: null })
    expect(open.lowPa).toBe(0)
    expect(open.highPa).toBeCloseTo(3169.7, -1)
  })

  it('is what all positions share', () => {
    expect(
      intersectVapour([
        { lowPa: 1000, highPa: 2000 },
        { lowPa: 1500, highPa: 3000 },
      ]),
    ).toEqual({ lowPa: 1500, highPa: 2000 })
  })

  it('is nothing where they share nothing', () => {
    // 80 % at 22 °C asks for more vapour (2115 Pa) than 30 % at 36 °C allows (1784 Pa).
    const cool = findAllowedVapour({ lowC: 22, highC: 24, lowRh: 80, highRh: 90 })
    const warm = findAllowedVapour({ lowC: 34, highC: 36, lowRh: 20, highRh: 30 })
    expect(intersectVapour([cool, warm])).toBeNull()
  })

  it('is anything where nothing is asked', () => {
    expect(intersectVapour([])).toEqual({ lowPa: 0, highPa: Infinity })
  })
})
