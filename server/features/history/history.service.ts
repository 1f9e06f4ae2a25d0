import type { EntityManager } from 'typeorm'
import { Change } from '../../database/entities/Change'
import { undoUntil } from '../../database/hanging'
import { NotFound } from '../../http/problem'

/** Whether the team itself or a row of any of its tables has this id and is there, or can still be put back. */
async function isOfTeam(manager: EntityManager, teamId: string, id: string, now: Date): Promise<boolean> {
  if (id === teamId) return true
  const tables = manager.connection.entityMetadatas.filter((entity) =>
    ['teamId', 'deletedAt', 'version'].every((column) => entity.findColumnWithPropertyName(column)),
  )
  const parts = tables.map(
    ({ tableName }) =>
      `SELECT 1 FROM "${tableName}" WHERE id = ? AND teamId = ? AND (deletedAt IS NULL OR deletedAt > ?)`,
  )
  // A still is there while its possession is; a membership has no undo.
  const stills = `SELECT 1 FROM stills s JOIN possessions p ON p.id = s.possessionId
                   WHERE s.id = ? AND s.teamId = ? AND (p.deletedAt IS NULL OR p.deletedAt > ?)`
  const members = 'SELECT 1 FROM memberships WHERE id = ? AND teamId = ?'
  const found: unknown[] = await manager.query(`${[...parts, stills, members].join(' UNION ALL ')} LIMIT 1`, [
    ...[...parts, stills].flatMap(() => [id, teamId, undoUntil(now)]),
    id,
    teamId,
  ])
  return found.length > 0
}

/** What happened to a row, oldest first. @throws NotFound when no row of the team has this id */
export async function historyOf(
  manager: EntityManager,
  teamId: string,
  rowId: string,
  now: Date,
): Promise<Change[]> {
  if (!(await isOfTeam(manager, teamId, rowId, now))) throw new NotFound('row')
  return manager.getRepository(Change).find({
    where: { teamId, rowId },
    relations: { person: true },
    order: { at: 'ASC' },
  })
}
