import type { Denied, Lane, Pickup } from '../vocabulary'
import { toMetres, type InFractions } from './frame'
import { lineD, polygonD, roundBoxD, type Box, type Point } from './path'
import type { Pen } from './pen'
import type { RulePack } from './rulePacks'
import type { GroupNode, SceneNode } from './scene'

export type BallSide = 'left' | 'right'

/** A place written for the ball on the right, as it is with the ball on the given side. */
const onSide = (x: number, y: number, side: BallSide): InFractions => ({ x, y: side === 'right' ? y : 1 - y })

/**
 * Where a class of pick-up is drawn when only the class is known: inside its stretch, clear of
 * board, ring and half-court line.
 */
const PICKUP_X: Record<Pickup, number> = { full: 0.07, 'three-quarter': 0.3, half: 0.47 }

/** x of the front as a fraction of the court. */
export const pickupX = (at: Pickup | number): number => (typeof at === 'number' ? at : PICKUP_X[at])

export interface Front {
  node: GroupNode
  box: Box
}

/**
 * Pick-up front: a line with teeth pointing at the ball, between the side zones that it would cross.
 * Thin: dashed, with hollow teeth.
 */
export function pickupFront(
  pack: RulePack,
  at: Pickup | number,
  thin: boolean,
  zones: readonly Box[],
  pen: Pen,
  label: string,
): Front {
  const { x } = toMetres(pack, { x: pickupX(at), y: 0.5 })
  const tooth = pen.px(7)
  const crossed = zones.filter((zone) => zone.x < x + tooth && zone.x + zone.width > x - tooth)
  const middle = pack.court.width / 2
  const gap = pen.px(8)
  const above = crossed.filter((zone) => zone.y + zone.height <= middle)
  const below = crossed.filter((zone) => zone.y >= middle)
  const top = Math.max(pen.px(16), ...above.map((zone) => zone.y + zone.height + gap))
  const bottom = Math.min(pack.court.width - pen.px(16), ...below.map((zone) => zone.y - gap))
  // An even number leaves the middle of the court, where board and ring are, without a tooth.
  const teeth = 2 * Math.max(2, Math.min(4, Math.round((bottom - top) / 3.2)))
  const ink = 'their'
  const nodes: SceneNode[] = [
    {
      kind: 'path',
      d: lineD({ x, y: top }, { x, y: bottom }),
      stroke: 'floor',
      strokeWidth: pen.line(2.2) + pen.px(4),
    },
    {
      kind: 'path',
      d: lineD({ x, y: top }, { x, y: bottom }),
      stroke: ink,
      strokeWidth: pen.line(2.2),
      ...(thin ? { dash: [pen.px(5), pen.px(3)] } : {}),
    },
  ]
  for (let i = 0; i < teeth; i += 1) {
    const y = top + ((bottom - top) * (i + 0.5)) / teeth
    const half = pen.px(6)
    nodes.push({
      kind: 'path',
      d: polygonD({ x, y: y - half }, { x: x - tooth, y }, { x, y: y + half }),
      fill: thin ? 'floor' : ink,
      stroke: ink,
      strokeWidth: pen.px(thin ? 1.2 : 0.6),
      join: 'miter',
    })
  }
  return {
    node: { kind: 'group', id: 'pickup-front', label, nodes },
    box: { x: x - tooth, y: top, width: tooth + pen.px(2), height: bottom - top },
  }
}

/** Where a denied pass would go, thrower or catch to receiver; drawn for the ball on the right. */
const DENIED_WAYS: Record<Denied, { from: [number, number]; to: [number, number] }> = {
  near: { from: [-0.02, 0.6], to: [0.15, 0.74] },
  far: { from: [-0.02, 0.6], to: [0.17, 0.29] },
  middle: { from: [0.08, 0.8], to: [0.33, 0.5] },
  'pass-back': { from: [0.1, 0.77], to: [0.1, 0.45] },
  'best-handler': { from: [-0.02, 0.6], to: [0.22, 0.6] },
}

