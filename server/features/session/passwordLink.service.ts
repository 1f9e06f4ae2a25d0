import type { Context } from '../../context'
import { Membership } from '../../database/entities/Membership'
import type { Caller } from '../../http/endpoint'
import { Conflict, NotFound } from '../../http/problem'
import { makePasswordLink } from './passwordReset.service'

/**
 * A link for a member of the caller's team. Whoever holds it holds the account, in every team that it is in: so
 * the caller must be head coach of all of them.
 * @param membershipId of the member
 * @throws NotFound; Conflict when the person is also on another coach's team
 */
export async function linkForMember(
  context: Context,
  caller: Caller,
  membershipId: string,
): Promise<{ url: string; expiresAt: string }> {
  return context.db.transaction(async (manager) => {
    const memberships = manager.getRepository(Membership)
    const member = await memberships.findOneBy({ id: membershipId, teamId: caller.teamId })
    if (!member) throw new NotFound('member')
    const theirs = await memberships.findBy({ personId: member.personId })
    const led = await memberships.findBy({ personId: caller.personId, role: 'head-coach' })
    const mine = new Set(led.map(({ teamId }) => teamId))
    if (!theirs.every(({ teamId }) => mine.has(teamId)))
      throw new Conflict(
        `This person is also on a team that you do not coach, so no link is made here. ${
          context.mail === null
            ? 'Whoever runs this server can set a mail server; then they can ask for a link themselves.'
            : 'They can ask for one themselves, on the page “Forgotten password”.'
        }`,
      )
    return makePasswordLink(context, manager, member.personId)
  })
}
