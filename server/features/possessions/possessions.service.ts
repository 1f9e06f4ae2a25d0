import { randomUUID } from 'node:crypto'
import { IsNull, type DataSource, type EntityManager } from 'typeorm'
import { PossessionBody, type PossessionPatch } from '@shared/possessions/schemas'
import { possessionColumns, trapColumns } from '../../database/columnsOf'
import { Counter } from '../../database/entities/Counter'
import { Game } from '../../database/entities/Game'
import { Possession } from '../../database/entities/Possession'
import { ScoutedGame } from '../../database/entities/ScoutedGame'
import { Trap } from '../../database/entities/Trap'
import { findAlsoDeleted, findInTeam } from '../../database/findInTeam'
import { putRow, type Put } from '../../database/putRow'
import { faultsOf } from '../../http/faults'
import { BadInput, NeedsIfMatch, NotFound, StaleVersion } from '../../http/problem'
import { trapsOf, withParts } from './loadPossessions'
import { bodyOfPossession, presentPossession, type WholePossession } from './possessions.presenter'

interface Write {
  id: string
  teamId: string
  ifMatch: number | null
  now: Date
  by: string
  batchId?: string
}

/** The rows of a game in the order they were played; deleted ones are not among them. */
export async function listPossessions(
  db: DataSource,
  parent: { teamId: string } & ({ scoutedGameId: string } | { gameId: string }),
): Promise<WholePossession[]> {
  const rows = await db.getRepository(Possession).find({
    where: { ...parent, deletedAt: IsNull() },
    order: { number: 'ASC', createdAt: 'ASC' },
  })
  return withParts(db.manager, rows)
}

/** @throws NotFound, also for a deleted one */
export async function getPossession(
  manager: EntityManager,
  teamId: string,
  id: string,
): Promise<WholePossession> {
  const row = await findInTeam(manager, Possession, teamId, id, 'possession')
  if (row.deletedAt !== null) throw new NotFound('possession')
  const [whole] = await withParts(manager, [row])
  if (!whole) throw new NotFound('possession')
  return whole
}

/** The games and the counter that a body names must be the team's own. */
async function checkParents(
  manager: EntityManager,
  { teamId, id }: Pick<Write, 'teamId' | 'id'>,
  body: PossessionBody,
): Promise<void> {
  if (body.scoutedGameId !== null)
    await findInTeam(manager, ScoutedGame, teamId, body.scoutedGameId, 'scouted game')
  if (body.gameId !== null) await findInTeam(manager, Game, teamId, body.gameId, 'game')
  if (body.counterId === null) return
  const counter = await findAlsoDeleted(manager, Counter, teamId, body.counterId, 'counter')
  // A trip keeps the counter that it was played with, also while that one is deleted.
  const kept =
    counter.deletedAt === null || (await manager.existsBy(Possession, { id, counterId: counter.id }))
  if (!kept) throw new NotFound('counter')
}

async function writeTraps(
  manager: EntityManager,
  possessionId: string,
  traps: PossessionBody['traps'],
  replace: boolean,
) {
  if (replace) await manager.delete(Trap, { possessionId })
  const rows = trapColumns(possessionId, traps, randomUUID)
  if (rows.length > 0) await manager.insert(Trap, rows)
}

/** Writes a row inside a transaction of the caller's. @throws NotFound, Conflict, StaleVersion */
export async function writePossession(
  manager: EntityManager,
  write: Write,
  body: PossessionBody,
): Promise<Put<Possession>> {
  await checkParents(manager, write, body)
  return putRow<Possession, PossessionBody>({
    ...write,
    manager,
    entity: Possession,
    what: 'possession',
    body,
    bodyOf: async (row) => bodyOfPossession(row, await trapsOf(manager, row.id)),
    columnsOf: possessionColumns,
    present: async (row) => presentPossession(await wholeOf(manager, row)),
    after: (row, before) => writeTraps(manager, row.id, body.traps, before !== null),
  })
}

async function wholeOf(manager: EntityManager, row: Possession): Promise<WholePossession> {
  const [whole] = await withParts(manager, [row])
  return whole ?? { row, traps: [], stills: [] }
}

/** @throws NotFound, Conflict, StaleVersion */
export function putPossession(
  db: DataSource,
  write: Write,
  body: PossessionBody,
): Promise<{ put: Put<Possession>; whole: WholePossession }> {
  return db.transaction(async (manager) => {
    const done = await writePossession(manager, write, body)
    return { put: done, whole: await wholeOf(manager, done.row) }
  })
}

/** Changes some fields; the whole row is checked again. @throws NotFound, NeedsIfMatch, BadInput, StaleVersion */
export function patchPossession(
  db: DataSource,
  write: Write,
  patch: PossessionPatch,
): Promise<{ put: Put<Possession>; whole: WholePossession }> {
  return db.transaction(async (manager) => {
    const present = await getPossession(manager, write.teamId, write.id)
    const { row, traps } = present
    if (write.ifMatch === null) throw new NeedsIfMatch()
    // Before the check of the whole row: whoever changed an old version is to see the present one.
    if (write.ifMatch !== row.version) throw new StaleVersion(presentPossession(present), row.version)
    const parsed = PossessionBody.safeParse(
      { ...bodyOfPossession(row, traps), ...patch },
      { reportInput: true },
    )
    if (!parsed.success) throw new BadInput(faultsOf(parsed.error))
    const done = await writePossession(manager, write, parsed.data)
    return { put: done, whole: await wholeOf(manager, done.row) }
  })
}
