import { describe, expect, it } from 'vitest'
import { findFirstChange, findPowerRatio, findThermostatFloor } from '../../../shared/checker/change-first.js'
import type { JudgedReading } from '../../../shared/checker/change-first.js'
import { CHANGE_RULES, findChangeRule } from '../../../shared/checker/change-rules.js'
import { judgeLimits, judgeRange, toStanding } from '../../../shared/checker/verdict.js'
import type { RangeRow } from '../../../shared/ranges.js'
import { fahrenheitToCelsius } from '../../../shared/units.js'
import { makeRange } from '../../helpers/page-content.js'

function judge(value: number, row: Partial<RangeRow>, part: Partial<JudgedReading> = {}): JudgedReading {
  const uncertainty = part.uncertainty ?? 0.3
  const range = makeRange('row', row)
  const hold = (limit: number | null) => (limit === null ? null : { value: limit, range, isInherited: false })
  const limits = { lower: hold(range.row.lowerLimit), upper: hold(range.row.upperLimit) }
  const limit = judgeLimits(range.row.parameter, { value, uncertainty }, limits)
  const verdict = judgeRange({ value, uncertainty }, range)
  return {
    readingIndex: 0,
    parameter: range.row.parameter,
    period: 'day',
    value,
    uncertainty,
    standing: toStanding(limit, verdict),
    limit,
    range: verdict,
    isHeatDanger: false,
    ...part,
  }
}

describe('the power ratio', () => {
  it('is about 0.44 for a raised thing that reads 112 °F where 90 °F is wanted in a room at 73 °F (common practice, no source)', () => {
    const reading = { value: fahrenheitToCelsius(112), uncertainty: 0.5 }
    const ratio = findPowerRatio(fahrenheitToCelsius(90), fahrenheitToCelsius(73), reading)
    expect(ratio).toBeCloseTo(0.44, 2)
    expect(findPowerRatio(90, 73, { value: 112, uncertainty: 0.9 })).toBeCloseTo(ratio ?? 0, 12)
  })

  it.each([
    ['the room at the target', 30, 30, 40, 0.5],
    ['the target 2 u over the room', 31, 30, 40, 0.5],
    ['the reading 2 u over the room', 40, 30, 31, 0.5],
    ['a room warmer than both', 30, 35, 32, 0.1],
  ])('is not given for %s', (_, target, room, value, uncertainty) => {
    expect(findPowerRatio(target, room, { value, uncertainty })).toBeNull()
  })

  it('is given just beyond 2 u', () => {
    expect(findPowerRatio(31.1, 30, { value: 32.2, uncertainty: 0.5 })).toBeCloseTo(0.5, 12)
  })
})

describe('too hot', () => {
  const row = { low: 30, high: 34 }

  it('asks for a weaker lamp or a lower perch, not for dimming, when less than half the excess is wanted', () => {
    const wanted = { low: fahrenheitToCelsius(88), high: fahrenheitToCelsius(92) }
    const change = findFirstChange([judge(fahrenheitToCelsius(112), wanted)], fahrenheitToCelsius(73))
    expect(change).toMatchObject({ ruleId: 'weaker-lamp' })
    expect(change?.powerRatio).toBeCloseTo(17 / 39, 6)
  })

  it.each([
    ['dim-lamp', 34.11, 0.8505],
    ['weaker-lamp', 34.13, 0.8493],
  ])('names %s on its side of a dimming by 15 % (common practice, no source)', (ruleId, value, ratio) => {
    const change = findFirstChange([judge(value, row, { uncertainty: 0.01 })], 20)
    expect(change?.ruleId).toBe(ruleId)
    expect(change?.powerRatio).toBeCloseTo(ratio, 4)
  })

  it('gives no number without a room temperature', () => {
    expect(findFirstChange([judge(38, row)], null)).toMatchObject({ ruleId: 'less-heat', powerRatio: null })
  })

  it('sends to the room where the room itself is as warm as the target', () => {
    expect(findFirstChange([judge(38, row)], 32)).toMatchObject({ ruleId: 'room-too-warm', powerRatio: null })
  })

  it('does not blame a room that is cooler than the target, however coarse the instrument', () => {
    const hot = judge(45, { low: 22, high: 28 }, { uncertainty: 2 })
    expect(findFirstChange([hot], 22)).toMatchObject({ ruleId: 'less-heat', powerRatio: null })
  })

  it('gives no night floor that would carry the place over its night high', () => {
    const row = { low: 20, high: 22 }
    const hot = judge(26, row, { period: 'night', uncertainty: 1.83 })
    expect(findFirstChange([hot], null)).toMatchObject({ ruleId: 'night-too-hot', thermostatFloorC: null })
    const cold = judge(16, { ...row, high: 24, upperLimit: 22.5 }, { period: 'night', uncertainty: 0.3 })
    expect(findFirstChange([cold], null)).toMatchObject({ ruleId: 'night-too-cool', thermostatFloorC: null })
  })

  it('gives no number where only an upper bound is cited, since there is no middle', () => {
    expect(findFirstChange([judge(38, { high: 34 })], 20)).toMatchObject({
      ruleId: 'less-heat',
      targetC: null,
    })
  })
})

