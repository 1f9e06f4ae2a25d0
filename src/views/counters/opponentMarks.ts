import type { Counted } from '@shared/court/pressOptions'
import type { TrapZone } from '@shared/court/trapZones'
import type { Pickup } from '@shared/vocabulary'
import { getTendencies } from '@/api/tendencies'
import { opponentZones } from '@/components/court/opponentZones'

/** What of an opponent's press lies under our drawing. */
export interface OpponentMarks {
  opponent: string
  zones: TrapZone[]
  pickup: (Counted & { at: Pickup }) | null
}

export async function loadOpponentMarks(
  team: string,
  opponent: string,
  signal: AbortSignal,
): Promise<OpponentMarks> {
  const read = await getTendencies(team, opponent, {}, signal)
  const { pickup } = read
  return {
    opponent,
    zones: opponentZones(read),
    pickup: pickup && { at: pickup.value, k: pickup.k, n: pickup.n, thin: pickup.thin },
  }
}
