/** A label that wants to stand over or under its point. */
export interface LabelWish {
  id: string
  /** The point it belongs to. */
  anchorX: number
  width: number
  height: number
  side: 'above' | 'below'
}

/** Where a label stands: its left edge and top, in the unit of the drawing. */
export interface LabelPlace {
  id: string
  x: number
  y: number
  width: number
  height: number
  side: 'above' | 'below'
}

export interface LabelLayout {
  places: LabelPlace[]
  /** Height the labels above take, from the top of the first row to the bottom of the last; 0 without any. */
  heightAbove: number
  heightBelow: number
}

const GAP = 10

interface Block {
  members: LabelWish[]
  /** Sum over members of (wish − offset inside the block): its mean is where the block stands best. */
  total: number
  width: number
}

/**
 * Stands labels in one row, in the order given, as near to their points as the gaps allow: least squares by pooling
 * neighbours that would touch (isotonic regression, pool adjacent violators). Their widths and gaps have to fit.
 */
function placeRow(row: readonly LabelWish[], left: number, right: number): Map<string, number> {
  const blocks: Block[] = []
  const startOf = (block: Block) => {
    const best = block.total / block.members.length
    return Math.min(Math.max(best, left), right - block.width)
  }
  for (const wish of row) {
    blocks.push({ members: [wish], total: wish.anchorX - wish.width / 2, width: wish.width })
    for (;;) {
      const last = blocks.at(-1)
      const before = blocks.at(-2)
      if (last === undefined || before === undefined) break
      if (startOf(before) + before.width + GAP <= startOf(last)) break
      const offset = before.width + GAP
      before.total += last.total - offset * last.members.length
      before.members.push(...last.members)
      before.width += GAP + last.width
      blocks.pop()
    }
  }
  const places = new Map<string, number>()
  for (const block of blocks) {
    let x = startOf(block)
    for (const { id, width } of block.members) {
      places.set(id, x)
      x += width + GAP
    }
  }
  return places
}

function rowWidth(row: readonly LabelWish[]): number {
  return row.reduce((sum, { width }) => sum + width, 0) + GAP * Math.max(0, row.length - 1)
}

/** Deals labels out to as few rows as hold them, in turn, so that neighbours stand in different rows. */
function dealRows(wishes: readonly LabelWish[], available: number): LabelWish[][] {
  for (let count = 1; count < wishes.length; count += 1) {
    const rows = Array.from({ length: count }, (_, row) =>
      wishes.filter((_wish, index) => index % count === row),
    )
    if (rows.every((row) => rowWidth(row) <= available)) return rows
  }
  return wishes.map((wish) => [wish])
}

function stackRows(
  wishes: readonly LabelWish[],
  left: number,
  right: number,
): { places: LabelPlace[]; height: number } {
  const sorted = [...wishes].sort((a, b) => a.anchorX - b.anchorX)
  const places: LabelPlace[] = []
  let top = 0
  for (const row of dealRows(sorted, right - left)) {
    if (row.length === 0) continue
    const height = Math.max(...row.map((wish) => wish.height))
    const lefts = placeRow(row, left, right)
    for (const wish of row) {
      // Labels above end on one line and labels below start on one: the side that faces the drawing.
      const y = wish.side === 'above' ? top + height - wish.height : top
      places.push({
        id: wish.id,
        x: lefts.get(wish.id) ?? left,
        y,
        width: wish.width,
        height: wish.height,
        side: wish.side,
      })
    }
    top += height + GAP
  }
  return { places, height: Math.max(0, top - GAP) }
}

/**
 * Stands every label between `left` and `right` so that no two touch, however many there are: labels of each side in
 * rows, each as near above or below its point as its neighbours let it. Heights count from the top of each side's rows.
 */
export function layOutLabels(wishes: readonly LabelWish[], left: number, right: number): LabelLayout {
  const above = stackRows(
    wishes.filter((wish) => wish.side === 'above'),
    left,
    right,
  )
  const below = stackRows(
    wishes.filter((wish) => wish.side === 'below'),
    left,
    right,
  )
  return { places: [...above.places, ...below.places], heightAbove: above.height, heightBelow: below.height }
}

export interface Point {
  x: number
  y: number
}

/**
 * Moves points apart until no two lie nearer than `distance`, as little as that takes, inside the given frame. Always
 * the same answer for the same points.
 */
export function spreadPoints(
  points: readonly Point[],
  distance: number,
  frame: { left: number; right: number; top: number; bottom: number },
): Point[] {
  const moved = points.map((point) => ({ ...point }))
  for (let round = 0; round < 200; round += 1) {
    let isSettled = true
    for (let i = 0; i < moved.length; i += 1) {
      for (let j = i + 1; j < moved.length; j += 1) {
        const a = moved[i]
        const b = moved[j]
        if (a === undefined || b === undefined) continue
        const gapX = b.x - a.x
        const gapY = b.y - a.y
        const length = Math.hypot(gapX, gapY)
        if (length >= distance - 1e-6) continue
        isSettled = false
        // Two points on one spot part sideways; a little past the distance, so that rounding cannot undo it.
        const push = (distance - length) / 2 + 0.05
        const [ux, uy] = length < 1e-9 ? [1, 0] : [gapX / length, gapY / length]
        a.x -= ux * push
        a.y -= uy * push
        b.x += ux * push
        b.y += uy * push
      }
    }
    for (const point of moved) {
      point.x = Math.min(frame.right, Math.max(frame.left, point.x))
      point.y = Math.min(frame.bottom, Math.max(frame.top, point.y))
    }
    if (isSettled) break
  }
  return moved
}
