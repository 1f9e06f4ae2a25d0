import { spotLabel } from '../tendencies/habits'
import { DENIED, LANES, PICKUPS, labelOf, type Lane, type Pickup } from '../vocabulary'
import type { Counted, PressSceneOptions } from './pressOptions'

const ofN = ({ k, n }: Pick<Counted, 'k' | 'n'>): string => `${k} of ${n}`

/** Under the pick-up's count. */
export const pickupWords = (at: Pickup | number): string =>
  typeof at === 'number' || at === 'full' ? 'pick up' : `pick up at ${labelOf(PICKUPS, at)}`

/** Under the room's count: "middle left open". */
export const roomWords = (lane: Lane): string => `${labelOf(LANES, lane).replace(/^the /, '')} left open`

/** One or two sentences that say what the press court shows. */
export function pressSentence(
  options: Pick<PressSceneOptions, 'zones' | 'pickup' | 'denied' | 'room'>,
): string {
  const they: string[] = []
  if (options.pickup) they.push(`${pickupWords(options.pickup.at)}, ${ofN(options.pickup)}`)
  for (const zone of [...options.zones].sort((a, b) => b.k - a.k))
    they.push(`trap ${spotPlace(zone.spot, zone.side)}, ${ofN(zone)}`)
  for (const one of options.denied ?? []) they.push(`deny ${labelOf(DENIED, one.lane)}, ${ofN(one)}`)
  const first = they.length > 0 ? `They ${they.join('; ')}.` : 'Nothing counted yet.'
  if (!options.room) return first
  return `${first} ${capital(labelOf(LANES, options.room.lane))} is left open, ${ofN(options.room)}.`
}

const spotPlace = (spot: string, side: string): string =>
  spot === 'other' ? 'elsewhere' : `in the ${spotLabel(spot, side)}`

const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1)
