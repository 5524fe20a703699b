import type { Quantity } from '../../shared/physiology.js'

/**
 * Bounds outside which a temperature cannot be what its column says, in °C. Our policy: wide enough for every record of
 * the datasets we have read (a desert ant's critical maximum of 56.7, a tree frog's LT50 of -30.1), narrow enough to meet
 * a value in °F or in kelvin.
 */
const plausibleC: Record<Quantity, readonly [low: number, high: number]> = {
  'field-body-temperature': [-5, 60],
  'selected-body-temperature': [0, 60],
  'critical-thermal-minimum': [-30, 40],
  'critical-thermal-maximum': [10, 65],
  'lethal-minimum': [-80, 40],
  'lethal-maximum': [10, 70],
  'supercooling-point': [-80, 5],
  'optimum-temperature': [0, 60],
}

/** The numbers of one row as it gives them, °C. */
export interface RowNumbers {
  meanC: number | null
  lowC: number | null
  highC: number | null
}

/** Why a row's numbers cannot be used, as a sentence; null when they can. */
export function findImplausible(quantity: Quantity, { meanC, lowC, highC }: RowNumbers): string | null {
  const given = [meanC, lowC, highC].filter((value) => value !== null)
  if (given.length === 0) return 'The row gives no value.'
  const [least, most] = plausibleC[quantity]
  const wild = given.find((value) => value < least || value > most)
  if (wild !== undefined) return `${wild} °C is not plausible for this quantity (${least} to ${most} °C).`
  if (lowC !== null && highC !== null && lowC > highC)
    return `The lowest value ${lowC} °C is above the highest ${highC} °C.`
  if (meanC !== null && lowC !== null && meanC < lowC)
    return `The mean ${meanC} °C is below the lowest value ${lowC} °C.`
  if (meanC !== null && highC !== null && meanC > highC) {
    return `The mean ${meanC} °C is above the highest value ${highC} °C.`
  }
  return null
}
