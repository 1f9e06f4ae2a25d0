import { OpponentList, OpponentRow, type OpponentBody } from '@shared/opponents/schemas'
import { request, teamPath } from './http'

export function listOpponents(team: string, signal?: AbortSignal): Promise<OpponentList> {
  return request('GET', teamPath(team, 'opponents'), OpponentList, { signal })
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
