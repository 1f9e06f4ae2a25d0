import type { EntityManager } from 'typeorm'
import type { TableFilter, TableQuery } from '@shared/possessions/table'
import { JOINED, PRESSED, SOURCES } from './expressions'
import { onCalendarDays } from './gameDays'
import { AS_PLAYED, tableOrder, tableWhere } from './tableSql'

/** A row's game: `day` is the calendar day in the team's zone. */
export interface RowGame {
  gameId: string
  kind: 'scouted' | 'ours'
  foe: string
  day: string
}

/** One page of the rows in a filter, in order. */
export async function tablePage(
  manager: EntityManager,
  opponentId: string,
  filter: TableFilter,
  { sort, direction, limit, offset }: Pick<TableQuery, 'sort' | 'direction' | 'limit' | 'offset'>,
): Promise<({ id: string } & RowGame)[]> {
  const where = tableWhere(filter)
  const rows: ({ id: string } & RowGame)[] = await manager.query(
    `WITH ${SOURCES}
     SELECT p.id, s.id AS gameId, s.kind, s.label AS foe, s.day FROM ${JOINED} WHERE ${where.sql}
      ORDER BY ${tableOrder(sort, direction)} LIMIT ? OFFSET ?`,
    [opponentId, opponentId, ...where.parameters, limit, offset],
  )
  return onCalendarDays(manager, opponentId, rows)
}

/** How many rows of a filter stand before one of them, in order; null where it is not among them. */
export async function placeInTable(
  manager: EntityManager,
  opponentId: string,
  filter: TableFilter,
  { sort, direction, row }: Pick<TableQuery, 'sort' | 'direction'> & { row: string },
): Promise<number | null> {
  const where = tableWhere(filter)
  const [found]: { place: number }[] = await manager.query(
    `WITH ${SOURCES}, placed AS (
       SELECT p.id, row_number() OVER (ORDER BY ${tableOrder(sort, direction)}) - 1 AS place
         FROM ${JOINED} WHERE ${where.sql})
     SELECT place FROM placed WHERE id = ?`,
    [opponentId, opponentId, ...where.parameters, row],
  )
  return found?.place ?? null
}

/** How many rows an opponent has, and how many of them are in a filter. */
export async function countTable(
  manager: EntityManager,
  opponentId: string,
  filter: TableFilter,
): Promise<{ total: number; of: number }> {
  const where = tableWhere(filter)
  const [row]: { total: number | null; of: number }[] = await manager.query(
    `WITH ${SOURCES} SELECT sum(${where.sql}) AS total, count(*) AS "of" FROM ${JOINED}`,
    [opponentId, opponentId, ...where.parameters],
  )
  return { total: row?.total ?? 0, of: row?.of ?? 0 }
}

export interface Bar {
  id: string
  number: number
  gameId: string
  pressed: 0 | 1
  shown: 0 | 1
}

/** Every row of an opponent in the order it was played, as little of each as the row ruler draws. */
export async function tableBars(
  manager: EntityManager,
  opponentId: string,
  filter: TableFilter,
): Promise<{ bars: Bar[]; games: (RowGame & { rows: number })[] }> {
  const where = tableWhere(filter)
  const bars: Bar[] = await manager.query(
    `WITH ${SOURCES}
     SELECT p.id, p.number, s.id AS gameId, ${PRESSED} AS pressed, (${where.sql}) AS shown
       FROM ${JOINED} ORDER BY ${AS_PLAYED}`,
    [opponentId, opponentId, ...where.parameters],
  )
  const games: (RowGame & { rows: number })[] = await manager.query(
    `WITH ${SOURCES}
     SELECT s.id AS gameId, s.kind, s.label AS foe, s.day, count(*) AS rows FROM source s
      GROUP BY s.id ORDER BY s.day, s.id`,
    [opponentId, opponentId],
  )
  return { bars, games: await onCalendarDays(manager, opponentId, games) }
}
