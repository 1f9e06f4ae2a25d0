import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { mirrorPlace } from '@shared/court/frame'
import { SPOT_CELLS, mirrorSpot, spotAt, spotCentre } from '@shared/court/trapSpots'

const unit = fc.double({ min: 0, max: 1, noNaN: true })
const edges = [0, 0.16, 0.22, 0.33, 0.38, 0.5, 0.55, 0.62, 0.67, 0.78, 0.84, 1]
/** Anything, and the edges, and their nearest neighbours as numbers. */
const tricky = fc.oneof(
  unit,
  fc.constantFrom(...edges),
  fc.constantFrom(...edges).map((edge) => Math.min(1, edge + Number.EPSILON)),
  fc.constantFrom(...edges).map((edge) => Math.max(0, edge - Number.EPSILON / 4)),
)

describe('spotAt', () => {
  it.each([
    // DOMAIN.md section 1, the table of trap spots; edges belong to the spot that begins there.
    [0, 0, 'coffin-corner', 'left'],
    [0.159, 0.219, 'coffin-corner', 'left'],
    [0.16, 0.1, 'early-sideline', 'left'],
    [0.38, 0.9, 'short-of-half', 'right'],
    [0.5, 0.1, 'just-over-half', 'left'],
    [0.62, 0.95, 'front-wing', 'right'],
    [0.84, 0.05, 'front-corner', 'left'],
    [1, 1, 'front-corner', 'right'],
    [1, 0, 'front-corner', 'left'],
    [0.3, 0.5, 'middle-lane', 'middle'],
    [0.16, 0.33, 'middle-lane', 'middle'],
    [0.16, 0.67, 'middle-lane', 'middle'],
    [0.55, 0.5, 'other', 'middle'],
    [0.1, 0.5, 'other', 'middle'],
    [0.3, 0.22, 'other', 'middle'],
    [0.3, 0.78, 'other', 'middle'],
    [0.3, 0.25, 'other', 'middle'],
    [-0.01, 0.1, 'other', 'middle'],
    [0.1, 1.01, 'other', 'middle'],
  ] as const)('x %d, y %d is %s, %s', (x, y, spot, side) => {
    expect(spotAt({ x, y })).toEqual({ spot, side })
  })

  it('mirrors exactly, edges and all', () => {
    fc.assert(
      fc.property(tricky, tricky, (x, y) => {
        expect(spotAt(mirrorPlace({ x, y }))).toEqual(mirrorSpot(spotAt({ x, y })))
      }),
      { numRuns: 2000 },
    )
  })

  it('puts the middle of every cell in that cell', () => {
    for (const { spot, side } of SPOT_CELLS) {
      const centre = spotCentre(spot, side)
      expect(centre).not.toBeNull()
      expect(spotAt(centre ?? { x: 0, y: 0 })).toEqual({ spot, side })
    }
  })

  it('agrees with the cells that are drawn', () => {
    fc.assert(
      fc.property(unit, unit, (x, y) => {
        const cell = SPOT_CELLS.find((one) => x > one.x0 && x < one.x1 && y > one.y0 && y < one.y1)
        fc.pre(!edges.includes(x) && !edges.includes(y))
        expect(spotAt({ x, y }).spot).toBe(cell?.spot ?? 'other')
      }),
    )
  })

  it('has no outline for other', () => {
    expect(spotCentre('other', 'middle')).toBeNull()
    expect(spotCentre('middle-lane', 'left')).toBeNull()
  })
})
