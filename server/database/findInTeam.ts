import type { EntityManager, EntityTarget } from 'typeorm'
import { NotFound } from '../http/problem'

/**
 * The row of an id inside a team.
 * @throws NotFound when there is none, it is another team's, or it was deleted.
 */
export async function findInTeam<E extends { id: string; teamId: string }>(
  manager: EntityManager,
  entity: EntityTarget<E>,
  teamId: string,
  id: string,
  what: string,
): Promise<E> {
  const row = await findAlsoDeleted(manager, entity, teamId, id, what)
  if ('deletedAt' in row && row.deletedAt !== null) throw new NotFound(what)
  return row
}

/**
 * The same, also for a row that was deleted and can still be put back.
 * @throws NotFound when there is none, or it is another team's.
 */
export async function findAlsoDeleted<E extends { id: string; teamId: string }>(
  manager: EntityManager,
  entity: EntityTarget<E>,
  teamId: string,
  id: string,
  what: string,
): Promise<E> {
  const row = await manager
    .getRepository(entity)
    .createQueryBuilder('row')
    .where('row.id = :id AND row.teamId = :teamId', { id, teamId })
    .getOne()
  if (!row) throw new NotFound(what)
  return row
}
