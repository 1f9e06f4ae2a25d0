import { HABITS, type Habit } from '@shared/tendencies/habits'
import type { Tendency, TendencyRead } from '@shared/tendencies/schemas'
import { betaAfter, betaInterval, betaMean, type Beta } from '@shared/stats/beta'
import { designEffect, intraclass, recencyWeight, type Count } from '@shared/stats/clusters'
import { claim, grade, reaches, thin } from '@shared/stats/evidence'
import { claimsByChance } from '@shared/stats/luck'
import { betaBinomialPool } from '@shared/stats/pooling'
import { wilson } from '@shared/stats/wilson'
import type { Grade } from '@shared/vocabulary'
import { ENGINE_DEFAULTS, type EngineSettings } from './settings'

/** Rows of one habit in one game after one trigger: what the counting SQL returns. */
export interface HabitCell {
  habitKey: string
  gameId: string
  /** 0 is their newest game. */
  gameAge: number
  trigger: string
  k: number
  n: number
}

/** A tendency with the distribution behind `adjusted`; the presenter leaves the distribution out. */
export type EngineTendency = Tendency & { posterior: Beta | null }

export interface TendencyOptions {
  /** A filter narrows the rows: cells then need lean before anything is claimed of them. */
  situation?: boolean
  /**
   * The triggers in view; null is all of them. Cells of other triggers may be given too: they are not
   * counted, but habits given pressed are pooled towards the overall rate of all cells.
   */
  triggers?: readonly string[] | null
  habits?: readonly Habit[]
  settings?: Partial<EngineSettings>
}

type Settings = Pick<EngineSettings, 'halfLifeGames' | 'icc' | 'iccFromGames' | 'pool'>

/** Jeffreys: half a row each way before anything was counted. */
const UNKNOWN: Beta = { a: 0.5, b: 0.5 }

function total(cells: readonly Count[]): Count {
  const sum = { k: 0, n: 0 }
  for (const cell of cells) {
    sum.k += cell.k
    sum.n += cell.n
  }
  return sum
}

function groupBy<T>(list: readonly T[], key: (member: T) => string): Map<string, T[]> {
  const groups = new Map<string, T[]>()
  for (const member of list) {
    const group = groups.get(key(member))
    if (group) group.push(member)
    else groups.set(key(member), [member])
  }
  return groups
}

/** Counts of each game; a season of cells goes through here, so nothing is copied on the way. */
function perGame(cells: readonly HabitCell[]): Count[] {
  const games = new Map<string, Count>()
  for (const { gameId, k, n } of cells) {
    const game = games.get(gameId)
    if (game) {
      game.k += k
      game.n += n
    } else games.set(gameId, { k, n })
  }
  return [...games.values()]
}

/** k of n with recent games weighing more, divided by the design effect of rows that share a game. */
function weighted(cells: readonly HabitCell[], settings: Settings): Count {
  const games = perGame(cells)
  const icc = games.length >= settings.iccFromGames ? intraclass(games) : settings.icc
  const effect = designEffect(
    games.map((game) => game.n),
    icc,
  )
  let k = 0
  let n = 0
  for (const cell of cells) {
    const weight = recencyWeight(cell.gameAge, settings.halfLifeGames) / effect
    k += weight * cell.k
    n += weight * cell.n
  }
  return { k, n }
}

/**
 * The adjusted posterior of RECORD.md section 4. Over all triggers it is the habit's own overall rate.
 * With some triggers in view, a habit given pressed is shrunk towards that overall rate by the
 * beta-binomial of its situations; the press rate never is.
 */
function posteriorOf(
  habit: Habit,
  inView: readonly HabitCell[],
  others: readonly HabitCell[],
  settings: Settings,
): Beta | null {
  if (inView.length === 0) return null
  const seen = weighted(inView, settings)
  if (!habit.givenPressed || others.length === 0) return betaAfter(UNKNOWN, seen.k, seen.n)
  const situation = (cells: readonly HabitCell[]) => ({
    ...weighted(cells, settings),
    rows: total(cells).n,
  })
  const byTrigger = [...groupBy([...inView, ...others], (cell) => cell.trigger).values()].map(situation)
  const pool = betaBinomialPool(byTrigger, settings.pool)
  if (pool === null) return betaAfter(UNKNOWN, seen.k, seen.n)
  return betaAfter({ a: pool.mean * pool.strength, b: (1 - pool.mean) * pool.strength }, seen.k, seen.n)
}

/** A sighting is never claimed, whichever way its bound lies; a situation's cell needs lean (RECORD.md section 4). */
const leastToClaim = (situation = false): Grade => (situation ? 'lean' : 'hint')

function tendencyOf(
  habit: Habit,
  cells: readonly HabitCell[],
  options: TendencyOptions,
  settings: Settings,
): EngineTendency {
  const triggers = options.triggers ?? null
  const isInView = (cell: HabitCell) => triggers === null || triggers.includes(cell.trigger)
  const inView = cells.filter((cell) => cell.n > 0 && isInView(cell))
  const others = triggers === null ? [] : cells.filter((cell) => cell.n > 0 && !isInView(cell))
  const { k, n } = total(inView)
  const games = perGame(inView).length
  const amount = grade(n, games)
  const mayClaim = reaches(amount, leastToClaim(options.situation))
  const posterior = posteriorOf(habit, inView, others, settings)
  const range = posterior && betaInterval(posterior, 0.8)
  return {
    key: habit.key,
    k,
    n,
    games,
    rate: n === 0 ? null : k / n,
    interval: wilson(k, n),
    grade: amount,
    claim: mayClaim ? claim(k, n) : 'unclear',
    thin: thin(k, n, games),
    adjusted: posterior && range && { mean: betaMean(posterior), low80: range.low, high80: range.high },
    posterior,
  }
}

/**
 * Every habit as counted and as adjusted, in the order of the catalogue; a habit without rows has n 0,
 * no rate and no interval. Cells of unknown habits are ignored.
 */
export function tendencies(cells: readonly HabitCell[], options: TendencyOptions = {}): EngineTendency[] {
  const settings = { ...ENGINE_DEFAULTS, ...options.settings }
  const byHabit = groupBy(cells, (cell) => cell.habitKey)
  return (options.habits ?? HABITS).map((habit) =>
    tendencyOf(habit, byHabit.get(habit.key) ?? [], options, settings),
  )
}

/**
 * How many counted habits are in view, how many of them are claimed, and how many claims chance alone
 * would give were every true rate one half (RECORD.md section 4, Luck). Only cells that can be claimed
 * count for chance.
 */
export function luckOf(list: readonly Tendency[], situation = false): TendencyRead['luck'] {
  const counted = list.filter((tendency) => tendency.n > 0)
  const claimable = counted.filter((tendency) => reaches(tendency.grade, leastToClaim(situation)))
  return {
    inView: counted.length,
    claimed: counted.filter((tendency) => tendency.claim !== 'unclear').length,
    byChance: claimsByChance(claimable.map((tendency) => tendency.n)),
  }
}
