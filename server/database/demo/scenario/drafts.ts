import type { z } from 'zod'
import type { TrackPoint } from '@shared/possessions/schemas'
import type { Trap } from '@shared/possessions/schemas'
import type {
  Denied,
  Lane,
  Outcome,
  OutcomePlace,
  Shape,
  TrapCue,
  TrapResult,
  Trigger,
} from '@shared/vocabulary'
import type { Random } from '../random'
import type { Draft } from './types'

type TrapInput = z.input<typeof Trap>
export type Side = 'left' | 'right'

/** Where a trap is logged, one point inside its area; the area follows from the point. */
const AREAS = {
  corner: { x: [0.05, 0.13], depth: [0.07, 0.19] },
  early: { x: [0.19, 0.33], depth: [0.06, 0.18] },
  short: { x: [0.4, 0.48], depth: [0.06, 0.18] },
  over: { x: [0.52, 0.6], depth: [0.06, 0.18] },
  middle: { x: [0.26, 0.42], depth: [0.42, 0.5] },
} as const
export type Area = keyof typeof AREAS

/** Seconds from the first touch at which a trap closes, by what sprang it. */
const CLOSES: Partial<Record<TrapCue, readonly [number, number]>> = {
  'on-catch': [1.4, 2.3],
  'first-dribble': [2, 2.9],
  'turned-back': [2.6, 3.6],
  'head-down': [2.8, 3.8],
  'on-crossing': [5.4, 6.6],
}

const tenth = (value: number) => Math.round(value * 10) / 10
const cent = (value: number) => Math.round(value * 1000) / 1000

function placeIn(area: Area, side: Side, random: Random): { x: number; y: number } {
  const { x, depth } = AREAS[area]
  const inwards = random.between(depth[0], depth[1])
  return { x: cent(random.between(x[0], x[1])), y: cent(side === 'left' ? inwards : 1 - inwards) }
}

export interface Pressed {
  trigger: Trigger
  shape: Shape
  end: Outcome
  /** Where it ended, where it was lost. */
  at?: OutcomePlace
  trap?: { area: Area; side: Side; cue: TrapCue; result: TrapResult }
  /** A second trap just over half. */
  then?: Side
  open?: Lane[] | 'not-visible'
  deny?: Denied[] | 'not-visible'
  /** Only the five touches were logged. */
  quick?: boolean
  /** Fields told as they are, over what is drawn up here. */
  over?: Partial<Draft>
}

const FAILED: readonly Outcome[] = ['lost-live', 'lost-dead', 'count']

/** A pressed possession as a scout would have logged it, with places and times drawn inside what is told. */
export function pressed(told: Pressed, random: Random): Draft {
  const traps: TrapInput[] = []
  const lostPastHalf = told.at === 'past-half'
  const crosses = !FAILED.includes(told.end) || lostPastHalf
  let crossedAt = crosses
    ? random.between(told.end === 'through-with-numbers' ? 3.4 : 4.8, told.then ? 6.4 : 7)
    : null
  if (told.end === 'foul-drawn' || told.end === 'stopped') crossedAt = null
  if (told.trap) {
    const { area, side, cue, result } = told.trap
    const [early, late] = CLOSES[cue] ?? [1.5, 3]
    const shift = area === 'short' ? 1.8 : 0
    const t = random.between(early, late) + shift
    traps.push({ ...placeIn(area, side, random), t: tenth(t), cue, result })
    if (crossedAt !== null) crossedAt = area === 'over' ? t - 0.5 : Math.max(crossedAt, t + 1.4)
  }
  if (told.then && crossedAt !== null)
    traps.push({
      ...placeIn('over', told.then, random),
      t: tenth(crossedAt + random.between(0.5, 1)),
      cue: 'on-crossing',
      result: lostPastHalf ? 'lost' : 'passed-out',
    })
  const quickFields: Draft = {
    trigger: told.trigger,
    shape: told.shape,
    pickup: told.shape === '1-2-1-1' ? 'full' : 'three-quarter',
    traps: told.quick ? traps.map(({ x, y, t }) => ({ x, y, t })) : traps,
    outcome: told.end,
  }
  if (told.quick) return { ...quickFields, ...told.over }
  const trapped = told.trap !== undefined
  return {
    ...quickFields,
    outcomePlace: told.at ?? null,
    throwerGuard: told.trigger === 'live' ? null : told.shape === '1-2-1-1' ? 'mirror' : 'off',
    denied: told.deny ?? null,
    tookAway: Array.isArray(told.deny) && told.deny.includes('pass-back') ? ['pass-back'] : null,
    leftOpen: told.open ?? null,
    onBall: trapped ? 'pressured' : 'contained',
    handler: random.pick(['strong', 'weak', 'unknown', 'unknown'] as const),
    goalie: trapped ? 'home' : null,
    crossedAt: crossedAt === null ? null : tenth(crossedAt),
    track: told.trigger === 'live' ? null : trackOf(traps, crossedAt, random),
    ...told.over,
  }
}

/** The ball's way: throw-in, catch, out of the first trap through the middle, over half, into the second. */
function trackOf(traps: readonly TrapInput[], crossedAt: number | null, random: Random): TrackPoint[] {
  const [first, second] = traps
  const right = (first?.y ?? random.next()) >= 0.5
  const entry = { x: -0.02, y: right ? 0.66 : 0.34 }
  const caught = first && first.x < 0.2 ? first : { x: 0.12, y: right ? 0.7 : 0.3 }
  const points: TrackPoint[] = [
    { t: tenth(-random.between(1.6, 3)), ...entry, kind: 'throw-in' },
    { t: 0, x: cent(caught.x), y: cent(caught.y), kind: 'catch' },
  ]
  let t = 0
  if (first) {
    t = first.t ?? 2
    if (first.x >= 0.2) points.push({ t: tenth(t), x: first.x, y: first.y, kind: 'dribble' })
    if (first.result === 'passed-out' && first.x < 0.5) {
      points.push({ t: tenth(t + 0.5), x: first.x, y: first.y, kind: 'pass' })
      t += 1.1
      points.push({
        t: tenth(t),
        x: cent(Math.max(first.x, random.between(0.3, 0.4))),
        y: cent(random.between(0.42, 0.56)),
        kind: 'catch',
      })
    }
  }
  if (crossedAt !== null && crossedAt > t && (first?.x ?? 0) < 0.5)
    points.push({
      t: tenth(crossedAt),
      x: 0.5,
      y: cent(second?.y ?? random.between(0.3, 0.7)),
      kind: 'dribble',
    })
  if (second) points.push({ t: second.t ?? 7, x: second.x, y: second.y, kind: 'dribble' })
  return points
}

/** A possession in which they did not press, or only showed it. */
export function unpressed(
  trigger: Trigger,
  shape: 'dropped-back' | 'fake',
  outcome: Outcome,
  random: Random,
  note = '',
): Draft {
  const over = outcome === 'through' || outcome === 'through-with-numbers'
  return {
    trigger,
    shape,
    outcome,
    crossedAt: over && random.next() < 0.6 ? tenth(random.between(3.6, 6.4)) : null,
    ...(note ? { note } : {}),
  }
}
