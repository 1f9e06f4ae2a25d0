import { Grounds, GroundsQuery } from '@shared/plans/grounds'
import { PlanBody, PlanRow, PlanState, SignOffBody } from '@shared/plans/schemas'
import type { Context } from '../../context'
import { endpoint, ok } from '../../http/endpoint'
import { OneRow } from '../../http/params'
import { listReply, putReply } from '../../http/present'
import { planGrounds } from './grounds'
import { presentPlan } from './plans.presenter'
import { planState, putPlan } from './plans.service'
import { signOff } from './signOff.service'

export const planRoutes = ({ db, clock }: Context) => {
  const state = async (teamId: string, gameId: string) => {
    const { plan, versions } = await planState(db.manager, teamId, gameId)
    return ok({ plan, versions } satisfies PlanState, plan?.version)
  }
  return [
    endpoint({
      method: 'get',
      path: '/teams/:team/games/:id/plan',
      summary: 'The newest version of the plan for a game, and the list of versions',
      action: 'plan:read',
      params: OneRow,
      response: PlanState,
      handle: ({ caller, params }) => state(caller.teamId, params.id),
    }),
    endpoint({
      method: 'put',
      path: '/teams/:team/games/:id/plan',
      summary: 'Write the head coach’s picks, roles and keys',
      action: 'plan:write',
      params: OneRow,
      body: PlanBody,
      response: PlanRow,
      handle: async ({ caller, params, body, ifMatch }) => {
        const put = await putPlan(db, {
          gameId: params.id,
          teamId: caller.teamId,
          body,
          ifMatch,
          now: clock(),
          by: caller.personId,
        })
        return putReply(put, presentPlan(put.row))
      },
    }),
    endpoint({
      method: 'get',
      path: '/teams/:team/games/:id/plan/grounds',
      summary: 'What a signed version stood on: its reasons with the possessions behind them',
      action: 'plan:read',
      params: OneRow,
      query: GroundsQuery,
      response: Grounds,
      handle: async ({ caller, params, query }) =>
        listReply(await planGrounds(db.manager, caller.teamId, params.id, query.plan)),
    }),
    endpoint({
      method: 'post',
      path: '/teams/:team/games/:id/plan/sign-off',
      summary: 'Freeze the plan and make its sheet',
      action: 'plan:sign-off',
      params: OneRow,
      body: SignOffBody,
      response: PlanState,
      handle: async ({ caller, params, body, ifMatch }) => {
        await signOff(db, {
          teamId: caller.teamId,
          gameId: params.id,
          personId: caller.personId,
          body,
          ifMatch,
          now: clock(),
        })
        return state(caller.teamId, params.id)
      },
    }),
  ]
}
