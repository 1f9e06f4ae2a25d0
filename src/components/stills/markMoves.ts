import { mendRegion, mendRing, type MarkPoint, type Region, type StillMarks } from '@shared/stills/marks'

/** What can be in hand over a still. */
export type Tool = 'ring' | 'shade' | 'pass' | 'words' | 'blur'
export type Mark = 'ring' | 'shade' | 'pass'

export const isMark = (tool: Tool | null): tool is Mark =>
  tool === 'ring' || tool === 'shade' || tool === 'pass'

/** What a person would draw first: an ellipse round two pairs of feet, room for one player. */
const RING = { rx: 0.085, ry: 0.04 }
const SHADE = { w: 0.3, h: 0.36 }
/** How far over the feet the ball is. */
const REACH = 0.36
const FACE = 0.05

const part = (value: number) => Math.round(Math.min(1, Math.max(0, value)) * 1e4) / 1e4
const within = ({ x, y }: MarkPoint): MarkPoint => ({ x: part(x), y: part(y) })
const rounded = <T extends Record<string, number>>(mark: T): T =>
  Object.fromEntries(
    Object.entries(mark).map(([key, value]) => [key, Math.floor(value * 1e4 + 1e-6) / 1e4]),
  ) as T
const ringOf = (ring: NonNullable<StillMarks['ring']>) => mendRing(rounded(ring))
const regionOf = (region: Region) => rounded(mendRegion(region))

const around = (at: MarkPoint, w: number, h: number): Region =>
  regionOf({ x: at.x - w / 2, y: at.y - h / 2, w, h })
const between = (a: MarkPoint, b: MarkPoint): Region =>
  regionOf({ x: Math.min(a.x, b.x), y: Math.min(a.y, b.y), w: Math.abs(a.x - b.x), h: Math.abs(a.y - b.y) })

/** Where the pass starts when nobody has said: the ball over the ring, else left of the middle. */
const startOf = ({ ring }: StillMarks): MarkPoint =>
  ring === null ? { x: 0.3, y: 0.45 } : within({ x: ring.x, y: ring.y - REACH })

/** A tap: the mark in hand goes there, with the size that it has or a first one. */
export function placed(marks: StillMarks, mark: Mark, at: MarkPoint): StillMarks {
  if (mark === 'ring') return { ...marks, ring: ringOf({ ...(marks.ring ?? RING), ...at }) }
  if (mark === 'pass') return { ...marks, pass: { from: marks.pass?.from ?? startOf(marks), to: within(at) } }
  const { w, h } = marks.shade ?? SHADE
  return { ...marks, shade: around(at, w, h) }
}

/** A stroke from one place to another: the ring follows, the shade is drawn from corner to corner, the pass flies. */
export function stroked(marks: StillMarks, mark: Mark, from: MarkPoint, to: MarkPoint): StillMarks {
  if (mark === 'ring') return placed(marks, mark, to)
  if (mark === 'shade') return { ...marks, shade: between(from, to) }
  return { ...marks, pass: { from: within(from), to: within(to) } }
}

/** By keys: one step across and down. With `other`, the other end of a pass, the far corner of the shade. */
export function nudged(marks: StillMarks, mark: Mark, by: MarkPoint, other = false): StillMarks {
  const { ring, shade, pass } = marks
  const add = (at: MarkPoint): MarkPoint => within({ x: at.x + by.x, y: at.y + by.y })
  if (mark === 'ring' && ring) return { ...marks, ring: ringOf({ ...ring, ...add(ring) }) }
  if (mark === 'shade' && shade)
    return {
      ...marks,
      shade: regionOf(
        other
          ? { ...shade, w: Math.min(1 - shade.x, shade.w + by.x), h: Math.min(1 - shade.y, shade.h + by.y) }
          : { ...shade, x: shade.x + by.x, y: shade.y + by.y },
      ),
    }
  if (mark === 'pass' && pass)
    return { ...marks, pass: other ? { ...pass, from: add(pass.from) } : { ...pass, to: add(pass.to) } }
  return placed(marks, mark, { x: 0.5, y: 0.6 })
}

/** Larger or smaller round its middle; a pass has no size. */
export function sized(marks: StillMarks, mark: Mark, by: number): StillMarks {
  const { ring, shade } = marks
  if (mark === 'ring' && ring)
    return { ...marks, ring: ringOf({ ...ring, rx: ring.rx * by, ry: ring.ry * by }) }
  if (mark === 'shade' && shade) return { ...marks, shade: sizedRegion(shade, by) }
  return marks
}

export const takenOff = (marks: StillMarks, mark: Mark): StillMarks => ({ ...marks, [mark]: null })

export function sizedRegion(region: Region, by: number): Region {
  const middle = { x: region.x + region.w / 2, y: region.y + region.h / 2 }
  return around(middle, Math.min(1, region.w * by), Math.min(1, region.h * by))
}

export const movedRegion = (region: Region, by: MarkPoint): Region =>
  regionOf({ ...region, x: region.x + by.x, y: region.y + by.y })

/** A square over a face. @param ratio the picture's width over its height */
export const faceAt = (at: MarkPoint, ratio: number): Region => around(at, FACE, FACE * ratio)

/** A face drawn from corner to corner. */
export const faceBetween = between

/** Where the handle of a mark is; null while it is not there. */
export function handleOf({ ring, shade, pass }: StillMarks, mark: Mark): MarkPoint | null {
  if (mark === 'ring') return ring && { x: ring.x, y: ring.y }
  if (mark === 'shade') return shade && { x: shade.x + shade.w / 2, y: shade.y + shade.h / 2 }
  return pass && pass.to
}
