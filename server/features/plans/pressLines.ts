import type { SpotName, SpotSide } from '@shared/court/trapSpots'
import type { FrozenPlan } from '@shared/sheets/schemas'
import { thin } from '@shared/stats/evidence'
import { LANES, labelOf, PICKUPS } from '@shared/vocabulary'
import type { OpponentRead } from '../tendencies/readOpponent'

type Press = FrozenPlan['press']
type Line = Omit<Press['lines'][number], 'letter'> & {
  /** Whether a zone of the drawing is what this line speaks of. */
  zone?: (spot: { spot: SpotName; order: 'first' | 'later' }) => boolean
}

/** Where a trap stands inside "They trap …" and "They trap again …", as players hear it. */
const WHERE: Partial<Record<SpotName, string>> = {
  'coffin-corner': 'in the corner',
  'early-sideline': 'on the sideline',
  'short-of-half': 'on the sideline short of half',
  'just-over-half': 'just past half',
  'front-wing': 'on the front wing',
  'front-corner': 'in the front corner',
  'middle-lane': 'in the middle',
}

/** At most this many zones are drawn; a sheet is read in two minutes. */
const ZONES = 4

const tendency = (read: OpponentRead, key: string) => {
  const found = read.tendencies.find((entry) => entry.key === key)
  return found && found.n > 0 ? found : null
}

/** The spot with the most traps of an order, both sides together. */
function mostTrapped(read: OpponentRead, order: 'first' | 'later'): { spot: SpotName; k: number } | null {
  const bySpot = new Map<SpotName, number>()
  for (const entry of read.spots)
    if (entry.order === order && entry.spot !== 'other')
      bySpot.set(entry.spot, (bySpot.get(entry.spot) ?? 0) + entry.k)
  const [best] = [...bySpot].sort((a, b) => b[1] - a[1])
  return best ? { spot: best[0], k: best[1] } : null
}

function trapLine(read: OpponentRead): Line | null {
  const best = mostTrapped(read, 'first')
  const trapped = tendency(read, 'trap')
  if (!best || !trapped) return null
  return {
    text: `They trap ${WHERE[best.spot] ?? 'the ball'}.`,
    k: best.k,
    n: trapped.n,
    ink: 'their',
    habitKey: best.spot === 'middle-lane' ? 'trap-at:middle-lane:middle' : `trap-at:${best.spot}:any`,
    zone: (zone) => zone.order === 'first' && zone.spot === best.spot,
  }
}

function againLine(read: OpponentRead): Line | null {
  const again = tendency(read, 'trap-again')
  const best = mostTrapped(read, 'later')
  if (!again || again.k === 0 || !best) return null
  return {
    text: `They trap again ${WHERE[best.spot] ?? ''}`.trim() + '.',
    // Said of one place, so counted there. A third trap on the other side may count a possession twice.
    k: Math.min(best.k, again.k),
    n: again.n,
    ink: 'their',
    habitKey: 'trap-again',
    zone: (zone) => zone.order === 'later' && zone.spot === best.spot,
  }
}

function pickupLine(read: OpponentRead): Line | null {
  if (!read.pickup) return null
  return {
    text: `They pick up ${labelOf(PICKUPS, read.pickup.value)}.`,
    k: read.pickup.k,
    n: read.pickup.n,
    ink: 'their',
    habitKey: 'pickup:full',
  }
}

/** The lane they leave open most often on the trap; null when none was counted. */
function roomOf(read: OpponentRead): { lane: NonNullable<Press['room']>; k: number; n: number } | null {
  const [best] = LANES.flatMap(({ value }) => {
    const found = tendency(read, `leave-open:${value}`)
    return found && found.k > 0 ? [{ lane: value, k: found.k, n: found.n }] : []
  }).sort((a, b) => b.k - a.k)
  return best ?? null
}

function roomLine(read: OpponentRead): Line | null {
  const room = roomOf(read)
  if (!room) return null
  return {
    text: `They leave ${labelOf(LANES, room.lane)} open.`,
    k: room.k,
    n: room.n,
    ink: 'our',
    habitKey: `leave-open:${room.lane}`,
  }
}

/**
 * What players are told of the press: up to three lines, each with its count, and the drawing they
 * belong to. Their habits first, the room they leave last.
 */
export function describePress(read: OpponentRead): Omit<Press, 'pressed' | 'mostlyShape'> {
  const theirs = [trapLine(read), againLine(read), pickupLine(read)].filter((line) => line !== null)
  const room = roomLine(read)
  const lines = [...theirs.slice(0, room ? 2 : 3), ...(room ? [room] : [])]
  const letters = ['A', 'B', 'C'] as const
  const lettered = lines.map((line, index) => ({ ...line, letter: letters[index] ?? 'C' }))
  const games = read.games.length
  const zones = read.spots
    .filter((spot) => spot.spot !== 'other' && spot.k > 0)
    .sort((a, b) => b.k - a.k)
    .slice(0, ZONES)
    .map(({ spot, side, order, k, n }) => ({
      spot,
      side: side as SpotSide,
      k,
      n,
      thin: thin(k, n, games),
      letter: lettered.find((line) => line.zone?.({ spot, order }))?.letter ?? null,
    }))
  return {
    pickup: read.pickup?.value ?? null,
    pickupThin: read.pickup?.thin ?? false,
    zones: onePerPlace(zones),
    room: roomOf(read)?.lane ?? null,
    lines: lettered.map(({ zone: _zone, ...line }) => line),
  }
}

/** First and later traps in one place are one zone on paper: the more frequent one. */
function onePerPlace(zones: Press['zones']): Press['zones'] {
  return zones.filter(
    (zone, index) =>
      zones.findIndex((other) => other.spot === zone.spot && other.side === zone.side) === index,
  )
}
