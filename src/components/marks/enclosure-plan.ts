import type { ClassificationRow } from '../../../shared/names.js'
import type { Position } from '../../../shared/ranges.js'
import type { Point } from './label-layout.js'

/** Width of the drawing, in its own unit; heights follow from what it holds. */
export const PLAN_WIDTH = 780
export const PLAN_LEFT = 14
export const PLAN_RIGHT = PLAN_WIDTH - PLAN_LEFT

export type AnimalShape = 'lizard' | 'snake' | 'turtle' | 'frog' | 'newt' | 'spider'
export type FloorThing = 'warm-hide' | 'humid-hide' | 'cool-hide' | 'shade' | 'water-dish'

/**
 * What an enclosure is drawn with. Points are measured from the floor line: y below zero is air, above zero ground. A
 * plan follows from the whole page, so that it stays the same when the lights or the season are switched.
 */
export interface EnclosurePlan {
  /** False for species kept without a warm and a cool end. */
  hasGradient: boolean
  lampX: number | null
  uvTubeX: number | null
  perch: 'rock' | 'branch' | null
  /** `deep` is ground to burrow in, `bank` slopes under water, `none` is all water. */
  ground: 'thin' | 'deep' | 'bank' | 'none'
  water: 'none' | 'dish' | 'pool' | 'tank'
  hasBurrow: boolean
  /** Where a pool begins; null without one. */
  poolX: number | null
  floor: { thing: FloorThing; x: number }[]
  /** Things on the floor are drawn smaller where they stand close. */
  floorScale: number
  animal: { shape: AnimalShape; x: number; y: number } | null
  points: Record<Position, Point>
}

export interface EnclosureFacts {
  /** Every position the page has a range for, whatever its stage, season or period. */
  positions: ReadonlySet<Position>
  /** Whether anything on the page speaks of UV. */
  hasUv: boolean
  classification: Pick<ClassificationRow, 'class' | 'order' | 'suborder' | 'microhabitat'> | null
}

const PERCH_X = 168
const POOL_STEP = 76
const FLOOR_ORDER: readonly { thing: FloorThing; position: Position }[] = [
  { thing: 'warm-hide', position: 'warm-hide' },
  { thing: 'humid-hide', position: 'humid-hide' },
  { thing: 'shade', position: 'shade' },
  { thing: 'water-dish', position: 'water' },
  { thing: 'cool-hide', position: 'cool-hide' },
]
const END_POSITIONS: readonly Position[] = [
  'basking-surface',
  'basking-air',
  'warm-end-air',
  'warm-hide',
  'cool-end-air',
  'cool-hide',
]

/** The outline that stands for the animal's group, or null where we have none: a wrong animal is worse than none. */
export function chooseAnimal(classification: EnclosureFacts['classification']): AnimalShape | null {
  if (classification === null) return null
  const { order, suborder } = classification
  if (order === 'Squamata')
    return suborder === 'Serpentes' ? 'snake' : suborder === 'Amphisbaenia' ? null : 'lizard'
  if (order === 'Rhynchocephalia') return 'lizard'
  if (order === 'Testudines') return 'turtle'
  if (order === 'Anura') return 'frog'
  if (order === 'Caudata') return 'newt'
  if (order === 'Araneae') return 'spider'
  return null
}

function chooseWater(facts: EnclosureFacts, hasBasking: boolean): EnclosurePlan['water'] {
  const { positions, classification } = facts
  if (!positions.has('water')) return 'none'
  if (hasBasking && /aquatic/i.test(classification?.microhabitat ?? '')) return 'pool'
  const onLand: readonly Position[] = ['warm-hide', 'humid-hide', 'cool-hide', 'shade', 'substrate']
  const landPlaces = onLand.filter((position) => positions.has(position)).length
  if (landPlaces > 1) return 'dish'
  if (hasBasking) return 'pool'
  const hasAir = positions.has('warm-end-air') || positions.has('cool-end-air')
  return landPlaces === 0 && !hasAir ? 'tank' : 'dish'
}

function chooseGround(
  facts: EnclosureFacts,
  water: EnclosurePlan['water'],
  hasGradient: boolean,
): EnclosurePlan['ground'] {
  if (water === 'tank') return 'none'
  if (water === 'pool') return 'bank'
  const { microhabitat = null, class: animalClass = null } = facts.classification ?? {}
  const burrows =
    /fossorial|burrow/i.test(microhabitat ?? '') || (animalClass === 'Arachnida' && !hasGradient)
  return facts.positions.has('substrate') && burrows ? 'deep' : 'thin'
}

