import type { DefenderId, Diagram, Move, Place } from '../diagram'
import type { Role } from '../../vocabulary'
import { stateAt } from '../diagramWalk'
import type { RulePack } from '../rulePacks'
import { toThrowIn } from './choices'
import type { Edit } from './edits'
import { isRole } from './sentence'
import { metresBetween } from './snap'

/** Where the hand is: setting up where they stand, or drawing a step. */
export type Station = number | 'start'

const isOut = ({ x, y }: Place): boolean => x < 0 || x > 1 || y < 0 || y > 1

/** The index of the last walk or screen of a player in a step; null when that player has none. */
export function lastWalk(diagram: Diagram, step: number, who: Role | DefenderId): number | null {
  const moves = diagram.steps[step]?.moves ?? []
  const index = moves.findLastIndex((move) => move.kind !== 'pass' && move.who === who)
  return index < 0 ? null : index
}

/**
 * What pulling a player means: at the start, where they stand; in a step, a cut (with the ball a dribble, held as a
 * screen a screen for the nearest of ours), or, where `again` is false and the player walks already, where that
 * walk ends.
 */
export function pullPlayer(
  diagram: Diagram,
  station: Station,
  who: Role | DefenderId,
  to: Place,
  pack: RulePack,
  { screen = false, again = false } = {},
): Edit | null {
  if (station === 'start') return { do: 'place', who, at: to }
  const walk = lastWalk(diagram, station, who)
  const known = walk === null ? undefined : diagram.steps[station]?.moves[walk]
  if (walk !== null && known && !again && !(screen && known.kind !== 'screen'))
    return { do: 'aim', step: station, index: walk, to }
  if (!isRole(who))
    return { do: 'add-move', step: station, move: { kind: 'theirs', who, to, bend: 0, beat: 0 } }
  const { after } = stateAt(diagram, station)
  if (screen) {
    const free = nearestOurs(after.ours, to, pack, who)
    const move: Move | null = free && { kind: 'screen', who, to, for: free, blind: false, beat: 0 }
    if (!move) return null
    return walk !== null && !again
      ? { do: 'change-move', step: station, index: walk, move }
      : { do: 'add-move', step: station, move }
  }
  const withBall = after.ball === who && !isOut(to)
  return {
    do: 'add-move',
    step: station,
    move: { kind: withBall ? 'dribble' : 'cut', who, to, bend: 0, beat: 0 },
  }
}

/** What pulling the ball to a player means: at the start who throws in, in a step a pass. */
export function pullBall(diagram: Diagram, station: Station, to: Role): Edit | null {
  if (station === 'start') return { do: 'thrower', role: to }
  const from = stateAt(diagram, station).after.ball
  if (from === to) return null
  const throwIn = toThrowIn(diagram, station)
  return {
    do: 'add-move',
    step: station,
    move: { kind: 'pass', from, to, flight: 'straight', throwIn, beat: 0 },
  }
}

/** Whoever of ours stands nearest to a place, within some metres. */
export function nearestOurs(
  ours: ReadonlyMap<Role, Place>,
  to: Place,
  pack: RulePack,
  except: Role | null = null,
  within = Infinity,
): Role | null {
  const near = [...ours]
    .filter(([role]) => role !== except)
    .map(([role, at]) => ({ role, metres: metresBetween(pack, at, to) }))
    .sort((a, b) => a.metres - b.metres)[0]
  return near && near.metres <= within ? near.role : null
}
