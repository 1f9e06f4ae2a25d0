import type { z } from 'zod'
import type { GameBody } from '@shared/games/schemas'
import type { OpponentBody } from '@shared/opponents/schemas'
import type { PossessionInput } from '@shared/possessions/schemas'
import type { ScoutedGameBody } from '@shared/scoutedGames/schemas'

/** Rows of the scenario name each other by key; whoever writes them makes the ids. */
export type DemoOpponent = z.input<typeof OpponentBody> & { key: string }
export type DemoGame = Omit<z.input<typeof GameBody>, 'opponentId'> & {
  key: string
  opponentKey: string
  /** Key of the person who signed the read off, if somebody did. */
  readKey: string | null
}
export type DemoScoutedGame = Omit<z.input<typeof ScoutedGameBody>, 'opponentId'> & {
  key: string
  opponentKey: string
  /** Key of the person who watched it. */
  scoutKey: string
}
export type DemoPossession = Omit<PossessionInput, 'scoutedGameId' | 'gameId' | 'counterId' | 'tripId'> & {
  key: string
  /** Exactly one of the two is set. */
  scoutedGameKey: string | null
  gameKey: string | null
  counterKey: string | null
  /** Rows of one trip share it; null for a trip of one row. */
  tripKey: string | null
}

/** A possession before it has a place in its game. */
export type Draft = Omit<
  DemoPossession,
  'key' | 'number' | 'period' | 'clock' | 'margin' | 'scoutedGameKey' | 'gameKey' | 'counterKey' | 'tripKey'
> & { counterKey?: string }

/** The rows of one trip, in order. */
export type Trip = Draft[]
