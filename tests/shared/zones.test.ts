import { describe, expect, it } from 'vitest'
import { UV_ZONES, ZONE_NOTE, describeZone, parseZone } from '../../shared/zones.js'
import { expectedSpanOf, requireCheckValue } from '../helpers/check-values.js'

describe('exposure zones (Ferguson et al. 2010; Baines et al. 2016; entered from memory)', () => {
  it.each([1, 2, 3, 4] as const)('holds the average and the maximum exposure of zone %i', (zone) => {
    const described = describeZone(zone)
    expect(described.average).toEqual(expectedSpanOf(requireCheckValue(`uvi-zone-${zone}-average`)))
    expect(described.maximum).toEqual(expectedSpanOf(requireCheckValue(`uvi-zone-${zone}-maximum`)))
  })

  it('are four, and say that they are from memory', () => {
    expect(UV_ZONES.map(({ zone }) => zone)).toEqual([1, 2, 3, 4])
    expect(ZONE_NOTE).toMatch(/from memory/)
  })

  it.each(['1', ' 4 ', 2])('takes %j', (input) => {
    expect(parseZone(input)).toEqual({ ok: true, zone: Number(input) })
  })

  it.each([0, 5, 7, 1.5, Number.NaN, '', '0', '5', '7', '2.6', '1e0', '0x1', 'two', '1 2'])(
    'refuses %j and explains the UV index',
    (input) => {
      expect(parseZone(input)).toEqual({ ok: false, message: expect.stringMatching(/UV index/) })
    },
  )
})
