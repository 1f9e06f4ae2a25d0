import type { EntityManager } from 'typeorm'
import type { OpponentPlayerRow } from '@shared/opponents/players'
import { JOINED, SOURCES } from './expressions'

/**
 * What each shirt number of an opponent did, over all rows against them: rows with it on the floor, traps that
 * it came to, balls that it took. Numbers that nobody logged are not among them.
 */
export async function countJerseys(
  manager: EntityManager,
  opponentId: string,
): Promise<Map<number, OpponentPlayerRow['counts']>> {
  const rows: ({ jersey: number } & OpponentPlayerRow['counts'])[] = await manager.query(
    `WITH ${SOURCES}, seen AS (
       SELECT j.value AS jersey, 1 AS onFloor, 0 AS traps, 0 AS steals FROM ${JOINED}, json_each(p.onFloor) j
        WHERE p.onFloor IS NOT NULL
       UNION ALL
       SELECT j.value, 0, 1, 0 FROM ${JOINED} JOIN traps t ON t.possessionId = p.id, json_each(t.trappers) j
        WHERE t.trappers IS NOT NULL
       UNION ALL
       SELECT json_extract(p.thief, '$'), 0, 0, 1 FROM ${JOINED}
        WHERE p.thief IS NOT NULL AND json_type(p.thief) = 'integer')
     SELECT jersey, sum(onFloor) AS onFloor, sum(traps) AS traps, sum(steals) AS steals FROM seen GROUP BY jersey`,
    [opponentId, opponentId],
  )
  return new Map(rows.map(({ jersey, ...counts }) => [jersey, counts]))
}
