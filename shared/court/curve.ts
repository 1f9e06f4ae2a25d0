import { n, type Box, type Point } from './path'

/** A way on the court: cubic pieces end to end, metres. */
export interface Cubic {
  readonly a: Point
  readonly b: Point
  readonly c: Point
  readonly d: Point
}
export type Curve = readonly Cubic[]

const SAMPLES = 24

const mix = (a: Point, b: Point, t: number): Point => ({ x: a.x + (b.x - a.x) * t, y: a.y + (b.y - a.y) * t })

export const distance = (a: Point, b: Point): number => Math.hypot(b.x - a.x, b.y - a.y)

export const straight = (a: Point, d: Point): Curve => [{ a, b: mix(a, d, 1 / 3), c: mix(a, d, 2 / 3), d }]

/**
 * A way that swings out: its middle lies bend x length to the side of the straight line, + to the right of
 * the way walked (y grows to the right of somebody facing up court).
 */
export function bent(a: Point, d: Point, bend: number): Curve {
  if (bend === 0) return straight(a, d)
  const control = {
    x: (a.x + d.x) / 2 - 2 * bend * (d.y - a.y),
    y: (a.y + d.y) / 2 + 2 * bend * (d.x - a.x),
  }
  return [{ a, b: mix(a, control, 2 / 3), c: mix(d, control, 2 / 3), d }]
}

/** The same way with its swing kept inside a box: nobody runs out of bounds between two places in it. */
export function keptInside(curve: Curve, box: Box): Curve {
  const held = (p: Point): Point => ({
    x: Math.min(box.x + box.width, Math.max(box.x, p.x)),
    y: Math.min(box.y + box.height, Math.max(box.y, p.y)),
  })
  const within = (p: Point) => held(p).x === p.x && held(p).y === p.y
  return curve.map((piece) =>
    within(piece.a) && within(piece.d) ? { ...piece, b: held(piece.b), c: held(piece.c) } : piece,
  )
}

/** A smooth way through every point in turn (Catmull-Rom, tension halved at the ends). */
export function through(points: readonly Point[]): Curve {
  const pieces: Cubic[] = []
  for (let i = 0; i < points.length - 1; i += 1) {
    const [a, d] = [points[i], points[i + 1]]
    if (!a || !d) continue
    const before = points[i - 1] ?? a
    const after = points[i + 2] ?? d
    // Handles never longer than a third of the piece, so that a short leg after a long one makes no loop.
    const third = distance(a, d) / 3
    pieces.push({ a, b: handle(a, before, d, third), c: handle(d, after, a, third), d })
  }
  return pieces
}

function handle(at: Point, from: Point, to: Point, longest: number): Point {
  const length = distance(from, to)
  if (length === 0) return at
  const reach = Math.min(longest, length / 6 + longest / 2)
  return { x: at.x + ((to.x - from.x) / length) * reach, y: at.y + ((to.y - from.y) / length) * reach }
}

function cubicAt({ a, b, c, d }: Cubic, t: number): Point {
  const [ab, bc, cd] = [mix(a, b, t), mix(b, c, t), mix(c, d, t)]
  return mix(mix(ab, bc, t), mix(bc, cd, t), t)
}

/** The part of a cubic between two parameters (de Casteljau, twice). */
function cubicPart(piece: Cubic, from: number, to: number): Cubic {
  const left = split(piece, to)[0]
  return to === 0 ? left : split(left, from / to)[1]
}

function split({ a, b, c, d }: Cubic, t: number): [Cubic, Cubic] {
  const [ab, bc, cd] = [mix(a, b, t), mix(b, c, t), mix(c, d, t)]
  const [abc, bcd] = [mix(ab, bc, t), mix(bc, cd, t)]
  const middle = mix(abc, bcd, t)
  return [
    { a, b: ab, c: abc, d: middle },
    { a: middle, b: bcd, c: cd, d },
  ]
}

interface Sample {
  piece: number
  t: number
  s: number
  point: Point
}

/** Curves never change, so what was measured once holds; a zigzag asks for its curve a hundred times. */
const measured = new WeakMap<Curve, Sample[]>()

function samples(curve: Curve): Sample[] {
  const known = measured.get(curve)
  if (known) return known
  const list: Sample[] = []
  measured.set(curve, list)
  let s = 0
  curve.forEach((piece, index) => {
    for (let i = index === 0 ? 0 : 1; i <= SAMPLES; i += 1) {
      const point = cubicAt(piece, i / SAMPLES)
      const last = list[list.length - 1]
      if (last) s += distance(last.point, point)
      list.push({ piece: index, t: i / SAMPLES, s, point })
    }
  })
  return list
}

export const lengthOf = (curve: Curve): number => samples(curve).at(-1)?.s ?? 0

/** Where a length along the way falls: its piece and parameter. */
function locate(list: readonly Sample[], s: number): { piece: number; t: number } {
  const next = list.findIndex((sample) => sample.s >= s)
  const after = list[next === -1 ? list.length - 1 : next]
  const before = list[(next === -1 ? list.length - 1 : next) - 1]
  if (!after) return { piece: 0, t: 0 }
  if (!before || after.s === before.s) return { piece: after.piece, t: after.t }
  const share = Math.min(1, (s - before.s) / (after.s - before.s))
  const from = before.piece === after.piece ? before.t : 0
  return { piece: after.piece, t: from + (after.t - from) * share }
}

/** Cuts the way by metres at its start and its end; empty when nothing is left. */
export function trimmed(curve: Curve, start: number, end: number): Curve {
  const list = samples(curve)
  const total = list.at(-1)?.s ?? 0
  if (total - start - end <= 1e-9) return []
  const from = locate(list, Math.max(0, start))
  const to = locate(list, total - Math.max(0, end))
  return curve.slice(from.piece, to.piece + 1).map((piece, i, kept) => {
    const a = i === 0 ? from.t : 0
    const b = i === kept.length - 1 ? to.t : 1
    return cubicPart(piece, a, b)
  })
}

/** Points along the way at equal spacing, and the direction there (unit vector). */
export function pointAt(curve: Curve, s: number): { point: Point; along: Point } {
  const list = samples(curve)
  const { piece, t } = locate(list, s)
  const cubic = curve[piece]
  if (!cubic) return { point: { x: 0, y: 0 }, along: { x: 1, y: 0 } }
  const [behind, ahead] = [cubicAt(cubic, Math.max(0, t - 0.01)), cubicAt(cubic, Math.min(1, t + 0.01))]
  const length = distance(behind, ahead) || 1
  return {
    point: cubicAt(cubic, t),
    along: { x: (ahead.x - behind.x) / length, y: (ahead.y - behind.y) / length },
  }
}

export const startOf = (curve: Curve): Point => curve[0]?.a ?? { x: 0, y: 0 }
export const endOf = (curve: Curve): Point => curve.at(-1)?.d ?? { x: 0, y: 0 }

/** Path data; straight pieces are written as lines. */
export function curveD(curve: Curve): string {
  const [first] = curve
  if (!first) return ''
  const pieces = curve.map((piece) => {
    const direct = distance(piece.a, piece.d)
    const bow = distance(piece.a, piece.b) + distance(piece.b, piece.c) + distance(piece.c, piece.d)
    if (bow - direct < 1e-6) return `L${n(piece.d.x)} ${n(piece.d.y)}`
    return `C${[piece.b, piece.c, piece.d].map((p) => `${n(p.x)} ${n(p.y)}`).join(' ')}`
  })
  return `M${n(first.a.x)} ${n(first.a.y)}${pieces.join('')}`
}
