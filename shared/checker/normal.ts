/**
 * The normal distribution. erfc by the rational Chebyshev approximations of W. J. Cody, "Rational Chebyshev
 * approximations for the error function", Mathematics of Computation 23 (1969) 631-637: relative error about 1e-16
 * over the whole line, so that tails keep their digits.
 */

const SMALL_NUMERATOR = [
  3.1611237438705656, 1.1386415415105016e2, 3.77485237685302e2, 3.2093775891384695e3, 1.857777061846032e-1,
] as const
const SMALL_DENOMINATOR = [
  2.3601290952344121e1, 2.4402463793444417e2, 1.2826165260773723e3, 2.844236833439171e3,
] as const
const MIDDLE_NUMERATOR = [
  5.641884969886701e-1, 8.883149794388376, 6.611919063714163e1, 2.9863513819740013e2, 8.819522212417691e2,
  1.7120476126340706e3, 2.0510783778260715e3, 1.2303393547979972e3, 2.1531153547440384e-8,
] as const
const MIDDLE_DENOMINATOR = [
  1.5744926110709835e1, 1.1769395089131219e2, 5.3718110186200986e2, 1.6213895745666902e3,
  3.2907992357334596e3, 4.3626190901432472e3, 3.4393676741437216e3, 1.2303393548037494e3,
] as const
const LARGE_NUMERATOR = [
  3.0532663496123234e-1, 3.6034489994980444e-1, 1.2578172611122925e-1, 1.6083785148742277e-2,
  6.587491615298378e-4, 1.6315387137302098e-2,
] as const
const LARGE_DENOMINATOR = [
  2.568520192289822, 1.8729528499234604, 5.2790510295142841e-1, 6.0518341312441319e-2, 2.3352049762686918e-3,
] as const

const FIRST_LIMIT = 0.46875
const SECOND_LIMIT = 4
const ONE_OVER_SQRT_PI = 0.5641895835477563
const SQRT_2 = Math.SQRT2

function divide(x: number, numerator: readonly number[], denominator: readonly number[]): number {
  const degree = denominator.length
  let above = (numerator[degree] ?? 0) * x
  let below = x
  for (let index = 0; index < degree - 1; index += 1) {
    above = (above + (numerator[index] ?? 0)) * x
    below = (below + (denominator[index] ?? 0)) * x
  }
  return (above + (numerator[degree - 1] ?? 0)) / (below + (denominator[degree - 1] ?? 0))
}

/** exp(−y²) with y split after its sixteenth, so that squaring loses no digits (Cody's device). */
function expMinusSquare(y: number): number {
  const coarse = Math.trunc(y * 16) / 16
  return Math.exp(-coarse * coarse) * Math.exp(-(y - coarse) * (y + coarse))
}

/** Complementary error function of any real number; 1 at 0, between 0 and 2. */
export function erfc(x: number): number {
  if (Number.isNaN(x)) return Number.NaN
  const y = Math.abs(x)
  if (y <= FIRST_LIMIT) return 1 - x * divide(y * y, SMALL_NUMERATOR, SMALL_DENOMINATOR)
  let tail: number
  if (y === Infinity) {
    tail = 0
  } else if (y <= SECOND_LIMIT) {
    tail = expMinusSquare(y) * divide(y, MIDDLE_NUMERATOR, MIDDLE_DENOMINATOR)
  } else {
    const inverse = 1 / (y * y)
    const correction = inverse * divide(inverse, LARGE_NUMERATOR, LARGE_DENOMINATOR)
    tail = (expMinusSquare(y) * (ONE_OVER_SQRT_PI - correction)) / y
  }
  return x < 0 ? 2 - tail : tail
}

/** Standard normal distribution function Φ(z): the probability of lying below z. Exactly 0.5 at 0; 0 and 1 at ∓∞. */
export function normalBelow(z: number): number {
  return erfc(-z / SQRT_2) / 2
}

/** 1 − Φ(z), without the loss of digits that the subtraction would bring. */
export function normalAbove(z: number): number {
  return erfc(z / SQRT_2) / 2
}

/** Φ(to) − Φ(from) for from ≤ to, taken in the tail where both are small; never negative. */
export function normalBetween(from: number, to: number): number {
  const share = from > 0 ? normalAbove(from) - normalAbove(to) : normalBelow(to) - normalBelow(from)
  return Math.max(0, share)
}
