import type { Parameter } from '../ranges.js'
import type { FirstChange } from './check.js'
import { findChangeRule } from './change-rules.js'
import type { Trouble } from './change-rules.js'
import { RATIO_DIFFERENCE_FACTOR, THERMOSTAT_SWING_C } from './policy.js'
import type { ReadingPeriod } from './reading.js'
import { compareStandings } from './verdict.js'
import type { LimitVerdict, RangeVerdict, Standing } from './verdict.js'

/** A judged reading as the rules see it, canonical units. */
export interface JudgedReading {
  readingIndex: number
  parameter: Parameter
  period: ReadingPeriod
  value: number
  uncertainty: number
  standing: Standing
  limit: LimitVerdict
  range: RangeVerdict
  /** The animal cannot leave this place, and its critical maximum is near. */
  isHeatDanger: boolean
}

/**
 * Share of the present power that would bring a reading to its target, r = (T_target − T_room)/(T_read − T_room), the
 * excess over the room taken as proportional to lamp power. Null when either difference is 2·u or less. Temperatures in one
 * unit, either scale.
 */
export function findPowerRatio(
  target: number,
  room: number,
  reading: { value: number; uncertainty: number },
): number | null {
  const least = RATIO_DIFFERENCE_FACTOR * reading.uncertainty
  const wanted = target - room
  const excess = reading.value - room
  if (wanted <= least || excess <= least) return null
  return wanted / excess
}

/** Thermostat floor for the night, °C: the night low, half the thermostat's swing and 2·u, sensed at the animal. */
export function findThermostatFloor(nightLowC: number, swingC: number, uncertaintyC: number): number {
  return nightLowC + swingC / 2 + 2 * uncertaintyC
}

/** What a source can drive past an upper limit, in the order in which it is to be put right. */
const LIMITED_BY_A_SOURCE: readonly Parameter[] = ['temperature', 'uv-index', 'relative-humidity']

/** Whether a reading lies on the far side of its range's middle from a limit that it is near: the instrument is too coarse. */
function isFarFromLimit({ value, limit, range: { low, high } }: JudgedReading): boolean {
  if (limit.answer !== 'near' || low === null || high === null) return false
  const middle = (low + high) / 2
  return limit.side === 'upper' ? value < middle : value > middle
}

function findTrouble(reading: JudgedReading): Trouble | null {
  const { parameter, limit, range } = reading
  if (limit.answer === 'past' && limit.side === 'upper') {
    return LIMITED_BY_A_SOURCE.includes(parameter) ? 'past-upper-limit' : null
  }
  if (parameter !== 'temperature') return null
  if (reading.isHeatDanger) return 'body-heat-danger'
  if (limit.answer === 'past' || (limit.answer === 'near' && !isFarFromLimit(reading))) {
    return limit.side === 'upper' ? 'too-hot' : 'too-cool'
  }
  if (range.answer === 'high') return 'too-hot'
  return range.answer === 'low' ? 'too-cool' : null
}

/** What comes before all else, whatever the standings. */
const FIRST_OF_ALL: readonly Trouble[] = ['body-heat-danger', 'past-upper-limit']
/** Of readings that stand alike: too hot before too cool, heat being the quicker harm. */
const TROUBLE_ORDER: readonly Trouble[] = ['past-upper-limit', 'body-heat-danger', 'too-hot', 'too-cool']

function compareTroubles(
  a: { trouble: Trouble; reading: JudgedReading },
  b: { trouble: Trouble; reading: JudgedReading },
): number {
  return (
    FIRST_OF_ALL.indexOf(b.trouble) - FIRST_OF_ALL.indexOf(a.trouble) ||
    compareStandings(a.reading.standing, b.reading.standing) ||
    TROUBLE_ORDER.indexOf(a.trouble) - TROUBLE_ORDER.indexOf(b.trouble) ||
    LIMITED_BY_A_SOURCE.indexOf(a.reading.parameter) - LIMITED_BY_A_SOURCE.indexOf(b.reading.parameter) ||
    a.reading.readingIndex - b.reading.readingIndex
  )
}

/** The night floor, or null where it would carry the place, half a swing above it, over the night high or the upper limit. */
function findFittingFloor({ range: { low, high }, limit, uncertainty }: JudgedReading): number | null {
  if (low === null) return null
  const floorC = findThermostatFloor(low, THERMOSTAT_SWING_C, uncertainty)
  const topC = floorC + THERMOSTAT_SWING_C / 2
  return topC > (high ?? Infinity) || topC >= (limit.upper?.value ?? Infinity) ? null : floorC
}

/** The one thing to change first among judged readings, or null when nothing of heat is wrong. `roomC` null: not measured. */
export function findFirstChange(
  readings: readonly JudgedReading[],
  roomC: number | null,
): FirstChange | null {
  const troubles = readings.flatMap((reading) => {
    const trouble = findTrouble(reading)
    return trouble === null ? [] : [{ trouble, reading }]
  })
  const [first] = troubles.sort(compareTroubles)
  if (first === undefined) return null
  const { trouble, reading } = first
  const { low, high } = reading.range
  const isEstimated = !FIRST_OF_ALL.includes(trouble)
  const targetC = isEstimated && low !== null && high !== null ? (low + high) / 2 : null
  const isRoomKnown = roomC !== null && targetC !== null
  const powerRatio = isRoomKnown ? findPowerRatio(targetC, roomC, reading) : null
  const isRoomAtTarget = isRoomKnown && roomC >= targetC
  const rule = findChangeRule({ trouble, period: reading.period, powerRatio, isRoomAtTarget })
  if (rule === null) return null
  return {
    ruleId: rule.id,
    readingIndex: reading.readingIndex,
    isUrgent: rule.isUrgent || reading.limit.answer === 'past',
    powerRatio: rule.advice.includes('{ratio}') || rule.advice.includes('{dim}') ? powerRatio : null,
    targetC,
    thermostatFloorC: rule.advice.includes('{floor}') ? findFittingFloor(reading) : null,
  }
}
