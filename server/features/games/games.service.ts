import type { DataSource, EntityManager } from 'typeorm'
import type { GameBody, GameRow } from '@shared/games/schemas'
import { countOpponents } from '../../database/counting/opponentCounts'
import { Game } from '../../database/entities/Game'
import { Membership } from '../../database/entities/Membership'
import { Opponent } from '../../database/entities/Opponent'
import { Plan } from '../../database/entities/Plan'
import { findInTeam } from '../../database/findInTeam'
import { putRow, type Put } from '../../database/putRow'
import { initialsOf } from '../session/session.presenter'
import { bodyOfGame, presentGame, type GameFacts } from './games.presenter'

async function headCoachOf(manager: EntityManager, teamId: string): Promise<GameRow['headCoach']> {
  const membership = await manager.getRepository(Membership).findOne({
    where: { teamId, role: 'head-coach' },
    relations: { person: true },
  })
  const name = membership?.person?.name
  return name ? { name, initials: initialsOf(name) } : null
}

/** The newest plan version of every game of a team. */
async function newestPlans(manager: EntityManager, teamId: string): Promise<Map<string, GameRow['plan']>> {
  const plans = await manager.getRepository(Plan).find({
    where: { teamId },
    select: { id: true, gameId: true, number: true, signedAt: true },
    order: { number: 'ASC' },
  })
  return new Map(plans.map(({ gameId, id, number, signedAt }) => [gameId, { id, number, signedAt }]))
}

/** Presents games of one team with what stands around each. */
export async function presentGames(
  manager: EntityManager,
  teamId: string,
  games: Game[],
  now: Date,
): Promise<GameRow[]> {
  const opponents = new Map(
    (await manager.getRepository(Opponent).findBy({ teamId })).map((row) => [row.id, row.name]),
  )
  const counts = await countOpponents(manager, teamId, now)
  const plans = await newestPlans(manager, teamId)
  const headCoach = await headCoachOf(manager, teamId)
  return games.map((game) => {
    const counted = counts.get(game.opponentId)?.counts
    const facts: GameFacts = {
      opponentName: opponents.get(game.opponentId) ?? '',
      possessions: counted?.possessions ?? 0,
      scoutedGames: counted?.scoutedGames ?? 0,
      plan: plans.get(game.id) ?? null,
      headCoach,
    }
    return presentGame(game, facts, now)
  })
}

/** Games of a team in the order they are played. */
export async function listGames(db: DataSource, teamId: string, now: Date): Promise<GameRow[]> {
  const rows = await db.getRepository(Game).find({ where: { teamId }, order: { tipOff: 'ASC' } })
  return presentGames(db.manager, teamId, rows, now)
}

/** @throws NotFound */
export async function getGame(db: DataSource, teamId: string, id: string, now: Date): Promise<GameRow> {
  const row = await findInTeam(db.manager, Game, teamId, id, 'game')
  const [game] = await presentGames(db.manager, teamId, [row], now)
  return game as GameRow
}

/** @throws NotFound, Conflict, StaleVersion */
export function putGame(
  db: DataSource,
  options: { id: string; teamId: string; body: GameBody; ifMatch: number | null; now: Date; by: string },
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
      present: async (row) => (await presentGames(manager, options.teamId, [row], options.now))[0],
    })
  })
}
