import type { RuleRow } from '@shared/rules/schemas'
import type { RuleNow } from './ruleNow'

/** Which rules the list shows. */
export const SHOWN = [
  { value: 'all', label: 'All' },
  { value: 'now', label: 'Speaking now' },
  { value: 'off', label: 'Off' },
] as const
export type Shown = (typeof SHOWN)[number]['value']

type NowById = ReadonlyMap<string, RuleNow> | null

/** By number; rules of the team's own after them, the oldest first. */
export const inOrder = (rows: readonly RuleRow[]): RuleRow[] =>
  [...rows].sort(
    (one, two) =>
      (one.number ?? Infinity) - (two.number ?? Infinity) ||
      one.createdAt.localeCompare(two.createdAt) ||
      one.id.localeCompare(two.id),
  )

const speaks = (row: RuleRow, now: NowById): boolean => now?.get(row.id)?.state === 'speaks'

export function shownRules(rows: readonly RuleRow[], now: NowById, shown: Shown): RuleRow[] {
  if (shown === 'off') return rows.filter(({ on }) => !on)
  return shown === 'now' ? rows.filter((row) => speaks(row, now)) : [...rows]
}

const rules = (count: number): string => `${count} ${count === 1 ? 'rule' : 'rules'}`

/** "44 rules, 43 on. 9 speak for Port Selby Gulls, Fri 20 March. They order the counters ..." */
export function headSentence(
  rows: readonly RuleRow[],
  now: NowById,
  opponent: string,
  gameDay: string,
): string {
  const on = rows.filter((row) => row.on).length
  const speaking = rows.filter((row) => speaks(row, now)).length
  const heard =
    now === null ? '' : `${speaking} ${speaking === 1 ? 'speaks' : 'speak'} now for ${opponent}, ${gameDay}. `
  return `${rules(rows.length)}, ${on === rows.length ? 'all' : on} on. ${heard}They put the counters in order for every opponent and never change a count.`
}

/** Why a choice of rules is empty. `game` says whether the order for a next game is known. */
export function emptyWords(shown: Shown, game: boolean): { title: string; detail: string } {
  if (shown === 'off') return { title: 'Every rule is on', detail: '' }
  return game
    ? { title: 'No rule speaks now', detail: 'Nothing counted of the next opponent is what a rule asks for.' }
    : { title: 'No game ahead', detail: 'Rules speak for an opponent. Put the next game in first.' }
}
