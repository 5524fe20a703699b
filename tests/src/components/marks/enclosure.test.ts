import { describe, expect, test } from 'vitest'
import { positionSchema, type Position } from '../../../../shared/ranges.js'
import {
  layOutEnclosure,
  layOutPoints,
  POINT_RADIUS,
} from '../../../../src/components/marks/enclosure-labels.js'
import {
  chooseAnimal,
  planEnclosure,
  type EnclosureFacts,
} from '../../../../src/components/marks/enclosure-plan.js'
import type { EnclosureTarget } from '../../../../src/components/marks/enclosure-target.js'

const ALL = positionSchema.options
const lizard: NonNullable<EnclosureFacts['classification']> = {
  class: 'Reptilia',
  order: 'Squamata',
  suborder: 'Sauria',
  microhabitat: null,
}

function plan(positions: readonly Position[], over: Partial<typeof lizard> = {}) {
  return planEnclosure({
    positions: new Set(positions),
    hasUv: positions.includes('basking-air'),
    classification: { ...lizard, ...over },
  })
}

function targetAt(position: Position, lines: number): EnclosureTarget {
  return {
    position,
    address: `#${position}`,
    lines: Array.from({ length: lines }, (_, index) => ({
      parameter: index === 0 ? ('temperature' as const) : ('relative-humidity' as const),
      text: `38.5 – 42.${index} °C`,
      spoken: 'temperature 38.5 to 42 °C',
      standing: index === 0 ? ('unclear' as const) : null,
    })),
  }
}

/** Every set of positions there can be, one by one. */
function* everySet(): Generator<Position[]> {
  for (let bits = 0; bits < 2 ** ALL.length; bits += 1) {
    yield ALL.filter((_, index) => (bits >> index) % 2 === 1)
  }
}

describe('what an enclosure is drawn with', () => {
  test('a lamp only where something basks, a UV tube only where UV is spoken of', () => {
    expect(plan(['basking-surface', 'cool-end-air'])).toMatchObject({
      lampX: 164,
      perch: 'rock',
      uvTubeX: null,
    })
    expect(plan(['warm-end-air', 'cool-end-air']).lampX).toBeNull()
    expect(plan(['basking-air']).uvTubeX).not.toBeNull()
  })

  test('an animal that climbs basks on a branch', () => {
    expect(plan(['basking-surface'], { microhabitat: 'Arboreal/Saxicolous' }).perch).toBe('branch')
  })

  test('a burrowing spider has deep ground and no ends', () => {
    const spider = { class: 'Arachnida', order: 'Araneae', suborder: null }
    expect(plan(['whole-enclosure', 'substrate', 'humid-hide'], spider)).toMatchObject({
      hasGradient: false,
      ground: 'deep',
      hasBurrow: true,
      lampX: null,
    })
  })

  test('water is a pool to one who basks beside it, a tank to one who lives in it, a dish among hides', () => {
    expect(plan(['basking-surface', 'water', 'cool-end-air']).water).toBe('pool')
    const land: Position[] = ['basking-surface', 'water', 'warm-hide', 'shade', 'substrate']
    expect(plan(land).water).toBe('dish')
    expect(plan(land, { microhabitat: 'Semi-Aquatic' })).toMatchObject({ water: 'pool', ground: 'bank' })
    expect(plan(['water']).water).toBe('tank')
    expect(plan(['warm-hide', 'cool-hide', 'water']).water).toBe('dish')
    expect(plan(['basking-surface']).water).toBe('none')
  })

  test('an animal without an outline of ours is not drawn as another', () => {
    expect(chooseAnimal({ ...lizard, suborder: 'Serpentes' })).toBe('snake')
    expect(chooseAnimal({ ...lizard, order: 'Coleoptera' })).toBeNull()
    expect(chooseAnimal(null)).toBeNull()
  })
})

describe('labels of the enclosure', () => {
  test('for every set of positions, none touches another, leaves the drawing or covers a point', () => {
    for (const positions of everySet()) {
      const layout = layOutEnclosure(
        plan(positions),
        positions.map((position, index) => targetAt(position, 1 + (index % 3))),
      )
      expect(layout.labels).toHaveLength(positions.length)
      layout.labels.forEach(({ place }, index) => {
        if (place.x < 0 || place.x + place.width > 780 || place.y < layout.lidY)
          throw new Error(positions.join())
        if (place.y + place.height > layout.height) throw new Error(positions.join())
        for (const { place: other } of layout.labels.slice(index + 1)) {
          const apart =
            place.x + place.width <= other.x ||
            other.x + other.width <= place.x ||
            place.y + place.height <= other.y ||
            other.y + other.height <= place.y
          if (!apart) throw new Error(`labels touch: ${positions.join()}`)
        }
        for (const { leader } of layout.labels) {
          if (leader === null) continue
          const { x, y } = leader.to
          const isCovered =
            x > place.x && x < place.x + place.width && y > place.y && y < place.y + place.height
          if (isCovered) throw new Error(`a point is covered: ${positions.join()}`)
        }
      })
    }
  })

  test('for every set of positions, no two numbered points touch on a narrow page', () => {
    for (const positions of everySet()) {
      const { points } = layOutPoints(
        plan(positions),
        positions.map((position) => targetAt(position, 1)),
      )
      points.forEach((a, index) => {
        for (const b of points.slice(index + 1)) {
          if (Math.hypot(a.x - b.x, a.y - b.y) < 2 * POINT_RADIUS) throw new Error(positions.join())
        }
      })
    }
    expect(ALL).toHaveLength(11)
  })
})
