import type { TendencyRead } from '@shared/tendencies/schemas'
import type { CountedGame } from '../../database/counting/tendencyCounts'
import type { OpponentRead } from './readOpponent'

/** "v Tarn Valley", or "against us" for one of our own games. */
export const gameLabel = (game: Pick<CountedGame, 'kind' | 'foe'>): string =>
  game.kind === 'ours' ? 'against us' : `v ${game.foe}`

export function presentRead(
  opponentId: string,
  read: OpponentRead,
  ball: TendencyRead['ball'],
): TendencyRead {
  return {
    opponentId,
    counted: read.games.reduce((sum, game) => sum + game.rows, 0),
    notCovered: read.notCovered,
    games: read.games.map((game) => ({
      id: game.id,
      kind: game.kind,
      label: gameLabel(game),
      playedOn: game.day,
      rows: game.rows,
    })),
    situations: read.situations,
    tendencies: read.tendencies.map(({ posterior: _posterior, ...tendency }) => tendency),
    pickup: read.pickup,
    spots: read.spots,
    ball,
    luck: read.luck,
  }
}
