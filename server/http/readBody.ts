import type { Request } from 'express'
import type { z } from 'zod'
import { faultsOf } from './faults'
import { BadInput } from './problem'

/** A request's body, for routes that are no team endpoint. @throws BadInput with every field at fault */
export function readBody<S extends z.ZodType>(schema: S, req: Request): z.output<S> {
  const parsed = schema.safeParse(req.body ?? {}, { reportInput: true })
  if (!parsed.success) throw new BadInput(faultsOf(parsed.error))
  return parsed.data
}
