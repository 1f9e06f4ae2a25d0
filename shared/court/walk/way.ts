import { walkedWay } from '../counterStep'
import { pointAt, lengthOf } from '../curve'
import { inMetres, type InMetres } from '../frame'
import type { RulePack } from '../rulePacks'

/** A walked way measured once: points at even spacing, so that a frame of the animation is one look-up. */
export interface Way {
  /** Metres. */
  readonly length: number
  readonly points: readonly InMetres[]
}

const SPACING = 0.25

/** The way of a move as it is drawn, bend and all. */
export function measuredWay(pack: RulePack, from: InMetres, to: InMetres, bend: number): Way {
  const curve = walkedWay(pack, from, to, bend)
  const length = lengthOf(curve)
  // A straight way needs its two ends only.
  const pieces = bend === 0 ? 1 : Math.max(1, Math.ceil(length / SPACING))
  const points = [from]
  for (let i = 1; i < pieces; i += 1) {
    const { point } = pointAt(curve, (length * i) / pieces)
    points.push(inMetres(point.x, point.y))
  }
  points.push(to)
  return { length, points }
}

/** The point some metres along a way. */
export function alongWay({ length, points }: Way, metres: number): InMetres {
  const first = points[0] ?? inMetres(0, 0)
  const last = points.at(-1) ?? first
  if (!(metres > 0)) return first
  if (metres >= length) return last
  const at = (metres / length) * (points.length - 1)
  const index = Math.floor(at)
  const a = points[index] ?? first
  const b = points[index + 1] ?? last
  return inMetres(a.x + (b.x - a.x) * (at - index), a.y + (b.y - a.y) * (at - index))
}

/** Metres along a way until x first passes a line across the court; null where it never does. */
export function metresToX({ length, points }: Way, x: number): number | null {
  const next = points.findIndex((point) => point.x > x)
  if (next < 0) return null
  const [a, b] = [points[next - 1], points[next]]
  if (!a || !b) return 0
  return (length * (next - 1 + (x - a.x) / (b.x - a.x))) / (points.length - 1)
}
