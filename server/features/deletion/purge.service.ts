import type { DataSource } from 'typeorm'
import type { StillFiles } from '../../adapters/stillFiles'
import { DELETABLE_TABLES, PURGE_STATEMENTS, undoUntil } from '../../database/hanging'

/**
 * Rows whose ten minutes are over go for good, with all that hangs on them, their history and their stills'
 * files. Returns how many went, children too. Files go first: if that fails, the rows are still there to try
 * again from.
 */
export async function purgeDeleted(db: DataSource, files: StillFiles, now: Date): Promise<number> {
  const until = undoUntil(now)
  const [over]: { n: number }[] = await db.query(
    `SELECT ${DELETABLE_TABLES.map((table) => `(SELECT count(*) FROM "${table}" WHERE "deletedAt" <= ?)`).join(' + ')} AS n`,
    DELETABLE_TABLES.map(() => until),
  )
  const gone = over?.n ?? 0
  if (gone > 0) {
    const stills: { id: string; teamId: string }[] = await db.query(
      `SELECT s.id, s.teamId FROM possessions p JOIN stills s ON s.possessionId = p.id WHERE p.deletedAt <= ?`,
      [until],
    )
    for (const still of stills) await files.remove(still.teamId, still.id)
    await db.transaction(async (manager) => {
      for (const { sql } of PURGE_STATEMENTS) await manager.query(sql, sql.includes('?') ? [until] : [])
    })
  }
  // What was overwritten in the database lives on in its log until that is emptied.
  await db.query('PRAGMA wal_checkpoint(TRUNCATE)')
  return gone
}
