import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { hatchLines, hatchStep } from '@shared/court/hatch'

const length = fc.double({ min: 0.05, max: 30, noNaN: true })

describe('hatchLines', () => {
  it('stays inside its box, at 45 degrees, with an even gap', () => {
    fc.assert(
      fc.property(
        length,
        length,
        length,
        length,
        fc.double({ min: 0.05, max: 2, noNaN: true }),
        (x, y, w, h, gap) => {
          const box = { x, y, width: w, height: h }
          const lines = hatchLines(box, gap)
          for (const [a, b] of lines) {
            for (const point of [a, b]) {
              expect(point.x).toBeGreaterThanOrEqual(x - 1e-12)
              expect(point.x).toBeLessThanOrEqual(x + w + 1e-12)
              expect(point.y).toBeGreaterThanOrEqual(y - 1e-12)
              expect(point.y).toBeLessThanOrEqual(y + h + 1e-12)
            }
            expect(b.x - a.x).toBeCloseTo(a.y - b.y, 9)
          }
          lines.slice(1).forEach(([b], i) => {
            const [a] = lines[i] ?? [b]
            // Distance between neighbours, square to the lines.
            expect(Math.abs(b.x + b.y - a.x - a.y) / Math.SQRT2).toBeCloseTo(gap, 9)
          })
          if (w + h > gap * Math.SQRT2) expect(lines.length).toBeGreaterThan(0)
        },
      ),
    )
  })

  it('draws nothing in an empty box or without a gap', () => {
    expect(hatchLines({ x: 0, y: 0, width: 0, height: 3 }, 1)).toEqual([])
    expect(hatchLines({ x: 0, y: 0, width: 3, height: 3 }, 0)).toEqual([])
  })
})

describe('hatchStep', () => {
  it.each([
    [0, 0, 1],
    [1, 11, 1],
    [2, 10, 2],
    [4, 10, 2],
    [5, 11, 3],
    [11, 11, 3],
  ])('%d of %d is step %d', (k, n, step) => {
    expect(hatchStep(k, n)).toBe(step)
  })
})
