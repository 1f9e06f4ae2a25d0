import { In, type DataSource, type EntityManager } from 'typeorm'
import type { PlanBody, PlanState } from '@shared/plans/schemas'
import { Counter } from '../../database/entities/Counter'
import { Game } from '../../database/entities/Game'
import { Plan } from '../../database/entities/Plan'
import { SquadPlayer } from '../../database/entities/SquadPlayer'
import { findInTeam } from '../../database/findInTeam'
import { putRow, type Put } from '../../database/putRow'
import { Conflict, NotFound } from '../../http/problem'
import { bodyOfPlan, presentPlan } from './plans.presenter'

/** Every version of a game's plan, oldest first. */
const versionsOf = (manager: EntityManager, gameId: string): Promise<Plan[]> =>
  manager
    .getRepository(Plan)
    .find({ where: { gameId }, relations: { signedBy: true }, order: { number: 'ASC' } })

/** The newest version and the list of all. @throws NotFound */
export async function planState(
  manager: EntityManager,
  teamId: string,
  gameId: string,
): Promise<PlanState & { newest: Plan | null }> {
  await findInTeam(manager, Game, teamId, gameId, 'game')
  const versions = await versionsOf(manager, gameId)
  const newest = versions.at(-1) ?? null
  return {
    newest,
    plan: newest && presentPlan(newest),
    versions: versions.map(({ id, number, signedAt }) => ({ id, number, signedAt })),
  }
}

/** Every counter and player that a plan names must be the team's own. @throws NotFound */
async function checkNamed(manager: EntityManager, teamId: string, body: PlanBody): Promise<void> {
  const counters = new Set(
    [
      body.firstCallId,
      body.changeUpId,
      ...body.notThisGame,
      ...body.roles.map((role) => role.counterId),
    ].filter((id) => id !== null),
  )
  if ((await manager.getRepository(Counter).countBy({ teamId, id: In([...counters]) })) < counters.size)
    throw new NotFound('counter')
  const players = new Set(body.roles.map((role) => role.squadPlayerId))
  if ((await manager.getRepository(SquadPlayer).countBy({ teamId, id: In([...players]) })) < players.size)
    throw new NotFound('player')
}

/** A new version needs the last one signed; a signed one is never changed. */
function checkVersion(newest: Plan | null, body: PlanBody, sameBody: boolean): void {
  if (newest === null) return
  if (newest.id !== body.id && newest.signedAt === null)
    throw new Conflict(
      `Version ${newest.number} is not signed off yet. Change that one.`,
      presentPlan(newest),
    )
  if (newest.id === body.id && newest.signedAt !== null && !sameBody)
    throw new Conflict(
      `Version ${newest.number} is signed off. Start a new version to change it.`,
      presentPlan(newest),
    )
}

/** Writes the head coach's picks into the open version, or opens the next. @throws NotFound, Conflict, StaleVersion */
export function putPlan(
  db: DataSource,
  options: { gameId: string; teamId: string; body: PlanBody; ifMatch: number | null; now: Date },
): Promise<Put<Plan>> {
  const { gameId, teamId, body } = options
  return db.transaction(async (manager) => {
    const { newest, versions } = await planState(manager, teamId, gameId)
    const known = versions.some((version) => version.id === body.id)
    if (known && newest?.id !== body.id)
      throw new Conflict('This is an older version and stays as it was signed off.')
    checkVersion(newest, body, newest !== null && JSON.stringify(bodyOfPlan(newest)) === JSON.stringify(body))
    await checkNamed(manager, teamId, body)
    return putRow<Plan, PlanBody>({
      ...options,
      id: body.id,
      manager,
      entity: Plan,
      what: 'plan',
      bodyOf: (row) => {
        if (row.gameId !== gameId) throw new NotFound('plan')
        return bodyOfPlan(row)
      },
      columnsOf: ({ id: _id, ...columns }) =>
        known
          ? columns
          : {
              ...columns,
              gameId,
              number: (newest?.number ?? 0) + 1,
              frozen: null,
              signedAt: null,
              signedById: null,
            },
      present: presentPlan,
    })
  })
}
