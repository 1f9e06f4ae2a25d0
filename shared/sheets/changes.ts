import type { FrozenCounter, FrozenPlan } from './schemas'

/** One difference between two versions: what it was and what it is; null where there was or is nothing. */
export interface SheetChangeLine {
  what: string
  from: string | null
  to: string | null
}

const ORDINALS = ['First', 'Second', 'Third'] as const

/**
 * What changed from one version of a sheet to the next, as a coach would say it. Roles are told by first names.
 * @param nameOf first name of a squad player, or null once erased
 */
export function changesBetween(
  older: FrozenPlan,
  newer: FrozenPlan,
  nameOf: (squadPlayerId: string) => string | null,
): SheetChangeLine[] {
  const lines: SheetChangeLine[] = []
  const compare = (what: string, from: string | null, to: string | null) => {
    if (from !== to) lines.push({ what, from, to })
  }
  compare('First call', older.firstCall.name, newer.firstCall.name)
  compare('Change-up', older.changeUp?.name ?? null, newer.changeUp?.name ?? null)
  compareRoles(older.firstCall, newer.firstCall, nameOf, compare)
  for (let at = 0; at < Math.max(older.keys.length, newer.keys.length); at++)
    compare(`${ORDINALS[at] ?? ''} reminder`.trim(), older.keys[at] ?? null, newer.keys[at] ?? null)
  for (const letter of ['A', 'B', 'C'] as const) {
    const said = ({ press }: FrozenPlan) => {
      const line = press.lines.find((one) => one.letter === letter)
      return line ? `${line.text} ${line.k} of ${line.n}` : null
    }
    compare(`Line ${letter}`, said(older), said(newer))
  }
  if (older.tipOff !== newer.tipOff) lines.push({ what: 'Tip-off moved', from: null, to: null })
  return lines
}

function compareRoles(
  older: FrozenCounter,
  newer: FrozenCounter,
  nameOf: (id: string) => string | null,
  compare: (what: string, from: string | null, to: string | null) => void,
): void {
  if (older.counterId !== newer.counterId) return
  const who = (counter: FrozenCounter, role: string) => {
    const id = counter.roles.find((one) => one.role === role)?.squadPlayerId ?? null
    return id === null ? null : (nameOf(id) ?? 'somebody who left')
  }
  for (const { role } of newer.roles) compare(`Role ${role}`, who(older, role), who(newer, role))
}
