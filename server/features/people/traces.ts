import { In, IsNull, Not, type EntityManager } from 'typeorm'
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

/**
 * @param who `also-left` takes a member who has left since the erasure was set: what is known of her is still here
 * @throws NotFound when there is nobody of that id in the team
 */
export async function tracesOf(
  manager: EntityManager,
  teamId: string,
  subject: Subject,
  who: 'members' | 'also-left' = 'members',
): Promise<Traces> {
  const { kind, id } = subject
  const player = kind === 'member' ? null : await manager.findOneBy(SquadPlayer, { id, teamId })
  if (kind === 'squad-player' && !player) throw new NotFound('player')
  const membership = await manager.findOneBy(
    Membership,
    kind === 'member' ? { teamId, personId: id } : { teamId, squadPlayerId: id },
  )
  if (kind === 'member' && !membership && who === 'members') throw new NotFound('member')
  const personId = membership?.personId ?? (kind === 'member' ? id : null)
  const person = personId === null ? null : await manager.findOneBy(Person, { id: personId })
  if (kind === 'member' && !person) throw new NotFound('member')
  const elsewhere = person
    ? await manager.countBy(Membership, { personId: person.id, teamId: Not(teamId) })
    : 0
  const addresses = await ownAddresses(manager, { teamId, player, person, membership })
  const invitationIds = await invitationsOf(manager, { teamId, player, person, addresses })
  const accountGoes = person !== null && elsewhere === 0
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
      playerId: player?.id ?? membership?.squadPlayerId ?? null,
      addresses,
      invitationIds,
      everywhere: accountGoes ? person.email : null,
    }),
    plans: player ? await plansWith(manager, teamId, player.id) : [],
  }
}

/** The account's and her guardian's address, unless somebody else here has the same: then it is still needed. */
async function ownAddresses(
  manager: EntityManager,
  { teamId, player, person, membership }: Pick<Traces, 'teamId' | 'player' | 'person' | 'membership'>,
): Promise<string[]> {
  const own: string[] = []
  const playerId = player?.id ?? membership?.squadPlayerId ?? null
  for (const address of new Set([person?.email, player?.guardianEmail])) {
    if (address === null || address === undefined) continue
    const families = await manager.findBy(SquadPlayer, { teamId, guardianEmail: address })
    const holder = await manager.findOneBy(Person, { email: address })
    const others =
      families.some(({ id }) => id !== playerId) ||
      (holder !== null &&
        holder.id !== person?.id &&
        (await manager.existsBy(Membership, { teamId, personId: holder.id })))
    if (!others) own.push(address)
  }
  return own
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
  whose: Pick<Traces, 'teamId' | 'addresses' | 'invitationIds'> & {
    playerId: string | null
    everywhere: string | null
  },
): Promise<string[]> {
  const { teamId, playerId, addresses, invitationIds, everywhere } = whose
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
  // By whose sheet it is: her address may have been another one then.
  if (playerId !== null)
    take(
      await manager
        .createQueryBuilder(Mail, 'mail')
        .where('mail.teamId = :teamId', { teamId })
        .andWhere(
          `(mail.attachment LIKE :hers OR mail.onceKey LIKE :hers OR mail.onceKey IN
            (SELECT 'recalled:' || copy.sheetId || ':' || copy.id FROM copies copy WHERE copy.squadPlayerId = :playerId))`,
          { hers: `%${playerId}%`, playerId },
        )
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
