import { isDeepStrictEqual } from 'node:util'
import { In, IsNull, type DataSource, type EntityManager } from 'typeorm'
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
    .find({ where: { gameId, deletedAt: IsNull() }, relations: { signedBy: true }, order: { number: 'ASC' } })

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
  if (
    (await manager.getRepository(Counter).countBy({ teamId, id: In([...counters]), deletedAt: IsNull() })) <
    counters.size
  )
    throw new NotFound('counter')
  const players = new Set(body.roles.map((role) => role.squadPlayerId))
  if ((await manager.getRepository(SquadPlayer).countBy({ teamId, id: In([...players]) })) < players.size)
    throw new NotFound('player')
}

/** A new version needs the last one signed; a signed one is never changed. `own` is the version written to. */
function checkVersion(newest: Plan | null, own: Plan | undefined): void {
  if (own === undefined) {
    if (newest && newest.signedAt === null)
      throw new Conflict(
        `Version ${newest.number} is not signed off yet. Change that one.`,
        presentPlan(newest),
      )
    return
  }
  if (own.id !== newest?.id) throw new Conflict('This is an older version and stays as it was signed off.')
  if (own.signedAt !== null)
    throw new Conflict(
      `Version ${own.number} is signed off. Start a new version to change it.`,
      presentPlan(own),
    )
}

/** Writes the head coach's picks into the open version, or opens the next. @throws NotFound, Conflict, StaleVersion */
export function putPlan(
  db: DataSource,
  options: { gameId: string; teamId: string; body: PlanBody; ifMatch: number | null; now: Date; by: string },
): Promise<Put<Plan>> {
  const { gameId, teamId, body } = options
  return db.transaction(async (manager) => {
    await findInTeam(manager, Game, teamId, gameId, 'game')
    const versions = await versionsOf(manager, gameId)
    const newest = versions.at(-1) ?? null
    const own = versions.find(({ id }) => id === body.id)
    // A repeat may come late, when its version is signed or a newer one is open: it changes nothing.
    const again = own !== undefined && isDeepStrictEqual(bodyOfPlan(own), body)
    if (!again) checkVersion(newest, own)
    await checkNamed(manager, teamId, body)
    const put = await putRow<Plan, PlanBody>({
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
        own
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
    // Loaded with whoever signed it.
    return own && put.outcome === 'unchanged' ? { ...put, row: own } : put
  })
}
