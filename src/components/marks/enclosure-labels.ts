import { POSITION_LABELS } from '../../../shared/labels.js'
import { groundDepth, labelSide, PLAN_LEFT, PLAN_RIGHT, type EnclosurePlan } from './enclosure-plan.js'
import type { EnclosureTarget } from './enclosure-target.js'
import { layOutLabels, spreadPoints, type LabelPlace, type Point } from './label-layout.js'
import { estimateTextWidth } from './text-width.js'

export const TITLE_SIZE = 13
export const VALUE_SIZE = 16
export const LINE_HEIGHT = 21
export const TITLE_HEIGHT = 18
export const PADDING_X = 10
export const PADDING_Y = 6
export const ICON_WIDTH = 20
export const MARK_WIDTH = 22

const LID_Y = 42
/** Air between the lowest label row and the floor, so that every point of the air stays below the labels. */
const AIR_HEIGHT = 158
/** The same where no point lies in the air. */
const LOW_AIR_HEIGHT = 116
const LABELS_TOP = LID_Y + 12
const BELOW_GAP = 26
/** Circles with a number must not touch; the distance of two centres. */
export const POINT_RADIUS = 25
const POINT_DISTANCE = 2 * POINT_RADIUS + 6

/** A label with the target it carries and the point it leads to. */
export interface EnclosureLabel {
  target: EnclosureTarget
  place: LabelPlace
  /** Where the leader leaves the label, and the point it ends at; null for what is true of the whole enclosure. */
  leader: { from: Point; to: Point } | null
}

export interface EnclosureLayout {
  lidY: number
  floorY: number
  height: number
  labels: EnclosureLabel[]
}

function labelSize(target: EnclosureTarget): { width: number; height: number } {
  const title = estimateTextWidth(POSITION_LABELS[target.position], TITLE_SIZE)
  const lines = target.lines.map(
    (line) =>
      ICON_WIDTH + estimateTextWidth(line.text, VALUE_SIZE, true) + (line.standing === null ? 0 : MARK_WIDTH),
  )
  return {
    width: Math.ceil(Math.max(title, ...lines) + 2 * PADDING_X),
    height: TITLE_HEIGHT + LINE_HEIGHT * target.lines.length + 2 * PADDING_Y,
  }
}

function clamp(value: number, low: number, high: number): number {
  return Math.min(high, Math.max(low, value))
}

/** Sizes the drawing to its labels and stands every label where it touches no other. */
export function layOutEnclosure(plan: EnclosurePlan, targets: readonly EnclosureTarget[]): EnclosureLayout {
  const wishes = targets.map((target) => ({
    id: target.position,
    anchorX: plan.points[target.position].x,
    side: labelSide(target.position),
    ...labelSize(target),
  }))
  const layout = layOutLabels(wishes, PLAN_LEFT + 12, PLAN_RIGHT - 12)
  const hasPointInAir = targets.some(
    ({ position }) => position !== 'whole-enclosure' && labelSide(position) === 'above',
  )
  const floorY = LABELS_TOP + layout.heightAbove + (hasPointInAir ? AIR_HEIGHT : LOW_AIR_HEIGHT)
  const bottom = floorY + groundDepth(plan)
  const belowTop = bottom + BELOW_GAP
  const labels = targets.flatMap((target): EnclosureLabel[] => {
    const laid = layout.places.find(({ id }) => id === target.position)
    if (laid === undefined) return []
    const isAbove = laid.side === 'above'
    const place = { ...laid, y: laid.y + (isAbove ? LABELS_TOP : belowTop) }
    const point = plan.points[target.position]
    const to = { x: point.x, y: floorY + point.y }
    const from = {
      x: clamp(to.x, place.x + 14, place.x + place.width - 14),
      y: isAbove ? place.y + place.height : place.y,
    }
    return [{ target, place, leader: target.position === 'whole-enclosure' ? null : { from, to } }]
  })
  const height = layout.heightBelow === 0 ? bottom + 2 : belowTop + layout.heightBelow + 2
  return { lidY: LID_Y, floorY, height, labels }
}

/** The numbered points of the narrow drawing, in the order of the targets, none touching another. */
export function layOutPoints(
  plan: EnclosurePlan,
  targets: readonly EnclosureTarget[],
): { lidY: number; floorY: number; height: number; points: Point[] } {
  const floorY = LID_Y + AIR_HEIGHT + 14
  const height = floorY + groundDepth(plan) + 2
  const wanted = targets.map(({ position }) => ({
    x: plan.points[position].x,
    y: floorY + plan.points[position].y,
  }))
  const points = spreadPoints(wanted, POINT_DISTANCE, {
    left: PLAN_LEFT + POINT_RADIUS + 4,
    right: PLAN_RIGHT - POINT_RADIUS - 4,
    top: LID_Y + POINT_RADIUS + 4,
    bottom: height - POINT_RADIUS - 6,
  })
  return { lidY: LID_Y, floorY, height, points }
}
