import { spotLabel } from '../tendencies/habits'
import type { Lane, Pickup } from '../vocabulary'
import { toMetres } from './frame'
import { hatchD, hatchOf, hatchStep } from './hatch'
import { boxD, lineD, polygonD, roundBoxD, type Box } from './path'
import { penOf, type Pen } from './pen'
import { pickupX, roomBox } from './pressMarks'
import type { Counted } from './pressOptions'
import { pressSentence } from './pressWords'
import type { RulePack } from './rulePacks'
import type { GroupNode, Ink, Scene, SceneNode, TextNode } from './scene'
import { CAP_HEIGHT, textWidth } from './textWidth'
import { zoneBox, type TrapZone } from './trapZones'

export interface StripOptions {
  pack: RulePack
  /** Default 14.8, so that a 28 m court is 414 px wide. */
  pxPerMetre?: number
  /** Default 64. */
  heightPx?: number
  zones: readonly TrapZone[]
  pickup?: (Counted & { at: Pickup | number }) | null
  room?: (Counted & { lane: Lane }) | null
  /** Said across the lanes when nothing has been counted. */
  nothing?: string
}

/** px. */
const TYPE = 12.5
const LANE_HEIGHT = 17
const ROOM_RADIUS = 8

/**
 * One opponent's press flattened onto the court's x axis, for a row of a list: top lane the left side, then
 * the middle, then the right side. All rows share the axis. It is not a court, so no marking is stretched.
 */
export function stripScene(options: StripOptions): Scene {
  const { pack } = options
  const pen = penOf(options.pxPerMetre ?? 14.8)
  const height = pen.px(options.heightPx ?? 64)
  const width = pack.court.length
  const lanes = [0.22, 0.5, 0.78].map((share) => height * share)
  const empty = options.nothing !== undefined
  const zones = empty ? [] : options.zones
  const nodes: SceneNode[] = [
    ground(pack, height, lanes, pen),
    { kind: 'group', id: 'trap-zones', nodes: zones.flatMap((zone) => stripZone(zone, options, lanes, pen)) },
  ]
  if (!empty && options.pickup) nodes.push(front(options.pickup, zones, pack, lanes, height, pen))
  if (!empty && options.room) nodes.push(room(options.room, pack, lanes[1] ?? 0, pen))
  if (options.nothing !== undefined)
    nodes.push(
      text(options.nothing, pen.px(21), height / 2, pen.px(13.5), 'graphite-2', 'start', 500, pen.px(12)),
    )
  return {
    view: { x: 0, y: 0, width, height },
    nodes,
    description: options.nothing ?? pressSentence(options),
  }
}

function ground(pack: RulePack, height: number, lanes: readonly number[], pen: Pen): GroupNode {
  const { length } = pack.court
  const upright = (x: number, weight: number, ink: Ink): SceneNode => ({
    kind: 'path',
    d: lineD({ x, y: 0 }, { x, y: height }),
    stroke: ink,
    strokeWidth: pen.px(weight),
  })
  // Lanes are parted by dots between them, not through them.
  const parted = [0, 1].map((i) => ((lanes[i] ?? 0) + (lanes[i + 1] ?? 0)) / 2)
  return {
    kind: 'group',
    id: 'strip',
    nodes: [
      { kind: 'path', d: boxD({ x: 0, y: 0, width: length, height }), fill: 'floor' },
      {
        kind: 'path',
        d: parted.map((y) => lineD({ x: 0, y }, { x: length, y })).join(''),
        stroke: 'court-line',
        strokeWidth: pen.px(1),
        dash: [pen.px(1.2), pen.px(5)],
      },
      upright(pack.freeThrowLine, 1, 'court-line'),
      upright(length - pack.freeThrowLine, 1, 'court-line'),
      upright(0, 2, 'court-line'),
      upright(length, 2, 'court-line'),
      upright(length / 2, 2.6, 'graphite'),
    ],
  }
}

function laneBox(x0: number, x1: number, middle: number, pen: Pen): Box {
  const height = pen.px(LANE_HEIGHT)
  return { x: x0, y: middle - height / 2, width: x1 - x0, height }
}

const laneOf = (zone: TrapZone): number => (zone.side === 'left' ? 0 : zone.side === 'right' ? 2 : 1)

