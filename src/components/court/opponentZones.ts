import type { TrapZone } from '@shared/court/trapZones'
import { thin } from '@shared/stats/evidence'
import type { TendencyRead } from '@shared/tendencies/schemas'

/** More zones than this under our own drawing hide the way that they are there to explain. */
const MOST = 4

/**
 * Where an opponent traps, for drawing under our own way: the spots with the most traps, one per place
 * (first and later traps in one place are the more frequent one of the two).
 */
export function opponentZones(read: Pick<TendencyRead, 'spots' | 'games'>): TrapZone[] {
  const games = read.games.length
  const zones: TrapZone[] = []
  const byCount = [...read.spots].sort((one, two) => two.k - one.k)
  for (const { spot, side, k, n } of byCount) {
    if (spot === 'other' || k === 0 || zones.length === MOST) continue
    if (zones.some((zone) => zone.spot === spot && zone.side === side)) continue
    zones.push({ spot, side, k, n, thin: thin(k, n, games) })
  }
  return zones
}
