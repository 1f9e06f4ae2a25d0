import { randomUUID } from 'node:crypto'
import { In, IsNull, type DataSource, type EntityManager } from 'typeorm'
import type { PracticeBody, PracticeRow } from '@shared/practices/schemas'
import { Counter } from '../../database/entities/Counter'
import { Game } from '../../database/entities/Game'
import { Practice } from '../../database/entities/Practice'
import { PracticeReps } from '../../database/entities/PracticeReps'
import { findInTeam } from '../../database/findInTeam'
import { putRow, type Put } from '../../database/putRow'
import { restoreDeleted, softDelete } from '../../database/softDelete'
import { NotFound } from '../../http/problem'
import { bodyOfPractice, presentPractice } from './practices.presenter'

/** Practices of a team, or for one game, the latest first. @throws NotFound for another team's game */
export async function listPractices(db: DataSource, teamId: string, gameId?: string): Promise<PracticeRow[]> {
  if (gameId !== undefined) await findInTeam(db.manager, Game, teamId, gameId, 'game')
  const rows = await db.getRepository(Practice).find({
    where: { teamId, deletedAt: IsNull(), ...(gameId === undefined ? {} : { gameId }) },
    order: { startsAt: 'DESC' },
  })
  return rows.flatMap((row) => {
    const body = bodyOfPractice(row)
    return body ? [presentPractice(row, body)] : []
  })
}

/** @throws NotFound */
export async function getPractice(db: DataSource, teamId: string, id: string): Promise<PracticeRow> {
  const row = await findInTeam(db.manager, Practice, teamId, id, 'practice')
  const body = bodyOfPractice(row)
  if (!body) throw new NotFound('practice')
  return presentPractice(row, body)
}

interface Write {
  id: string
  teamId: string
  now: Date
  by: string
  ifMatch: number | null
}

/** Writes a practice and what was run in it. @throws NotFound, Conflict, StaleVersion */
export function putPractice(db: DataSource, options: Write & { body: PracticeBody }): Promise<Put<Practice>> {
  const { teamId, body } = options
  return db.transaction(async (manager) => {
    await findInTeam(manager, Game, teamId, body.gameId, 'game')
    await checkCounters(manager, options)
    return putRow<Practice, PracticeBody>({
      ...options,
      manager,
      entity: Practice,
      what: 'practice',
      bodyOf: (row) => bodyOfPractice(row) ?? { ...body, reps: [] },
      columnsOf: (next) => ({ gameId: next.gameId, startsAt: next.startsAt, body: next }),
      present: (row) => presentPractice(row, bodyOfPractice(row) ?? body),
      after: (row) => writeReps(manager, row, body),
    })
  })
}

/** A practice keeps what was run in it, also once a counter of it is gone for good. @throws NotFound */
async function checkCounters(
  manager: EntityManager,
  { id, teamId, body }: Write & { body: PracticeBody },
): Promise<void> {
  const before = await manager.getRepository(Practice).findOneBy({ id, teamId })
  const kept = new Set(before && bodyOfPractice(before)?.reps.map(({ counterId }) => counterId))
  const asked = [...new Set(body.reps.map(({ counterId }) => counterId))].filter((one) => !kept.has(one))
  if ((await manager.getRepository(Counter).countBy({ teamId, id: In(asked) })) < asked.length)
    throw new NotFound('counter')
}

/** Rows of their own beside the body, so that they can be summed; none of a counter that is gone. */
async function writeReps(
  manager: EntityManager,
  { id, teamId }: Practice,
  body: PracticeBody,
): Promise<void> {
  const rows = manager.getRepository(PracticeReps)
  await rows.delete({ practiceId: id })
  const counters = await manager
    .getRepository(Counter)
    .find({ where: { teamId, id: In(body.reps.map(({ counterId }) => counterId)) }, select: { id: true } })
  const there = new Set(counters.map((counter) => counter.id))
  for (const reps of body.reps.filter(({ counterId }) => there.has(counterId)))
    await rows.insert({ id: randomUUID(), teamId, practiceId: id, ...reps })
}

const practice = (manager: EntityManager, { id, teamId, now, by }: Omit<Write, 'ifMatch'>) => ({
  manager,
  entity: Practice,
  what: 'practice',
  teamId,
  id,
  now,
  by,
})

/** @throws NotFound, StaleVersion */
export const deletePractice = (db: DataSource, options: Write): Promise<void> =>
  db.transaction((manager) =>
    softDelete({
      ...practice(manager, options),
      ifMatch: options.ifMatch,
      present: (row) => {
        const body = bodyOfPractice(row)
        return body && presentPractice(row, body)
      },
    }),
  )

/** @throws NotFound, Conflict when the time for it is over */
export async function restorePractice(db: DataSource, options: Omit<Write, 'ifMatch'>): Promise<PracticeRow> {
  await db.transaction((manager) => restoreDeleted(practice(manager, options)))
  return getPractice(db, options.teamId, options.id)
}
