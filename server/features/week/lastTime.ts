import type { EntityManager } from 'typeorm'
import type { GameRow } from '@shared/games/schemas'
import { betaAfter, betaMean, betaOf } from '@shared/stats/beta'
import { predictiveRange } from '@shared/stats/predictive'
import type { LastCall, LastTime } from '@shared/week/schemas'
import { NOT_STOPPED, PRESSED, THROUGH } from '../../database/counting/expressions'
import type { EngineSettings } from '../../engine/settings'
import { engineSettings } from '../team/team.service'

/** Pressed trips of our own games that were not stopped, by game, counter and shape. */
export interface OwnCell {
  gameId: string
  /** Whether the game was played before the one in question. */
  earlier: 0 | 1
  counterId: string | null
  shape: string
  k: number
  n: number
}

const sum = (cells: readonly OwnCell[]) =>
  cells.reduce((all, { k, n }) => ({ k: all.k + k, n: all.n + n }), { k: 0, n: 0 })

/**
 * How many of n trips with a counter our record before the game let us expect. As RECORD.md section 5 has it, but for
 * the rules, which rested on a read that has grown since: base from our own success, then the counter's own trips,
 * against the same shape worth one and against others a quarter. The range is of a new game's few trips, so it is
 * the predictive one.
 */
export function expectedBefore(
  cells: readonly OwnCell[],
  counterId: string,
  shape: string | null,
  n: number,
  { basePrior, priorTrips, recordWeights }: EngineSettings,
): LastCall['expected'] {
  const earlier = cells.filter((cell) => cell.earlier === 1)
  const own = sum(earlier)
  const base = betaMean(betaAfter(betaOf(basePrior.rate, basePrior.trips), own.k, own.n))
  const posterior = earlier
    .filter((cell) => cell.counterId === counterId)
    .reduce(
      (beta, cell) => {
        const weight = cell.shape === shape ? recordWeights.sameShape : recordWeights.otherShape
        return betaAfter(beta, weight * cell.k, weight * cell.n)
      },
      betaOf(base, priorTrips),
    )
  return predictiveRange(posterior, n)
}

/** Expected against what happened in our last game; null when no trip of it was pressed. */
export async function lastTimeOut(
  manager: EntityManager,
  teamId: string,
  game: GameRow,
): Promise<LastTime | null> {
  const cells: OwnCell[] = await manager.query(
    `SELECT p.gameId, g.tipOff < ? AS earlier, p.counterId, p.shape, count(*) AS n, sum(${THROUGH}) AS k
       FROM possessions p JOIN games g ON g.id = p.gameId
      WHERE p.teamId = ? AND p.deletedAt IS NULL AND g.deletedAt IS NULL AND (g.id = ? OR g.tipOff < ?)
        AND ${PRESSED} AND ${NOT_STOPPED}
      GROUP BY p.gameId, p.counterId, p.shape`,
    [game.tipOff, teamId, game.id, game.tipOff],
  )
  const now = cells.filter((cell) => cell.gameId === game.id)
  const pressed = sum(now)
  if (pressed.n === 0) return null
  const lost: LastTime['lost'] = await manager.query(
    `SELECT p.outcomePlace AS place, count(*) AS count FROM possessions p
      WHERE p.gameId = ? AND p.deletedAt IS NULL AND ${PRESSED} AND ${NOT_STOPPED} AND NOT ${THROUGH}
      GROUP BY p.outcomePlace ORDER BY count DESC`,
    [game.id],
  )
  const names: { id: string; name: string }[] = await manager.query(
    'SELECT id, name FROM counters WHERE teamId = ?',
    [teamId],
  )
  const settings = await engineSettings(manager, teamId)
  const shapes = new Map<string, number>()
  for (const { shape, n } of now) shapes.set(shape, (shapes.get(shape) ?? 0) + n)
  const shape = [...shapes].sort((a, b) => b[1] - a[1])[0]?.[0] ?? null
  const calls = names
    .map(({ id, name }): LastCall => {
      const { k, n } = sum(now.filter((cell) => cell.counterId === id))
      const before = sum(cells.filter((cell) => cell.earlier === 1 && cell.counterId === id))
      return { counterId: id, name, k, n, before, expected: expectedBefore(cells, id, shape, n, settings) }
    })
    .filter(({ n }) => n > 0)
    .sort((a, b) => b.n - a.n || a.name.localeCompare(b.name))
  return {
    gameId: game.id,
    opponentId: game.opponentId,
    opponentName: game.opponentName,
    tipOff: game.tipOff,
    place: game.place,
    shape,
    pressed,
    lost,
    calls,
  }
}
