import { RuleList, RuleRow, type RuleBody } from '@shared/rules/schemas'
import { request, teamPath } from './http'

export function listRules(team: string, signal?: AbortSignal): Promise<RuleList> {
  return request('GET', teamPath(team, 'rules'), RuleList, { signal })
}

/** Adds with a new id; edits when the version it is based on is given. */
export function putRule(team: string, id: string, body: RuleBody, version?: number): Promise<RuleRow> {
  return request('PUT', teamPath(team, 'rules', id), RuleRow, { body, version })
}
