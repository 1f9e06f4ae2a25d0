import { StripList } from '@shared/opponents/strips'
import type { Context } from '../../context'
import { endpoint } from '../../http/endpoint'
import { InTeam } from '../../http/params'
import { listReply } from '../../http/present'
import { listStrips } from './strips.service'

export const stripRoutes = ({ db }: Context) => [
  endpoint({
    method: 'get',
    path: '/teams/:team/strips',
    summary: 'The press of every opponent, flattened onto one axis for the list of opponents',
    action: 'opponent:read',
    params: InTeam,
    response: StripList,
    handle: async ({ caller }) => listReply(await listStrips(db.manager, caller.teamId)),
  }),
]
