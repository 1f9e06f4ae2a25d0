import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  bent,
  curveD,
  distance,
  endOf,
  lengthOf,
  pointAt,
  startOf,
  straight,
  through,
  trimmed,
} from '@shared/court/curve'

const coordinate = fc.double({ min: -3, max: 30, noNaN: true })
const point = fc.record({ x: coordinate, y: coordinate })

describe('ways on the court', () => {
  it('swing to the right of the way walked for a positive bend', () => {
    // Walking up court (x grows), the right hand is where y grows.
    const { point: middle } = pointAt(
      bent({ x: 0, y: 0 }, { x: 10, y: 0 }, 0.2),
      lengthOf(bent({ x: 0, y: 0 }, { x: 10, y: 0 }, 0.2)) / 2,
    )
    expect(middle.y).toBeCloseTo(2, 1)
  })

  it('begin and end where they should', () => {
    fc.assert(
      fc.property(point, point, fc.double({ min: -0.6, max: 0.6, noNaN: true }), (a, d, bend) => {
        const curve = bent(a, d, bend)
        expect(distance(startOf(curve), a)).toBeLessThan(1e-9)
        expect(distance(endOf(curve), d)).toBeLessThan(1e-9)
      }),
    )
  })

  it('lose what is cut off at either end and nothing else', () => {
    fc.assert(
      fc.property(fc.array(point, { minLength: 2, maxLength: 5 }), (points) => {
        const curve = through(points)
        const length = lengthOf(curve)
        fc.pre(length > 1)
        const cut = trimmed(curve, length * 0.2, length * 0.3)
        expect(lengthOf(cut) / length).toBeGreaterThan(0.45)
        expect(lengthOf(cut) / length).toBeLessThan(0.55)
      }),
    )
  })

  it('are empty when cut away whole', () => {
    expect(trimmed(straight({ x: 0, y: 0 }, { x: 1, y: 0 }), 0.6, 0.6)).toEqual([])
    expect(trimmed(straight({ x: 2, y: 2 }, { x: 2, y: 2 }), 0, 0)).toEqual([])
  })

  it('never write a number that a renderer cannot read', () => {
    fc.assert(
      fc.property(fc.array(point, { maxLength: 5 }), (points) => {
        expect(curveD(through(points))).toMatch(/^(M-?[\d.]+ -?[\d.]+([LC][-\d. ]+)*)?$/)
      }),
    )
  })
})
