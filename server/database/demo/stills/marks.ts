import { mendRegion, mendRing, type MarkPoint, type StillMarks } from '@shared/stills/marks'
import { seeded } from '../random'
import type { Camera } from './camera'
import { cameraOf, HEIGHT, metres, WIDTH, type Place, type StillSpec } from './render'

/** Metres: of the ring round two pairs of feet, of the room round a free player, of a ball held and caught. */
const RING = 1.15
const ROOM = 1.5
const TALL = 2
const HELD = 1.75
const CAUGHT = 1.25
/** A pass from outside begins this far inside the picture, as a fraction of it. */
const EDGE = 0.02

const part = (value: number) => Math.round(value * 1e4) / 1e4

/** A place on the floor, or over it, as fractions of the picture; null behind the camera. */
function seen(camera: Camera, x: number, y: number, z: number): MarkPoint | null {
  const pixel = camera.see([x, y, z])
  return pixel && { x: part(pixel.x / WIDTH), y: part(pixel.y / HEIGHT) }
}

const isIn = ({ x, y }: MarkPoint, edge: number) => x > edge && x < 1 - edge && y > edge && y < 1 - edge

function boxOf(points: (MarkPoint | null)[]) {
  const all = points.filter((point) => point !== null)
  const [xs, ys] = [all.map(({ x }) => x), all.map(({ y }) => y)]
  const [left, right] = [Math.max(0, Math.min(...xs)), Math.min(1, Math.max(...xs))]
  const [top, bottom] = [Math.max(0, Math.min(...ys)), Math.min(1, Math.max(...ys))]
  return {
    x: part(left),
    y: part(top),
    w: Math.floor((right - left) * 1e4) / 1e4,
    h: Math.floor((bottom - top) * 1e4) / 1e4,
  }
}

const corners = (x: number, y: number, half: number): [number, number][] => [
  [x - half, y - half],
  [x + half, y - half],
  [x + half, y + half],
  [x - half, y + half],
]

function ringOn(camera: Camera, place: Place | null): StillMarks['ring'] {
  if (!place) return null
  const { x, y } = metres(place)
  const middle = seen(camera, x, y, 0)
  if (!middle || !isIn(middle, 0.03)) return null
  const { w, h } = boxOf([
    seen(camera, x - RING, y, 0),
    seen(camera, x + RING, y, 0),
    seen(camera, x, y - RING, 0),
    seen(camera, x, y + RING, 0),
  ])
  return mendRing({ ...middle, rx: part(w / 2), ry: part(h / 2) })
}

function shadeOn(camera: Camera, place: Place | null): StillMarks['shade'] {
  if (!place) return null
  const { x, y } = metres(place)
  const middle = seen(camera, x, y, TALL / 2)
  if (!middle || !isIn(middle, 0.06)) return null
  return mendRegion(
    boxOf(corners(x, y, ROOM).flatMap(([a, b]) => [seen(camera, a, b, 0), seen(camera, a, b, TALL)])),
  )
}

/** Where the way from a place outside the picture comes into it. */
function cutOff(from: MarkPoint, to: MarkPoint): MarkPoint {
  const share = Math.max(
    0,
    ...(['x', 'y'] as const).map((axis) => {
      const edge = Math.min(1 - EDGE, Math.max(EDGE, from[axis]))
      return edge === from[axis] ? 0 : (edge - from[axis]) / (to[axis] - from[axis])
    }),
  )
  return { x: part(from.x + (to.x - from.x) * share), y: part(from.y + (to.y - from.y) * share) }
}

function passOn(camera: Camera, pass: StillSpec['pass']): StillMarks['pass'] {
  if (!pass) return null
  const [a, b] = [metres(pass.from), metres(pass.to)]
  const from = seen(camera, a.x, a.y, HELD)
  const to = seen(camera, b.x, b.y, CAUGHT)
  return from && to && isIn(to, 0.03) ? { from: cutOff(from, to), to } : null
}

/** The marks of an invented still, where its camera sees their places; what lies outside the picture is not marked. */
export function marksOn(spec: StillSpec): StillMarks {
  const camera = cameraOf(spec, seeded(spec.seed))
  return {
    version: 1,
    ring: ringOn(camera, spec.ring),
    shade: shadeOn(camera, spec.room),
    pass: passOn(camera, spec.pass),
  }
}
