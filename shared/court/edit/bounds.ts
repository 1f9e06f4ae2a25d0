import type { Place } from '../diagram'
import { clamped } from './reading'

/** The bounds of a diagram's schema, for whoever changes one. */
export const LEAST_PLACE = { x: -0.08, y: -0.06 } as const
export const MOST_PLACE = { x: 1.02, y: 1.06 } as const
export const BEND = 0.6
export const STEPS = 12
export const MOVES = 12
export const LAST_BEAT = 5
export const TITLE = 60
export const WORDS = 3
export const WORD = 24

/** Fractions are kept to 3 mm on the longest court, so that a mirrored place comes back to itself. */
const FINE = 10_000

const fine = (value: number): number => Math.round(value * FINE) / FINE + 0

/** A place that a diagram may hold: brought into bounds, to four decimals. */
export const heldPlace = ({ x, y }: { readonly x: number; readonly y: number }): Place => ({
  x: fine(clamped(x, LEAST_PLACE.x, MOST_PLACE.x)),
  y: fine(clamped(y, LEAST_PLACE.y, MOST_PLACE.y)),
})

export const heldBend = (bend: number): number => fine(clamped(bend, -BEND, BEND))
