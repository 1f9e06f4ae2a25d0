import { z } from 'zod'

/**
 * What a scout draws over a still: at most one ring, one shade and one pass. All in fractions of the picture, from
 * its upper left corner, so that marks hold for every size that it is shown in.
 */

/** Least half axis and least side of a mark: a smaller one cannot be made out, or taken hold of again. */
const LEAST = 0.01

const part = z.number().min(0).max(1)
export const MarkPoint = z.object({ x: part, y: part })
export type MarkPoint = z.infer<typeof MarkPoint>

/** An ellipse at a player's feet; half axes as fractions of the width and of the height. */
export const Ring = z.object({
  x: part,
  y: part,
  rx: z.number().min(LEAST).max(0.5),
  ry: z.number().min(LEAST).max(0.5),
})
export type Ring = z.infer<typeof Ring>

const rect = z.object({ x: part, y: part, w: z.number().min(LEAST).max(1), h: z.number().min(LEAST).max(1) })
const staysInside = ({ x, y, w, h }: z.infer<typeof rect>) => x + w <= 1.000_001 && y + h <= 1.000_001
const OUTSIDE = 'This reaches past the edge of the picture. Make it smaller.'

/** A part of the picture: x and y of its upper left corner. */
export const Region = rect.refine(staysInside, { message: OUTSIDE })
export type Region = z.infer<typeof Region>

export const StillMarks = z
  .object({
    version: z.literal(1),
    ring: Ring.nullable(),
    /** Room that is left, never a trap. */
    shade: Region.nullable(),
    pass: z.object({ from: MarkPoint, to: MarkPoint }).nullable(),
  })
  .strict()
export type StillMarks = z.infer<typeof StillMarks>

export const NO_MARKS: StillMarks = { version: 1, ring: null, shade: null, pass: null }

const MendedRing = z.object({ x: z.number(), y: z.number(), rx: z.number(), ry: z.number() })
const MendedRect = z.object({ x: z.number(), y: z.number(), w: z.number(), h: z.number() })
const MendedPoint = z.object({ x: z.number(), y: z.number() })
const MendedPass = z.object({ from: MendedPoint, to: MendedPoint })

const held = (value: number, least: number, most: number) => Math.min(most, Math.max(least, value))
const inside = ({ x, y }: MarkPoint): MarkPoint => ({ x: held(x, 0, 1), y: held(y, 0, 1) })

/** A ring brought back into the picture. */
export const mendRing = ({ x, y, rx, ry }: Ring): Ring => ({
  ...inside({ x, y }),
  rx: held(rx, LEAST, 0.5),
  ry: held(ry, LEAST, 0.5),
})

/** A part of the picture brought back into it: moved in first, then made smaller. */
export function mendRegion({ x, y, w, h }: Region): Region {
  const [width, height] = [held(w, LEAST, 1), held(h, LEAST, 1)]
  return { x: held(x, 0, 1 - width), y: held(y, 0, 1 - height), w: width, h: height }
}

/**
 * Stored marks as they can be drawn: what reaches past the picture is brought back, a mark that cannot be read is
 * left out, the others stay.
 */
export function marksOf(stored: unknown): StillMarks {
  const read = z.record(z.string(), z.unknown()).safeParse(stored)
  if (!read.success || read.data['version'] !== 1) return NO_MARKS
  const ring = MendedRing.safeParse(read.data['ring'])
  const shade = MendedRect.safeParse(read.data['shade'])
  const pass = MendedPass.safeParse(read.data['pass'])
  return {
    version: 1,
    ring: ring.success ? mendRing(ring.data) : null,
    shade: shade.success ? mendRegion(shade.data) : null,
    pass: pass.success ? { from: inside(pass.data.from), to: inside(pass.data.to) } : null,
  }
}