export interface DeniedWay {
  node: GroupNode
  /** Round the gate. */
  box: Box
  /** Along the dotted line, so that no words lie on it. */
  line: Box[]
}

/** Denied lane: a dotted line with a gate of two bars across it. */
export function deniedLane(pack: RulePack, lane: Denied, side: BallSide, pen: Pen, label: string): DeniedWay {
  const way = DENIED_WAYS[lane]
  const a = toMetres(pack, onSide(...way.from, side))
  const b = toMetres(pack, onSide(...way.to, side))
  const length = Math.hypot(b.x - a.x, b.y - a.y)
  const along = { x: (b.x - a.x) / length, y: (b.y - a.y) / length }
  const middle = { x: a.x + (b.x - a.x) * 0.6, y: a.y + (b.y - a.y) * 0.6 }
  const bar = (offset: number): string => {
    const at = { x: middle.x + along.x * offset, y: middle.y + along.y * offset }
    const half = pen.px(9)
    return lineD(
      { x: at.x - along.y * half, y: at.y + along.x * half },
      { x: at.x + along.y * half, y: at.y - along.x * half },
    )
  }
  const gate = bar(pen.px(-3)) + bar(pen.px(3))
  const reach = pen.px(10)
  return {
    node: {
      kind: 'group',
      id: `denied-${lane}`,
      label,
      nodes: [
        {
          kind: 'path',
          d: lineD(a, b),
          stroke: 'their',
          strokeWidth: pen.line(1.8),
          dash: [pen.px(3), pen.px(4)],
        },
        { kind: 'path', d: gate, stroke: 'floor', strokeWidth: pen.line(2.6) + pen.px(5) },
        { kind: 'path', d: gate, stroke: 'their', strokeWidth: pen.line(2.6) },
      ],
    },
    box: { x: middle.x - reach, y: middle.y - reach, width: 2 * reach, height: 2 * reach },
    line: alongLine(a, b, pen.px(3)),
  }
}

/** Small boxes that follow a line from end to end. */
function alongLine(a: Point, b: Point, half: number): Box[] {
  const count = Math.max(1, Math.ceil(Math.hypot(b.x - a.x, b.y - a.y) / (4 * half)))
  return Array.from({ length: count + 1 }, (_, i) => ({
    x: a.x + ((b.x - a.x) * i) / count - half,
    y: a.y + ((b.y - a.y) * i) / count - half,
    width: 2 * half,
    height: 2 * half,
  }))
}

/** Where the room lies that a press leaves; fractions, for the ball on the right. */
const ROOMS: Record<Lane, { x0: number; x1: number; y0: number; y1: number }> = {
  middle: { x0: 0.255, x1: 0.395, y0: 0.335, y1: 0.665 },
  sideline: { x0: 0.23, x1: 0.45, y0: 0.76, y1: 0.97 },
  long: { x0: 0.66, x1: 0.84, y0: 0.33, y1: 0.67 },
  'pass-back': { x0: 0.02, x1: 0.15, y0: 0.35, y1: 0.65 },
  'far-side': { x0: 0.2, x1: 0.42, y0: 0.04, y1: 0.29 },
}

/** The box of the room, metres. */
export function roomBox(pack: RulePack, lane: Lane, side: BallSide): Box {
  const room = ROOMS[lane]
  const a = toMetres(pack, onSide(room.x0, room.y0, side))
  const b = toMetres(pack, onSide(room.x1, room.y1, side))
  return { x: a.x, y: Math.min(a.y, b.y), width: b.x - a.x, height: Math.abs(b.y - a.y) }
}

/** Room: our ink, a 9 in 100 wash, corners of 1 m, never hatched. */
export function roomNode(box: Box, pen: Pen, label: string): GroupNode {
  return {
    kind: 'group',
    id: 'room',
    label,
    nodes: [
      {
        kind: 'path',
        d: roundBoxD(box, 1),
        fill: 'our',
        fillOpacity: 0.09,
        stroke: 'our',
        strokeWidth: pen.px(1.6),
      },
    ],
  }
}

export const middleOf = (box: Box): Point => ({ x: box.x + box.width / 2, y: box.y + box.height / 2 })
