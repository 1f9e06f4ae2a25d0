import type { EntityManager } from 'typeorm'
import { dayInZone } from '../../http/zone'

/**
 * Rows of SOURCES with `day` as the calendar day: a scouted game has one, a game of ours has the instant of its
 * tip-off, which falls on the day that it is where the team is.
 */
export async function onCalendarDays<T extends { kind: 'scouted' | 'ours'; day: string }>(
  manager: EntityManager,
  opponentId: string,
  rows: readonly T[],
): Promise<T[]> {
  if (!rows.some(({ kind }) => kind === 'ours')) return [...rows]
  const [team]: { timeZone: string }[] = await manager.query(
    'SELECT t.timeZone FROM opponents o JOIN teams t ON t.id = o.teamId WHERE o.id = ?',
    [opponentId],
  )
  const zone = team?.timeZone ?? 'UTC'
  return rows.map((row) => (row.kind === 'ours' ? { ...row, day: dayInZone(new Date(row.day), zone) } : row))
}
