import type { EntityManager } from 'typeorm'
import { is, NOT_STOPPED, PRESSED, THROUGH } from './expressions'

/** Our own game trips with a counter against a shape: n counts pressed rows that were not stopped. */
export interface RecordCell {
  counterId: string
  shape: string
  k: number
  n: number
}

/** Records of every counter of a team. */
export function countRecords(manager: EntityManager, teamId: string): Promise<RecordCell[]> {
  return manager.query(
    `SELECT p.counterId, p.shape, count(*) AS n, sum(${THROUGH}) AS k
       FROM possessions p
      WHERE p.teamId = ? AND p.counterId IS NOT NULL AND p.gameId IS NOT NULL AND p.deletedAt IS NULL
        AND ${PRESSED} AND ${NOT_STOPPED}
      GROUP BY p.counterId, p.shape ORDER BY n DESC`,
    [teamId],
  )
}

/** Our own success against pressure over all counters and none. */
export async function countOwnSuccess(
  manager: EntityManager,
  teamId: string,
): Promise<{ k: number; n: number }> {
  const [row]: { k: number | null; n: number }[] = await manager.query(
    `SELECT count(*) AS n, sum(${THROUGH}) AS k FROM possessions p
      WHERE p.teamId = ? AND p.gameId IS NOT NULL AND p.deletedAt IS NULL AND ${PRESSED} AND ${NOT_STOPPED}`,
    [teamId],
  )
  return { k: row?.k ?? 0, n: row?.n ?? 0 }
}

/** Throw-ins of our own games on which the count ran out. */
export async function countOwnThrowInCounts(manager: EntityManager, teamId: string): Promise<number> {
  const [row]: { n: number }[] = await manager.query(
    `SELECT count(*) AS n FROM possessions p
      WHERE p.teamId = ? AND p.gameId IS NOT NULL AND p.deletedAt IS NULL
        AND ${is('p.outcome', 'count')} AND ${is('p.outcomePlace', 'entry')}`,
    [teamId],
  )
  return row?.n ?? 0
}
