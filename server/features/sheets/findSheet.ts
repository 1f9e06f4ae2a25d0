import type { EntityManager } from 'typeorm'
import { Plan } from '../../database/entities/Plan'
import { Sheet } from '../../database/entities/Sheet'
import { findInTeam } from '../../database/findInTeam'
import { NotFound } from '../../http/problem'

/** A sheet and the plan version that it shows. @throws NotFound, also when its game was deleted: it goes with it */
export async function findSheet(
  manager: EntityManager,
  teamId: string,
  id: string,
): Promise<{ sheet: Sheet; plan: Plan }> {
  const sheet = await findInTeam(manager, Sheet, teamId, id, 'sheet')
  const plan = await manager.getRepository(Plan).findOneByOrFail({ id: sheet.planId })
  if (plan.deletedAt !== null) throw new NotFound('sheet')
  return { sheet, plan }
}
