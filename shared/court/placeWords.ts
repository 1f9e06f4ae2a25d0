import type { InFractions } from './frame'
import { spotAt } from './trapSpots'

/** A place as a coach says it: "the left deep corner", "the middle", "the basket". */
export function placeWords(place: InFractions): string {
  const { x, y } = place
  const side = y < 0.5 ? 'left' : 'right'
  if (x < 0) return 'the endline'
  if (y < 0 || y > 1) return `the ${side} sideline`
  const { spot } = spotAt(place)
  switch (spot) {
    case 'coffin-corner':
      return `the ${side} deep corner`
    case 'early-sideline':
      return `the ${side} sideline`
    case 'short-of-half':
      return `the ${side} sideline short of half`
    case 'just-over-half':
      return `the ${side} sideline just over half`
    case 'front-wing':
      return `the ${side} front wing`
    case 'front-corner':
      return `the ${side} front corner`
    default:
      return betweenLanes(x, y, side)
  }
}

function betweenLanes(x: number, y: number, side: string): string {
  // By the baskets the lane's edges have names of their own, so the middle is narrower there.
  const aside = Math.abs(y - 0.5)
  const central = aside < (x < 0.26 || x > 0.74 ? 0.1 : 0.17)
  if (x > 0.86 && central) return 'the basket'
  if (x < 0.16) return central ? 'our own basket' : `the ${side} block`
  if (x < 0.26) return central ? 'our free-throw line' : `the ${side} elbow`
  if (x < 0.46) return central ? 'the middle' : `the ${side} lane`
  if (x < 0.54) return central ? 'the middle of half court' : `half court on the ${side}`
  if (x < 0.74) return central ? 'the front middle' : `the front ${side} lane`
  return central ? 'their free-throw line' : `the front ${side} elbow`
}
