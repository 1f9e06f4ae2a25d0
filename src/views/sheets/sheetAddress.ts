import type { LocationQuery, LocationQueryRaw } from 'vue-router'
import { Paper } from '@shared/sheets/schemas'
import type { RulePackKey } from '@shared/court/rulePacks'

export const TABS = ['press', 'way', 'job'] as const
export type Tab = (typeof TABS)[number]

/** Where a player is on her sheet. */
export interface Place {
  tab: Tab
  /** Index of the step of our way; as many as there are steps stands for the change-up. */
  step: number
}

const text = (value: LocationQuery[string] | undefined): string =>
  (Array.isArray(value) ? value[0] : value) ?? ''

/** Tab and step as they stand in the address, never past the last one; the address counts from 1. */
export function placeOf(query: LocationQuery, last: number): Place {
  const tab = TABS.find((one) => one === text(query.tab)) ?? 'press'
  const step = Math.trunc(Number(text(query.step) || 1)) - 1
  return { tab, step: tab === 'way' && Number.isFinite(step) ? Math.min(Math.max(0, step), last) : 0 }
}

export const queryOf = ({ tab, step }: Place): LocationQueryRaw => ({
  ...(tab === 'press' ? {} : { tab }),
  ...(tab === 'way' && step > 0 ? { step: String(step + 1) } : {}),
})

/** The paper of the address, else the one that is common where a rule set is played. */
export function paperOf(query: LocationQuery, pack: RulePackKey): Paper {
  const asked = Paper.safeParse(text(query.paper))
  if (asked.success) return asked.data
  return pack === 'fiba' ? 'a4' : 'letter'
}

/** The player whose copy the address asks for; null is everybody's. */
export function copyOf(query: LocationQuery, players: readonly { squadPlayerId: string }[]): string | null {
  const asked = text(query.player)
  return players.some(({ squadPlayerId }) => squadPlayerId === asked) ? asked : null
}
