import { PracticeList, PracticeRow, ScriptProposal, type PracticeInput } from '@shared/practices/schemas'
import { request, requestNothing, teamPath } from './http'

/** Practices before a game, the latest first. */
export function listGamePractices(team: string, game: string, signal?: AbortSignal): Promise<PracticeList> {
  return request('GET', teamPath(team, 'games', game, 'practices'), PracticeList, { signal })
}

/** A script as the server shares it out from the read. */
export function proposeScript(
  team: string,
  game: string,
  query: { minutes?: number; startsAt?: string } = {},
  signal?: AbortSignal,
): Promise<ScriptProposal> {
  return request('GET', teamPath(team, 'games', game, 'script'), ScriptProposal, { query, signal })
}

/** Creates with a new id; edits when the version it is based on is given. */
export function putPractice(
  team: string,
  id: string,
  body: PracticeInput,
  version?: number,
): Promise<PracticeRow> {
  return request('PUT', teamPath(team, 'practices', id), PracticeRow, { body, version })
}

/** Can be undone for ten minutes with `restorePractice`. */
export function deletePractice(team: string, id: string, version?: number): Promise<void> {
  return requestNothing('DELETE', teamPath(team, 'practices', id), { version })
}

export function restorePractice(team: string, id: string): Promise<PracticeRow> {
  return request('POST', teamPath(team, 'practices', id, 'restore'), PracticeRow)
}