describe('too cool', () => {
  it('asks for about r of the power under a thermostat', () => {
    const change = findFirstChange([judge(26, { low: 30, high: 34 })], 20)
    expect(change).toMatchObject({ ruleId: 'stronger-lamp', targetC: 32 })
    expect(change?.powerRatio).toBeCloseTo(2, 12)
  })

  it('gives no number without a room temperature', () => {
    expect(findFirstChange([judge(26, { low: 30, high: 34 })], null)?.ruleId).toBe('more-heat')
  })

  it('by night sets a thermostat floor of the night low, half the swing and 2 u', () => {
    expect(findThermostatFloor(20, 2, 0.4)).toBeCloseTo(21.8, 12)
    const change = findFirstChange([judge(16, { low: 20, high: 24 }, { period: 'night' })], 15)
    expect(change?.ruleId).toBe('night-too-cool')
    expect(change?.thermostatFloorC).toBeCloseTo(20 + 1 + 0.6, 12)
  })
})

describe('near a limit with an instrument too coarse for the range', () => {
  it('asks for no more heat where the reading lies over the middle of the range', () => {
    const reading = judge(22.2, { low: 20, high: 22, lowerLimit: 19.5 }, { uncertainty: 1.83 })
    expect(reading.standing).toBe('near')
    expect(findFirstChange([reading], null)).toBeNull()
  })

  it('asks for no less heat where the reading lies under the middle of the range', () => {
    const reading = judge(29, { low: 30, high: 32, upperLimit: 33 }, { uncertainty: 3 })
    expect(reading.standing).toBe('near')
    expect(findFirstChange([reading], null)).toBeNull()
  })
})

describe('which reading comes first', () => {
  const row = { low: 30, high: 34, lowerLimit: 15, upperLimit: 45 }

  it('is one past an upper limit: source off, animal out, now', () => {
    const readings = [judge(14, row), judge(46, row, { readingIndex: 1 })]
    expect(findFirstChange(readings, 20)).toMatchObject({
      ruleId: 'past-upper-limit',
      readingIndex: 1,
      isUrgent: true,
      powerRatio: null,
    })
  })

  it('holds for a UV index and a humidity past an upper limit too', () => {
    const uv = { parameter: 'uv-index', low: 1, high: 3, upperLimit: 6 } as const
    expect(findFirstChange([judge(7, uv)], null)?.ruleId).toBe('past-upper-limit')
    const damp = { parameter: 'relative-humidity', low: 30, high: 50, upperLimit: 80 } as const
    expect(findFirstChange([judge(90, damp)], null)?.ruleId).toBe('past-upper-limit')
  })

  it('is heat before a UV index before a humidity, where each is past an upper limit', () => {
    const damp = judge(90, { parameter: 'relative-humidity', low: 30, high: 50, upperLimit: 80 })
    const uv = judge(7, { parameter: 'uv-index', low: 1, high: 3, upperLimit: 6 }, { readingIndex: 1 })
    const hot = judge(46, row, { readingIndex: 2 })
    expect(findFirstChange([damp, uv, hot], 20)?.readingIndex).toBe(2)
    expect(findFirstChange([damp, uv], 20)?.readingIndex).toBe(1)
  })

  it('is then danger to the body from heat, before any place that is too cool, range or no range', () => {
    const cold = judge(10, row)
    const hide = judge(44, {}, { readingIndex: 1, isHeatDanger: true })
    expect(findFirstChange([cold, hide], 20)).toMatchObject({
      ruleId: 'body-heat-danger',
      readingIndex: 1,
      isUrgent: true,
      powerRatio: null,
      targetC: null,
    })
    const past = judge(46, row, { readingIndex: 2 })
    expect(findFirstChange([cold, hide, past], 20)?.readingIndex).toBe(2)
  })

  it('is then the worse verdict, and too hot before too cool', () => {
    const high = judge(38, row, { readingIndex: 1 })
    const low = judge(26, row, { readingIndex: 0 })
    expect(findFirstChange([low, high], 20)?.readingIndex).toBe(1)
    const nearCold = judge(15.2, row, { readingIndex: 2 })
    expect(findFirstChange([low, high, nearCold], 10)).toMatchObject({
      readingIndex: 2,
      ruleId: 'stronger-lamp',
    })
  })

  it('is none when nothing of heat is wrong', () => {
    const damp = judge(90, { parameter: 'relative-humidity', low: 30, high: 50 })
    expect(findFirstChange([judge(32, row), damp, judge(34.1, row)], 20)).toBeNull()
  })

  it('is urgent past a lower limit too', () => {
    expect(findFirstChange([judge(10, row)], 5)).toMatchObject({ ruleId: 'stronger-lamp', isUrgent: true })
  })
})

describe('the table of rules', () => {
  it('says for each rule what it assumes and where it comes from', () => {
    for (const rule of CHANGE_RULES) {
      expect(rule.assumes, rule.id).not.toBe('')
      expect(rule.source, rule.id).toMatch(/common practice, no source|\d{4}/)
    }
    expect(new Set(CHANGE_RULES.map(({ id }) => id)).size).toBe(CHANGE_RULES.length)
  })

  it('names a number only where the rule has one', () => {
    for (const trouble of ['past-upper-limit', 'body-heat-danger', 'too-hot', 'too-cool'] as const) {
      for (const period of ['day', 'night'] as const) {
        for (const powerRatio of [null, 0.2, 0.85, 0.99, 1, 3]) {
          const rule = findChangeRule({ trouble, period, powerRatio, isRoomAtTarget: false })
          expect(rule, `${trouble} ${period}`).not.toBeNull()
          if (/\{(?:ratio|dim)\}/.test(rule?.advice ?? '')) expect(powerRatio).not.toBeNull()
          if (rule?.id === 'dim-lamp') expect(powerRatio).toBeGreaterThanOrEqual(0.85)
        }
      }
    }
  })
})
