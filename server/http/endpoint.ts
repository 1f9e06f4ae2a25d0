import type { Request, RequestHandler, Response, Router } from 'express'
import type { z } from 'zod'
import type { Action } from '@shared/session/schemas'
import type { TeamRole } from '@shared/vocabulary'
import { faultsOf } from './faults'
import { may } from './policy'
import { BadInput, NotAllowed, NotFound, NotSignedIn, type FieldFault } from './problem'

/** Who is asking, inside the team of the address. */
export interface Caller {
  personId: string
  name: string
  teamId: string
  role: TeamRole
  squadPlayerId: string | null
}

/** What a handler hands back; the endpoint writes it out. */
export interface Reply<T = unknown> {
  status: 200 | 201 | 204
  body?: T
  /** Number inside the ETag. */
  version?: number
}

export interface Input<P, Q, B> {
  caller: Caller
  params: P
  query: Q
  body: B
  /** The version in `If-Match`, or null when none was sent. */
  ifMatch: number | null
  req: Request
  res: Response
}

type Schema = z.ZodType
type Out<S, Else> = S extends Schema ? z.output<S> : Else

interface Shape<P extends Schema, Q, B> {
  method: 'get' | 'put' | 'post' | 'patch' | 'delete'
  /** Below /api, with Express parameters: `/teams/:team/opponents/:id`. */
  path: string
  /** One line for the API's description. */
  summary: string
  action: Action
  params: P
  query?: Q
  body?: B
  /** Schema of the 200/201 body, for the description; absent for 204 and files. */
  response?: Schema
  /** Middleware between the checks and the handler (uploads). */
  before?: RequestHandler[]
  /** Refusals of its own beside those that every endpoint has, for the description. */
  problems?: Record<number, string>
  /** Media types other than JSON: what a request brings and an answer holds. */
  media?: { request?: string; response?: string; field?: string }
}

/** A team endpoint as data: mounted, authorised and described from the same value. */
export interface Endpoint extends Shape<Schema, Schema | undefined, Schema | undefined> {
  handle: (input: Input<unknown, unknown, unknown>) => Promise<Reply | undefined>
}

/** Declares an endpoint; params, query and body arrive parsed in the handler. */
export function endpoint<
  P extends Schema,
  Q extends Schema | undefined = undefined,
  B extends Schema | undefined = undefined,
>(
  shape: Shape<P, Q, B> & {
    handle: (input: Input<z.output<P>, Out<Q, undefined>, Out<B, undefined>>) => Promise<Reply | undefined>
  },
): Endpoint {
  return shape as unknown as Endpoint
}

export const ok = <T>(body: T, version?: number): Reply<T> => ({ status: 200, body, version })
export const gone = (): Reply => ({ status: 204 })

function parse(schema: Schema | undefined, value: unknown, faults: FieldFault[], prefix = ''): unknown {
  if (!schema) return undefined
  const parsed = schema.safeParse(value, { reportInput: true })
  if (parsed.success) return parsed.data
  faults.push(...faultsOf(parsed.error, prefix))
  return undefined
}

/** `If-Match: "7"` as 7; anything else that is there is a fault, for a weak or foreign tag never matches. */
function readIfMatch(req: Request): number | null {
  const header = req.get('If-Match')
  if (header === undefined) return null
  const match = /^"(\d{1,9})"$/.exec(header.trim())
  if (!match) throw new BadInput([{ field: 'If-Match', message: 'Send the ETag you were given, e.g. "3".' }])
  return Number(match[1])
}

/** Finds the caller's membership of a team, or null. */
export type FindCaller = (req: Request, teamId: string) => Promise<Caller | null>

/**
 * Mounts an endpoint: signed in (401), in this team (404), allowed (403), well-formed (400), then the
 * handler. A person outside the team gets the same 404 as for a team that does not exist.
 */
export function mount(router: Router, spec: Endpoint, findCaller: FindCaller): void {
  const check: RequestHandler = async (req, res, next) => {
    if (!req.user) throw new NotSignedIn()
    const caller = await findCaller(req, String(req.params['team']))
    if (!caller) throw new NotFound('team', '')
    if (!may(caller.role, spec.action)) throw new NotAllowed()
    const faults: FieldFault[] = []
    parse(spec.params, req.params, faults)
    if (faults.length > 0) throw new BadInput(faults)
    res.locals['caller'] = caller
    next()
  }
  const run: RequestHandler = async (req, res) => {
    const faults: FieldFault[] = []
    const params = parse(spec.params, req.params, faults)
    const query = parse(spec.query, req.query, faults)
    const body = parse(spec.body, req.body ?? {}, faults)
    if (faults.length > 0) throw new BadInput(faults)
    const caller = res.locals['caller'] as Caller
    const reply = await spec.handle({ caller, params, query, body, ifMatch: readIfMatch(req), req, res })
    if (!reply) return
    if (reply.version !== undefined) res.set('ETag', `"${reply.version}"`)
    if (reply.status === 204) res.status(204).end()
    else res.status(reply.status).json(reply.body)
  }
  router[spec.method](spec.path, check, ...(spec.before ?? []), run)
}
