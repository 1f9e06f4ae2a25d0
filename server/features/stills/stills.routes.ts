import { z } from 'zod'
import { Id } from '@shared/http/common'
import { LIMITS } from '@shared/limits'
import { StillRow } from '@shared/possessions/schemas'
import { StillFields } from '@shared/stills/schemas'
import type { Context } from '../../context'
import { endpoint, gone } from '../../http/endpoint'
import { OneRow } from '../../http/params'
import { NotFound } from '../../http/problem'
import { oneFile } from '../../http/uploads'
import { presentStill } from '../possessions/possessions.presenter'
import { deleteStill, findStill, putStill } from './stills.service'

const OneStill = OneRow.extend({ still: Id })
const Size = z.object({
  size: z.enum(['full', 'thumbnail']).default('full'),
  /** Tells the picture before a blur from the one after it; the server always sends the present one. */
  pixels: z.string().max(9).optional(),
})

/** A still's picture; what is drawn and said about it is in `editStillRoutes`. */
export const stillRoutes = ({ db, clock, stillFiles }: Context) => [
  endpoint({
    method: 'put',
    path: '/teams/:team/possessions/:id/stills/:still',
    summary: 'Add a still to a possession',
    action: 'scouting:write',
    params: OneStill,
    body: StillFields,
    response: StillRow,
    before: [oneFile('still', LIMITS.stillBytes)],
    media: { request: 'multipart/form-data', field: 'still' },
    handle: async ({ caller, params, body, req }) => {
      const { still, created } = await putStill(db, stillFiles, {
        teamId: caller.teamId,
        possessionId: params.id,
        stillId: params.still,
        fields: body,
        bytes: req.file?.buffer ?? Buffer.alloc(0),
        now: clock(),
        by: caller.personId,
      })
      return { status: created ? 201 : 200, body: presentStill(still), version: still.version }
    },
  }),
  endpoint({
    method: 'delete',
    path: '/teams/:team/possessions/:id/stills/:still',
    summary: 'Delete a still, for good',
    action: 'scouting:write',
    params: OneStill,
    handle: async ({ caller, params }) => {
      await deleteStill(db, stillFiles, {
        teamId: caller.teamId,
        possessionId: params.id,
        stillId: params.still,
      })
      return gone()
    },
  }),
  endpoint({
    method: 'get',
    path: '/teams/:team/stills/:id',
    summary: 'The picture of a still',
    action: 'scouting:read',
    params: OneRow,
    query: Size,
    media: { response: 'image/jpeg' },
    handle: async ({ caller, params, query, res }) => {
      const still = await findStill(db.manager, caller.teamId, params.id)
      const path = stillFiles.pathOf(still.teamId, still.id, query.size)
      await new Promise<void>((resolve, reject) => {
        // A still may be blurred, and a person may leave the team: the browser alone keeps it, and asks.
        const options = { headers: { 'Cache-Control': 'private, no-cache' }, dotfiles: 'allow' as const }
        res
          .type('image/jpeg')
          // Once the answer has begun, a fault is a reader who has left.
          .sendFile(path, options, (error) =>
            error && !res.headersSent ? reject(new NotFound('still')) : resolve(),
          )
      })
      return undefined
    },
  }),
]
