import type { Style } from './typeset'

const MM = 72 / 25.4

/** Sheet and margin, points (design sections 4 and 7: 12 mm on A4, 13 mm on Letter). */
export const PAPERS = {
  a4: { size: [210 * MM, 297 * MM], margin: 12 * MM },
  letter: { size: [8.5 * 72, 11 * 72], margin: 13 * MM },
} as const

/** Sizes of body to try, largest first. Under 14 pt is the fuller sheet, the coach's own choice. */
export const BODIES = [14.5, 14, 13.5, 13, 12.5, 12, 11.5, 11, 10.5, 10, 9.5] as const
export const SMALLEST_BODY = 9.5

/** How far drawings may shrink before type does. */
export const SHRINKS = [1, 0.97, 0.94, 0.91, 0.88, 0.85, 0.82, 0.79, 0.76, 0.73, 0.7] as const

export interface Sizes {
  body: number
  name: number
  head: number
  count: number
  key: number
  foot: number
  /** Radius of the letters in the list. */
  letter: number
  /** Radius of the reader's own token. */
  token: number
}

/** Every size that goes with a body, points; under 14 the others follow it down to a floor. */
export function sizesFor(body: number): Sizes {
  const share = Math.min(1, body / 14)
  const of = (size: number, floor: number) => Math.max(floor, size * share)
  return {
    body,
    name: of(28, 20),
    head: of(17, 12),
    count: of(19, 12),
    key: of(20, 13),
    foot: of(11, 8.5),
    letter: of(9.8, 7),
    token: of(24, 16),
  }
}

/** Wide for names, normal for sentences, narrow for numbers. */
export const STYLES = {
  name: (size: number): Style => ({ font: 'archivo-800', size, ink: 'their', stretch: 1.1, tracking: -0.02 }),
  head: (size: number): Style => ({ font: 'archivo-800', size, ink: 'our', stretch: 1.06, tracking: -0.012 }),
  key: (size: number): Style => ({
    font: 'archivo-800',
    size,
    ink: 'graphite',
    stretch: 1.04,
    tracking: -0.015,
  }),
  text: (size: number): Style => ({ font: 'archivo-400', size, ink: 'graphite' }),
  strong: (size: number): Style => ({ font: 'archivo-700', size, ink: 'graphite' }),
  label: (size: number): Style => ({ font: 'archivo-500', size, ink: 'graphite' }),
  count: (size: number, ink: 'their' | 'our'): Style => ({ font: 'narrow-700', size, ink }),
} as const
