import { IsNull, LessThanOrEqual, type DataSource, type EntityManager } from 'typeorm'
import type { GoesKey, StaysKey } from '@shared/people/erasureWords'
import type { ErasureBody, ErasurePreview } from '@shared/people/schemas'
import { Change } from '../../database/entities/Change'
import { Copy } from '../../database/entities/Copy'
import { Erasure } from '../../database/entities/Erasure'
import { HandOn } from '../../database/entities/HandOn'
import { Opening } from '../../database/entities/Opening'
import { Plan } from '../../database/entities/Plan'
import { Possession } from '../../database/entities/Possession'
import { ScoutedGame } from '../../database/entities/ScoutedGame'
import { Team } from '../../database/entities/Team'
import { eachAlone } from '../../database/eachAlone'
import { findInTeam } from '../../database/findInTeam'
import { putRow, type Put } from '../../database/putRow'
import { Conflict, NotFound } from '../../http/problem'
import { dayAfter, dayInZone, startOfDay } from '../../http/zone'
import { countSessions, eraseSubject } from './eraseSubject'
import { leaveNoByte } from './leaveNoByte'
import { keepAHead } from './members.service'
import { presentErasure } from './people.presenter'
import { nameOf } from './people.service'
import { tracesOf, type Traces } from './traces'

/** The next midnight where the team is. */
async function dueAfter(manager: EntityManager, teamId: string, now: Date): Promise<[Date, string]> {
  const { timeZone } = await manager.findOneByOrFail(Team, { id: teamId })
  return [startOfDay(dayAfter(dayInZone(now, timeZone), 1), timeZone), timeZone]
}

/** The two lists of an erasure as they stand now; nothing is changed. @throws NotFound */
export async function previewErasure(
  { manager }: DataSource,
  options: { teamId: string; body: ErasureBody; now: Date; backupDays: number },
): Promise<ErasurePreview> {
  const { teamId, body, now, backupDays } = options
  const traces = await tracesOf(manager, teamId, { kind: body.kind, id: body.subjectId })
  const [due, timeZone] = await dueAfter(manager, teamId, now)
  return {
    name: (await nameOf(manager, body)) ?? '',
    dueAt: due.toISOString(),
    goes: counted(await going(manager, traces)),
    stays: counted(await staying(manager, traces)),
    backupsUntil: dayAfter(dayInZone(due, timeZone), backupDays),
  }
}

const counted = <K extends string>(counts: Record<K, number>) =>
  (Object.entries(counts) as [K, number][])
    .filter(([, count]) => count > 0)
    .map(([key, count]) => ({ key, count }))

const one = (yes: boolean) => (yes ? 1 : 0)

async function going(manager: EntityManager, traces: Traces): Promise<Record<GoesKey, number>> {
  const { teamId, player, person, membership, accountGoes, invitationIds, letterIds, plans } = traces
  const personId = person?.id
  return {
    name: one(player !== null || person !== null),
    skills: one(player !== null),
    guardian: one(player?.guardianEmail != null),
    consent: one(player !== null && player.pictureConsent !== 'not-asked'),
    account: one(accountGoes),
    membership: one(membership !== null && !accountGoes),
    sessions: personId !== undefined && accountGoes ? await countSessions(manager, personId) : 0,
    history: player ? await manager.countBy(Change, { teamId, rowId: player.id }) : 0,
    invitations: invitationIds.length,
    letters: letterIds.length,
    openings: personId === undefined ? 0 : await manager.countBy(Opening, { teamId, personId }),
    copies: player ? await manager.countBy(Copy, { teamId, squadPlayerId: player.id }) : 0,
    drafts: plans.filter(({ signedAt }) => signedAt === null).length,
  }
}

async function staying(manager: EntityManager, traces: Traces): Promise<Record<StaysKey, number>> {
  const { teamId, person, plans } = traces
  const by = person?.id
  const none = Promise.resolve(0)
  return {
    plans: plans.filter(({ signedAt }) => signedAt !== null).length,
    possessions: await manager.countBy(Possession, { teamId, deletedAt: IsNull() }),
    scouted: await (by === undefined ? none : manager.countBy(ScoutedGame, { teamId, scoutId: by })),
    signed: await (by === undefined ? none : manager.countBy(Plan, { teamId, signedById: by })),
    changes: await (by === undefined ? none : manager.countBy(Change, { teamId, personId: by })),
    handOns: await (by === undefined
      ? none
      : manager.count(HandOn, {
          where: [
            { teamId, fromId: by },
            { teamId, toId: by },
          ],
        })),
  }
}

