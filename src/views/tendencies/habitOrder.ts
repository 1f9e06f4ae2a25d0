import { reaches } from '@shared/stats/evidence'
import { habitOf, type Habit } from '@shared/tendencies/habits'
import type { Tendency } from '@shared/tendencies/schemas'
import { isGiven, type Given } from './given'

/** A tendency with what its habit is called and counts. */
export interface HabitCount {
  habit: Habit
  tendency: Tendency
}

export interface HabitGroup {
  title: string
  rows: HabitCount[]
  /** Looked for and not seen once, by how often they were looked for. */
  never: NeverSeen[]
}

/** Habits of 0 of n: never is weak, so it says how many in 100 that still allows (Wilson 95). */
export interface NeverSeen {
  n: number
  upTo: number
  labels: string[]
}

/** How many stand in the short list. */
export const SHORT_LIST = 8

const GROUP_TITLES: Record<Habit['group'], string> = {
  press: 'How often and how far up',
  shape: 'Shape',
  entry: 'On the throw-in',
  ball: 'On the ball',
  trap: 'Traps',
  behind: 'Behind the trap',
  result: 'What came of it',
}

/**
 * Habits that answer one question, by key or by what stands before the colon, and how many of them the short
 * list takes: the ones counted most. In the order in which a staff asks.
 */
const QUESTIONS: readonly { keys: readonly string[]; take: number }[] = [
  { keys: ['press'], take: 1 },
  { keys: ['pickup:full'], take: 1 },
  { keys: ['shape'], take: 1 },
  { keys: ['trap-at'], take: 2 },
  { keys: ['leave-open'], take: 1 },
  { keys: ['deny'], take: 1 },
  { keys: ['trap-again'], take: 1 },
  { keys: ['cue'], take: 1 },
  { keys: ['safety-leaves-early', 'safety-home'], take: 1 },
  { keys: ['mirror', 'thrower-free'], take: 1 },
  { keys: ['trap'], take: 1 },
  { keys: ['variant'], take: 1 },
  { keys: ['sag'], take: 1 },
  { keys: ['all-out', 'light'], take: 1 },
  { keys: ['fake'], take: 1 },
  { keys: ['disguise'], take: 1 },
]

const joined = (tendencies: readonly Tendency[]): HabitCount[] =>
  tendencies.flatMap((tendency) => {
    const habit = habitOf(tendency.key)
    return habit ? [{ habit, tendency }] : []
  })

/** One side of a spot is told under the spot itself. */
const isOneSide = (key: string): boolean => /^trap-at:.*:(left|right)$/.test(key)
const answers = (key: string, keys: readonly string[]): boolean =>
  keys.includes(key) || (!keys.includes(key) && keys.includes(key.split(':')[0] ?? ''))

/** 0 is said first: claimed on firm or lean counts, then on a hint; then open, then rarely; thin ones last. */
function tier({ claim, grade, thin }: Tendency): number {
  if (claim === 'usually' && !thin && reaches(grade, 'lean')) return 0
  if (claim === 'usually' && reaches(grade, 'hint')) return 1
  if (!reaches(grade, 'hint')) return 4
  return claim === 'rarely' ? 3 : 2
}

/**
 * The habits to know first: of each question the answer counted most, in order of evidence and, where that
 * is alike, of the questions. A habit that was looked for and never seen is not among them, nor one that the
 * situation itself asks for.
 */
export function importantHabits(
  tendencies: readonly Tendency[],
  given: readonly Given[] = [],
  most = SHORT_LIST,
): HabitCount[] {
  const seen = joined(tendencies).filter(
    ({ tendency: { k, key } }) => k > 0 && !isOneSide(key) && !isGiven(key, given),
  )
  const picked = QUESTIONS.flatMap(({ keys, take }, place) =>
    seen
      .filter(({ tendency }) => answers(tendency.key, keys))
      .sort((a, b) => tier(a.tendency) - tier(b.tendency) || (b.tendency.rate ?? 0) - (a.tendency.rate ?? 0))
      .slice(0, take)
      .map((row) => ({ row, place })),
  )
  return picked
    .sort((a, b) => tier(a.row.tendency) - tier(b.row.tendency) || a.place - b.place)
    .slice(0, most)
    .map(({ row }) => row)
}

/** Every habit with anything counted, in the groups of the catalogue; groups without any are left out. */
export function groupedHabits(tendencies: readonly Tendency[]): HabitGroup[] {
  const rows = joined(tendencies).filter(({ tendency }) => tendency.n > 0)
  return (Object.keys(GROUP_TITLES) as Habit['group'][]).flatMap((group) => {
    const own = rows.filter(({ habit }) => habit.group === group)
    if (own.length === 0) return []
    const seen = own.filter(({ tendency }) => tendency.k > 0)
    return [{ title: GROUP_TITLES[group], rows: seen, never: neverSeen(own) }]
  })
}

/** The habits of 0 of n, those looked for most first; the sides of a spot that was never seen go with it. */
function neverSeen(rows: readonly HabitCount[]): NeverSeen[] {
  const byCount = new Map<number, NeverSeen>()
  for (const { habit, tendency } of rows) {
    if (tendency.k > 0) continue
    const whole = rows.find(({ habit: { key } }) => key === habit.key.replace(/:(left|right)$/, ':any'))
    if (isOneSide(habit.key) && whole?.tendency.k === 0) continue
    const entry = byCount.get(tendency.n) ?? {
      n: tendency.n,
      upTo: Math.round((tendency.interval?.high ?? 1) * 100),
      labels: [],
    }
    entry.labels.push(habit.label)
    byCount.set(tendency.n, entry)
  }
  return [...byCount.values()].sort((a, b) => b.n - a.n)
}

/** The habits that nothing was logged for in this view. */
export const uncounted = (tendencies: readonly Tendency[]): Habit[] =>
  joined(tendencies)
    .filter(({ tendency, habit }) => tendency.n === 0 && !isOneSide(habit.key))
    .map(({ habit }) => habit)

/** "right 5, left 2": the sides of a trap spot that is told as one; empty for every other habit. */
export function sidesOf(key: string, tendencies: readonly Tendency[]): string {
  if (!/^trap-at:.*:any$/.test(key)) return ''
  const stem = key.slice(0, -'any'.length)
  return (['right', 'left'] as const)
    .flatMap((side) => {
      const found = tendencies.find((tendency) => tendency.key === stem + side)
      return found && found.k > 0 ? [{ side, k: found.k }] : []
    })
    .sort((a, b) => b.k - a.k)
    .map(({ side, k }) => `${side} ${k}`)
    .join(', ')
}

/** Nothing here is more than a sighting: there is nothing to call. */
export const allSightings = (tendencies: readonly Tendency[]): boolean =>
  tendencies.every(({ grade }) => !reaches(grade, 'hint'))
