import type { DataSource } from 'typeorm'
import { Invitation } from '../../database/entities/Invitation'
import { forgetHistory } from '../../database/history'

/** Days that an invitation which opens nothing any more stays on the page; then its address is nobody's business. */
const DAYS = 90

/** Deletes invitations that were used, taken back or past their day for as long, with their history. */
export async function forgetOldInvitations(db: DataSource, now: Date): Promise<void> {
  const until = new Date(now.getTime() - DAYS * 86_400_000).toISOString()
  await db.transaction(async (manager) => {
    const old = await manager
      .createQueryBuilder(Invitation, 'row')
      .select('row.id')
      .where('(row.usedAt <= :until OR row.revokedAt <= :until OR row.expiresAt <= :until)', { until })
      .getMany()
    if (old.length === 0) return
    const ids = old.map(({ id }) => id)
    await forgetHistory(manager, ids)
    await manager.delete(Invitation, ids)
  })
}
