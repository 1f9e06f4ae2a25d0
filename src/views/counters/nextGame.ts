import type { Choice } from '@shared/choices/schemas'
import type { GameRow } from '@shared/games/schemas'
import type { PlanRow } from '@shared/plans/schemas'
import { getChoices } from '@/api/choices'
import { listGames } from '@/api/games'
import { getPlan } from '@/api/plans'

/** The game that is played next; null when none is ahead. `now` in milliseconds since 1970. */
export function nextGameOf(games: readonly GameRow[], now: number): GameRow | null {
  return gamesAhead(games, now)[0] ?? null
}

/** The games that are still to be played, the next one first. */
export function gamesAhead(games: readonly GameRow[], now: number): GameRow[] {
  const ahead = games.filter((game) => Date.parse(game.tipOff) > now)
  return ahead.sort((one, two) => Date.parse(one.tipOff) - Date.parse(two.tipOff))
}

export interface NextGame {
  game: GameRow
  /** The shape they show most; null while nothing is counted. */
  mostly: string | null
  plan: PlanRow | null
  /** The counters in order against them, with who fits which role. */
  choices: readonly Choice[]
}

/** What the book marks for the next game: their shape and what is picked. Null when no game is ahead. */
export async function loadNextGame(team: string, now: number, signal: AbortSignal): Promise<NextGame | null> {
  const game = nextGameOf((await listGames(team, signal)).rows, now)
  if (game === null) return null
  const [choices, { plan }] = await Promise.all([
    getChoices(team, game.id, signal),
    getPlan(team, game.id, signal),
  ])
  return { game, mostly: choices.mostly?.shape ?? null, plan, choices: choices.choices }
}

/** What a counter is picked as in a plan, in words; empty when it is not. */
export function pickedWords(plan: PlanRow | null, counterId: string): string {
  if (plan?.firstCallId === counterId) return 'First call'
  if (plan?.changeUpId === counterId) return 'Change-up'
  return ''
}
