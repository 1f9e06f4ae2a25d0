import { Choices, Turns, type RulePreview } from '@shared/choices/schemas'
import { request, teamPath } from './http'

/** The team's counters for one game, ranked, with every reason. */
export function getChoices(team: string, game: string, signal?: AbortSignal): Promise<Choices> {
  return request('GET', teamPath(team, 'games', game, 'choices'), Choices, { signal })
}

/** What their next rows would have to show for another counter to lead. */
export function getTurns(team: string, game: string, signal?: AbortSignal): Promise<Turns> {
  return request('GET', teamPath(team, 'games', game, 'turns'), Turns, { signal })
}

/** The order as it would be were a rule written like this; nothing is kept. */
export function previewRule(
  team: string,
  game: string,
  body: RulePreview,
  signal?: AbortSignal,
): Promise<Choices> {
  return request('POST', teamPath(team, 'games', game, 'choices', 'preview'), Choices, { body, signal })
}
