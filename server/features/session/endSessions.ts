import type { EntityManager } from 'typeorm'
import { StoredSession } from '../../database/entities/StoredSession'

/** Signs a person out everywhere, but for one session that may stay. */
export async function endSessions(
  manager: EntityManager,
  personId: string,
  but: string | null = null,
): Promise<void> {
  await manager
    .getRepository(StoredSession)
    .createQueryBuilder()
    .delete()
    // Where passport keeps who is signed in, inside express-session's own JSON.
    .where("json_extract(data, '$.passport.user') = :personId", { personId })
    .andWhere('id <> :but', { but: but ?? '' })
    .execute()
}
