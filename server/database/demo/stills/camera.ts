/** A point in the hall, metres: x up court from the endline, y across from the left sideline, z up. */
export type Vec = readonly [x: number, y: number, z: number]
export interface Pixel {
  x: number
  y: number
  /** Pixels to a metre at that distance. */
  scale: number
}

const NEAR = 0.6
const minus = (a: Vec, b: Vec): Vec => [a[0] - b[0], a[1] - b[1], a[2] - b[2]]
const dot = (a: Vec, b: Vec) => a[0] * b[0] + a[1] * b[1] + a[2] * b[2]
const cross = (a: Vec, b: Vec): Vec => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
]
const unit = (a: Vec): Vec => {
  const length = Math.hypot(...a)
  return [a[0] / length, a[1] / length, a[2] / length]
}

/** A pinhole camera; the hall's axes are left-handed, so that right in the picture is up cross forward. */
export interface Camera {
  /** Null behind the camera. */
  see(point: Vec): Pixel | null
  /** SVG points of a flat outline, cut off where it comes too near; empty when nothing of it is in front. */
  outline(points: readonly Vec[]): string
}

/**
 * @param lens focal length as a multiple of the picture's width
 */
export function cameraAt(from: Vec, to: Vec, lens: number, width: number, height: number): Camera {
  const forward = unit(minus(to, from))
  const right = unit(cross([0, 0, 1], forward))
  const up = cross(forward, right)
  const depth = (p: Vec) => dot(minus(p, from), forward)
  const see = (p: Vec): Pixel | null => {
    const far = depth(p)
    if (far < NEAR * 0.99) return null
    const scale = (lens * width) / far
    const away = minus(p, from)
    return { x: width / 2 + dot(away, right) * scale, y: height / 2 - dot(away, up) * scale, scale }
  }
  const outline = (points: readonly Vec[]): string => {
    const kept: Vec[] = []
    points.forEach((here, i) => {
      const next = points[(i + 1) % points.length] ?? here
      const [a, b] = [depth(here), depth(next)]
      if (a >= NEAR) kept.push(here)
      if (a < NEAR !== b < NEAR) {
        const t = (NEAR - a) / (b - a)
        kept.push([
          here[0] + (next[0] - here[0]) * t,
          here[1] + (next[1] - here[1]) * t,
          here[2] + (next[2] - here[2]) * t,
        ])
      }
    })
    return kept
      .map(see)
      .filter((pixel) => pixel !== null)
      .map(({ x, y }) => `${x.toFixed(1)},${y.toFixed(1)}`)
      .join(' ')
  }
  return { see, outline }
}
