import type { DataSource, EntityManager } from 'typeorm'
import type { MemberEdit } from '@shared/people/schemas'
import { Membership } from '../../database/entities/Membership'
import { SquadPlayer } from '../../database/entities/SquadPlayer'
import { findInTeam } from '../../database/findInTeam'
import { fieldsChanged, recordChange } from '../../database/history'
import { Conflict, NeedsIfMatch, NotFound, StaleVersion } from '../../http/problem'
import { presentMember, type WithPerson } from './people.presenter'

/** How many head coaches a team has. */
const headsOf = (manager: EntityManager, teamId: string): Promise<number> =>
  manager.countBy(Membership, { teamId, role: 'head-coach' })

async function findMember(manager: EntityManager, teamId: string, id: string): Promise<WithPerson> {
  const row = await manager.findOne(Membership, { where: { id, teamId }, relations: { person: true } })
  if (!row?.person) throw new NotFound('member')
  return row as WithPerson
}

/** @throws Conflict: a team without a head coach could not be led nor ended. */
export async function keepAHead(
  manager: EntityManager,
  row: Pick<Membership, 'teamId' | 'role'>,
  what: string,
): Promise<void> {
  if (row.role === 'head-coach' && (await headsOf(manager, row.teamId)) === 1)
    throw new Conflict(`This is the only head coach, so ${what}. Make somebody else a head coach first.`)
}

/** Somebody in the squad has at most one account. @throws NotFound, Conflict */
export async function checkPlace(
  manager: EntityManager,
  teamId: string,
  squadPlayerId: string,
  memberId: string | null,
): Promise<SquadPlayer> {
  const player = await findInTeam(manager, SquadPlayer, teamId, squadPlayerId, 'player')
  const account = await manager.findOneBy(Membership, { teamId, squadPlayerId })
  if (account && account.id !== memberId) throw new Conflict(`${player.firstName} has an account already.`)
  return player
}

/** @throws NotFound, StaleVersion, NeedsIfMatch, Conflict for the only head coach and a place that is taken */
export function changeMember(
  db: DataSource,
  options: {
    teamId: string
    id: string
    callerId: string
    body: MemberEdit
    ifMatch: number | null
    now: Date
  },
) {
  const { teamId, id, callerId, body, ifMatch, now } = options
  return db.transaction(async (manager) => {
    const row = await findMember(manager, teamId, id)
    const present = async () => presentMember(row, { callerId, heads: await headsOf(manager, teamId) })
    if (ifMatch === null) throw new NeedsIfMatch()
    if (ifMatch !== row.version) throw new StaleVersion(await present(), row.version)
    if (body.role === row.role && body.squadPlayerId === row.squadPlayerId) return present()
    if (body.role !== 'head-coach') await keepAHead(manager, row, 'the role stays')
    if (body.squadPlayerId !== null) await checkPlace(manager, teamId, body.squadPlayerId, id)
    const version = row.version + 1
    const fields = fieldsChanged({ role: row.role, squadPlayerId: row.squadPlayerId }, body)
    Object.assign(row, body, { version })
    await manager.update(Membership, { id }, { ...body, version })
    await recordChange(manager, Membership, {
      teamId,
      rowId: id,
      action: 'changed',
      by: callerId,
      now,
      fields,
    })
    return present()
  })
}

/** Takes a membership out; what they did for the team stays. @throws NotFound, StaleVersion, Conflict */
export function removeMember(
  db: DataSource,
  options: { teamId: string; callerId: string; ifMatch: number | null; now: Date } & (
    { id: string } | { personId: string }
  ),
): Promise<void> {
  const { teamId, callerId, ifMatch, now } = options
  return db.transaction(async (manager) => {
    const id =
      'id' in options
        ? options.id
        : (await manager.findOneByOrFail(Membership, { teamId, personId: options.personId })).id
    const row = await findMember(manager, teamId, id)
    if (ifMatch !== null && ifMatch !== row.version)
      throw new StaleVersion(
        presentMember(row, { callerId, heads: await headsOf(manager, teamId) }),
        row.version,
      )
    await keepAHead(manager, row, 'they stay in the team')
    await manager.delete(Membership, { id })
    await recordChange(manager, Membership, { teamId, rowId: id, action: 'deleted', by: callerId, now })
  })
}
