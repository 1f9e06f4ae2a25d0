import type { Random } from '../random'
import type { Camera } from './camera'

export type Kit = 'dark' | 'white'
export type Pose = 'arms-up' | 'arms-wide' | 'ready' | 'run' | 'hold' | 'hold-high' | 'call'

type Joint = readonly [across: number, up: number]
/** Shares of body height; across is to the right in the picture, feet at 0. */
interface Skeleton {
  hip: Joint
  shoulders: Joint
  head: Joint
  hands: readonly [elbowL: Joint, handL: Joint, elbowR: Joint, handR: Joint]
  legs: readonly [kneeL: Joint, footL: Joint, kneeR: Joint, footR: Joint]
  ball?: Joint
}

const STAND: Skeleton['legs'] = [
  [-0.11, 0.26],
  [-0.14, 0.015],
  [0.11, 0.26],
  [0.14, 0.015],
]
const POSES: Record<Pose, Skeleton> = {
  'arms-up': {
    hip: [0, 0.47],
    shoulders: [0, 0.75],
    head: [0, 0.875],
    hands: [
      [-0.2, 0.9],
      [-0.17, 1.1],
      [0.19, 0.91],
      [0.21, 1.12],
    ],
    legs: STAND,
  },
  'arms-wide': {
    hip: [0, 0.43],
    shoulders: [0.01, 0.7],
    head: [0.02, 0.82],
    hands: [
      [-0.22, 0.62],
      [-0.4, 0.68],
      [0.24, 0.63],
      [0.42, 0.7],
    ],
    legs: [
      [-0.17, 0.24],
      [-0.2, 0.015],
      [0.17, 0.24],
      [0.21, 0.015],
    ],
  },
  ready: {
    hip: [0, 0.42],
    shoulders: [0.02, 0.69],
    head: [0.05, 0.81],
    hands: [
      [-0.15, 0.55],
      [-0.1, 0.44],
      [0.19, 0.56],
      [0.24, 0.46],
    ],
    legs: [
      [-0.15, 0.23],
      [-0.17, 0.015],
      [0.15, 0.23],
      [0.17, 0.015],
    ],
  },
  run: {
    hip: [0, 0.47],
    shoulders: [0.05, 0.75],
    head: [0.09, 0.875],
    hands: [
      [-0.1, 0.58],
      [-0.02, 0.47],
      [0.18, 0.6],
      [0.24, 0.72],
    ],
    legs: [
      [-0.05, 0.25],
      [-0.25, 0.14],
      [0.14, 0.29],
      [0.17, 0.02],
    ],
  },
  hold: {
    hip: [0, 0.45],
    shoulders: [-0.01, 0.72],
    head: [-0.02, 0.84],
    hands: [
      [-0.16, 0.58],
      [-0.03, 0.62],
      [0.15, 0.58],
      [0.06, 0.62],
    ],
    legs: [
      [-0.13, 0.25],
      [-0.17, 0.015],
      [0.13, 0.25],
      [0.18, 0.015],
    ],
    ball: [0.015, 0.635],
  },
  'hold-high': {
    hip: [0, 0.46],
    shoulders: [0, 0.74],
    head: [0, 0.86],
    hands: [
      [-0.17, 0.88],
      [-0.05, 1.01],
      [0.17, 0.88],
      [0.07, 1.01],
    ],
    legs: [
      [-0.11, 0.26],
      [-0.15, 0.015],
      [0.12, 0.26],
      [0.16, 0.015],
    ],
    ball: [0.01, 1.035],
  },
  call: {
    hip: [0, 0.46],
    shoulders: [0, 0.73],
    head: [0.01, 0.85],
    hands: [
      [-0.16, 0.56],
      [-0.13, 0.44],
      [0.15, 0.9],
      [0.13, 1.08],
    ],
    legs: [
      [-0.12, 0.25],
      [-0.16, 0.015],
      [0.12, 0.25],
      [0.17, 0.015],
    ],
  },
}

const KIT: Record<Kit, { shirt: string; shade: string; shorts: string }> = {
  dark: { shirt: '#303033', shade: '#1d1d20', shorts: '#27272a' },
  white: { shirt: '#e9e7e1', shade: '#bdbbb4', shorts: '#d6d4cd' },
}
/** A thin dark edge keeps limbs off the floor. */
const EDGE = 'rgba(24,24,25,.65)'
/** Girls of sixteen, metres. */
const TALL = [1.66, 1.86] as const

