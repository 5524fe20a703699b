import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { MATERIALS, correctForEmissivity, readSurface } from '../../../shared/checker/emissivity.js'
import { expectedOf, inputOf, listCheckValues } from '../../helpers/check-values.js'

describe('correcting an infrared reading', () => {
  it.each(listCheckValues('ir-correct-'))('meets the check value $id ($source)', (value) => {
    const corrected = correctForEmissivity({
      readC: inputOf(value, 'reading_C'),
      emissivitySet: 1,
      emissivity: inputOf(value, 'emissivity'),
      surroundingsC: inputOf(value, 'background_C'),
    })
    expect(Math.abs((corrected?.surfaceC ?? Number.NaN) - expectedOf(value))).toBeLessThan(0.01)
  })

  it('changes nothing when the instrument is set to the surface, or the surroundings are as warm', () => {
    const same = { emissivity: 0.95, emissivitySet: 0.95 }
    expect(correctForEmissivity({ readC: 40, surroundingsC: 20, ...same })?.surfaceC).toBeCloseTo(40, 10)
    const level = { emissivity: 0.7, emissivitySet: 0.95 }
    expect(correctForEmissivity({ readC: 30, surroundingsC: 30, ...level })?.surfaceC).toBeCloseTo(30, 10)
  })

  it('lowers the reading when the instrument is set below the surface', () => {
    const infrared = { readC: 40, surroundingsC: 25, emissivity: 0.98, emissivitySet: 0.9 }
    expect(correctForEmissivity(infrared)?.surfaceC).toBeLessThan(40)
  })

  it('says that nothing balances where the surroundings outshine the reading', () => {
    const infrared = { readC: 0, surroundingsC: 900, emissivity: 0.1, emissivitySet: 1 }
    expect(correctForEmissivity(infrared)).toBeNull()
  })

  it('gives back the surface that a reading was taken of, and its slopes', () => {
    const temperature = fc.double({ min: -20, max: 120, noNaN: true })
    const emissivity = fc.double({ min: 0.6, max: 1, noNaN: true })
    fc.assert(
      fc.property(temperature, temperature, emissivity, emissivity, (surfaceC, surroundingsC, real, set) => {
        const settings = { emissivity: real, emissivitySet: set, surroundingsC }
        const readC = readSurface({ surfaceC, ...settings })
        fc.pre(readC !== null)
        const found = correctForEmissivity({ readC, ...settings })
        expect(found?.surfaceC).toBeCloseTo(surfaceC, 6)
        const step = 1e-4
        const higher = correctForEmissivity({ readC: readC + step, ...settings })
        const slope = ((higher?.surfaceC ?? 0) - (found?.surfaceC ?? 0)) / step
        expect(found?.perReading).toBeCloseTo(slope, 3)
        const shinier = correctForEmissivity({ readC, ...settings, emissivity: real + step })
        const slant = ((shinier?.surfaceC ?? 0) - (found?.surfaceC ?? 0)) / step
        expect((found?.perEmissivityC ?? 0) / slant).toSatisfy(
          (ratio: number) => Math.abs(ratio - 1) < 0.01 || Math.abs(slant) < 0.1,
        )
      }),
    )
  })
})

describe('the materials table (instrument handbooks; tables differ by up to 0.1)', () => {
  const known = listCheckValues('emissivity-').filter(({ id }) => !id.endsWith('human-skin'))

  it.each(known)('holds $id', ({ id, expected }) => {
    const material = MATERIALS[id.replace('emissivity-', '') as keyof typeof MATERIALS]
    const [low, high] = Array.isArray(expected) ? expected : [expected, expected]
    expect([material.low, material.high]).toEqual([low, high])
    expect(material.middle).toBeGreaterThanOrEqual(material.low)
    expect(material.middle).toBeLessThanOrEqual(material.high)
  })
})
