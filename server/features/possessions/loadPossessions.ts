import { In, type EntityManager } from 'typeorm'
import type { Possession } from '../../database/entities/Possession'
import { Still } from '../../database/entities/Still'
import { Trap } from '../../database/entities/Trap'
import type { WholePossession } from './possessions.presenter'

const byPossession = <T extends { possessionId: string }>(rows: T[]): Map<string, T[]> => {
  const groups = new Map<string, T[]>()
  for (const row of rows) groups.set(row.possessionId, [...(groups.get(row.possessionId) ?? []), row])
  return groups
}

/** Traps and stills of some possessions, in two queries whatever their number. */
export async function withParts(manager: EntityManager, rows: Possession[]): Promise<WholePossession[]> {
  if (rows.length === 0) return []
  const ids = rows.map((row) => row.id)
  const where = { where: { possessionId: In(ids) }, order: { position: 'ASC' as const } }
  const traps = byPossession(await manager.find(Trap, where))
  const stills = byPossession(await manager.find(Still, where))
  return rows.map((row) => ({ row, traps: traps.get(row.id) ?? [], stills: stills.get(row.id) ?? [] }))
}

export const trapsOf = (manager: EntityManager, possessionId: string): Promise<Trap[]> =>
  manager.find(Trap, { where: { possessionId }, order: { position: 'ASC' } })
