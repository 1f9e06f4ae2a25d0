import type { DataSource, EntityManager } from 'typeorm'
import { Possession } from '../../database/entities/Possession'
import { restoreDeleted, softDelete } from '../../database/softDelete'
import { withParts } from './loadPossessions'
import { presentPossession, type WholePossession } from './possessions.presenter'

interface Which {
  teamId: string
  id: string
  by: string
  now: Date
}

async function wholeOf(manager: EntityManager, row: Possession): Promise<WholePossession> {
  const [whole] = await withParts(manager, [row])
  return whole ?? { row, traps: [], stills: [] }
}

/** Takes a possession out of every count; it can be put back for ten minutes. A repeat changes nothing. */
export function deletePossession(db: DataSource, which: Which & { ifMatch: number | null }): Promise<void> {
  return db.transaction((manager) =>
    softDelete({
      ...which,
      manager,
      entity: Possession,
      what: 'possession',
      present: async (row) => presentPossession(await wholeOf(manager, row)),
    }),
  )
}

/** Puts a deleted possession back while that is possible. @throws NotFound once it is gone, Conflict */
export function restorePossession(db: DataSource, which: Which): Promise<WholePossession> {
  return db.transaction(async (manager) => {
    const row = await restoreDeleted({ ...which, manager, entity: Possession, what: 'possession' })
    return wholeOf(manager, row)
  })
}
