import { join } from 'node:path'
import Database from 'better-sqlite3'
import type { DataSource } from 'typeorm'
import { Erasure } from '../database/entities/Erasure'
import { Team } from '../database/entities/Team'
import { eraseSubject } from '../features/people/eraseSubject'
import { leaveNoByte } from '../features/people/leaveNoByte'
import { NotFound } from '../http/problem'
import { exists } from './files'
import { DATABASE_FILE } from './manifest'

type DoneErasure = Omit<Erasure, 'team' | 'askedBy' | 'stoppedBy'>

/**
 * Who was erased in the database that a restore is about to replace: ids and times only, no names. Null where
 * there is none to ask, or it cannot be read.
 */
export async function doneErasures(dataDir: string): Promise<DoneErasure[] | null> {
  const file = join(dataDir, DATABASE_FILE)
  if (!(await exists(file))) return null
  try {
    const connection = new Database(file, { fileMustExist: true, readonly: true })
    try {
      return connection.prepare('SELECT * FROM "erasures" WHERE "doneAt" IS NOT NULL').all() as DoneErasure[]
    } finally {
      connection.close()
    }
  } catch (error) {
    // Damaged, or older than erasures: the restore is often there to mend just that.
    if (error instanceof Database.SqliteError) return null
    throw error
  }
}

/**
 * Does erasures again in a database that was backed up before them, so that nobody comes back by a restore, and
 * keeps them there for the next one. Returns how many people the backup still held.
 */
export async function eraseAgain(db: DataSource, erasures: readonly DoneErasure[]): Promise<number> {
  let held = 0
  for (const erasure of erasures)
    await db.transaction(async (manager) => {
      if (!(await manager.existsBy(Team, { id: erasure.teamId }))) return
      try {
        await eraseSubject(manager, erasure.teamId, { kind: erasure.kind, id: erasure.subjectId })
        held += 1
      } catch (error) {
        if (!(error instanceof NotFound)) throw error
      }
      // Whoever asked may not be among the people of the backup.
      const kept = { ...erasure, askedById: null, stoppedById: null }
      await manager.upsert(Erasure, kept, ['id'])
    })
  if (held > 0) await leaveNoByte(db)
  return held
}
