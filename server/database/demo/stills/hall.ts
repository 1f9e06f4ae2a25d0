import type { Random } from '../random'
import type { Camera, Vec } from './camera'

/** Metres: FIBA floor and its markings. */
const LENGTH = 28
const WIDTH = 15
const LANE = { half: 2.45, deep: 5.8 }
const ARC = { radius: 6.75, basket: 1.575, corner: 0.9 }
const LINE = 0.06

const grey = (value: number) => {
  const level = Math.round(Math.max(0, Math.min(255, value)))
  return `rgb(${level},${level},${level})`
}
const flat = (camera: Camera, points: readonly Vec[], fill: string, more = '') => {
  const outline = camera.outline(points)
  return outline ? `<polygon points="${outline}" fill="${fill}" ${more}/>` : ''
}

/** A painted line along a way on the floor, as wide as on a real one. */
function painted(camera: Camera, way: readonly (readonly [number, number])[], ink: string): string {
  let out = ''
  for (let i = 1; i < way.length; i += 1) {
    const [a, b] = [way[i - 1], way[i]]
    if (!a || !b) continue
    const length = Math.hypot(b[0] - a[0], b[1] - a[1]) || 1
    const [nx, ny] = [(-(b[1] - a[1]) / length) * LINE, ((b[0] - a[0]) / length) * LINE]
    out += flat(
      camera,
      [
        [a[0] + nx, a[1] + ny, 0],
        [b[0] + nx, b[1] + ny, 0],
        [b[0] - nx, b[1] - ny, 0],
        [a[0] - nx, a[1] - ny, 0],
      ],
      ink,
    )
  }
  return out
}

export function arc(cx: number, cy: number, radius: number, from: number, to: number, pieces = 48) {
  return Array.from({ length: pieces + 1 }, (_, i): readonly [number, number] => {
    const angle = from + ((to - from) * i) / pieces
    return [cx + Math.cos(angle) * radius, cy + Math.sin(angle) * radius]
  })
}

/** Floor, markings and the far basket end. */
export function floor(camera: Camera): string {
  const rect = (x0: number, x1: number, y0: number, y1: number): Vec[] => [
    [x0, y0, 0],
    [x1, y0, 0],
    [x1, y1, 0],
    [x0, y1, 0],
  ]
  const mid = WIDTH / 2
  let out = flat(camera, rect(-4.6, 40, -2.2, 40), grey(126))
  out += flat(camera, rect(0, LENGTH, 0, WIDTH), 'url(#floor)')
  for (let y = 0.5; y < WIDTH; y += 0.5)
    out += flat(camera, rect(0, LENGTH, y, y + 0.02), grey(120), 'opacity=".35"')
  for (const end of [0, 1]) {
    const at = (x: number) => (end ? LENGTH - x : x)
    out += flat(
      camera,
      rect(at(0), at(LANE.deep), mid - LANE.half, mid + LANE.half),
      grey(128),
      'opacity=".6"',
    )
  }
  const ink = grey(222)
  const box = (x0: number, x1: number, y0: number, y1: number): [number, number][] => [
    [x0, y0],
    [x1, y0],
    [x1, y1],
    [x0, y1],
    [x0, y0],
  ]
  out += painted(camera, box(0, LENGTH, 0, WIDTH), ink)
  out += painted(
    camera,
    [
      [LENGTH / 2, 0],
      [LENGTH / 2, WIDTH],
    ],
    ink,
  )
  out += painted(camera, arc(LENGTH / 2, mid, 1.8, 0, Math.PI * 2), ink)
  const half = Math.asin((mid - ARC.corner) / ARC.radius)
  for (const end of [0, 1]) {
    const at = (x: number) => (end ? LENGTH - x : x)
    const turn = (way: (readonly [number, number])[]) => way.map(([x, y]): [number, number] => [at(x), y])
    out += painted(camera, turn(box(0, LANE.deep, mid - LANE.half, mid + LANE.half)), ink)
    out += painted(camera, turn(arc(LANE.deep, mid, 1.8, -Math.PI / 2, Math.PI / 2)), ink)
    const curve = arc(ARC.basket, mid, ARC.radius, -half, half)
    out += painted(camera, turn([[0, ARC.corner], ...curve, [0, WIDTH - ARC.corner]]), ink)
  }
  return out
}

