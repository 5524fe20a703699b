import { toShare, type Axis } from './axis.js'

/** A stretch of an axis in the reader's unit; a null side is open. */
export interface Stretch {
  low: number | null
  high: number | null
}

/** How near two stretches may come in one lane, as a share of the axis. */
const LEAST_GAP = 0.015

/**
 * The lane of each stretch, 0 for the first, so that none touches another in its lane. Longest first fills best, but the
 * order of the sources is kept: it is the order of the table beside it.
 */
export function assignLanes(axis: Axis, stretches: readonly Stretch[]): number[] {
  const ends: { low: number; high: number }[][] = []
  return stretches.map((stretch) => {
    const low = stretch.low === null ? 0 : toShare(axis, stretch.low)
    const high = stretch.high === null ? 1 : toShare(axis, stretch.high)
    let lane = ends.findIndex((taken) =>
      taken.every((other) => low - other.high > LEAST_GAP || other.low - high > LEAST_GAP),
    )
    if (lane === -1) lane = ends.push([]) - 1
    ends[lane]?.push({ low, high })
    return lane
  })
}

/** The height of each lane's line below `top`, the lanes shared out over at most `height` and never further than `widest` apart. */
export function spreadLanes(count: number, top: number, height: number, widest: number): number[] {
  if (count <= 0) return []
  const gap = count === 1 ? 0 : Math.min(widest, height / (count - 1))
  const used = gap * (count - 1)
  return Array.from({ length: count }, (_, lane) => top + (height - used) + lane * gap)
}