/** Sets an erasure for the next midnight. @throws NotFound, Conflict for the only head coach and for a second one */
export function putErasure(
  db: DataSource,
  options: {
    teamId: string
    id: string
    by: string
    body: ErasureBody
    ifMatch: number | null
    now: Date
  },
): Promise<Put<Erasure>> {
  const { teamId, id, by, body, now } = options
  return db.transaction(async (manager) => {
    const found = await manager.findOneBy(Erasure, { id })
    // Done or not, the same again changes nothing; for a new one somebody has to be there.
    if (!found) {
      const { membership } = await tracesOf(manager, teamId, { kind: body.kind, id: body.subjectId })
      if (membership) await keepAHead(manager, membership, 'the team cannot do without')
      const waiting = { ...body, teamId, stoppedAt: IsNull(), doneAt: IsNull() }
      if (await manager.existsBy(Erasure, waiting)) throw new Conflict('This is set for tonight already.')
    }
    const [due] = await dueAfter(manager, teamId, now)
    return putRow<Erasure, ErasureBody>({
      ...options,
      manager,
      entity: Erasure,
      what: 'erasure',
      bodyOf: ({ kind, subjectId }) => ({ kind, subjectId }),
      columnsOf: (columns) => {
        if (found) throw new Conflict('An erasure is not changed. Stop it and set another one.')
        return {
          ...columns,
          askedById: by,
          dueAt: due.toISOString(),
          stoppedAt: null,
          stoppedById: null,
          doneAt: null,
        }
      },
      present: (row) => presentErasure(row, null),
    })
  })
}

/** Anybody of the staff stops it while it waits; a repeat changes nothing. @throws NotFound, Conflict once it is done */
export function stopErasure(
  db: DataSource,
  { teamId, id, by, now }: { teamId: string; id: string; by: string; now: Date },
): Promise<Erasure> {
  return db.transaction(async (manager) => {
    const row = await findInTeam(manager, Erasure, teamId, id, 'erasure')
    if (row.doneAt !== null) throw new Conflict('This is done. What went is gone for good.')
    if (row.stoppedAt !== null) return row
    const stamp = now.toISOString()
    const stopped = { stoppedAt: stamp, stoppedById: by, updatedAt: stamp, version: row.version + 1 }
    await manager.update(Erasure, { id }, stopped)
    return Object.assign(row, stopped)
  })
}

/** An erasure with the names of who asked and who stopped it. */
export async function describeErasure(manager: EntityManager, teamId: string, id: string) {
  const relations = { askedBy: true, stoppedBy: true }
  const row = await manager.findOneOrFail(Erasure, { where: { id, teamId }, relations })
  return presentErasure(row, await nameOf(manager, row))
}

/**
 * Does what is due, each in a transaction of its own, and then leaves no byte of it in the file or its log.
 * One that has become impossible, because the only head coach would go, is stopped. Returns how many were done.
 */
export async function eraseDue(db: DataSource, now: Date): Promise<number> {
  const stamp = now.toISOString()
  const due = await db
    .getRepository(Erasure)
    .findBy({ doneAt: IsNull(), stoppedAt: IsNull(), dueAt: LessThanOrEqual(stamp) })
  try {
    await eachAlone(due, ({ id }) => db.transaction((manager) => eraseOne(manager, id, stamp)))
  } finally {
    if (due.length > 0) await leaveNoByte(db)
  }
  return due.length
}

async function eraseOne(manager: EntityManager, id: string, stamp: string): Promise<void> {
  const row = await manager.findOneByOrFail(Erasure, { id })
  if (row.stoppedAt !== null || row.doneAt !== null) return
  const end = (how: 'doneAt' | 'stoppedAt') =>
    manager.update(Erasure, { id }, { [how]: stamp, updatedAt: stamp, version: row.version + 1 })
  try {
    const subject = { kind: row.kind, id: row.subjectId }
    const { membership } = await tracesOf(manager, row.teamId, subject, 'also-left')
    if (membership) await keepAHead(manager, membership, 'the team cannot do without')
  } catch (error) {
    // Gone already is done; the only head coach stays.
    if (error instanceof NotFound) return void (await end('doneAt'))
    if (error instanceof Conflict) return void (await end('stoppedAt'))
    throw error
  }
  await eraseSubject(manager, row.teamId, { kind: row.kind, id: row.subjectId })
  await end('doneAt')
}