/** Board, ring, net and post of the end that the ball is thrown in at. */
export function basket(camera: Camera): string {
  const mid = WIDTH / 2
  const quad = (x: number, y0: number, y1: number, z0: number, z1: number): Vec[] => [
    [x, y0, z0],
    [x, y1, z0],
    [x, y1, z1],
    [x, y0, z1],
  ]
  let out = flat(camera, quad(-1.6, mid - 0.25, mid + 0.25, 0, 2.2), grey(46))
  out += flat(
    camera,
    [
      [-1.6, mid - 0.1, 2],
      [-1.6, mid + 0.1, 2],
      [1.2, mid + 0.1, 3.2],
      [1.2, mid - 0.1, 3.2],
    ],
    grey(58),
  )
  out += flat(
    camera,
    quad(1.2, mid - 0.9, mid + 0.9, 2.9, 3.95),
    grey(206),
    `stroke="${grey(70)}" stroke-width="3" opacity=".9"`,
  )
  out += flat(
    camera,
    quad(1.21, mid - 0.3, mid + 0.3, 3.05, 3.5),
    'none',
    `stroke="${grey(90)}" stroke-width="3"`,
  )
  const ring = arc(1.6, mid, 0.23, 0, Math.PI * 2, 20)
  for (const [radius, z, opacity] of [
    [0.2, 2.95, 0.5],
    [0.17, 2.8, 0.45],
    [0.13, 2.66, 0.4],
  ] as const)
    out += flat(
      camera,
      arc(1.6, mid, radius, 0, Math.PI * 2, 16).map(([x, y]): Vec => [x, y, z]),
      'none',
      `stroke="${grey(235)}" stroke-width="2" opacity="${opacity}"`,
    )
  return (
    out +
    flat(
      camera,
      ring.map(([x, y]): Vec => [x, y, 3.05]),
      'none',
      `stroke="${grey(90)}" stroke-width="4"`,
    )
  )
}

/** Rows of people in the dark behind the far sideline and the endline, and the boards in front of them. */
export function crowd(camera: Camera, random: Random): string {
  let out = ''
  const seat = (point: Vec) => {
    const pixel = camera.see(point)
    if (!pixel || random.next() < 0.12) return
    const tone = grey(random.between(26, 78))
    const skin = grey(random.between(50, 128))
    const w = pixel.scale * 0.24
    out += `<ellipse cx="${pixel.x.toFixed(1)}" cy="${(pixel.y + w * 1.6).toFixed(1)}" rx="${w.toFixed(1)}" ry="${(w * 1.25).toFixed(1)}" fill="${tone}"/>`
    out += `<circle cx="${pixel.x.toFixed(1)}" cy="${pixel.y.toFixed(1)}" r="${(w * 0.46).toFixed(1)}" fill="${skin}"/>`
  }
  for (let row = 9; row >= 0; row -= 1) {
    for (let x = -16; x < 46; x += 0.62)
      seat([
        x + random.between(-0.14, 0.14),
        -4.2 - row * 0.85,
        1.1 + row * 0.55 + random.between(-0.07, 0.07),
      ])
    for (let y = -4; y < 24; y += 0.62)
      seat([
        -6.2 - row * 0.85,
        y + random.between(-0.14, 0.14),
        1.1 + row * 0.55 + random.between(-0.07, 0.07),
      ])
  }
  return out
}

export function boards(camera: Camera): string {
  const wall = (
    a: readonly [number, number],
    b: readonly [number, number],
    fill: string,
    z0: number,
    z1: number,
  ) =>
    flat(
      camera,
      [
        [a[0], a[1], z0],
        [b[0], b[1], z0],
        [b[0], b[1], z1],
        [a[0], a[1], z1],
      ],
      fill,
    )
  let out = ''
  for (let x = -5; x < 36; x += 3)
    out += wall([x, -2.2], [x + 2.92, -2.2], grey((x + 5) % 9 === 0 ? 62 : 44), 0, 0.85)
  for (let y = -2; y < 24; y += 3)
    out += wall([-4.6, y], [-4.6, y + 2.92], grey((y + 2) % 9 === 0 ? 58 : 40), 0, 0.85)
  return out
}
