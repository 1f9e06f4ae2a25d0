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
  const only = opponentId ? 'AND opponentId = ?' : ''
  const scope = opponentId ? [teamId, opponentId] : [teamId]
  const shapes: ShapeCount[] = await manager.query(
    `WITH source AS (
       SELECT id, opponentId, coverageKind, coverageFrom, coverageTo, rulePack FROM scouted_games WHERE teamId = ? ${only}
       UNION ALL
       SELECT id, opponentId, 'all', NULL, NULL, rulePack FROM games WHERE teamId = ? ${only})
     SELECT s.opponentId, p.shape, count(*) AS possessions, sum(${PRESSED} AND ${COVERED}) AS pressed,
            sum(${HAS_SHAPE} AND ${COVERED}) AS pressable
       FROM source s JOIN possessions p ON (p.scoutedGameId = s.id OR p.gameId = s.id) AND p.deletedAt IS NULL
      GROUP BY s.opponentId, p.shape`,
    [...scope, ...scope],
  )
  const games: { opponentId: string; scoutedGames: number }[] = await manager.query(
    `SELECT opponentId, count(*) AS scoutedGames FROM scouted_games WHERE teamId = ? ${only} GROUP BY opponentId`,
    scope,
  )
  const meetings: { opponentId: string; id: string; tipOff: string; place: 'home' | 'away' | 'neutral' }[] =
    await manager.query(
      `SELECT opponentId, id, min(tipOff) AS tipOff, place FROM games
        WHERE teamId = ? ${only} AND tipOff >= ? GROUP BY opponentId`,
      [...scope, now.toISOString()],
    )
  const result = new Map<string, OpponentCounts>()
  const entry = (id: string): OpponentCounts => {
    const fresh = {
      counts: { scoutedGames: 0, possessions: 0, pressed: 0, pressable: 0, mostlyShape: null },
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
  for (const { opponentId: id, ...game } of meetings) entry(id).nextGame = game
  return result
}
