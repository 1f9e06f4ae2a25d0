import { GameRow, type HandOnBody } from '@shared/games/schemas'
import { request, teamPath } from './http'

/** Gives the work on a game to somebody of the staff; to whoever has it already it changes nothing. */
export function handOn(team: string, game: string, body: HandOnBody): Promise<GameRow> {
  return request('POST', teamPath(team, 'games', game, 'hand-on'), GameRow, { body })
}

/** Signs the read of a game off, or takes that back. */
export function signRead(team: string, game: string, signed: boolean): Promise<GameRow> {
  return request(signed ? 'POST' : 'DELETE', teamPath(team, 'games', game, 'read-sign-off'), GameRow)
}
