import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { layOutLabels, spreadPoints, type LabelPlace } from '../../../../src/components/marks/label-layout.js'

function touch(a: LabelPlace, b: LabelPlace): boolean {
  const slack = 1e-6
  return (
    a.x + a.width > b.x + slack &&
    b.x + b.width > a.x + slack &&
    a.y + a.height > b.y + slack &&
    b.y + b.height > a.y + slack
  )
}

const wish = fc.record({
  anchorX: fc.double({ min: -50, max: 830, noNaN: true }),
  width: fc.double({ min: 20, max: 240, noNaN: true }),
  height: fc.constantFrom(40, 61, 82, 103),
  side: fc.constantFrom('above' as const, 'below' as const),
})

describe('labels', () => {
  test('no two touch and all stay between the sides, at any count and size', () => {
    fc.assert(
      fc.property(fc.array(wish, { maxLength: 24 }), (wishes) => {
        const layout = layOutLabels(
          wishes.map((one, index) => ({ ...one, id: String(index) })),
          20,
          760,
        )
        expect(layout.places).toHaveLength(wishes.length)
        for (const side of ['above', 'below'] as const) {
          const places = layout.places.filter((place) => place.side === side)
          const height = side === 'above' ? layout.heightAbove : layout.heightBelow
          places.forEach((place, index) => {
            expect(place.x).toBeGreaterThanOrEqual(20 - 1e-6)
            expect(place.x + place.width).toBeLessThanOrEqual(760 + 1e-6)
            expect(place.y).toBeGreaterThanOrEqual(0)
            expect(place.y + place.height).toBeLessThanOrEqual(height + 1e-6)
            for (const other of places.slice(index + 1)) expect(touch(place, other)).toBe(false)
          })
        }
      }),
    )
  })

  test('one label alone stands straight over its point', () => {
    const { places } = layOutLabels(
      [{ id: 'a', anchorX: 300, width: 100, height: 40, side: 'above' }],
      0,
      780,
    )
    expect(places[0]?.x).toBe(250)
  })

  test('two that want one place share the way', () => {
    const both = ['a', 'b'].map((id) => ({
      id,
      anchorX: 400,
      width: 100,
      height: 40,
      side: 'above' as const,
    }))
    const { places } = layOutLabels(both, 0, 780)
    expect(places.map(({ x }) => x)).toEqual([295, 405])
  })

  test('what does not fit one row takes another', () => {
    const many = Array.from({ length: 9 }, (_, index) => ({
      id: String(index),
      anchorX: 80 * index,
      width: 150,
      height: 40,
      side: 'below' as const,
    }))
    const { places, heightBelow } = layOutLabels(many, 0, 780)
    expect(new Set(places.map(({ y }) => y)).size).toBe(3)
    expect(heightBelow).toBe(3 * 40 + 2 * 10)
  })
})

describe('numbered points', () => {
  test('keep their distance inside the frame, from any start', () => {
    const frame = { left: 40, right: 740, top: 70, bottom: 240 }
    const point = fc.record({
      x: fc.double({ min: 0, max: 780, noNaN: true }),
      y: fc.double({ min: 0, max: 300, noNaN: true }),
    })
    fc.assert(
      fc.property(fc.array(point, { maxLength: 11 }), (points) => {
        const moved = spreadPoints(points, 56, frame)
        moved.forEach((a, index) => {
          expect(a.x).toBeGreaterThanOrEqual(frame.left)
          expect(a.x).toBeLessThanOrEqual(frame.right)
          expect(a.y).toBeGreaterThanOrEqual(frame.top)
          expect(a.y).toBeLessThanOrEqual(frame.bottom)
          for (const b of moved.slice(index + 1)) expect(Math.hypot(a.x - b.x, a.y - b.y)).toBeGreaterThan(54)
        })
      }),
    )
  })

  test('points that stand clear are left alone', () => {
    const points = [
      { x: 100, y: 100 },
      { x: 300, y: 100 },
    ]
    expect(spreadPoints(points, 56, { left: 0, right: 780, top: 0, bottom: 300 })).toEqual(points)
  })
})
