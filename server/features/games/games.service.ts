import { IsNull, type DataSource, type EntityManager } from 'typeorm'
import type { GameBody, GameRow } from '@shared/games/schemas'
import type { TeamRole } from '@shared/vocabulary'
import { countOpponents } from '../../database/counting/opponentCounts'
import { Game } from '../../database/entities/Game'
import { Opponent } from '../../database/entities/Opponent'
import { findInTeam } from '../../database/findInTeam'
import { putRow, type Put } from '../../database/putRow'
import { newestHandOns, newestPlans, newestScouts, peopleOf, staffOf } from './around'
import { bodyOfGame, presentGame, type GameFacts } from './games.presenter'

/** Whoever asks, for what they may do with a game. */
export type Asking = { personId: string; role: TeamRole }

/** Presents games of one team with what stands around each. */
export async function presentGames(
  manager: EntityManager,
  teamId: string,
  games: Game[],
  now: Date,
  caller: Asking | null = null,
): Promise<GameRow[]> {
  const opponents = new Map(
    (await manager.getRepository(Opponent).findBy({ teamId })).map((row) => [row.id, row.name]),
  )
  const counts = await countOpponents(manager, teamId, now)
  const plans = await newestPlans(manager, teamId)
  const staff = await staffOf(manager, teamId)
  const byId = new Map(staff.map(({ id, name, initials }) => [id, { id, name, initials }]))
  const head = staff.find(({ isHead }) => isHead)
  const scouts = await newestScouts(manager, teamId)
  const handOns = await newestHandOns(
    manager,
    games.map(({ id }) => id),
  )
  const readers = await peopleOf(
    manager,
    games.map(({ readById }) => readById),
  )
  return games.map((game) => {
    const counted = counts.get(game.opponentId)?.counts
    const facts: GameFacts = {
      opponentName: opponents.get(game.opponentId) ?? '',
      possessions: counted?.possessions ?? 0,
      scoutedGames: counted?.scoutedGames ?? 0,
      ourGames: counted?.ourGames ?? 0,
      plan: plans.get(game.id) ?? null,
      headCoach: (head && byId.get(head.id)) ?? null,
      staff: byId,
      scoutId: scouts.get(game.opponentId) ?? null,
      handedOn: handOns.get(game.id) ?? null,
      readBy: readers.get(game.readById ?? '') ?? null,
      caller,
    }
    return presentGame(game, facts, now)
  })
}

/** Games of a team in the order they are played. */
export async function listGames(
  db: DataSource,
  teamId: string,
  now: Date,
  caller: Asking | null = null,
): Promise<GameRow[]> {
  const rows = await db
    .getRepository(Game)
    .find({ where: { teamId, deletedAt: IsNull() }, order: { tipOff: 'ASC' } })
  return presentGames(db.manager, teamId, rows, now, caller)
}

/** @throws NotFound */
export async function getGame(
  db: DataSource,
  teamId: string,
  id: string,
  now: Date,
  caller: Asking | null = null,
): Promise<GameRow> {
  const row = await findInTeam(db.manager, Game, teamId, id, 'game')
  const [game] = await presentGames(db.manager, teamId, [row], now, caller)
  return game as GameRow
}

/** @throws NotFound, Conflict, StaleVersion */
export function putGame(
  db: DataSource,
  options: {
    id: string
    teamId: string
    body: GameBody
    ifMatch: number | null
    now: Date
    by: string
    caller?: Asking
  },
): Promise<Put<Game>> {
  return db.transaction(async (manager) => {
    await findInTeam(manager, Opponent, options.teamId, options.body.opponentId, 'opponent')
    return putRow<Game, GameBody>({
      ...options,
      manager,
      entity: Game,
      what: 'game',
      bodyOf: bodyOfGame,
      columnsOf: (body) => body,
      present: async (row) =>
        (await presentGames(manager, options.teamId, [row], options.now, options.caller))[0],
    })
  })
}
