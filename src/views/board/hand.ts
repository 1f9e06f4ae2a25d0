import type { DefenderId, Diagram, Place } from '@shared/court/diagram'
import { stateAt } from '@shared/court/diagramWalk'
import { heldPlace } from '@shared/court/edit/bounds'
import type { Edit } from '@shared/court/edit/edits'
import { nearestOurs, pullBall, pullPlayer, type Station } from '@shared/court/edit/gestures'
import { snapped } from '@shared/court/edit/snap'
import { inMetres, toMetres, toPlace, type InMetres } from '@shared/court/frame'
import type { RulePack } from '@shared/court/rulePacks'
import type { Role } from '@shared/vocabulary'

/** What the hand has taken up. `again` is a player at the end of a walk, to walk on from there. */
export type Held =
  | { kind: 'player'; who: Role | DefenderId; again: boolean }
  | { kind: 'ball' }
  | { kind: 'aim'; index: number }
  | { kind: 'bend'; index: number }
  | { kind: 'word'; index: number }

/** Something in hand: where it was taken up, and where it is. */
export interface Hand {
  held: Held
  from: InMetres
  at: InMetres
  /** Where it would be let go: drawn to a spot where one is near. */
  place: Place
  /** The spot's name. */
  spot: string | null
  screen: boolean
  moved: boolean
}

/** Metres that a pointer has to go before it pulls. */
const SLIP = 0.35
/** Metres from a player at which a ball is caught. */
const CATCH = 2.5

export const takenUp = (held: Held, from: InMetres, pack: RulePack): Hand => ({
  held,
  from,
  at: from,
  place: heldPlace(toPlace(pack, from)),
  spot: null,
  screen: false,
  moved: false,
})

/** The hand somewhere else. The ball, a bend and a word go where they are pulled; players find the spots. */
export function handAt(hand: Hand, at: InMetres, pack: RulePack, screen: boolean): Hand {
  const free = hand.held.kind !== 'player' && hand.held.kind !== 'aim'
  const { place, spot } = free
    ? { place: heldPlace(toPlace(pack, at)), spot: null }
    : snapped(toPlace(pack, at), pack)
  const moved = hand.moved || Math.hypot(at.x - hand.from.x, at.y - hand.from.y) > SLIP
  return { ...hand, at: free ? at : toMetres(pack, place), place, spot, screen, moved }
}

/** Half a metre by an arrow key. */
export function handByKey(hand: Hand, key: string, pack: RulePack): Hand | null {
  const by = { ArrowLeft: [-0.5, 0], ArrowRight: [0.5, 0], ArrowUp: [0, -0.5], ArrowDown: [0, 0.5] }[key]
  if (!by) return null
  const at = inMetres(hand.at.x + (by[0] ?? 0), hand.at.y + (by[1] ?? 0))
  const place = heldPlace(toPlace(pack, at))
  const { spot, place: near } = snapped(place, pack)
  // A key goes exactly where it says; the spot is named where it is met.
  const on = spot !== null && Math.hypot(near.x - place.x, near.y - place.y) < 0.012
  return { ...hand, at: toMetres(pack, place), place: on ? near : place, spot: on ? spot : null, moved: true }
}

/** Whoever of ours the ball would go to from where it is held, near where they stand or end. */
export function catcherOf(hand: Hand, diagram: Diagram, station: Station, pack: RulePack): Role | null {
  const { before, after } = stateAt(diagram, station === 'start' ? 0 : station)
  const except = station === 'start' ? null : after.ball
  const ours = station === 'start' ? before.ours : after.ours
  return (
    nearestOurs(ours, hand.place, pack, except, CATCH) ??
    nearestOurs(before.ours, hand.place, pack, except, CATCH)
  )
}

/** How far to the side a way swings whose middle is at a point: a share of its length, + to the right. */
export function bendThrough(from: InMetres, to: InMetres, at: InMetres): number {
  const [dx, dy] = [to.x - from.x, to.y - from.y]
  const square = dx * dx + dy * dy
  if (square < 1e-6) return 0
  const [mx, my] = [at.x - (from.x + to.x) / 2, at.y - (from.y + to.y) / 2]
  const bend = (my * dx - mx * dy) / square
  return Math.abs(bend) < 0.03 ? 0 : bend
}

/** What letting go would draw; null for nothing. */
export function editOfHand(hand: Hand, diagram: Diagram, station: Station, pack: RulePack): Edit | null {
  const { held, place, screen } = hand
  if (held.kind === 'player')
    return pullPlayer(diagram, station, held.who, place, pack, { screen, again: held.again })
  if (held.kind === 'ball') {
    const to = catcherOf(hand, diagram, station, pack)
    return to && pullBall(diagram, station, to)
  }
  if (station === 'start') return null
  if (held.kind === 'word') return { do: 'move-word', step: station, index: held.index, at: place }
  if (held.kind === 'aim') return { do: 'aim', step: station, index: held.index, to: place }
  const walked = stateAt(diagram, station).moves.find(({ index }) => index === held.index)
  if (!walked) return null
  const bend = bendThrough(toMetres(pack, walked.from), toMetres(pack, walked.to), hand.at)
  return { do: 'bend', step: station, index: held.index, bend }
}
