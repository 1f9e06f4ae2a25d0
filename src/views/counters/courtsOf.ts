import { customPack, type OwnCourt } from '@shared/court/ownCourt'
import { rulePack, type RulePack, type RulePackKey } from '@shared/court/rulePacks'
import { OWN_COURT } from './useCounterAddress'

export interface CourtChoice {
  value: string
  label: string
  pack: RulePack
}

/**
 * The courts that a counter can be looked at on: the books it names, and the team's own hall where it has one. The
 * first one is the page's own: the team's book where the counter is drawn for it.
 */
export function courtsOf(
  drawnFor: readonly RulePackKey[],
  teams: RulePackKey,
  own: OwnCourt | null,
): CourtChoice[] {
  const keys = drawnFor.includes(teams) ? [teams, ...drawnFor.filter((key) => key !== teams)] : [...drawnFor]
  const books = (keys.length > 0 ? keys : [teams]).map((key): CourtChoice => {
    const pack = rulePack(key)
    return { value: key, label: `${pack.name}, ${pack.backcourtSeconds} s`, pack }
  })
  if (own === null) return books
  const pack = customPack(rulePack(teams), own)
  return [...books, { value: OWN_COURT, label: `Our court, ${pack.backcourtSeconds} s`, pack }]
}
