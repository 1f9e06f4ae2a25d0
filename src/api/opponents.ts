import type { z } from 'zod'
import { OpponentPlayerList, OpponentPlayerRow, type OpponentPlayerBody } from '@shared/opponents/players'
import { OpponentList, OpponentRow, type OpponentBody, type OpponentsQuery } from '@shared/opponents/schemas'
import { request, requestNothing, teamPath } from './http'

/** By their next meeting; a search, another order or a page only when asked. */
export function listOpponents(
  team: string,
  signal?: AbortSignal,
  query: OpponentsQuery = {},
): Promise<OpponentList> {
  return request('GET', teamPath(team, 'opponents'), OpponentList, { query, signal })
}

export function getOpponent(team: string, id: string, signal?: AbortSignal): Promise<OpponentRow> {
  return request('GET', teamPath(team, 'opponents', id), OpponentRow, { signal })
}

/** Creates with a new id; edits when the version it is based on is given. */
export function putOpponent(
  team: string,
  id: string,
  body: OpponentBody,
  version?: number,
): Promise<OpponentRow> {
  return request('PUT', teamPath(team, 'opponents', id), OpponentRow, { body, version })
}

/** With its games, their possessions and players; can be undone for ten minutes with `restoreOpponent`. */
export function deleteOpponent(team: string, id: string, version?: number): Promise<void> {
  return requestNothing('DELETE', teamPath(team, 'opponents', id), { version })
}

export function restoreOpponent(team: string, id: string): Promise<OpponentRow> {
  return request('POST', teamPath(team, 'opponents', id, 'restore'), OpponentRow)
}

/** Their players by number, with what was counted of each. */
export function listOpponentPlayers(
  team: string,
  opponent: string,
  signal?: AbortSignal,
): Promise<OpponentPlayerList> {
  return request('GET', teamPath(team, 'opponents', opponent, 'players'), OpponentPlayerList, { signal })
}

/** Creates with a new id; edits when the version it is based on is given. */
export function putOpponentPlayer(
  team: string,
  id: string,
  body: z.input<typeof OpponentPlayerBody>,
  version?: number,
): Promise<OpponentPlayerRow> {
  return request('PUT', teamPath(team, 'opponent-players', id), OpponentPlayerRow, { body, version })
}

/** Can be undone for ten minutes with `restoreOpponentPlayer`. */
export function deleteOpponentPlayer(team: string, id: string, version?: number): Promise<void> {
  return requestNothing('DELETE', teamPath(team, 'opponent-players', id), { version })
}

export function restoreOpponentPlayer(team: string, id: string): Promise<OpponentPlayerRow> {
  return request('POST', teamPath(team, 'opponent-players', id, 'restore'), OpponentPlayerRow)
}
