import { IsNull, type DataSource, type EntityManager } from 'typeorm'
import type { ScoutedGameBody, ScoutedGameRow } from '@shared/scoutedGames/schemas'
import { PRESSED } from '../../database/counting/expressions'
import { scoutedGameColumns } from '../../database/columnsOf'
import { Opponent } from '../../database/entities/Opponent'
import { ScoutedGame } from '../../database/entities/ScoutedGame'
import { findInTeam } from '../../database/findInTeam'
import { putRow, type Put } from '../../database/putRow'
import { bodyOfScoutedGame, presentScoutedGame } from './scoutedGames.presenter'

/** Rows, pressed rows and stills of each scouted game of an opponent, counted in SQL. */
async function countByGame(
  manager: EntityManager,
  opponentId: string,
): Promise<Map<string, ScoutedGameRow['counts']>> {
  const rows: ({ id: string } & ScoutedGameRow['counts'])[] = await manager.query(
    `SELECT g.id, count(p.id) AS possessions, coalesce(sum(${PRESSED}), 0) AS pressed,
            coalesce(sum((SELECT count(*) FROM stills s WHERE s.possessionId = p.id)), 0) AS stills
       FROM scouted_games g LEFT JOIN possessions p ON p.scoutedGameId = g.id AND p.deletedAt IS NULL
      WHERE g.opponentId = ? GROUP BY g.id`,
    [opponentId],
  )
  return new Map(rows.map(({ id, ...counts }) => [id, counts]))
}

/** Scouted games of an opponent, newest first. @throws NotFound */
export async function listScoutedGames(
  db: DataSource,
  teamId: string,
  opponentId: string,
): Promise<ScoutedGameRow[]> {
  await findInTeam(db.manager, Opponent, teamId, opponentId, 'opponent')
  const rows = await db.getRepository(ScoutedGame).find({
    where: { teamId, opponentId, deletedAt: IsNull() },
    relations: { scout: true },
    order: { playedOn: 'DESC', createdAt: 'DESC' },
  })
  const counts = await countByGame(db.manager, opponentId)
  return rows.map((row) => presentScoutedGame(row, counts.get(row.id)))
}

/** One scouted game with its counts. @throws NotFound */
export async function getScoutedGame(
  manager: EntityManager,
  teamId: string,
  id: string,
): Promise<ScoutedGameRow> {
  const found = await findInTeam(manager, ScoutedGame, teamId, id, 'scouted game')
  const row = await manager.findOneOrFail(ScoutedGame, {
    where: { id: found.id },
    relations: { scout: true },
  })
  const counts = await countByGame(manager, row.opponentId)
  return presentScoutedGame(row, counts.get(row.id))
}

/** Whoever logged it first stays its scout. @throws NotFound, Conflict, StaleVersion */
export function putScoutedGame(
  db: DataSource,
  options: {
    id: string
    teamId: string
    scoutId: string
    body: ScoutedGameBody
    ifMatch: number | null
    now: Date
  },
): Promise<Put<ScoutedGame>> {
  return db.transaction(async (manager) => {
    await findInTeam(manager, Opponent, options.teamId, options.body.opponentId, 'opponent')
    const there = await manager.findOneBy(ScoutedGame, { id: options.id })
    return putRow<ScoutedGame, ScoutedGameBody>({
      ...options,
      by: options.scoutId,
      manager,
      entity: ScoutedGame,
      what: 'scouted game',
      bodyOf: bodyOfScoutedGame,
      columnsOf: (body) => ({ ...scoutedGameColumns(body), scoutId: there?.scoutId ?? options.scoutId }),
      present: (row) => getScoutedGame(manager, options.teamId, row.id),
    })
  })
}
