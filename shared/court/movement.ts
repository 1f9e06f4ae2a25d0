import { curveD, endOf, lengthOf, pointAt, trimmed, type Curve } from './curve'
import type { Pen } from './pen'
import { lineD, polygonD, type Point } from './path'
import type { Ink, PathNode, SceneNode } from './scene'

export type MovementKind = 'cut' | 'pass' | 'dribble' | 'screen'

/** Weights in px (DESIGN.md section 3). */
const WEIGHT: Record<MovementKind, number> = { cut: 2.4, pass: 2.2, dribble: 2.1, screen: 2.6 }
const HEAD = 7.5
const HEAD_HALF = 3.3
const T_BAR = 16
const ZIG = { high: 3.4, long: 9 }

/** A walk that only frames the ball's way is drawn lighter, so that the ball leads the eye. */
export const BESIDE = 0.7

/** How a line differs from the plain one: weight as a share, dash and gap in px. */
export interface LineStyle {
  emphasis?: number
  dash?: readonly [on: number, off: number]
}

const PASS_DASH = [7, 5] as const

/**
 * A way as it is drawn: cut solid, pass dashed, dribble zigzag, screen with a T-bar, each on a casing.
 * Nothing where the way is too short to be seen.
 */
export function movement(
  kind: MovementKind,
  curve: Curve,
  pen: Pen,
  ink: Ink = 'our',
  { emphasis = 1, dash }: LineStyle = {},
): SceneNode[] {
  const length = lengthOf(curve)
  if (length < pen.px(5)) return []
  const weight = pen.line(WEIGHT[kind]) * emphasis
  // Small drawings draw smaller heads and bars, by the same factor as their lines.
  const head = Math.min(pen.px(HEAD * pen.k), length)
  const shaft = kind === 'screen' ? curve : trimmed(curve, 0, head * 0.8)
  const d = kind === 'dribble' ? zigzagD(shaft, pen) : curveD(shaft)
  const line: PathNode = {
    kind: 'path',
    d,
    stroke: ink,
    strokeWidth: weight,
    cap: 'butt',
    join: 'round',
    ...(kind === 'pass' ? { dash: (dash ?? PASS_DASH).map((length) => pen.px(length * pen.k)) } : {}),
  }
  const end = kind === 'screen' ? tBar(curve, pen, ink) : arrowHead(curve, head, pen, ink)
  return [...casing(curve, kind, weight, pen), ...(d ? [line] : []), end]
}

/** How much wider than its line a casing is, px; less where many lines share a small court. */
const casingPx = (pen: Pen): number => (pen.pxPerMetre < 18 ? 3 : 5)

/** A floor-coloured band under the part of the way that lies on the court. */
function casing(curve: Curve, kind: MovementKind, weight: number, pen: Pen): SceneNode[] {
  const length = lengthOf(curve)
  const step = length / 40
  let enters = 0
  while (enters < length && pointAt(curve, enters).point.x < 0) enters += step
  const onCourt = trimmed(curve, enters, 0)
  if (onCourt.length === 0) return []
  const wide = kind === 'dribble' ? pen.px(ZIG.high * 2 * pen.k) : 0
  return [
    {
      kind: 'path',
      d: curveD(onCourt),
      stroke: 'floor',
      strokeWidth: weight + wide + pen.px(casingPx(pen)),
      cap: 'butt',
    },
  ]
}

/** Ours ends in a filled arrow, theirs in an open diamond, so that a grey copy tells them apart. */
function arrowHead(curve: Curve, head: number, pen: Pen, ink: Ink): PathNode {
  const tip = endOf(curve)
  const { point: base } = pointAt(curve, lengthOf(curve) - head)
  const length = Math.hypot(tip.x - base.x, tip.y - base.y) || 1
  const along = { x: (tip.x - base.x) / length, y: (tip.y - base.y) / length }
  const half = pen.px(HEAD_HALF * pen.k)
  const back = { x: tip.x - along.x * head, y: tip.y - along.y * head }
  const wings = (at: Point): [Point, Point] => [
    { x: at.x - along.y * half, y: at.y + along.x * half },
    { x: at.x + along.y * half, y: at.y - along.x * half },
  ]
  if (ink !== 'their') return { kind: 'path', d: polygonD(tip, ...wings(back)), fill: ink }
  const [left, right] = wings({ x: (tip.x + back.x) / 2, y: (tip.y + back.y) / 2 })
  return {
    kind: 'path',
    d: polygonD(tip, left, back, right),
    fill: 'floor',
    stroke: ink,
    strokeWidth: pen.px(1.3),
    join: 'miter',
  }
}

function tBar(curve: Curve, pen: Pen, ink: Ink): PathNode {
  const { along } = pointAt(curve, lengthOf(curve))
  const end = endOf(curve)
  const half = pen.px((T_BAR * pen.k) / 2)
  return {
    kind: 'path',
    d: lineD(
      { x: end.x - along.y * half, y: end.y + along.x * half },
      { x: end.x + along.y * half, y: end.y - along.x * half },
    ),
    stroke: ink,
    strokeWidth: pen.line(WEIGHT.screen),
  }
}

/** 3.4 px to either side, 9 px a wave, straight for the last 9. */
function zigzagD(curve: Curve, pen: Pen): string {
  const length = lengthOf(curve)
  const wave = pen.px(ZIG.long * pen.k)
  const high = pen.px(ZIG.high * pen.k)
  const waves = Math.floor((length - wave) / wave)
  if (waves < 1) return curveD(curve)
  const points: Point[] = [pointAt(curve, 0).point]
  for (let i = 0; i < waves; i += 1) {
    for (const [share, side] of [
      [0.25, -1],
      [0.75, 1],
    ] as const) {
      const { point, along } = pointAt(curve, (i + share) * wave)
      points.push({ x: point.x - along.y * high * side, y: point.y + along.x * high * side })
    }
  }
  points.push(pointAt(curve, waves * wave).point, endOf(curve))
  return lineD(...points)
}
