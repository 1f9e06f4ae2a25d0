import type { GameBody, GameRow } from '@shared/games/schemas'
import type { Game } from '../../database/entities/Game'
import { metaOf } from '../../http/present'

/** What stands around a game; the station follows from it. */
export interface GameFacts {
  opponentName: string
  possessions: number
  scoutedGames: number
  plan: GameRow['plan']
  headCoach: GameRow['headCoach']
}

/** Fewer counted possessions than this and the game is still with the scout (setting). */
const ENOUGH_TO_READ = 10

/** Where the work stands, from what is there: counted, chosen and signed, played. */
export function stationOf(
  tipOff: string,
  facts: Pick<GameFacts, 'possessions' | 'plan'>,
  now: Date,
): GameRow['station'] {
  if (tipOff <= now.toISOString()) return 'review'
  if (facts.plan?.signedAt) return 'teach'
  return facts.possessions < ENOUGH_TO_READ ? 'scout' : 'choose'
}

const NOT_DUE: GameBody['due'] = { scout: null, read: null, teach: null, review: null }

export const bodyOfGame = (row: Game): GameBody => ({
  opponentId: row.opponentId,
  tipOff: row.tipOff,
  place: row.place,
  rulePack: row.rulePack,
  chooseBy: row.chooseBy,
  due: row.due ?? NOT_DUE,
  notes: row.notes,
})

export const presentGame = (row: Game, facts: GameFacts, now: Date): GameRow => ({
  ...metaOf(row),
  ...bodyOfGame(row),
  opponentName: facts.opponentName,
  station: stationOf(row.tipOff, facts, now),
  counts: { possessions: facts.possessions, scoutedGames: facts.scoutedGames },
  plan: facts.plan,
  headCoach: facts.headCoach,
})
