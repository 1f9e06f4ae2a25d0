import { z } from 'zod'
import { RulePackKey } from '@shared/court/rulePacks'
import type { GameRow } from '@shared/games/schemas'
import type { ScoutedGameRow } from '@shared/scoutedGames/schemas'

/** The game whose possessions are logged: one that a scout watched, or one of our own after it was played. */
export const LogGame = z.object({
  id: z.uuid(),
  ours: z.boolean(),
  opponentId: z.uuid(),
  rulePack: RulePackKey,
  /** Whom they pressed. */
  foe: z.string(),
  /** Calendar day in the team's zone. */
  day: z.string(),
  /** "live" or "on film"; null for ours. */
  seen: z.enum(['live', 'film']).nullable(),
})
export type LogGame = z.infer<typeof LogGame>

export const scoutedLogGame = (game: ScoutedGameRow): LogGame => ({
  id: game.id,
  ours: false,
  opponentId: game.opponentId,
  rulePack: game.rulePack,
  foe: game.foe,
  day: game.playedOn,
  seen: game.seen,
})

/**
 * One of our own games.
 * @param team our name as it stands beside theirs
 * @param day the day of its tip-off in the team's zone
 */
export const ownLogGame = (game: GameRow, team: string, day: string): LogGame => ({
  id: game.id,
  ours: true,
  opponentId: game.opponentId,
  rulePack: game.rulePack,
  foe: team,
  day,
  seen: null,
})
