import type { Random } from '../random'
import type { DemoPossession, Draft, Trip } from './types'

/** FIBA: four periods of ten minutes. */
const PERIOD = 600
/** Seconds: with less left nobody has time to bring the ball over half. */
const LAST_BALL = 14

export interface Stretch {
  /** What every row's key starts with. */
  key: string
  kind: 'scouted' | 'ours'
  /** Seconds of play at which the scout starts and stops. */
  from: number
  to: number
  /** The score when the scout starts: the pressing team, the other. */
  score: readonly [theirs: number, foe: number]
  /** How often a trip that got through ends in points for the other team, 0 to 1. */
  foeScores: number
  /** Points after the last logged row, each side. */
  later: readonly [theirs: number, foe: number]
}

export interface Played {
  rows: DemoPossession[]
  score: { theirs: number; foe: number }
}

/**
 * Puts trips on the clock of one game: another order, times that fall, a score that agrees with what came
 * before each row (a made basket is two or three points for the pressing team). A period's first logged
 * ball is a break where there is one to spare.
 */
export function layOut(trips: readonly Trip[], stretch: Stretch, random: Random): Played {
  const order = inOrder(trips, stretch, random)
  let [theirs, foe] = stretch.score
  let number = 0
  const rows: DemoPossession[] = []
  order.forEach(({ trip, at }, index) => {
    trip.forEach((draft, within) => {
      number += 1
      if (within === 0) {
        if (draft.trigger === 'made-basket') theirs += random.next() < 0.15 ? 3 : 2
        if (draft.trigger === 'made-free-throw') theirs += random.next() < 0.5 ? 2 : 1
      }
      rows.push({
        ...placed(draft, at + within * random.between(4, 9)),
        key: `${stretch.key}-${String(number).padStart(2, '0')}`,
        number,
        margin: theirs - foe,
        scoutedGameKey: stretch.kind === 'scouted' ? stretch.key : null,
        gameKey: stretch.kind === 'ours' ? stretch.key : null,
        tripKey: trip.length > 1 ? `${stretch.key}-trip-${index + 1}` : null,
      })
      if (within === trip.length - 1) {
        if (scoredOn(draft, stretch.foeScores, random)) foe += random.next() < 0.12 ? 3 : 2
      }
    })
  })
  return { rows, score: { theirs: theirs + stretch.later[0], foe: foe + stretch.later[1] } }
}

function scoredOn(draft: Draft, rate: number, random: Random): boolean {
  if (draft.outcome === 'through-with-numbers') return random.next() < Math.min(1, rate + 0.25)
  if (draft.outcome === 'through' || draft.outcome === 'foul-drawn') return random.next() < rate
  return false
}

function placed({ counterKey = '', ...draft }: Draft, at: number) {
  const period = Math.min(4, Math.floor(at / PERIOD) + 1)
  const left = Math.max(LAST_BALL, period * PERIOD - at)
  return { ...draft, counterKey: counterKey || null, period, clock: Math.round(left * 10) }
}

/** Trips with the second of play each starts at: at least a spell apart, breaks at the head of a period. */
function inOrder(trips: readonly Trip[], stretch: Stretch, random: Random): { trip: Trip; at: number }[] {
  const shuffled = random.shuffle(trips)
  const share = (stretch.to - stretch.from) / shuffled.length
  const times = shuffled.map((_, i) => stretch.from + (i + random.between(0.15, 0.8)) * share)
  const isBreak = (trip: Trip | undefined) => trip?.[0]?.trigger === 'break'
  for (let i = 0; i < shuffled.length; i += 1) {
    const period = Math.floor((times[i] ?? 0) / PERIOD)
    const before = i === 0 ? -1 : Math.floor((times[i - 1] ?? 0) / PERIOD)
    if (period === before || (i === 0 && stretch.from === 0)) continue
    const spare = shuffled.findIndex((trip, j) => j >= i && isBreak(trip))
    const [here, there] = [shuffled[i], shuffled[spare]]
    if (!here || !there) continue
    shuffled[i] = there
    shuffled[spare] = here
    times[i] = period * PERIOD + random.between(1, 6)
  }
  return shuffled.map((trip, i) => ({ trip, at: times[i] ?? stretch.from }))
}
