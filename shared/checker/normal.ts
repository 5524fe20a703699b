/**
 * The normal distribution. erfc by the rational Chebyshev approximations of W. J. Cody, "Rational Chebyshev
 * approximations for the error function", Mathematics of Computation 23 (1969) 631-637: relative error about 1e-16
 * over the whole line, so that tails keep their digits.
 */

const SMALL_NUMERATOR = [
  3.1611237438705655, 113.86415415105016, 377.485237685302, 3209.3775891384694, 0.1857777061846032,
] as const
const SMALL_DENOMINATOR = [
  23.601290952344122, 244.02463793444417, 1282.6165260773723, 2844.236833439171,
] as const
const MIDDLE_NUMERATOR = [
  0.5641884969886701, 8.883149794388377, 66.11919063714163, 298.6351381974001, 881.952221241769,
  1712.0476126340707, 2051.0783778260716, 1230.3393547979972, 2.1531153547440383e-8,
] as const
const MIDDLE_DENOMINATOR = [
  15.744926110709835, 117.69395089131218, 537.1811018620099, 1621.3895745666903, 3290.7992357334597,
  4362.619090143247, 3439.3676741437216, 1230.3393548037493,
] as const
const LARGE_NUMERATOR = [
  0.30532663496123236, 0.36034489994980445, 0.12578172611122926, 0.01608378514874228, 0.0006587491615298378,
  0.016315387137302097,
] as const
const LARGE_DENOMINATOR = [
  2.568520192289822, 1.8729528499234604, 0.5279051029514285, 0.06051834131244132, 0.0023352049762686918,
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
