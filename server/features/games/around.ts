import { In, type EntityManager } from 'typeorm'
import type { Coach, GameRow } from '@shared/games/schemas'
import { HandOn } from '../../database/entities/HandOn'
import { Membership } from '../../database/entities/Membership'
import { Person } from '../../database/entities/Person'
import { Plan } from '../../database/entities/Plan'
import { ScoutedGame } from '../../database/entities/ScoutedGame'
import { initialsOf } from '../session/session.presenter'
import type { GameFacts } from './games.presenter'

/** The staff of a team, the head coach first, then by name. */
export async function staffOf(
  manager: EntityManager,
  teamId: string,
): Promise<(Coach & { isHead: boolean })[]> {
  const memberships = await manager.getRepository(Membership).find({
    where: { teamId, role: In(['head-coach', 'assistant-coach']) },
    relations: { person: true },
  })
  return memberships
    .flatMap(({ person, role }) =>
      person
        ? [
            {
              id: person.id,
              name: person.name,
              initials: initialsOf(person.name),
              isHead: role === 'head-coach',
            },
          ]
        : [],
    )
    .sort((a, b) => Number(b.isHead) - Number(a.isHead) || a.name.localeCompare(b.name))
}

/** The newest plan version of every game of a team. */
export async function newestPlans(
  manager: EntityManager,
  teamId: string,
): Promise<Map<string, GameRow['plan']>> {
  const plans = await manager.getRepository(Plan).find({
    where: { teamId },
    select: { id: true, gameId: true, number: true, signedAt: true },
    order: { number: 'ASC' },
  })
  return new Map(plans.map(({ gameId, id, number, signedAt }) => [gameId, { id, number, signedAt }]))
}

/** Who watched the newest game of each opponent of a team, by opponent. */
export async function newestScouts(manager: EntityManager, teamId: string): Promise<Map<string, string>> {
  const rows = await manager
    .getRepository(ScoutedGame)
    .createQueryBuilder('row')
    .select(['row.opponentId AS opponentId', 'row.scoutId AS scoutId'])
    .where('row.teamId = :teamId AND row.deletedAt IS NULL AND row.scoutId IS NOT NULL', { teamId })
    .orderBy('row.playedOn', 'ASC')
    .addOrderBy('row.createdAt', 'ASC')
    .getRawMany<{ opponentId: string; scoutId: string }>()
  return new Map(rows.map(({ opponentId, scoutId }) => [opponentId, scoutId]))
}

/** The newest hand-on of each of these games, by game. */
export async function newestHandOns(
  manager: EntityManager,
  gameIds: readonly string[],
): Promise<Map<string, NonNullable<GameFacts['handedOn']>>> {
  const rows = await manager.getRepository(HandOn).find({
    where: { gameId: In([...gameIds]) },
    relations: { from: true, to: true },
    order: { at: 'ASC' },
  })
  return new Map(
    rows.map(({ gameId, station, from, to, note, at }) => [
      gameId,
      { station, from: from?.name ?? null, to: to?.name ?? null, note, at },
    ]),
  )
}

/** People by id; whoever was erased is missing. */
export async function peopleOf(
  manager: EntityManager,
  ids: readonly (string | null)[],
): Promise<Map<string, Coach>> {
  const wanted = [...new Set(ids.filter((id) => id !== null))]
  const people = await manager.getRepository(Person).find({
    where: { id: In(wanted) },
    select: { id: true, name: true },
  })
  return new Map(people.map(({ id, name }) => [id, { id, name, initials: initialsOf(name) }]))
}
