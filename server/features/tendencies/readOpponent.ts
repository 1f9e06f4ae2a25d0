import type { EntityManager } from 'typeorm'
import { thin } from '@shared/stats/evidence'
import type { TendencyFilter, TendencyRead } from '@shared/tendencies/schemas'
import { HABITS, type Habit } from '@shared/tendencies/habits'
import { PICKUPS, TRIGGERS } from '@shared/vocabulary'
import { narrows } from '../../database/counting/filters'
import {
  countGames,
  countHabits,
  countPickups,
  countSituations,
  countSpots,
  type CountedGame,
} from '../../database/counting/tendencyCounts'
import type { EngineSettings } from '../../engine/settings'
import { luckOf, tendencies, type EngineTendency, type HabitCell } from '../../engine/tendencies'

/** What is counted of an opponent in a situation, with the engine's own numbers beside it. */
export interface OpponentRead {
  games: CountedGame[]
  notCovered: number
  situations: TendencyRead['situations']
  tendencies: EngineTendency[]
  /** The counts behind them, game by game. */
  cells: HabitCell[]
  pickup: TendencyRead['pickup']
  spots: TendencyRead['spots']
  luck: TendencyRead['luck']
}

/** The pick-up at or short of which half of the rows lie, from full court outward. */
function medianPickup(rows: Awaited<ReturnType<typeof countPickups>>): TendencyRead['pickup'] {
  const n = rows.reduce((sum, row) => sum + row.rows, 0)
  if (n === 0) return null
  const games = new Set(rows.map((row) => row.gameId)).size
  let below = 0
  for (const { value } of PICKUPS) {
    const k = rows.filter((row) => row.pickup === value).reduce((sum, row) => sum + row.rows, 0)
    below += k
    if (below * 2 >= n) return { value, k, n, thin: thin(k, n, games) }
  }
  return null
}

const countOf = (list: readonly EngineTendency[], key: string) =>
  list.find((tendency) => tendency.key === key)

/**
 * Counts, tendencies, spots and luck of an opponent. An empty filter is the whole read; figures default to RECORD.md's.
 * @param habits only these are worked out, where a list of many opponents needs no more
 */
export async function readOpponent(
  manager: EntityManager,
  opponentId: string,
  filter: TendencyFilter,
  settings?: EngineSettings,
  habits: readonly Habit[] = HABITS,
): Promise<OpponentRead> {
  const { games, notCovered } = await countGames(manager, opponentId, filter)
  const ages = new Map(games.map((game) => [game.id, game.age]))
  // All triggers are counted: what a filter leaves out still says how their rate usually lies (pooling).
  const cells = await countHabits(manager, opponentId, { ...filter, trigger: undefined }, ages)
  const list = tendencies(cells, {
    situation: narrows(filter),
    triggers: filter.trigger ?? null,
    settings,
    habits,
  })
  const counted = await countSituations(manager, opponentId, filter)
  const all = counted.reduce((sum, row) => ({ n: sum.n + row.n, pressed: sum.pressed + row.pressed }), {
    n: 0,
    pressed: 0,
  })
  const trapped = countOf(list, 'trap')
  const again = countOf(list, 'trap-again')
  const spots = await countSpots(manager, opponentId, filter)
  return {
    games: games.filter((game) => game.rows > 0),
    notCovered,
    situations: [
      { trigger: 'all', ...all },
      ...TRIGGERS.map(
        ({ value }) => counted.find((row) => row.trigger === value) ?? { trigger: value, n: 0, pressed: 0 },
      ),
    ],
    tendencies: list,
    cells,
    pickup: medianPickup(await countPickups(manager, opponentId, filter)),
    spots: spots.map((spot) => ({ ...spot, n: (spot.order === 'first' ? trapped?.n : again?.n) ?? 0 })),
    luck: luckOf(list, narrows(filter)),
  }
}
