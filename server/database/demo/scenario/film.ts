import { SHAPE_VARIANTS, NOT_PRESSED, SUCCESSES } from '@shared/vocabulary'
import { seeded, type Random } from '../random'
import type { DemoPossession } from './types'

/** A team's press by shirt number: whoever does what in it, best first. */
export interface PressFive {
  mirror: number
  trappers: readonly number[]
  thieves: readonly number[]
  safety: number
  bench: readonly number[]
}

const SEED = 4_711
/** Seconds of film before the throw-up. */
const LEAD = 95
/** Shirt numbers that are worn on both sides of the demo: our own handlers have them too. */
const RECEIVERS = [4, 7, 9, 11] as const
/** Seconds of film to a second of play: whistles, free throws, time-outs. */
const SLOWER = 1.8

type Film = Partial<DemoPossession>

/**
 * What a scout adds from film, agreeing with what the row says already: who was on the floor, who came to the
 * ball, who took it, where the throw-in was caught, how it ended past half. Rows that hold only the five
 * touches stay as they are.
 */
export function filmed(rows: readonly DemoPossession[], five: PressFive, seed: number): DemoPossession[] {
  const random = seeded(SEED + seed)
  return rows.map((row) =>
    row.onBall === undefined && row.crossedAt == null ? row : { ...row, ...film(row, five, random) },
  )
}

const isPressed = ({ shape }: DemoPossession) =>
  typeof shape === 'string' && !NOT_PRESSED.some((other) => other === shape)

function film(row: DemoPossession, five: PressFive, random: Random): Film {
  const at = filmTimeOf(row)
  const through = SUCCESSES.some((one) => one === row.outcome)
  const past: Film = through ? finishOf(row, random) : {}
  if (!isPressed(row)) return { filmTime: at, ...past }
  return {
    filmTime: at,
    onFloor: floorOf(five, random),
    ...pressOf(row, five, random),
    ...past,
    ...(row.outcome === 'lost-live'
      ? {
          thief: random.next() < 0.75 ? random.pick(five.thieves) : five.trappers[0],
          pointsAgainst: random.pick([0, 2, 2, 0, 3]),
        }
      : {}),
    ...(row.outcome === 'stopped' && random.next() < 0.5 ? { timeOutBurned: true } : {}),
  }
}

function filmTimeOf({ period, clock }: DemoPossession): number {
  const played = ((period ?? 1) - 1) * 600 + 600 - (clock ?? 0) / 10
  return Math.round(LEAD + played * SLOWER)
}

/** The five most of the time; now and then the safety is rested. */
function floorOf(five: PressFive, random: Random): number[] {
  const all = [...new Set([five.mirror, ...five.trappers, ...five.thieves])].slice(0, 4)
  const last = random.next() < 0.3 ? random.pick(five.bench) : five.safety
  return [...all, last].sort((a, b) => a - b)
}

function pressOf(row: DemoPossession, five: PressFive, random: Random): Film {
  const traps = Array.isArray(row.traps) ? row.traps : row.traps
  const caught = row.track?.find(({ kind }) => kind === 'catch')
  return {
    ...(row.trigger === 'live' || !caught
      ? {}
      : { entrySpot: { x: caught.x, y: caught.y }, receiver: random.pick(RECEIVERS) }),
    traps: Array.isArray(traps)
      ? traps.map((trap, i) => ({
          ...trap,
          trappers:
            i === 0
              ? [five.trappers[0] ?? five.mirror, five.trappers[1] ?? five.mirror].sort((a, b) => a - b)
              : null,
        }))
      : (traps ?? null),
    ...(caught ? { forcedSide: caught.y < 0.5 ? ('left' as const) : ('right' as const) } : {}),
    passes: row.outcome === 'count' ? 1 : 1 + Math.floor(random.next() * 3),
    reversals: random.next() < 0.25 ? 1 : 0,
    fallback: row.outcome === 'through' ? random.pick(['person', 'person', '2-3'] as const) : null,
    ...(row.shape === 'person' && row.shapeVariant == null ? { shapeVariant: SHAPE_VARIANTS[0].value } : {}),
  }
}

function finishOf(row: DemoPossession, random: Random): Film {
  if (row.outcome === 'foul-drawn') return { finish: 'free-throws', points: random.pick([1, 2, 0]) }
  if (row.outcome === 'through-with-numbers')
    return random.next() < 0.7
      ? { finish: 'lay-up', points: 2 }
      : { finish: 'open-shot', points: random.pick([0, 3]) }
  const finish = random.pick(['set-up', 'set-up', 'hard-shot', 'open-shot'] as const)
  return { finish, points: finish === 'set-up' ? random.pick([0, 2]) : random.pick([0, 0, 2]) }
}
