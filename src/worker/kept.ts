/** Names that the worker and the pages share. */

/** Everything that was read with a signal and may be read again without one. */
export const KEPT_CACHE = 'overtop-kept'

/** On an answer that comes from this device: when it was fetched, RFC 3339. */
export const KEPT_AT = 'x-overtop-kept-at'

/** What a player needs in the hall: who is signed in, the list of sheets, a sheet and its printed page. */
const KEPT = [/^\/api\/session$/, /^\/api\/teams\/[^/]+\/sheets(\/[^/]+)?$/]

/** Whether an address is kept for a hall without a signal; nothing else of the record lies on a device. */
export const isKept = (pathname: string): boolean => KEPT.some((pattern) => pattern.test(pathname))