/** One player without a face: a shadow, limbs, a shirt; drawn at her size for where she stands. */
export function figure(
  camera: Camera,
  at: { x: number; y: number },
  kit: Kit,
  pose: Pose,
  random: Random,
): string {
  const feet = camera.see([at.x, at.y, 0])
  if (!feet) return ''
  const tall = random.between(TALL[0], TALL[1])
  const size = feet.scale * tall
  const flip = random.next() < 0.5 ? -1 : 1
  const skin = `hsl(0,0%,${Math.round(random.between(20, 44))}%)`
  const hair = `hsl(0,0%,${Math.round(random.between(7, 17))}%)`
  const { shirt, shade, shorts } = KIT[kit]
  const bones = POSES[pose]
  const lean = random.between(-0.07, 0.07)
  const turned = random.between(0.78, 1.02)
  const px = ([a, b]: Joint): [number, number] => [
    feet.x + (a * flip * turned + lean * b) * size,
    feet.y - b * size,
  ]
  const n = (value: number) => value.toFixed(1)
  const limb = (joints: Joint[], wide: number, ink: string) => {
    const way = joints.map(px).map(([x, y]) => `${n(x)} ${n(y)}`)
    const path = (pen: string, width: number) =>
      `<path d="M${way.join('L')}" fill="none" stroke="${pen}" stroke-width="${n(width * size)}" stroke-linecap="round" stroke-linejoin="round"/>`
    return path(EDGE, wide + 0.01) + path(ink, wide)
  }
  const beside = ([a, b]: Joint, across: number): Joint => [a + across, b]
  const { hip, shoulders, head, hands, legs } = bones
  const [kneeL, footL, kneeR, footR] = legs
  const [hipL, hipR] = [beside(hip, -0.055), beside(hip, 0.055)]
  const [armL, armR] = [beside(shoulders, -0.095), beside(shoulders, 0.095)]
  const shoe = (foot: Joint) => {
    const [x, y] = px(foot)
    return `<ellipse cx="${n(x + 0.012 * flip * size)}" cy="${n(y)}" rx="${n(0.05 * size)}" ry="${n(0.022 * size)}" fill="#1b1b1d"/>`
  }
  const corner = (points: Joint[], fill: string) =>
    `<path d="M${points
      .map(px)
      .map(([x, y]) => `${n(x)} ${n(y)}`)
      .join(
        'L',
      )}Z" fill="${fill}" stroke="${fill}" stroke-width="${n(0.03 * size)}" stroke-linejoin="round"/>`

  let out = `<ellipse cx="${n(feet.x)}" cy="${n(feet.y)}" rx="${n(0.24 * size)}" ry="${n(0.055 * size)}" fill="#000" opacity=".34"/>`
  out += limb([hipL, kneeL, footL], 0.066, skin) + limb([hipR, kneeR, footR], 0.066, skin)
  out += limb([beside(footL, 0), [footL[0], footL[1] + 0.07]], 0.056, '#d9d7d0')
  out += limb([beside(footR, 0), [footR[0], footR[1] + 0.07]], 0.056, '#d9d7d0')
  out += shoe(footL) + shoe(footR)
  const half = (from: Joint, to: Joint): Joint => [
    from[0] + (to[0] - from[0]) * 0.72,
    from[1] + (to[1] - from[1]) * 0.72,
  ]
  out += limb([hipL, half(hipL, kneeL)], 0.115, shorts) + limb([hipR, half(hipR, kneeR)], 0.115, shorts)
  const [elbowL, handL, elbowR, handR] = hands
  const front = pose === 'hold' || pose === 'hold-high'
  const arms = limb([armL, elbowL, handL], 0.05, skin) + limb([armR, elbowR, handR], 0.05, skin)
  if (!front) out += arms
  out += corner([armL, armR, beside(hip, 0.075), beside(hip, -0.075)], shirt)
  out += corner([beside(shoulders, 0.045), armR, beside(hip, 0.075), beside(hip, 0.04)], shade)
  out += limb([[shoulders[0], shoulders[1] + 0.015], head], 0.05, skin)
  const [hx, hy] = px(head)
  out += `<ellipse cx="${n(hx)}" cy="${n(hy)}" rx="${n(0.056 * size)}" ry="${n(0.07 * size)}" fill="${skin}"/>`
  out += `<path d="M${n(hx - 0.054 * size)} ${n(hy + 0.012 * size)}A${n(0.054 * size)} ${n(0.07 * size)} 0 0 1 ${n(hx + 0.054 * size)} ${n(hy - 0.006 * size)}Q${n(hx)} ${n(hy - 0.03 * size)} ${n(hx - 0.054 * size)} ${n(hy + 0.012 * size)}Z" fill="${hair}"/>`
  out += `<circle cx="${n(hx - 0.055 * flip * size)}" cy="${n(hy - 0.025 * size)}" r="${n(0.024 * size)}" fill="${hair}"/>`
  if (front) out += arms
  if (bones.ball) out += ball(px(bones.ball), size)
  return out
}

function ball([x, y]: [number, number], size: number): string {
  const r = 0.068 * size
  const seam = `fill="none" stroke="#3a3a3a" stroke-width="${(r * 0.12).toFixed(1)}"`
  return (
    `<circle cx="${x.toFixed(1)}" cy="${y.toFixed(1)}" r="${r.toFixed(1)}" fill="#8d8d8d" stroke="#2a2a2a" stroke-width="${(r * 0.1).toFixed(1)}"/>` +
    `<path d="M${(x - r).toFixed(1)} ${y.toFixed(1)}Q${x.toFixed(1)} ${(y + r * 0.5).toFixed(1)} ${(x + r).toFixed(1)} ${y.toFixed(1)}" ${seam}/>` +
    `<path d="M${x.toFixed(1)} ${(y - r).toFixed(1)}Q${(x + r * 0.4).toFixed(1)} ${y.toFixed(1)} ${x.toFixed(1)} ${(y + r).toFixed(1)}" ${seam}/>`
  )
}
