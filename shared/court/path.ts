/** SVG path data from numbers in metres, rounded to a tenth of a millimetre. */
export interface Point {
  readonly x: number
  readonly y: number
}

export interface Box {
  readonly x: number
  readonly y: number
  readonly width: number
  readonly height: number
}

/** A number as path data: no exponent, no negative zero. */
export function n(value: number): string {
  const rounded = Math.round(value * 1e4) / 1e4
  return String(Math.abs(rounded) < 1e-4 ? 0 : rounded)
}

const at = (point: Point): string => `${n(point.x)} ${n(point.y)}`

export const lineD = (...points: readonly Point[]): string =>
  points.map((point, i) => `${i === 0 ? 'M' : 'L'}${at(point)}`).join('')

export const polygonD = (...points: readonly Point[]): string => `${lineD(...points)}Z`

export const boxD = ({ x, y, width, height }: Box): string =>
  `M${n(x)} ${n(y)}H${n(x + width)}V${n(y + height)}H${n(x)}Z`

export function circleD({ x, y }: Point, r: number): string {
  const arc = `A${n(r)} ${n(r)} 0 1 1`
  return `M${n(x - r)} ${n(y)}${arc} ${n(x + r)} ${n(y)}${arc} ${n(x - r)} ${n(y)}Z`
}

/** A box with round corners; the radius is cut to half the shorter side. */
export function roundBoxD({ x, y, width, height }: Box, radius: number): string {
  const r = Math.min(radius, width / 2, height / 2)
  const arc = (dx: number, dy: number) => `a${n(r)} ${n(r)} 0 0 1 ${n(dx)} ${n(dy)}`
  return (
    `M${n(x + r)} ${n(y)}h${n(width - 2 * r)}${arc(r, r)}v${n(height - 2 * r)}${arc(-r, r)}` +
    `h${n(2 * r - width)}${arc(-r, -r)}v${n(2 * r - height)}${arc(r, -r)}Z`
  )
}

export const overlaps = (a: Box, b: Box): boolean =>
  a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height

/** Whether the inner box lies wholly inside the outer one. */
export const inside = (inner: Box, outer: Box): boolean =>
  inner.x >= outer.x &&
  inner.y >= outer.y &&
  inner.x + inner.width <= outer.x + outer.width &&
  inner.y + inner.height <= outer.y + outer.height

export const grown = ({ x, y, width, height }: Box, by: number): Box => ({
  x: x - by,
  y: y - by,
  width: width + 2 * by,
  height: height + 2 * by,
})
