import { RuleList } from '@shared/rules/schemas'
import { request, teamPath } from './http'

export function listRules(team: string, signal?: AbortSignal): Promise<RuleList> {
  return request('GET', teamPath(team, 'rules'), RuleList, { signal })
}
