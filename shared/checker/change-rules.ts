import type { FirstChange } from './check.js'
import { DIM_RATIO_MIN } from './policy.js'

/** What is wrong with the reading a change is for. */
export type Trouble = 'past-upper-limit' | 'body-heat-danger' | 'too-hot' | 'too-cool'

/** What a rule looks at, besides the trouble: day or night, and the power ratio r where it can be told. */
export interface ChangeCircumstances {
  trouble: Trouble
  period: 'day' | 'night'
  /** r = (T_target − T_room)/(T_read − T_room); null when it cannot be told. */
  powerRatio: number | null
  /** The room by itself is as warm as the target or warmer, so that no lamp setting reaches it. */
  isRoomAtTarget: boolean
}

/** One rule: the circumstances it holds in (each one left out holds always), what it says, and what that rests on. */
export interface ChangeRule {
  id: string
  trouble: Trouble
  period?: 'day' | 'night'
  ratioFrom?: number
  ratioBelow?: number
  isRoomAtTarget?: boolean
  isUrgent: boolean
  /** {dim} percent to dim by, {ratio} share of the power, {floor} thermostat floor, {target} middle of the range. */
  advice: string
  assumes: string
  source: string
}

const COMMON_PRACTICE = 'common practice, no source'

/** The rules for heat, in order: the first whose circumstances hold is the advice. Data, read by `findFirstChange`. */
export const CHANGE_RULES: readonly ChangeRule[] = [
  {
    id: 'past-upper-limit',
    trouble: 'past-upper-limit',
    isUrgent: true,
    advice:
      'Switch the source off and take the animal out now. Put it back only when the place reads right again.',
    assumes: 'The instrument is not at fault, and the limit is one past which harm is likely.',
    source: COMMON_PRACTICE,
  },
  {
    id: 'body-heat-danger',
    trouble: 'body-heat-danger',
    isUrgent: true,
    advice:
      'Turn down the heat at this place and get the animal to a cooler one now. Its body may not bear this temperature.',
    assumes:
      'The animal cannot get away from here, and the critical maximum named in the cautions holds for it.',
    source: COMMON_PRACTICE,
  },
  {
    id: 'room-too-warm',
    trouble: 'too-hot',
    isRoomAtTarget: true,
    isUrgent: false,
    advice:
      'The room itself is about as warm as this place should be, so no setting of the heat source is enough. Cool the room, or move the enclosure to a cooler one.',
    assumes: 'The room was measured outside the enclosure and away from its lamps.',
    source: COMMON_PRACTICE,
  },
  {
    id: 'night-too-hot',
    trouble: 'too-hot',
    period: 'night',
    isUrgent: false,
    advice:
      'Set the thermostat of the night heat to a floor of {floor}, sensed where the animal sleeps, or switch the night heat off.',
    assumes:
      'A heat source without light runs at night. The floor is the night low, half the thermostat’s swing and twice the uncertainty; no number is given where that would pass the night high or a limit.',
    source: COMMON_PRACTICE,
  },
  {
    id: 'dim-lamp',
    trouble: 'too-hot',
    ratioFrom: DIM_RATIO_MIN,
    ratioBelow: 1,
    isUrgent: false,
    advice: 'Dim the lamp by about {dim}.',
    assumes:
      'The excess over the room is proportional to the lamp’s power. A halogen stays in its working band when dimmed by no more than 15 %.',
    source: COMMON_PRACTICE,
  },
  {
    id: 'weaker-lamp',
    trouble: 'too-hot',
    ratioBelow: DIM_RATIO_MIN,
    isUrgent: false,
    advice: 'Fit a weaker lamp, about {ratio} of the power, or lower the perch. Do not dim this one so far.',
    assumes:
      'The excess over the room is proportional to the lamp’s power. A halogen dimmed by more than 15 % leaves its working band. A thing that lifts the animal towards the lamp heats it more than the floor shows.',
    source: COMMON_PRACTICE,
  },
  {
    id: 'less-heat',
    trouble: 'too-hot',
    isUrgent: false,
    advice: 'Give this place a little less heat: a weaker lamp, or more distance from it.',
    assumes:
      'How much cannot be told without a room temperature that differs clearly from the reading and from the target.',
    source: COMMON_PRACTICE,
  },
  {
    id: 'night-too-cool',
    trouble: 'too-cool',
    period: 'night',
    isUrgent: false,
    advice:
      'Add a heat source without light under a thermostat with a floor of {floor}, sensed where the animal sleeps.',
    assumes:
      'The floor is the night low, half the thermostat’s swing and twice the uncertainty; no number is given where that would pass the night high or a limit.',
    source: COMMON_PRACTICE,
  },
  {
    id: 'stronger-lamp',
    trouble: 'too-cool',
    ratioFrom: 1,
    isUrgent: false,
    advice:
      'Raise the power to about {ratio} of what it is, only under a thermostat. The next lamp size up overshoots, so read again before the animal goes back.',
    assumes: 'The excess over the room is proportional to the lamp’s power.',
    source: COMMON_PRACTICE,
  },
  {
    id: 'more-heat',
    trouble: 'too-cool',
    isUrgent: false,
    advice: 'Give this place a little more heat, only under a thermostat.',
    assumes:
      'How much cannot be told without a room temperature that differs clearly from the reading and from the target.',
    source: COMMON_PRACTICE,
  },
]

/** What follows every change. */
export const AFTER_A_CHANGE = 'Change this one thing, wait until everything is warm, and read again.'

/** The rule of that id; the table holds every id a check can name. */
export function requireChangeRule(id: FirstChange['ruleId']): ChangeRule {
  const rule = CHANGE_RULES.find((candidate) => candidate.id === id)
  if (rule === undefined) throw new Error(`There is no rule ${id} for what to change.`)
  return rule
}

/** The first rule that holds. */
export function findChangeRule(circumstances: ChangeCircumstances): ChangeRule | null {
  const { trouble, period, powerRatio, isRoomAtTarget } = circumstances
  const holds = (rule: ChangeRule) =>
    rule.trouble === trouble &&
    (rule.period === undefined || rule.period === period) &&
    (rule.isRoomAtTarget === undefined || rule.isRoomAtTarget === isRoomAtTarget) &&
    (rule.ratioFrom === undefined || (powerRatio !== null && powerRatio >= rule.ratioFrom)) &&
    (rule.ratioBelow === undefined || (powerRatio !== null && powerRatio < rule.ratioBelow))
  return CHANGE_RULES.find(holds) ?? null
}
