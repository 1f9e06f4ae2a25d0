import type { RequestHandler } from 'express'
import { BadInput } from './problem'

/** Levels of a body; a rule of many conditions has some ten. */
const DEEPEST = 24

/** Refuses a body so deep that checking it would run out of stack. */
export const notTooDeep: RequestHandler = (req, _res, next) => {
  let level: unknown[] = [req.body]
  for (let depth = 0; level.length > 0; depth += 1) {
    if (depth > DEEPEST)
      throw new BadInput([{ field: 'body', message: 'This is nested too deep. Make it simpler.' }])
    level = level.flatMap((value) =>
      typeof value === 'object' && value !== null ? (Object.values(value) as unknown[]) : [],
    )
  }
  next()
}
