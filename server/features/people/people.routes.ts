import { z } from 'zod'
import { Id } from '@shared/http/common'
import { ERASURE_KINDS, MemberEdit, MemberRow, PeoplePage } from '@shared/people/schemas'
import type { Context } from '../../context'
import { endpoint, ok } from '../../http/endpoint'
import { InTeam, OneRow } from '../../http/params'
import { NotAllowed } from '../../http/problem'
import { exportPerson } from './export.service'
import { changeMember, removeMember } from './members.service'
import { mayExport } from './people.policy'
import { readPeople } from './people.service'

const WhoseExport = z.object({ kind: z.enum(ERASURE_KINDS), id: Id })

export const peopleRoutes = ({ db, clock, config }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/people',
    summary: 'Members, players without an account, invitations and erasures that wait',
    action: 'team:read',
    params: InTeam,
    response: PeoplePage,
    handle: async ({ caller }) => {
      const where = { teamId: caller.teamId, callerId: caller.personId, now: clock() }
      return ok({ ...(await readPeople(db, where)), backupDays: config.backupDays })
    },
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/people/export',
    summary: 'Everything that the team keeps on one person, as a file',
    action: 'sheet:read',
    params: InTeam,
    query: WhoseExport,
    response: z.record(z.string(), z.unknown()),
    handle: async ({ caller, query, res }) => {
      if (!mayExport(caller, query))
        throw new NotAllowed('You may take out what is kept on yourself. Ask the head coach for others.')
      res.attachment('kept-on-one-person.json')
      return ok(await exportPerson(db, caller.teamId, query, clock()))
    },
  }),
  endpoint({
    method: 'patch',
    path: '/teams/:team/members/:id',
    summary: 'Change a member’s role',
    action: 'team:write',
    params: OneRow,
    body: MemberEdit,
    response: MemberRow,
    handle: async ({ caller, params, body, ifMatch }) => {
      const where = { teamId: caller.teamId, id: params.id, callerId: caller.personId }
      const row = await changeMember(db, { ...where, body, ifMatch, now: clock() })
      return ok(row, row.version)
    },
  }),
  endpoint({
    method: 'delete',
    path: '/teams/:team/members/:id',
    summary: 'Take a member out of the team',
    action: 'team:write',
    params: OneRow,
    handle: async ({ caller, params, ifMatch }) => {
      const { teamId, personId: callerId } = caller
      await removeMember(db, { teamId, callerId, id: params.id, ifMatch, now: clock() })
      return { status: 204 }
    },
  }),
  endpoint({
    method: 'delete',
    path: '/teams/:team/membership',
    summary: 'Leave the team',
    action: 'sheet:read',
    params: InTeam,
    handle: async ({ caller, ifMatch }) => {
      const { teamId, personId } = caller
      await removeMember(db, { teamId, callerId: personId, personId, ifMatch, now: clock() })
      return { status: 204 }
    },
  }),
]
