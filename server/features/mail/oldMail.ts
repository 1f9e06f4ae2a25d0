import type { DataSource } from 'typeorm'
import { Mail } from '../../database/entities/Mail'

/** Days that a letter stays on the staff's page; after that nobody needs to know whom it went to. */
const DAYS = 90

/** Deletes letters that are over and as old as that. What still waits stays. */
export async function forgetOldMail(db: DataSource, now: Date): Promise<void> {
  const until = new Date(now.getTime() - DAYS * 86_400_000).toISOString()
  await db
    .getRepository(Mail)
    .createQueryBuilder()
    .delete()
    .where("createdAt <= :until AND state NOT IN ('waiting', 'sending')", { until })
    .execute()
}
