import type { DataSource, EntityManager } from 'typeorm'
import { LIMITS } from '@shared/limits'
import type { StillFiles } from '../../adapters/stillFiles'
import { Possession } from '../../database/entities/Possession'
import { Still } from '../../database/entities/Still'
import { findAlsoDeleted } from '../../database/findInTeam'
import { NotFound, StaleVersion } from '../../http/problem'
import { withParts } from './loadPossessions'
import { presentPossession, type WholePossession } from './possessions.presenter'

interface Which {
  teamId: string
  id: string
  ifMatch: number | null
}

const undoUntil = (now: Date) => new Date(now.getTime() - LIMITS.undoMinutes * 60_000).toISOString()

async function present(manager: EntityManager, row: Possession) {
  const [whole] = await withParts(manager, [row])
  return presentPossession(whole ?? { row, traps: [], stills: [] })
}

/** Takes a possession out of every count; it can be put back for ten minutes. A repeat changes nothing. */
export function deletePossession(db: DataSource, { teamId, id, ifMatch }: Which, now: Date): Promise<void> {
  return db.transaction(async (manager) => {
    const row = await findAlsoDeleted(manager, Possession, teamId, id, 'possession')
    if (row.deletedAt !== null) return
    if (ifMatch !== null && ifMatch !== row.version)
      throw new StaleVersion(await present(manager, row), row.version)
    const stamp = now.toISOString()
    await manager.update(Possession, { id }, { deletedAt: stamp, updatedAt: stamp, version: row.version + 1 })
  })
}

/** Puts a deleted possession back while that is possible. @throws NotFound once it is gone */
export function restorePossession(
  db: DataSource,
  { teamId, id }: Which,
  now: Date,
): Promise<WholePossession> {
  return db.transaction(async (manager) => {
    const row = await findAlsoDeleted(manager, Possession, teamId, id, 'possession')
    if (row.deletedAt !== null) {
      if (row.deletedAt <= undoUntil(now)) throw new NotFound('possession')
      Object.assign(row, { deletedAt: null, updatedAt: now.toISOString(), version: row.version + 1 })
      await manager.update(
        Possession,
        { id },
        { deletedAt: null, updatedAt: row.updatedAt, version: row.version },
      )
    }
    const [whole] = await withParts(manager, [row])
    return whole ?? { row, traps: [], stills: [] }
  })
}

/**
 * Rows whose ten minutes are over go for good, with their stills' files. Returns how many went. Files go
 * first: if that fails, the row is still there to try again from.
 */
export async function purgeDeleted(db: DataSource, files: StillFiles, now: Date): Promise<number> {
  const over = await db
    .getRepository(Possession)
    .createQueryBuilder('row')
    .select(['row.id', 'row.teamId'])
    .where('row.deletedAt IS NOT NULL AND row.deletedAt <= :until', { until: undoUntil(now) })
    .getMany()
  for (const { id } of over) {
    const stills = await db.getRepository(Still).findBy({ possessionId: id })
    for (const still of stills) await files.remove(still.teamId, still.id)
    await db.getRepository(Possession).delete({ id })
  }
  // What was overwritten in the database lives on in its log until that is emptied.
  await db.query('PRAGMA wal_checkpoint(TRUNCATE)')
  return over.length
}
