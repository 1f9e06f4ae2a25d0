import type { EntityManager } from 'typeorm'
import { is, JOINED, NOT_STOPPED, PRESSED, SOURCES, THROUGH } from './expressions'

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

/** The ball was last in the middle lane short of the front wing: where a pass was taken there, it was one to the middle. */
const LAST_IN_MIDDLE = `coalesce(
  json_extract(p.track, '$[#-1].y') BETWEEN 0.33 AND 0.67 AND json_extract(p.track, '$[#-1].x') BETWEEN 0.16 AND 0.62, 0)`

/** Most live losses in the middle lane to one of theirs whose number was seen; 0 when there was none. */
export async function countTheirStealsInMiddle(manager: EntityManager, opponentId: string): Promise<number> {
  const [row]: { n: number }[] = await manager.query(
    `WITH ${SOURCES}
     SELECT count(*) AS n FROM ${JOINED}
      WHERE ${is('p.outcome', 'lost-live')} AND json_type(p.thief) = 'integer' AND ${LAST_IN_MIDDLE}
      GROUP BY p.thief ORDER BY n DESC LIMIT 1`,
    [opponentId, opponentId],
  )
  return row?.n ?? 0
}

/** Live losses in the middle lane in our own games. */
export async function countOurStealsInMiddle(manager: EntityManager, teamId: string): Promise<number> {
  const [row]: { n: number }[] = await manager.query(
    `SELECT count(*) AS n FROM possessions p
      WHERE p.teamId = ? AND p.gameId IS NOT NULL AND p.deletedAt IS NULL
        AND ${is('p.outcome', 'lost-live')} AND ${LAST_IN_MIDDLE}`,
    [teamId],
  )
  return row?.n ?? 0
}
