import type { ErrorRequestHandler, RequestHandler } from 'express'
import type { Logger } from 'pino'
import type { Problem } from '@shared/http/common'

/** One field at fault and what to do about it. */
export interface FieldFault {
  field: string
  message: string
}

/**
 * An error that a caller may see, mapped once to RFC 9457 problem details. Services throw the named
 * subclasses; nothing is ever matched by message text.
 */
export class HttpError extends Error {
  constructor(
    readonly status: number,
    readonly slug: string,
    readonly title: string,
    detail: string,
    readonly more: { errors?: FieldFault[]; current?: unknown; etag?: string } = {},
  ) {
    super(detail)
  }
}

export class NotSignedIn extends HttpError {
  constructor(detail = 'Sign in first.') {
    super(401, 'not-signed-in', 'Not signed in', detail)
  }
}

export class NotAllowed extends HttpError {
  constructor(detail = 'Your role in this team does not include this. Ask the head coach.') {
    super(403, 'not-allowed', 'Not allowed', detail)
  }
}

/** Also for a row of another team: its existence is not told. */
export class NotFound extends HttpError {
  constructor(what: string, where = ' in this team') {
    super(404, 'not-found', 'Not found', `There is no such ${what}${where}.`)
  }
}

export class BadInput extends HttpError {
  constructor(
    errors: FieldFault[],
    detail = 'Some of what was sent cannot be taken. Each line says what to change.',
  ) {
    super(400, 'bad-input', 'Cannot be taken', detail, { errors })
  }
}

/** The id exists with another body and no `If-Match` was sent, or the state does not allow it. */
export class Conflict extends HttpError {
  constructor(detail: string, current?: unknown) {
    super(409, 'conflict', 'Stands in the way', detail, current === undefined ? {} : { current })
  }
}

/** The edit was made on an older version; carries the present row so that both can be shown. */
export class StaleVersion extends HttpError {
  constructor(current: unknown, version: number) {
    super(
      412,
      'stale-version',
      'Changed meanwhile',
      'Somebody changed this since you opened it. Look at both, then save again.',
      {
        current,
        etag: `"${version}"`,
      },
    )
  }
}

export class NeedsIfMatch extends HttpError {
  constructor() {
    super(428, 'if-match-needed', 'Version needed', 'Send If-Match with the version that you changed.')
  }
}

export class TooMany extends HttpError {
  constructor(detail: string) {
    super(429, 'too-many', 'Too many tries', detail)
  }
}

/** The RFC 9457 body of an error at an address. */
function problemOf(error: HttpError, instance: string): Problem {
  return {
    type: `/problems/${error.slug}`,
    title: error.title,
    status: error.status,
    detail: error.message,
    instance,
    ...(error.more.errors ? { errors: error.more.errors } : {}),
    ...(error.more.current !== undefined ? { current: error.more.current } : {}),
  }
}

/** Body-parser and friends throw objects with a status; they become our own words here. */
function foreign(error: unknown): HttpError {
  if (error instanceof HttpError) return error
  const status = typeof error === 'object' && error !== null && 'status' in error ? Number(error.status) : 500
  if (status === 413)
    return new HttpError(413, 'too-large', 'Too large', 'What was sent is too large. Send less at once.')
  if (status === 415)
    return new HttpError(415, 'wrong-type', 'Wrong type', 'Send JSON with Content-Type application/json.')
  if (status >= 400 && status < 500)
    return new HttpError(
      400,
      'bad-input',
      'Cannot be taken',
      'What was sent could not be read. Send well-formed JSON.',
    )
  return new HttpError(
    500,
    'failed',
    'Did not work',
    'This did not work and nothing was changed. Try again in a moment.',
  )
}

/** The one error handler: problem details out, the cause into the log when it was ours. */
export function problemHandler(log: Logger): ErrorRequestHandler {
  return (cause, req, res, next) => {
    if (res.headersSent) return next(cause)
    const error = foreign(cause)
    if (error.status >= 500) log.error({ err: cause, method: req.method, path: req.path }, 'request failed')
    if (error.more.etag) res.set('ETag', error.more.etag)
    res
      .status(error.status)
      .type('application/problem+json')
      .send(JSON.stringify(problemOf(error, req.originalUrl)))
  }
}

/** Anything under /api that no route answers. */
export const noSuchAddress: RequestHandler = (req) => {
  throw new HttpError(404, 'not-found', 'Not found', `There is nothing at ${req.method} ${req.path}.`)
}
