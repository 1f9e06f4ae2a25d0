import type { Pen } from './pen'
import { circleD, lineD, type Point } from './path'
import type { GroupNode, Ink, PathNode, SceneNode, TextNode } from './scene'
import { CAP_HEIGHT } from './textWidth'

/** A token's size, metres, and whether it is too small for a number. */
export interface TokenSize {
  r: number
  dot: boolean
}

/** Under this radius, px, a token loses its number and becomes a dot. */
export const DOT_BELOW = 7

/** Radius 12 px, 9.5 small, and less again below 12 px per metre, where a court is a thumbnail. */
export function tokenSize(pen: Pen, small: boolean, radiusPx?: number): TokenSize {
  const base = radiusPx ?? (small ? 9.5 : 12)
  const px = radiusPx === undefined && pen.pxPerMetre < 12 ? (base * pen.pxPerMetre) / 12 : base
  const dot = px < DOT_BELOW
  return { r: pen.px(dot ? Math.min(px, 4.5) : px), dot }
}

/** One of ours: a circle with its number; solid when it is the reader or on the ball's way. */
export function ourToken(
  at: Point,
  role: string,
  solid: boolean,
  size: TokenSize,
  pen: Pen,
  id = `token-${role}`,
): GroupNode {
  const casing: PathNode = { kind: 'path', d: circleD(at, size.r + pen.px(3)), fill: 'floor' }
  const disc: PathNode = {
    kind: 'path',
    d: circleD(at, size.r),
    fill: solid ? 'our' : 'sheet',
    stroke: 'our',
    strokeWidth: pen.px(size.dot ? 1.4 : 2),
  }
  const nodes: SceneNode[] = size.dot
    ? [disc]
    : [casing, disc, centred(role, at, size.r * 1.28, solid ? 'paper' : 'our')]
  return { kind: 'group', id, label: role, nodes }
}

/** Where one of ours stood a step ago. */
export const ghost = (at: Point, size: TokenSize, pen: Pen): PathNode => ({
  kind: 'path',
  d: circleD(at, size.r * 0.8),
  stroke: 'our',
  strokeWidth: pen.px(1.3),
  dash: [pen.px(2.6), pen.px(2.4)],
})

/** One of theirs: a bare X on a floor-coloured casing. */
export function theirToken(at: Point, id: string, size: TokenSize, pen: Pen, heavy = false): GroupNode {
  const arm = size.dot ? size.r * 0.9 : size.r * 0.64
  const d =
    lineD({ x: at.x - arm, y: at.y - arm }, { x: at.x + arm, y: at.y + arm }) +
    lineD({ x: at.x - arm, y: at.y + arm }, { x: at.x + arm, y: at.y - arm })
  const weight = pen.px((size.dot ? 1.8 : 3) * (heavy ? 1.3 : 1))
  return {
    kind: 'group',
    id: `theirs-${id}`,
    label: id,
    nodes: [
      { kind: 'path', d, stroke: 'floor', strokeWidth: weight + pen.px(5) },
      { kind: 'path', d, stroke: 'their', strokeWidth: weight },
    ],
  }
}

/** The ball at the shoulder of whoever has it; `nearer` draws it larger, as a ball high in the air is. */
export function ballAt(holder: Point, size: TokenSize, pen: Pen, nearer = 1): GroupNode {
  const at = { x: holder.x + size.r * 0.58, y: holder.y - size.r * 1.08 }
  return {
    kind: 'group',
    id: 'ball',
    label: 'ball',
    nodes: [
      {
        kind: 'path',
        d: circleD(at, size.r * 0.44 * nearer),
        fill: 'ball',
        stroke: 'graphite',
        strokeWidth: pen.px(size.dot ? 1 : 1.5),
      },
    ],
  }
}

/** A letter on a graphite disc: links the drawing to a list without talk of colour. */
export function letterDisc(at: Point, letter: string, r: number, pen: Pen): SceneNode[] {
  return [
    {
      kind: 'path',
      d: circleD(at, r),
      fill: 'graphite',
      stroke: 'floor',
      strokeWidth: pen.px(3),
    },
    centred(letter, at, r * 1.25, 'paper'),
  ]
}

function centred(text: string, at: Point, size: number, ink: Ink): TextNode {
  return {
    kind: 'text',
    x: at.x,
    y: at.y + (size * CAP_HEIGHT) / 2,
    text,
    size,
    cut: 'count',
    weight: 700,
    anchor: 'middle',
    ink,
  }
}
