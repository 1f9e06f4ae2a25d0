import {
  Account,
  AskedPassword,
  PasswordLink,
  type AskPassword,
  type ChangePassword,
  type UsePasswordLink,
} from '@shared/session/account'
import { request, requestNothing, teamPath } from './http'

/** Asks for a link to a new password. The answer is the same whether or not there is an account. */
export function askPassword(body: AskPassword): Promise<AskedPassword> {
  return request('POST', '/api/password-resets', AskedPassword, { body })
}

/** Sets a new password by a link. 410 when the link no longer works. */
export function usePasswordLink(body: UsePasswordLink): Promise<void> {
  return requestNothing('POST', '/api/password-resets/use', { body })
}

export function getAccount(signal?: AbortSignal): Promise<Account> {
  return request('GET', '/api/session/account', Account, { signal })
}

/** Changes one's own password; every other session ends. 400 names `old` when that does not fit. */
export function putPassword(body: ChangePassword): Promise<void> {
  return requestNothing('PUT', '/api/session/password', { body })
}

/** Whether sheets of a team come by mail. */
export function putMailChoice(team: string, mail: boolean): Promise<Account> {
  return request('PUT', `/api/session/teams/${encodeURIComponent(team)}/mail`, Account, { body: { mail } })
}

/** Signs out here and everywhere else. */
export function deleteEverySession(): Promise<void> {
  return requestNothing('DELETE', '/api/session/everywhere')
}

/** A link to a new password for a member, told once. 409 when they are on a team that the caller does not coach. */
export function postPasswordLink(team: string, membershipId: string): Promise<PasswordLink> {
  return request('POST', teamPath(team, 'members', membershipId, 'password-link'), PasswordLink)
}
