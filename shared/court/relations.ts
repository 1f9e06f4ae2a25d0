import type { RulePack } from './rulePacks'

/**
 * Where the three-point arc meets its straight line in the corner, in metres from the endline.
 * Pythagoras on the arc's radius and the line's distance from the middle of the court.
 */
export function arcMeetsLine(pack: RulePack): number {
  const { radius } = pack.threePoint
  const across = cornerOffset(pack)
  return pack.basket + Math.sqrt(Math.max(0, radius * radius - across * across))
}

/** Half the angle that the arc spans as seen from the basket, in degrees. */
export function arcHalfAngle(pack: RulePack): number {
  return (Math.atan2(cornerOffset(pack), arcMeetsLine(pack) - pack.basket) * 180) / Math.PI
}

/** Free-throw line to the centre of the basket, in metres. */
export const freeThrowToBasket = (pack: RulePack): number => pack.freeThrowLine - pack.basket

/** Free-throw line to the face of the board, in metres. */
export const freeThrowToBoard = (pack: RulePack): number => pack.freeThrowLine - pack.board.face

/** Corner to opposite corner, in metres. */
export const diagonal = (pack: RulePack): number => Math.hypot(pack.court.length, pack.court.width)

/** The corner line's distance from the middle of the court, in metres. */
function cornerOffset(pack: RulePack): number {
  return pack.court.width / 2 - pack.threePoint.cornerInset
}
