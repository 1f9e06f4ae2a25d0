import { z } from 'zod'
import type { InFractions } from './frame'

/** The named areas where two come to the ball (DOMAIN.md section 1); `other` is any place outside them. */
export const SPOT_NAMES = [
  'coffin-corner',
  'early-sideline',
  'short-of-half',
  'just-over-half',
  'front-wing',
  'front-corner',
  'middle-lane',
  'other',
] as const
export const SpotName = z.enum(SPOT_NAMES)
export type SpotName = z.infer<typeof SpotName>

/** Left is y 0, facing up court. The middle lane and `other` have no side. */
export const SpotSide = z.enum(['left', 'right', 'middle'])
export type SpotSide = z.infer<typeof SpotSide>

export interface Spot {
  spot: SpotName
  side: SpotSide
}

/** A named area in fractions of the court. */
export interface SpotCell extends Spot {
  x0: number
  x1: number
  y0: number
  y1: number
}

/** Sideline cells reach this far in from their sideline; the middle lane lies between MIDDLE_EDGES. */
const SIDELINE_DEPTH = 0.22
const FAR_SIDELINE = 0.78
const MIDDLE_EDGES = [0.33, 0.67] as const
const MIDDLE_ENDS = [0.16, 0.55] as const

const SIDELINE_CELLS = [
  { spot: 'coffin-corner', x0: 0, x1: 0.16 },
  { spot: 'early-sideline', x0: 0.16, x1: 0.38 },
  { spot: 'short-of-half', x0: 0.38, x1: 0.5 },
  { spot: 'just-over-half', x0: 0.5, x1: 0.62 },
  { spot: 'front-wing', x0: 0.62, x1: 0.84 },
  { spot: 'front-corner', x0: 0.84, x1: 1 },
] as const

/** Every area a scout can tap, left side first, then right, then the middle lane. */
export const SPOT_CELLS: readonly SpotCell[] = [
  ...SIDELINE_CELLS.map((cell): SpotCell => ({ ...cell, side: 'left', y0: 0, y1: SIDELINE_DEPTH })),
  ...SIDELINE_CELLS.map((cell): SpotCell => ({ ...cell, side: 'right', y0: FAR_SIDELINE, y1: 1 })),
  {
    spot: 'middle-lane',
    side: 'middle',
    x0: MIDDLE_ENDS[0],
    x1: MIDDLE_ENDS[1],
    y0: MIDDLE_EDGES[0],
    y1: MIDDLE_EDGES[1],
  },
]

/**
 * The area of a place. In x an area owns its lower edge and not its upper, and x = 1 belongs to the front
 * corner. In y the distance is taken from the nearer sideline, so that left and right mirror exactly: a
 * sideline area owns its sideline and not its inner edge (y = .22 and y = .78 are outside), the middle
 * lane owns both of its edges (.33 and .67). Out of bounds is `other`.
 */
export function spotAt(place: InFractions): Spot {
  const { x, y } = place
  // The larger of y and 1 - y is the same number for a place and its mirror, down to the last bit;
  // the smaller is not, because 1 - (1 - y) may differ from y.
  const far = Math.max(y, 1 - y)
  if (x < 0 || x > 1 || far > 1 || Number.isNaN(x + y)) return { spot: 'other', side: 'middle' }
  if (far > FAR_SIDELINE) {
    const cell = SIDELINE_CELLS.find(({ x1 }) => x < x1 || x1 === 1)
    if (cell) return { spot: cell.spot, side: y < 0.5 ? 'left' : 'right' }
  }
  if (far <= MIDDLE_EDGES[1] && x >= MIDDLE_ENDS[0] && x < MIDDLE_ENDS[1])
    return { spot: 'middle-lane', side: 'middle' }
  return { spot: 'other', side: 'middle' }
}

/** The area of a spot and side; undefined for `other`, which has no outline. */
export function spotCell(spot: SpotName, side: SpotSide): SpotCell | undefined {
  return SPOT_CELLS.find((cell) => cell.spot === spot && cell.side === side)
}

/** The middle of a spot; null for `other` and for a side that the spot does not have. */
export function spotCentre(spot: SpotName, side: SpotSide): { x: number; y: number } | null {
  const cell = spotCell(spot, side)
  return cell ? { x: (cell.x0 + cell.x1) / 2, y: (cell.y0 + cell.y1) / 2 } : null
}

/** The same spot on the other side. */
export function mirrorSpot({ spot, side }: Spot): Spot {
  return { spot, side: side === 'left' ? 'right' : side === 'right' ? 'left' : 'middle' }
}
