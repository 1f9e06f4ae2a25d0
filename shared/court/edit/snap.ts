import type { Place } from '../diagram'
import { toMetres, type InFractions } from '../frame'
import { placeWords } from '../placeWords'
import type { RulePack } from '../rulePacks'
import { heldPlace } from './bounds'

/** Metres from a spot, and from a line, at which a hand is drawn to it. */
const SPOT_REACH = 0.6
const LINE_REACH = 0.35

const ELBOW = { x: 0.207, y: 0.337 }
const BLOCK = { x: 0.08, y: 0.337 }
const CORNER = { x: 0.045, y: 0.06 }

/** The trade's spots at both ends and on both sides. */
export const SPOTS: readonly Place[] = [ELBOW, BLOCK, CORNER].flatMap(({ x, y }) =>
  [x, 1 - x].flatMap((endX) => [y, 1 - y].map((sideY) => heldPlace({ x: endX, y: sideY }))),
)

interface Line {
  /** The coordinate that the line holds, and its value. */
  axis: 'x' | 'y'
  value: number
  words: (place: InFractions) => string
  /** Where along the court the line is. */
  holds?: (place: InFractions) => boolean
}

const sideOf = ({ y }: InFractions): string => (y < 0.5 ? 'left' : 'right')
const inCourt = ({ x }: InFractions): boolean => x >= 0 && x <= 1
const byBasket = ({ x }: InFractions): boolean => inCourt({ x, y: 0 }) && (x < ELBOW.x || x > 1 - ELBOW.x)

const LINES: readonly Line[] = [
  { axis: 'x', value: 0.5, words: () => 'half court' },
  { axis: 'x', value: ELBOW.x, words: () => 'the free-throw line extended' },
  { axis: 'x', value: 1 - ELBOW.x, words: () => 'their free-throw line extended' },
  { axis: 'x', value: -0.03, words: () => 'behind the endline' },
  { axis: 'y', value: 0.04, words: (at) => `the ${sideOf(at)} sideline`, holds: inCourt },
  { axis: 'y', value: 0.96, words: (at) => `the ${sideOf(at)} sideline`, holds: inCourt },
  { axis: 'y', value: ELBOW.y, words: (at) => `the ${sideOf(at)} edge of the lane`, holds: byBasket },
  { axis: 'y', value: 1 - ELBOW.y, words: (at) => `the ${sideOf(at)} edge of the lane`, holds: byBasket },
]

export interface Snapped {
  place: Place
  /** The spot or line it was drawn to; null where the hand let go in the open. */
  spot: string | null
}

/** A place drawn to the nearest spot, or else to the lines near it, as the trade names them. */
export function snapped(place: InFractions, pack: RulePack): Snapped {
  const held = heldPlace(place)
  const near = SPOTS.map((spot) => ({ spot, metres: metresBetween(pack, spot, held) }))
    .filter(({ metres }) => metres <= SPOT_REACH)
    .sort((a, b) => a.metres - b.metres)[0]
  if (near) return { place: near.spot, spot: placeWords(near.spot) }
  let found = held
  const words: string[] = []
  for (const line of LINES) {
    const on = heldPlace({ ...found, [line.axis]: line.value })
    if (metresBetween(pack, on, held) > LINE_REACH || line.holds?.(found) === false) continue
    found = on
    words.push(line.words(on))
  }
  return { place: found, spot: words.length > 0 ? words.join(', ') : null }
}

export function metresBetween(pack: RulePack, one: InFractions, other: InFractions): number {
  const [a, b] = [toMetres(pack, one), toMetres(pack, other)]
  return Math.hypot(a.x - b.x, a.y - b.y)
}