function stripZone(
  zone: TrapZone,
  { pack, zones }: StripOptions,
  lanes: readonly number[],
  pen: Pen,
): GroupNode[] {
  const place = zoneBox(pack, zone, pen)
  if (!place) return []
  const box = laneBox(place.x, place.x + place.width, lanes[laneOf(zone)] ?? 0, pen)
  const hatch = hatchOf('small', zone.thin ? 1 : hatchStep(zone.k, zone.n))
  const words = `${zone.k} of ${zone.n}`
  const size = pen.px(TYPE)
  // A count never lies on the half-court line, which runs through every row.
  const half = pack.court.length / 2
  const past = box.x + box.width
  const after = (past < half && half - past < pen.px(8) ? half : past) + pen.px(5)
  const end = after + textWidth(words, size, 'count')
  const next = zones.some((other) => {
    const there = other !== zone && laneOf(other) === laneOf(zone) ? zoneBox(pack, other, pen) : null
    return there !== null && there.x < end && there.x + there.width > after
  })
  // Hemmed in by its neighbour or the endline, the count stands on its own hatch.
  const inside = next || end > pack.court.length
  const middle = box.y + box.height / 2
  return [
    {
      kind: 'group',
      id: `strip-${zone.spot}-${zone.side}`,
      label: `${spotLabel(zone.spot, zone.side)}: ${words}${zone.thin ? ', thin' : ''}`,
      nodes: [
        { kind: 'path', d: hatchD(box, pen.px(hatch.gap)), stroke: 'their', strokeWidth: pen.px(hatch.line) },
        {
          kind: 'path',
          d: boxD(box),
          stroke: 'their',
          strokeWidth: pen.px(1.3),
          ...(zone.thin ? { dash: [pen.px(5), pen.px(3)] } : {}),
        },
        inside
          ? text(words, box.x + box.width / 2, middle, size, 'their', 'middle', 600, pen.px(4))
          : text(words, after, middle, size, 'their', 'start', zone.thin ? 500 : 700, pen.px(4)),
      ],
    },
  ]
}

/** Middle lane only where the corners are traps, else all three. */
function front(
  pickup: Counted & { at: Pickup | number },
  zones: readonly TrapZone[],
  pack: RulePack,
  lanes: readonly number[],
  height: number,
  pen: Pen,
): GroupNode {
  const { x } = toMetres(pack, { x: pickupX(pickup.at), y: 0.5 })
  const crossed = zones.some((zone) => {
    const box = laneOf(zone) === 1 ? null : zoneBox(pack, zone, pen)
    return box !== null && box.x < x && box.x + box.width > x
  })
  const middle = lanes[1] ?? height / 2
  const reach = crossed ? pen.px(LANE_HEIGHT / 2) : height * 0.42
  const [half, deep] = [pen.px(5), pen.px(7)]
  const teeth = (crossed ? [middle] : lanes).map((y) =>
    polygonD({ x, y: y - half }, { x: x - deep, y }, { x, y: y + half }),
  )
  return {
    kind: 'group',
    id: 'strip-front',
    label: `pick up: ${pickup.k} of ${pickup.n}${pickup.thin ? ', thin' : ''}`,
    nodes: [
      {
        kind: 'path',
        d: lineD({ x, y: middle - reach }, { x, y: middle + reach }),
        stroke: 'their',
        strokeWidth: pen.px(2),
        ...(pickup.thin ? { dash: [pen.px(5), pen.px(3)] } : {}),
      },
      {
        kind: 'path',
        d: teeth.join(''),
        fill: pickup.thin ? 'floor' : 'their',
        stroke: 'their',
        strokeWidth: pen.px(1.2),
      },
    ],
  }
}

function room(one: Counted & { lane: Lane }, pack: RulePack, middle: number, pen: Pen): GroupNode {
  const place = roomBox(pack, one.lane, 'right')
  const box = laneBox(place.x, place.x + place.width, middle, pen)
  const words = `${one.k} of ${one.n}`
  return {
    kind: 'group',
    id: 'strip-room',
    label: `room: ${words}`,
    nodes: [
      { kind: 'path', d: roundBoxD(box, pen.px(ROOM_RADIUS)), fill: 'floor' },
      {
        kind: 'path',
        d: roundBoxD(box, pen.px(ROOM_RADIUS)),
        fill: 'our',
        fillOpacity: 0.09,
        stroke: 'our',
        strokeWidth: pen.px(1.6),
      },
      text(words, box.x + box.width / 2, middle, pen.px(TYPE), 'our', 'middle', 700),
    ],
  }
}

/** A line of type whose middle stands at y. */
function text(
  words: string,
  x: number,
  y: number,
  size: number,
  ink: Ink,
  anchor: TextNode['anchor'],
  weight: TextNode['weight'],
  halo = 0,
): TextNode {
  return {
    kind: 'text',
    x,
    y: y + (size * CAP_HEIGHT) / 2,
    text: words,
    size,
    cut: 'count',
    weight,
    anchor,
    ink,
    ...(halo > 0 ? { halo: { ink: 'floor', width: halo } } : {}),
  }
}