/** Decides what is drawn and where each position is measured. */
export function planEnclosure(facts: EnclosureFacts): EnclosurePlan {
  const { positions, classification } = facts
  const hasBasking = positions.has('basking-surface') || positions.has('basking-air')
  const hasGradient = END_POSITIONS.some((position) => positions.has(position))
  const water = chooseWater(facts, hasBasking)
  const ground = chooseGround(facts, water, hasGradient)
  const hasBurrow = ground === 'deep'
  const microhabitat = classification?.microhabitat ?? ''
  const perch = hasBasking ? (/arboreal/i.test(microhabitat) ? 'branch' : 'rock') : null

  const things = FLOOR_ORDER.filter(
    ({ thing, position }) => positions.has(position) && (thing !== 'water-dish' || water === 'dish'),
  )
  const left = hasBasking ? 322 : hasBurrow ? 420 : 130
  // Beside a pool the land is short: things stand close, and the water begins behind the last of them.
  const right = water === 'pool' ? left + POOL_STEP * (things.length - 1) : 690
  const poolX = water === 'pool' ? (things.length === 0 ? 336 : right + 40) : null
  const step = things.length <= 1 ? 0 : (right - left) / (things.length - 1)
  const alone = water === 'pool' ? left : things[0]?.thing === 'cool-hide' ? right : (left + right) / 2
  const floor = things.map(({ thing }, index) => ({
    thing,
    x: Math.round(things.length === 1 ? alone : left + index * step),
  }))
  const xOf = (thing: FloorThing, fallback: number) =>
    floor.find((object) => object.thing === thing)?.x ?? fallback

  const shape = chooseAnimal(classification)
  const restsAt = hasBurrow
    ? { x: 262, y: 78 }
    : hasBasking
      ? { x: PERCH_X - 14, y: perch === 'branch' ? -64 : -58 }
      : water === 'tank'
        ? { x: 330, y: -34 }
        : { x: left === 130 && floor.length > 0 ? 250 : 390, y: 0 }

  return {
    hasGradient,
    lampX: hasBasking ? PERCH_X - 4 : null,
    uvTubeX: facts.hasUv ? (hasBasking ? 230 : 300) : null,
    perch,
    ground,
    water,
    hasBurrow,
    floor,
    floorScale: water === 'pool' ? 0.66 : step > 0 && step < 112 ? 0.8 : 1,
    poolX,
    animal: shape === null ? null : { shape, ...restsAt },
    points: {
      'basking-surface': { x: PERCH_X + 34, y: perch === 'branch' ? -60 : -52 },
      'basking-air': { x: PERCH_X - 22, y: -88 },
      'warm-end-air': { x: hasBasking ? 296 : 120, y: -112 },
      'warm-hide': { x: xOf('warm-hide', 322), y: -14 },
      'cool-end-air': { x: 668, y: -112 },
      'cool-hide': { x: xOf('cool-hide', 690), y: -14 },
      'humid-hide': { x: xOf('humid-hide', 420), y: -14 },
      shade: { x: xOf('shade', 520), y: -26 },
      substrate: hasBurrow ? { x: 300, y: 80 } : { x: hasBasking ? 268 : 210, y: 24 },
      water:
        water === 'pool'
          ? { x: Math.round(((poolX ?? 336) + PLAN_RIGHT) / 2) + 30, y: 44 }
          : water === 'tank'
            ? { x: 470, y: -60 }
            : { x: xOf('water-dish', 600), y: 8 },
      'whole-enclosure': { x: 390, y: -128 },
    },
  }
}

/** How far the ground reaches below the floor line. */
export function groundDepth(plan: Pick<EnclosurePlan, 'ground'>): number {
  switch (plan.ground) {
    case 'thin':
      return 44
    case 'deep':
      return 122
    case 'bank':
      return 96
    case 'none':
      return 24
  }
}

/** Whether a position's label stands over the drawing or under it: what is in the air over, what is on the ground under. */
export function labelSide(position: Position): 'above' | 'below' {
  switch (position) {
    case 'basking-surface':
    case 'basking-air':
    case 'warm-end-air':
    case 'cool-end-air':
    case 'whole-enclosure':
      return 'above'
    case 'warm-hide':
    case 'cool-hide':
    case 'humid-hide':
    case 'shade':
    case 'substrate':
    case 'water':
      return 'below'
  }
}
