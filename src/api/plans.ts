import { Grounds } from '@shared/plans/grounds'
import { PlanRow, PlanState, type PlanInput, type SignOffBody } from '@shared/plans/schemas'
import { request, teamPath } from './http'

/** The newest version of the game's plan, or null in it before the first pick, and all versions. */
export function getPlan(team: string, game: string, signal?: AbortSignal): Promise<PlanState> {
  return request('GET', teamPath(team, 'games', game, 'plan'), PlanState, { signal })
}

/** Writes the open version: a new id in the body creates it, the version given edits it. */
export function putPlan(team: string, game: string, body: PlanInput, version?: number): Promise<PlanRow> {
  return request('PUT', teamPath(team, 'games', game, 'plan'), PlanRow, { body, version })
}

/** Freezes the version and makes its sheet; the same ids again change nothing. */
export function signOffPlan(
  team: string,
  game: string,
  body: SignOffBody,
  version: number,
): Promise<PlanState> {
  return request('POST', teamPath(team, 'games', game, 'plan', 'sign-off'), PlanState, { body, version })
}

/** What the newest signed version stood on. */
export function getGrounds(team: string, game: string, signal?: AbortSignal): Promise<Grounds> {
  return request('GET', teamPath(team, 'games', game, 'plan', 'grounds'), Grounds, { signal })
}
