import { In, IsNull, type EntityManager } from 'typeorm'
import { Invitation } from '../../database/entities/Invitation'
import { Mail } from '../../database/entities/Mail'
import { Membership } from '../../database/entities/Membership'
import { Person } from '../../database/entities/Person'
import { Plan } from '../../database/entities/Plan'
import { SquadPlayer } from '../../database/entities/SquadPlayer'
import { NotFound } from '../../http/problem'
import type { Subject } from './people.policy'

/** Where in one team somebody is written down. */
export interface Traces {
  teamId: string
  player: SquadPlayer | null
  membership: Membership | null
  person: Person | null
  /** The account has no other team, so it goes too. */
  accountGoes: boolean
  /** Addresses that nobody else in this team has. */
  addresses: string[]
  invitationIds: string[]
  letterIds: string[]
  /** Plans with a role of hers, signed or not. */
  plans: Plan[]
}

/** @throws NotFound when there is nobody of that id in the team */
export async function tracesOf(manager: EntityManager, teamId: string, subject: Subject): Promise<Traces> {
  const { kind, id } = subject
  const player = kind === 'member' ? null : await manager.findOneBy(SquadPlayer, { id, teamId })
  if (kind === 'squad-player' && !player) throw new NotFound('player')
  const membership = await manager.findOneBy(
    Membership,
    kind === 'member' ? { teamId, personId: id } : { teamId, squadPlayerId: id },
  )
  if (kind === 'member' && !membership) throw new NotFound('member')
  const person = membership && (await manager.findOneBy(Person, { id: membership.personId }))
  const teams = person ? await manager.countBy(Membership, { personId: person.id }) : 0
  const addresses = [person?.email ?? null, await ownGuardian(manager, player)].filter(
    (address) => address !== null,
  )
  const invitationIds = await invitationsOf(manager, { teamId, player, person, addresses })
  const accountGoes = person !== null && teams === 1
  return {
    teamId,
    player,
    membership,
    person,
    accountGoes,
    addresses,
    invitationIds,
    letterIds: await lettersOf(manager, {
      teamId,
      player,
      addresses,
      invitationIds,
      everywhere: accountGoes ? person.email : null,
    }),
    plans: player ? await plansWith(manager, teamId, player.id) : [],
  }
}

/** Her guardian's address, unless a sister in the squad has the same: then it is still needed. */
async function ownGuardian(manager: EntityManager, player: SquadPlayer | null): Promise<string | null> {
  if (!player || player.guardianEmail === null) return null
  const { teamId, guardianEmail } = player
  return (await manager.countBy(SquadPlayer, { teamId, guardianEmail })) === 1 ? guardianEmail : null
}

async function invitationsOf(
  manager: EntityManager,
  { teamId, player, person, addresses }: Pick<Traces, 'teamId' | 'player' | 'person' | 'addresses'>,
): Promise<string[]> {
  const rows = await manager.find(Invitation, {
    select: { id: true },
    where: [
      ...(player ? [{ teamId, squadPlayerId: player.id }] : []),
      ...(person ? [{ teamId, usedById: person.id }] : []),
      ...(addresses.length > 0 ? [{ teamId, email: In(addresses) }] : []),
    ],
  })
  return rows.map(({ id }) => id)
}

async function lettersOf(
  manager: EntityManager,
  whose: Pick<Traces, 'teamId' | 'player' | 'addresses' | 'invitationIds'> & { everywhere: string | null },
): Promise<string[]> {
  const { teamId, player, addresses, invitationIds, everywhere } = whose
  const found = new Set<string>()
  const take = (rows: Mail[]) => rows.forEach(({ id }) => found.add(id))
  const select = { id: true } as const
  if (addresses.length > 0)
    take(
      await manager.find(Mail, {
        select,
        where: [
          { teamId, recipient: In(addresses) },
          // Between a person and the product: a new password.
          ...(everywhere === null ? [] : [{ teamId: IsNull(), recipient: everywhere }]),
        ],
      }),
    )
  if (invitationIds.length > 0)
    take(await manager.find(Mail, { select, where: { teamId, aboutId: In(invitationIds) } }))
  if (player)
    take(
      await manager
        .createQueryBuilder(Mail, 'mail')
        .where('mail.teamId = :teamId AND mail.attachment LIKE :hers', { teamId, hers: `%${player.id}%` })
        .getMany(),
    )
  return [...found]
}

const plansWith = (manager: EntityManager, teamId: string, playerId: string): Promise<Plan[]> =>
  manager
    .createQueryBuilder(Plan, 'plan')
    .where('plan.teamId = :teamId AND (plan.roles LIKE :hers OR plan.frozen LIKE :hers)', {
      teamId,
      hers: `%${playerId}%`,
    })
    .getMany()
