import type { RulePack } from './rulePacks'

declare const space: unique symbol

/** A point on a real court: metres, x from the throw-in's endline, y from the left sideline facing up court. */
export interface InMetres {
  readonly x: number
  readonly y: number
  readonly [space]: 'metres'
}

/**
 * A place as it is stored: fractions of the landmark court (RECORD.md section 2). A plain {x, y} is one;
 * a point in metres is not, so the two cannot be mixed up.
 */
export interface InFractions {
  readonly x: number
  readonly y: number
  readonly [space]?: 'fractions'
}

/** Landmarks of the stored frame: endline, free-throw line, half and their mirrors; sidelines and lane edges. */
export const LANDMARKS_X = [0, 0.207, 0.5, 0.793, 1] as const
export const LANDMARKS_Y = [0, 0.337, 0.663, 1] as const

/** Says that x and y are metres; the one place where a bare pair becomes a point on the court. */
export const inMetres = (x: number, y: number): InMetres => ({ x, y }) as InMetres

/** A stored place on the court of a rule set. Off the court the outermost piece goes on at its own slope. */
export function toMetres(pack: RulePack, place: InFractions): InMetres {
  return inMetres(along(LANDMARKS_X, metresX(pack), place.x), along(LANDMARKS_Y, metresY(pack), place.y))
}

/** The stored place of a point on the court of a rule set; undoes toMetres. */
export function toPlace(pack: RulePack, point: InMetres): { x: number; y: number } {
  return { x: along(metresX(pack), LANDMARKS_X, point.x), y: along(metresY(pack), LANDMARKS_Y, point.y) }
}

/** The same place seen from the other side: left and right change, up court does not. */
export const mirrorPlace = (place: InFractions): { x: number; y: number } => ({ x: place.x, y: 1 - place.y })

/** The same point on the other side of the split line, metres. */
export const mirrorPoint = (pack: RulePack, point: InMetres): InMetres =>
  inMetres(point.x, pack.court.width - point.y)

function metresX(pack: RulePack): readonly number[] {
  const { length } = pack.court
  return [0, pack.freeThrowLine, length / 2, length - pack.freeThrowLine, length]
}

function metresY(pack: RulePack): readonly number[] {
  const { width } = pack.court
  return [0, (width - pack.laneWidth) / 2, (width + pack.laneWidth) / 2, width]
}

/** Piecewise linear from one row of knots to another of the same length; the end pieces run on. */
function along(from: readonly number[], to: readonly number[], value: number): number {
  const last = from.length - 2
  let piece = 0
  while (piece < last && value >= (from[piece + 1] ?? Infinity)) piece += 1
  const [a = 0, b = 1, c = 0, d = 1] = [from[piece], from[piece + 1], to[piece], to[piece + 1]]
  return c + ((value - a) * (d - c)) / (b - a)
}
