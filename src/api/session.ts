import { Session, type SignIn } from '@shared/session/schemas'
import { request, requestNothing } from './http'

/** Who is signed in and on which teams. 401 when nobody is. */
export function getSession(signal?: AbortSignal): Promise<Session> {
  return request('GET', '/api/session', Session, { signal })
}

/** Signs in and answers with the new session. 401 when address or password are wrong, 429 after too many tries. */
export function postSession(body: SignIn, signal?: AbortSignal): Promise<Session> {
  return request('POST', '/api/session', Session, { body, signal })
}

export function deleteSession(): Promise<void> {
  return requestNothing('DELETE', '/api/session')
}
