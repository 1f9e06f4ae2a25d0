import type { DataSource } from 'typeorm'

/** Moving rows about leaves old copies in a page's free room, which secure_delete does not see; a rewrite does. */
export async function leaveNoByte(db: DataSource): Promise<void> {
  await db.query('VACUUM')
  await db.query('PRAGMA wal_checkpoint(TRUNCATE)')
}
