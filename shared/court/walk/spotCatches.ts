import { spotLabel } from '../../tendencies/habits'
import type { Role } from '../../vocabulary'
import type { Diagram, Place } from '../diagram'
import { walkDiagram } from '../diagramWalk'
import { spotAt } from '../trapSpots'
import type { TrapZone } from '../trapZones'

/** Somebody of ours catches, or waits, where two of theirs come to the ball. */
export interface SpotCatch {
  kind: 'catches' | 'waits'
  step: number
  /** Index of the pass in its step; null for somebody who waits. */
  move: number | null
  role: Role
  place: Place
  zone: TrapZone
  words: string
}

const words = (role: Role, does: string, zone: TrapZone): string =>
  `${role} ${does} in the ${spotLabel(zone.spot, zone.side)}, where they trap ${zone.k} of ${zone.n}${zone.thin ? ' (thin)' : ''}.`

/** The spot of theirs that a place lies in; only one where they have trapped. */
function zoneAt(zones: readonly TrapZone[], place: Place): TrapZone | undefined {
  const { spot, side } = spotAt(place)
  if (spot === 'other') return undefined
  return zones.find((zone) => zone.k > 0 && zone.spot === spot && zone.side === side)
}

/** Catches that lie in one of an opponent's trap spots, in order. */
export function catchesInSpots(diagram: Diagram, zones: readonly TrapZone[]): SpotCatch[] {
  return walkDiagram(diagram).flatMap(({ moves }, step) =>
    moves.flatMap(({ move, index, to }): SpotCatch[] => {
      if (move.kind !== 'pass') return []
      const zone = zoneAt(zones, to)
      if (!zone) return []
      return [
        {
          kind: 'catches',
          step,
          move: index,
          role: move.to,
          place: to,
          zone,
          words: words(move.to, 'catches', zone),
        },
      ]
    }),
  )
}

/**
 * Who stands in a trap spot at the end of a step, after the ball is in, without the ball and without having
 * caught there: once each player and spot.
 */
export function waitsInSpots(diagram: Diagram, zones: readonly TrapZone[]): SpotCatch[] {
  const seen = new Set(
    catchesInSpots(diagram, zones).map(({ role, zone }) => `${role} ${zone.spot} ${zone.side}`),
  )
  return walkDiagram(diagram).flatMap(({ after }, step) =>
    [...after.ours].flatMap(([role, place]): SpotCatch[] => {
      const zone = role === after.ball ? undefined : zoneAt(zones, place)
      const key = zone && `${role} ${zone.spot} ${zone.side}`
      if (!zone || !key || seen.has(key)) return []
      seen.add(key)
      return [{ kind: 'waits', step, move: null, role, place, zone, words: words(role, 'waits', zone) }]
    }),
  )
}
