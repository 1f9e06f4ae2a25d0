import { randomUUID } from 'node:crypto'
import type { PossessionInput, PossessionRow } from '@shared/possessions/schemas'
import type { ScoutedGameBody } from '@shared/scoutedGames/schemas'
import { gameBody, opponentBody, possessionBody, scoutedGameBody, teamUrl } from './fixture'
import { TEAM, type Agent } from './testApp'

/** Puts a new row of a collection and hands back its id. @throws when it is not created */
export async function created(
  agent: Agent,
  collection: string,
  body: object,
  teamId = TEAM,
): Promise<string> {
  const id = randomUUID()
  const answer = await agent.put(teamUrl(`/${collection}/${id}`, teamId)).send(body)
  if (answer.status !== 201)
    throw new Error(`expected 201 for ${collection}, got ${answer.status}: ${JSON.stringify(answer.body)}`)
  return id
}

export const newOpponent = (agent: Agent, name = 'Port Selby Gulls', teamId = TEAM): Promise<string> =>
  created(agent, 'opponents', opponentBody(name), teamId)

/** A scouted game of an opponent, by default film of FIBA rules with all possessions covered. */
export const newScoutedGame = (
  agent: Agent,
  opponentId: string,
  more: Partial<ScoutedGameBody> = {},
  teamId = TEAM,
): Promise<string> => created(agent, 'scouted-games', { ...scoutedGameBody(opponentId), ...more }, teamId)

export const newGame = (agent: Agent, opponentId: string, teamId = TEAM): Promise<string> =>
  created(agent, 'games', gameBody(opponentId), teamId)

/** A possession of a scouted game, pressed and with one trap unless `more` says otherwise. */
export const newPossession = (
  agent: Agent,
  scoutedGameId: string,
  more: Partial<PossessionInput> = {},
  teamId = TEAM,
): Promise<string> => created(agent, 'possessions', possessionBody(scoutedGameId, more), teamId)

/** The fields at fault of a problem, by name. */
export function faultsIn(body: { errors?: { field: string; message: string }[] }): Record<string, string> {
  return Object.fromEntries((body.errors ?? []).map(({ field, message }) => [field, message]))
}

export const listed = async (agent: Agent, scoutedGameId: string): Promise<PossessionRow[]> =>
  (await agent.get(teamUrl(`/scouted-games/${scoutedGameId}/possessions`))).body.rows as PossessionRow[]
