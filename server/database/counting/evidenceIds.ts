import type { EntityManager } from 'typeorm'
import type { TendencyFilter } from '@shared/tendencies/schemas'
import { SOURCES } from './expressions'
import { situation } from './filters'
import { onCalendarDays } from './gameDays'
import { habitRows, TRAP_LINE, type HabitSql } from './habitSql'

export interface EvidenceId {
  id: string
  /** In k, not only in n. */
  counted: boolean
  kind: 'scouted' | 'ours'
  foe: string
  day: string
}

/** The possessions behind a habit's n, newest game first, and how many there are in all. */
export async function evidenceIds(
  manager: EntityManager,
  opponentId: string,
  habit: HabitSql,
  filter: TendencyFilter,
  page: { limit: number; offset: number },
): Promise<{ rows: EvidenceId[]; total: number }> {
  const where = situation(filter)
  const rows: (Omit<EvidenceId, 'counted'> & { counted: number; total: number })[] = await manager.query(
    `WITH ${SOURCES}, ${TRAP_LINE}
     SELECT p.id, ${habit.k} AS counted, p.kind, p.label AS foe, p.day, count(*) OVER () AS total
       FROM (${habitRows(where.sql)}) p WHERE ${habit.n}
      ORDER BY p.day DESC, p.gameId, p.number LIMIT ? OFFSET ?`,
    [opponentId, opponentId, ...where.parameters, page.limit, page.offset],
  )
  // A page past the end has no row to read the total from.
  const beyond = rows.length === 0 && page.offset > 0
  const listed = rows.map(({ total: _total, counted, ...row }) => ({ ...row, counted: counted === 1 }))
  return {
    rows: await onCalendarDays(manager, opponentId, listed),
    total: beyond
      ? (await evidenceIds(manager, opponentId, habit, filter, { limit: 1, offset: 0 })).total
      : (rows[0]?.total ?? 0),
  }
}
