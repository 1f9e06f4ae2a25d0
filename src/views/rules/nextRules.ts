import type { Choices } from '@shared/choices/schemas'
import type { GameRow } from '@shared/games/schemas'
import type { TendencyRead } from '@shared/tendencies/schemas'
import { getChoices } from '@/api/choices'
import { listGames } from '@/api/games'
import { getTendencies } from '@/api/tendencies'
import { nextGameOf } from '../counters/nextGame'

export interface NextOrder {
  game: GameRow
  choices: Choices
  read: TendencyRead
}

/** The order for the next game and the counts that it rests on; null when no game is ahead. */
export async function loadNextOrder(
  team: string,
  now: number,
  signal: AbortSignal,
): Promise<NextOrder | null> {
  const game = nextGameOf((await listGames(team, signal)).rows, now)
  if (game === null) return null
  const [choices, read] = await Promise.all([
    getChoices(team, game.id, signal),
    getTendencies(team, game.opponentId, {}, signal),
  ])
  return { game, choices, read }
}
