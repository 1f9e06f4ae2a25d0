import type { EntityManager } from 'typeorm'
import type { OpponentRow } from '@shared/opponents/schemas'
import { COVERED, HAS_SHAPE, PRESSED } from './expressions'

export interface OpponentCounts {
  counts: OpponentRow['counts']
  nextGame: OpponentRow['nextGame']
}

interface ShapeCount {
  opponentId: string
  shape: string | null
  possessions: number
  pressed: number
  pressable: number
}

/** Counts and next meeting of every opponent of a team, or of one. */
export async function countOpponents(
  manager: EntityManager,
  teamId: string,
  now: Date,
  opponentId?: string,
): Promise<Map<string, OpponentCounts>> {
  const onlyOf = (table: string) => (opponentId ? `AND ${table}.opponentId = ?` : '')
  const scope = opponentId ? [teamId, opponentId] : [teamId]
  const shapes: ShapeCount[] = await manager.query(
    `WITH source AS (
       SELECT g.opponentId, g.coverageKind, g.coverageFrom, g.coverageTo, g.rulePack, p.rowid AS possession
         FROM scouted_games g JOIN possessions p ON p.scoutedGameId = g.id
        WHERE g.teamId = ? ${onlyOf('g')} AND +p.deletedAt IS NULL
       UNION ALL
       SELECT g.opponentId, 'all', NULL, NULL, g.rulePack, p.rowid
         FROM games g JOIN possessions p ON p.gameId = g.id
        WHERE g.teamId = ? ${onlyOf('g')} AND +p.deletedAt IS NULL)
     SELECT s.opponentId, p.shape, count(*) AS possessions, sum(${PRESSED} AND ${COVERED}) AS pressed,
            sum(${HAS_SHAPE} AND ${COVERED}) AS pressable
       FROM source s CROSS JOIN possessions p ON p.rowid = s.possession
      GROUP BY s.opponentId, p.shape`,
    [...scope, ...scope],
  )
  const games: { opponentId: string; scoutedGames: number }[] = await manager.query(
    `SELECT opponentId, count(*) AS scoutedGames FROM scouted_games g
      WHERE teamId = ? ${onlyOf('g')} AND deletedAt IS NULL GROUP BY opponentId`,
    scope,
  )
  const ours: { opponentId: string; ourGames: number }[] = await manager.query(
    `SELECT g.opponentId, count(*) AS ourGames FROM games g
      WHERE g.teamId = ? ${onlyOf('g')} AND g.deletedAt IS NULL
        AND EXISTS (SELECT 1 FROM possessions p WHERE p.gameId = g.id AND +p.deletedAt IS NULL)
      GROUP BY g.opponentId`,
    scope,
  )
  const meetings: { opponentId: string; id: string; tipOff: string; place: 'home' | 'away' | 'neutral' }[] =
    await manager.query(
      `SELECT opponentId, id, min(tipOff) AS tipOff, place FROM games g
        WHERE teamId = ? ${onlyOf('g')} AND tipOff >= ? AND deletedAt IS NULL GROUP BY opponentId`,
      [...scope, now.toISOString()],
    )
  const result = new Map<string, OpponentCounts>()
  const entry = (id: string): OpponentCounts => {
    const fresh = {
      counts: { scoutedGames: 0, ourGames: 0, possessions: 0, pressed: 0, pressable: 0, mostlyShape: null },
      nextGame: null,
    }
    const present = result.get(id) ?? fresh
    result.set(id, present)
    return present
  }
  for (const row of shapes) {
    const { counts } = entry(row.opponentId)
    counts.possessions += row.possessions
    counts.pressed += row.pressed
    counts.pressable += row.pressable
    if (row.shape && row.pressed > (counts.mostlyShape?.k ?? 0))
      counts.mostlyShape = { shape: row.shape, k: row.pressed, n: 0 }
  }
  for (const { counts } of result.values()) if (counts.mostlyShape) counts.mostlyShape.n = counts.pressed
  for (const row of games) entry(row.opponentId).counts.scoutedGames = row.scoutedGames
  for (const row of ours) entry(row.opponentId).counts.ourGames = row.ourGames
  for (const { opponentId: id, ...game } of meetings) entry(id).nextGame = game
  return result
}
