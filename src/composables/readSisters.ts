import type { RouteLocationRaw } from 'vue-router'

/** The two pages of an opponent's possessions, counted and one by one; `open` is the one that is looked at. */
export function readSisters(
  team: string,
  opponent: string,
  open: 'read' | 'possessions',
): { label: string; to: RouteLocationRaw; current: boolean }[] {
  const params = { team, opponent }
  return [
    { label: 'Read', to: { name: 'read', params }, current: open === 'read' },
    { label: 'Possessions', to: { name: 'possessions', params }, current: open === 'possessions' },
  ]
}
