/** Shares this close to 0 or 1 are written as a bound rather than as a number that they are not. */
const SMALLEST_SHOWN = 0.001

/**
 * A probability in per cent with one decimal, cut and never rounded up, so that no words contradict the answer ("94.9 %"
 * stays below 95). 0 % and 100 % are written only of what is certain.
 */
export function writeProbability(probability: number, isCertain: boolean): string {
  if (isCertain && (probability === 0 || probability === 1)) return `${probability * 100} %`
  if (probability < SMALLEST_SHOWN) return 'under 0.1 %'
  if (probability > 1 - SMALLEST_SHOWN) return 'over 99.9 %'
  // Half a unit of the thirteenth digit keeps 0.995 from becoming 99.4 through binary rounding.
  return `${(Math.floor(probability * 1000 + 1e-10) / 10).toFixed(1)} %`
}
