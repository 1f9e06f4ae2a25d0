import type { z } from 'zod'
import { CounterRow } from '@shared/counters/schemas'
import { GameRow } from '@shared/games/schemas'
import { OpponentPlayerRow } from '@shared/opponents/players'
import { OpponentRow } from '@shared/opponents/schemas'
import { ScoutedGameRow } from '@shared/scoutedGames/schemas'
import type { Action } from '@shared/session/schemas'
import type { Context } from '../../context'
import type { TeamRow } from '../../database/columns'
import { endpoint, gone, ok, type Endpoint } from '../../http/endpoint'
import { OneRow } from '../../http/params'
import { DELETABLE, deleteRow, restoreRow, type Deletable } from './deletion.service'

/** DELETE and restore of one kind of row, at the address of its collection. */
function pair<E extends TeamRow>(
  { db, clock }: Context,
  collection: string,
  kind: Deletable<E>,
  action: Action,
  response: z.ZodType,
): Endpoint[] {
  const path = `/teams/:team/${collection}/:id`
  return [
    endpoint({
      method: 'delete',
      path,
      summary: `Delete a ${kind.what} and what hangs on it; it can be put back for ten minutes`.replace(
        'a opponent',
        'an opponent',
      ),
      action,
      params: OneRow,
      handle: async ({ caller, params, ifMatch }) => {
        const which = { teamId: caller.teamId, id: params.id, by: caller.personId, now: clock(), ifMatch }
        await deleteRow(db, kind, which)
        return gone()
      },
    }),
    endpoint({
      method: 'post',
      path: `${path}/restore`,
      summary: `Put a deleted ${kind.what} back`,
      action,
      params: OneRow,
      response,
      handle: async ({ caller, params }) => {
        const which = { teamId: caller.teamId, id: params.id, by: caller.personId, now: clock() }
        const { body, version } = await restoreRow(db, kind, which)
        return ok(body, version)
      },
    }),
  ]
}

export const deletionRoutes = (context: Context) => [
  ...pair(context, 'opponents', DELETABLE.opponents, 'opponent:write', OpponentRow),
  ...pair(context, 'scouted-games', DELETABLE['scouted-games'], 'scouting:write', ScoutedGameRow),
  ...pair(context, 'games', DELETABLE.games, 'game:write', GameRow),
  ...pair(context, 'counters', DELETABLE.counters, 'counter:write', CounterRow),
  ...pair(context, 'opponent-players', DELETABLE['opponent-players'], 'opponent:write', OpponentPlayerRow),
]
