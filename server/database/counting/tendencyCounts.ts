import type { EntityManager } from 'typeorm'
import { SPOT_CELLS, type SpotName, type SpotSide } from '@shared/court/trapSpots'
import type { TendencyFilter } from '@shared/tendencies/schemas'
import { GOT_OUT, type Pickup, type Trigger } from '@shared/vocabulary'
import { COVERED, HAS_SHAPE, inSpot, is, JOINED, PRESSED, seen, SOURCES } from './expressions'
import { situation } from './filters'
import { onCalendarDays } from './gameDays'
import { COUNTED_HABITS, habitRows, TRAP_LINE } from './habitSql'

/** Counts of one habit in one game after one trigger; `gameAge` is 0 for their newest game. */
export interface CountCell {
  habitKey: string
  gameId: string
  gameAge: number
  trigger: Trigger
  k: number
  n: number
}

/** A game behind the counts, newest first; `age` is 0 for the newest. */
export interface CountedGame {
  id: string
  kind: 'scouted' | 'ours'
  /** Whom they played; empty for a game of ours. */
  foe: string
  /** Calendar day in the team's zone. */
  day: string
  age: number
  rows: number
}

export interface SpotCount {
  spot: SpotName
  side: SpotSide
  order: 'first' | 'later'
  k: number
}

/** Aliases of the distinct n expressions: many habits share one, and each is worked out once a row. */
const N_ALIAS = new Map<string, string>()
for (const { n } of COUNTED_HABITS) if (!N_ALIAS.has(n)) N_ALIAS.set(n, `n${N_ALIAS.size}`)

const N_FLAGS = [...N_ALIAS].map(([sql, alias]) => `${sql} AS ${alias}`).join(', ')
const COLUMNS = COUNTED_HABITS.map(({ key, n, k }, index) => ({
  key,
  k,
  nAlias: N_ALIAS.get(n) ?? '',
  kAlias: `k${index}`,
}))
const SUMS = [
  ...[...N_ALIAS.values()].map((alias) => `sum(${alias}) AS ${alias}`),
  ...COLUMNS.map(({ k, nAlias, kAlias }) => `sum(CASE WHEN ${nAlias} THEN ${k} ELSE 0 END) AS ${kAlias}`),
].join(',\n  ')

/**
 * Every habit, game by game and trigger by trigger; only cells with something in n come back.
 * `ages` says how many games ago each game was.
 */
export async function countHabits(
  manager: EntityManager,
  opponentId: string,
  filter: TendencyFilter,
  ages: ReadonlyMap<string, number>,
): Promise<CountCell[]> {
  const where = situation(filter)
  const rows: Record<string, number | string>[] = await manager.query(
    `WITH ${SOURCES}, ${TRAP_LINE},
     flagged AS MATERIALIZED (SELECT p.*, ${N_FLAGS} FROM (${habitRows(where.sql)}) p)
     SELECT p.gameId, p.trigger AS "trigger", ${SUMS} FROM flagged p GROUP BY p.gameId, p.trigger`,
    [opponentId, opponentId, ...where.parameters],
  )
  const cells: CountCell[] = []
  for (const row of rows) {
    const gameId = String(row['gameId'])
    const gameAge = ages.get(gameId) ?? 0
    const trigger = row['trigger'] as Trigger
    for (const { key, nAlias, kAlias } of COLUMNS) {
      const n = Number(row[nAlias])
      if (n > 0) cells.push({ habitKey: key, gameId, gameAge, trigger, k: Number(row[kAlias]), n })
    }
  }
  return cells
}

/** Per trigger: covered rows with a shape and how many of them pressed, whatever the trigger filter says. */
export async function countSituations(
  manager: EntityManager,
  opponentId: string,
  filter: TendencyFilter,
): Promise<{ trigger: Trigger; n: number; pressed: number }[]> {
  const where = situation({ ...filter, trigger: undefined })
  return manager.query(
    `WITH ${SOURCES}
     SELECT p.trigger AS "trigger", count(*) AS n, sum(${PRESSED}) AS pressed
       FROM ${JOINED} WHERE ${where.sql} AND ${HAS_SHAPE} AND ${COVERED} GROUP BY p.trigger`,
    [opponentId, opponentId, ...where.parameters],
  )
}

/** The games with rows in the situation, and how many rows fell outside what was covered. */
export async function countGames(
  manager: EntityManager,
  opponentId: string,
  filter: TendencyFilter,
): Promise<{ games: CountedGame[]; notCovered: number }> {
  const where = situation({ ...filter, trigger: undefined })
  const triggers = situation({ trigger: filter.trigger })
  const rows: (Omit<CountedGame, 'age'> & { outside: number })[] = await manager.query(
    `WITH ${SOURCES}
     SELECT s.id, s.kind, s.label AS foe, s.day, sum(${COVERED} AND ${triggers.sql}) AS rows,
            sum(NOT ${COVERED} AND ${triggers.sql}) AS outside
       FROM ${JOINED} WHERE ${where.sql} GROUP BY s.id ORDER BY s.day DESC, s.id`,
    [opponentId, opponentId, ...triggers.parameters, ...triggers.parameters, ...where.parameters],
  )
  const games = rows.map(({ outside: _outside, ...game }, age) => ({ ...game, age }))
  return {
    games: await onCalendarDays(manager, opponentId, games),
    notCovered: rows.reduce((sum, row) => sum + row.outside, 0),
  }
}

/** Pressed rows per pick-up, and the games behind them. */
export async function countPickups(
  manager: EntityManager,
  opponentId: string,
  filter: TendencyFilter,
): Promise<{ pickup: Pickup; gameId: string; rows: number }[]> {
  const where = situation(filter)
  return manager.query(
    `WITH ${SOURCES}
     SELECT p.pickup, s.id AS gameId, count(*) AS rows FROM ${JOINED}
      WHERE ${where.sql} AND ${PRESSED} AND ${seen('p.pickup')} AND ${COVERED} GROUP BY p.pickup, s.id`,
    [opponentId, opponentId, ...where.parameters],
  )
}

const FIRST_GOT_OUT = `EXISTS (SELECT 1 FROM traps f WHERE f.possessionId = p.id AND f.position = 1 AND f.result IN (${GOT_OUT.map(
  (result) => `'${result}'`,
).join(', ')}))`

const SPOT_CASE = SPOT_CELLS.map(
  ({ spot, side }) => `WHEN ${inSpot(spot, side)} THEN '${spot} ${side}'`,
).join(' ')

/**
 * Possessions with a trap in each spot, for the court: the first trap of n logged ones, and later traps of
 * the n in which the first was got out of.
 */
export async function countSpots(
  manager: EntityManager,
  opponentId: string,
  filter: TendencyFilter,
): Promise<SpotCount[]> {
  const where = situation(filter)
  const rows: { cell: string; first: number; k: number }[] = await manager.query(
    `WITH ${SOURCES}
     SELECT CASE ${SPOT_CASE} ELSE 'other middle' END AS cell, t.position = 1 AS first, count(DISTINCT p.id) AS k
       FROM ${JOINED} JOIN traps t ON t.possessionId = p.id
      WHERE ${where.sql} AND ${COVERED} AND ${PRESSED} AND ${is('p.trapsLogged', 'seen')}
        AND (t.position = 1 OR ${FIRST_GOT_OUT})
      GROUP BY 1, 2`,
    [opponentId, opponentId, ...where.parameters],
  )
  return rows.map(({ cell, first, k }) => {
    const [spot, side] = cell.split(' ')
    return { spot: spot as SpotName, side: side as SpotSide, order: first ? 'first' : 'later', k }
  })
}
