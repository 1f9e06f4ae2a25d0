import type { DataSource, EntityManager, EntityTarget } from 'typeorm'
import type { TeamRow } from '../../database/columns'
import { Counter } from '../../database/entities/Counter'
import { Game } from '../../database/entities/Game'
import { Opponent } from '../../database/entities/Opponent'
import { OpponentPlayer } from '../../database/entities/OpponentPlayer'
import { ScoutedGame } from '../../database/entities/ScoutedGame'
import { restoreDeleted, softDelete } from '../../database/softDelete'
import { Conflict } from '../../http/problem'
import { getCounter } from '../counters/counters.service'
import { presentGames } from '../games/games.service'
import { checkJersey, presentOpponentPlayers } from '../opponents/opponentPlayers.service'
import { presentOpponent } from '../opponents/opponents.presenter'
import { countsOf } from '../opponents/opponents.service'
import { getScoutedGame } from '../scoutedGames/scoutedGames.service'

/** How rows of one kind are deleted and put back. */
export interface Deletable<E extends TeamRow> {
  entity: EntityTarget<E>
  what: string
  /** The row as its own endpoint shows it. */
  present: (manager: EntityManager, row: E, now: Date) => Promise<unknown>
  mayGo?: (manager: EntityManager, row: E) => Promise<void>
  mayReturn?: (manager: EntityManager, row: E) => Promise<void>
}

/** A counter that is on the table of a plan not yet signed stays; a signed plan holds its own copy. */
async function inNoOpenPlan(manager: EntityManager, counter: Counter): Promise<void> {
  const plans: { opponent: string }[] = await manager.query(
    `SELECT o.name AS opponent FROM plans p JOIN games g ON g.id = p.gameId JOIN opponents o ON o.id = g.opponentId
      WHERE p.teamId = ? AND p.signedAt IS NULL AND p.deletedAt IS NULL
        AND (? IN (p.firstCallId, p.changeUpId) OR instr(p.notThisGame, ?) > 0 OR instr(p.roles, ?) > 0)
      ORDER BY g.tipOff LIMIT 1`,
    [counter.teamId, counter.id, counter.id, counter.id],
  )
  const [plan] = plans
  if (plan)
    throw new Conflict(
      `${counter.name} is in the open plan against ${plan.opponent}. Take it out of that plan or sign the plan off first.`,
    )
}

/** Kinds that are deleted by the same service, by the name of their address. */
export const DELETABLE = {
  opponents: {
    entity: Opponent,
    what: 'opponent',
    present: async (manager, row, now) => presentOpponent(row, await countsOf(manager, row, now)),
  } satisfies Deletable<Opponent>,
  'scouted-games': {
    entity: ScoutedGame,
    what: 'scouted game',
    present: (manager, row) => getScoutedGame(manager, row.teamId, row.id),
  } satisfies Deletable<ScoutedGame>,
  games: {
    entity: Game,
    what: 'game',
    present: async (manager, row, now) => (await presentGames(manager, row.teamId, [row], now))[0],
  } satisfies Deletable<Game>,
  counters: {
    entity: Counter,
    what: 'counter',
    present: (manager, row) => getCounter(manager, row.teamId, row.id),
    mayGo: inNoOpenPlan,
  } satisfies Deletable<Counter>,
  'opponent-players': {
    entity: OpponentPlayer,
    what: 'player of theirs',
    present: async (manager, row) => (await presentOpponentPlayers(manager, [row]))[0],
    mayReturn: (manager, row) => checkJersey(manager, row),
  } satisfies Deletable<OpponentPlayer>,
}

interface Which {
  teamId: string
  id: string
  by: string
  now: Date
}

/** Takes a row and what hangs on it out for ten minutes. @throws NotFound, StaleVersion, Conflict */
export function deleteRow<E extends TeamRow>(
  db: DataSource,
  kind: Deletable<E>,
  which: Which & { ifMatch: number | null },
): Promise<void> {
  return db.transaction((manager) =>
    softDelete({
      ...which,
      manager,
      entity: kind.entity,
      what: kind.what,
      present: (row) => kind.present(manager, row, which.now),
      ...(kind.mayGo ? { check: (row: E) => kind.mayGo?.(manager, row) ?? Promise.resolve() } : {}),
    }),
  )
}

/** Puts a row back with what went with it; hands back how it is shown and its version. @throws NotFound, Conflict */
export function restoreRow<E extends TeamRow>(
  db: DataSource,
  kind: Deletable<E>,
  which: Which,
): Promise<{ body: unknown; version: number }> {
  return db.transaction(async (manager) => {
    const row = await restoreDeleted({
      ...which,
      manager,
      entity: kind.entity,
      what: kind.what,
      ...(kind.mayReturn ? { check: (row: E) => kind.mayReturn?.(manager, row) ?? Promise.resolve() } : {}),
    })
    return { body: await kind.present(manager, row, which.now), version: row.version }
  })
}
