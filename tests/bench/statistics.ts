/** The value below which a share of the values lies, by nearest rank. */
export function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b)
  const rank = Math.max(1, Math.ceil(share * sorted.length))
  return sorted[rank - 1] ?? Number.NaN
}

export function median(values: readonly number[]): number {
  return quantile(values, 0.5)
}

/** A figure with so many significant digits that a ratio of one run can bear. */
export function writeRatio(ratio: number): string {
  return ratio.toFixed(2)
}

export function writeMilliseconds(milliseconds: number): string {
  return `${milliseconds < 10 ? milliseconds.toFixed(1) : Math.round(milliseconds)} ms`
}
