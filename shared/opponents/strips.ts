import { z } from 'zod'
import { SpotName, SpotSide } from '../court/trapSpots'
import { thin } from '../stats/evidence'
import type { Tendency, TendencyRead } from '../tendencies/schemas'
import { LANES, PICKUPS, valuesOf } from '../vocabulary'

const Counted = z.object({ k: z.number().int(), n: z.number().int(), thin: z.boolean() })

/** One opponent's press for a row of a list: where they trap, from where they pick up, what they leave open. */
export const OpponentStrip = z.object({
  opponentId: z.uuid(),
  zones: z.array(Counted.extend({ spot: SpotName, side: SpotSide })),
  pickup: Counted.extend({ value: z.enum(valuesOf(PICKUPS)) }).nullable(),
  room: Counted.extend({ lane: z.enum(valuesOf(LANES)) }).nullable(),
})
export type OpponentStrip = z.infer<typeof OpponentStrip>
export const StripList = z.object({ rows: z.array(OpponentStrip), total: z.number().int() })
export type StripList = z.infer<typeof StripList>

/** More zones than this and the counts of a row stand on one another. */
const ZONES = 4

/** Whether a strip looks at a habit. */
export const onStrip = (key: string): boolean =>
  key === 'trap' || key === 'trap-again' || key.startsWith('leave-open:')

/** What of a read stands on the strip. A spot that was seen once stands there only where none was seen more often. */
export function stripOf(
  read: Pick<TendencyRead, 'spots' | 'pickup'> & {
    tendencies: readonly Pick<Tendency, 'key' | 'k' | 'n' | 'games' | 'thin'>[]
  },
): Omit<OpponentStrip, 'opponentId'> {
  const gamesOf = (key: string) => read.tendencies.find((tendency) => tendency.key === key)?.games ?? 0
  const byPlace = new Map<string, TendencyRead['spots'][number]>()
  for (const spot of read.spots) {
    if (spot.spot === 'other' || spot.k === 0 || spot.k > spot.n) continue
    const place = `${spot.spot} ${spot.side}`
    if (spot.k > (byPlace.get(place)?.k ?? 0)) byPlace.set(place, spot)
  }
  const all = [...byPlace.values()].sort((a, b) => b.k - a.k || a.side.localeCompare(b.side))
  const often = all.filter(({ k }) => k > 1)
  const zones = (often.length > 0 ? often : all).slice(0, ZONES).map(({ spot, side, k, n, order }) => ({
    spot,
    side,
    k,
    n,
    thin: thin(k, n, gamesOf(order === 'first' ? 'trap' : 'trap-again')),
  }))
  const open = LANES.flatMap(({ value: lane }) => {
    const found = read.tendencies.find(({ key }) => key === `leave-open:${lane}`)
    return found && found.k > 0 ? [{ lane, k: found.k, n: found.n, thin: found.thin }] : []
  }).sort((a, b) => b.k / b.n - a.k / a.n || b.n - a.n)
  return { zones, pickup: read.pickup, room: open[0] ?? null }
}
