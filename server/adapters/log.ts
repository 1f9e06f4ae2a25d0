import { pino, type DestinationStream, type Logger } from 'pino'

/**
 * The server's log, one JSON line each. It is read by whoever runs the machine, not by the staff: what a failed
 * query carried (names, notes, sessions) stays out of it.
 */
export const createLog = (level: string, to?: DestinationStream): Logger =>
  pino({ level, redact: { paths: ['err.parameters'], remove: true } }, to)

/** What is logged of a request and its answer: no header, for the cookie in them is as good as a password. */
export const REQUEST_SERIALIZERS = {
  req: ({ id, method, url }: { id: unknown; method: string; url: string }) => ({ id, method, url }),
  res: ({ statusCode }: { statusCode: number }) => ({ statusCode }),
}
