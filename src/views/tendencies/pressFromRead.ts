import type { Counted } from '@shared/court/pressOptions'
import { shapeSpots } from '@shared/court/shapeSpots'
import type { TrapZone } from '@shared/court/trapZones'
import { thin } from '@shared/stats/evidence'
import { spotLabel } from '@shared/tendencies/habits'
import type { Tendency, TendencyRead } from '@shared/tendencies/schemas'
import { DENIED, labelOf, LANES, SHAPES, type Denied, type Lane, type Shape } from '@shared/vocabulary'

type Spot = TendencyRead['spots'][number]

/** What the court of a read shows, and which habit each part of it opens. */
export interface ReadMarks {
  zones: TrapZone[]
  pickup: (Counted & { at: NonNullable<TendencyRead['pickup']>['value'] }) | null
  denied: (Counted & { lane: Denied })[]
  room: (Counted & { lane: Lane }) | null
  defenders: { x: number; y: number }[]
  /** Id of a part of the drawing to the key of its habit. */
  habitOf: Map<string, string>
  /** Trap spots that were counted but not drawn, as words. */
  rest: string[]
}

/** More zones than this hide the court; the others stand in words below it. */
const ZONES = 6
const LANES_DENIED = 2

/** `selected`: the key of the habit in hand; its zone gets the heavier edge. */
export function marksOf(read: TendencyRead, selected: string | null): ReadMarks {
  const byKey = new Map(read.tendencies.map((tendency) => [tendency.key, tendency]))
  const all = cells(read.spots)
  // A spot seen once is no place to draw beside spots that they come back to.
  const often = all.filter(({ k }) => k > 1)
  const spots = often.length === 0 ? all : often
  const zones = spots.slice(0, ZONES).map((spot): TrapZone => {
    const games = byKey.get(spot.order === 'first' ? 'trap' : 'trap-again')?.games ?? 0
    return {
      spot: spot.spot,
      side: spot.side,
      k: spot.k,
      n: spot.n,
      thin: thin(spot.k, spot.n, games),
      note: zoneNote(spot),
      selected: isSelected(spot, selected),
    }
  })
  const denied = most(read.tendencies, 'deny:', LANES_DENIED)
    .filter(({ rate }) => rate !== null && rate >= 0.5)
    .flatMap((tendency) => {
      const lane = DENIED.find(({ value }) => `deny:${value}` === tendency.key)?.value
      return lane ? [{ lane, ...countOf(tendency) }] : []
    })
  const [open] = most(read.tendencies, 'leave-open:', 1)
  const lane = LANES.find(({ value }) => `leave-open:${value}` === open?.key)?.value
  return {
    zones,
    pickup: read.pickup && {
      at: read.pickup.value,
      k: read.pickup.k,
      n: read.pickup.n,
      thin: read.pickup.thin,
    },
    denied,
    room: open && lane ? { lane, ...countOf(open) } : null,
    defenders: standing(read.tendencies, zones),
    habitOf: new Map([
      ...zones.map(({ spot, side }): [string, string] => [
        `trap-zone-${spot}-${side}`,
        `trap-at:${spot}:${side}`,
      ]),
      // Only full court is counted as a habit of its own.
      ...(read.pickup?.value === 'full' ? [['pickup-front', 'pickup:full'] as [string, string]] : []),
      ...denied.map(({ lane: denial }): [string, string] => [`denied-${denial}`, `deny:${denial}`]),
      ...(open ? [['room', open.key] as [string, string]] : []),
    ]),
    rest: all
      .filter((spot) => spots.indexOf(spot) < 0 || spots.indexOf(spot) >= ZONES)
      .map(({ spot, side, k, n, order }) => {
        const which = order === 'later' ? 'second trap ' : ''
        return `${which}${spotLabel(spot, side)} ${k} of ${n}`
      }),
  }
}

const countOf = ({ k, n, thin: isThin }: Tendency): Counted => ({ k, n, thin: isThin })

/** One entry per spot: where first and later traps share it, the one counted more. Most first; equal counts left first. */
function cells(spots: readonly Spot[]): Spot[] {
  const best = new Map<string, Spot>()
  for (const spot of spots) {
    // A later trap after a first one whose end was not seen is outside its own n: no rate can be told for it.
    if (spot.spot === 'other' || spot.k === 0 || spot.k > spot.n) continue
    const name = `${spot.spot} ${spot.side}`
    const present = best.get(name)
    if (!present || spot.k > present.k) best.set(name, spot)
  }
  return [...best.values()].sort((a, b) => b.k - a.k || a.side.localeCompare(b.side))
}

const SHORT_NAMES: Partial<Record<Spot['spot'], string>> = {
  'coffin-corner': 'deep corner',
  'early-sideline': 'early sideline',
  'short-of-half': 'short of half',
  'just-over-half': 'just over half',
  'front-wing': 'front wing',
  'front-corner': 'front corner',
  'middle-lane': 'middle lane',
}

function zoneNote({ spot, side, order }: Spot): string {
  if (order === 'later') return side === 'middle' ? 'second trap, middle' : `second trap, ${side} side`
  return `first trap, ${side === 'middle' ? '' : `${side} `}${SHORT_NAMES[spot] ?? ''}`
}

function isSelected({ spot, side, order }: Spot, selected: string | null): boolean {
  if (selected === 'trap-again') return order === 'later'
  return selected === `trap-at:${spot}:${side}` || selected === `trap-at:${spot}:any`
}

/** The counted ones of a family, most often first; at equal rates the one with more behind it. */
function most(tendencies: readonly Tendency[], stem: string, take: number): Tendency[] {
  return tendencies
    .filter(({ key, k }) => key.startsWith(stem) && k > 0)
    .sort((a, b) => (b.rate ?? 0) - (a.rate ?? 0) || b.n - a.n)
    .slice(0, take)
}

/** Where they stand in the shape of at least half of their presses; nobody where no shape is. */
function standing(tendencies: readonly Tendency[], zones: readonly TrapZone[]): { x: number; y: number }[] {
  const [top] = most(tendencies, 'shape:', 1)
  if (!top || top.thin || (top.rate ?? 0) < 0.5) return []
  const shape: Shape | undefined = SHAPES.find(({ value }) => `shape:${value}` === top.key)?.value
  if (!shape) return []
  const side = (one: 'left' | 'right') =>
    zones
      .filter((zone) => zone.spot === 'coffin-corner' && zone.side === one)
      .reduce((sum, { k }) => sum + k, 0)
  return shapeSpots(shape, side('left') > side('right') ? 'left' : 'right')
}

/** The shape whose start spots stand on the court, for the line under it; null where nobody stands there. */
export function standingShape(
  tendencies: readonly Tendency[],
): { label: string; k: number; n: number } | null {
  if (standing(tendencies, []).length === 0) return null
  const [top] = most(tendencies, 'shape:', 1)
  return top ? { label: labelOf(SHAPES, top.key.slice('shape:'.length)), k: top.k, n: top.n } : null
}
