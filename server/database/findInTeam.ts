import type { EntityManager, EntityTarget } from 'typeorm'
import { NotFound } from '../http/problem'

/**
 * The row of an id inside a team.
 * @throws NotFound when there is none, or it is another team's.
 */
export async function findInTeam<E extends { id: string; teamId: string }>(
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
