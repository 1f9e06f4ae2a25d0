import type { EngineCounter } from '@server/engine/ranking'
import type { EnginePlayer } from '@server/engine/facts'
import type { EngineRole } from '@shared/stats/roles'
import type { EngineRule } from '@server/engine/rules'
import { tendencies, type EngineTendency, type HabitCell } from '@server/engine/tendencies'
import type { Skills } from '@shared/squad/schemas'

/** k of n of a habit shared out evenly over so many games, the first of them the newest. */
export function spread(
  habitKey: string,
  k: number,
  n: number,
  games = 2,
  trigger = 'made-basket',
): HabitCell[] {
  const part = (whole: number, game: number) =>
    Math.floor((whole * (game + 1)) / games) - Math.floor((whole * game) / games)
  return Array.from({ length: games }, (_, game) => ({
    habitKey,
    gameId: `game-${game}`,
    gameAge: game,
    trigger,
    k: part(k, game),
    n: part(n, game),
  }))
}

export type Counts = Record<string, readonly [k: number, n: number]>

/** An opponent's tendencies from k of n by habit key. */
export const read = (counts: Counts, games = 2): EngineTendency[] =>
  tendencies(Object.entries(counts).flatMap(([key, [k, n]]) => spread(key, k, n, games)))

export const ableAtAll: Skills = { handle: 2, 'throw-in': 2, 'long-arm': 2, decide: 2, sprint: 2, screen: 2 }

export const player = (id: string, skills: Partial<Skills> = {}, available = true): EnginePlayer => ({
  id,
  skills: { ...ableAtAll, ...skills },
  available,
})

export const six = (skills: Partial<Skills> = {}): EnginePlayer[] =>
  ['p1', 'p2', 'p3', 'p4', 'p5', 'p6'].map((id) => player(id, skills))

/** Five roles that ask nothing, changed by role number. */
export const roles = (needs: Partial<Record<'1' | '2' | '3' | '4' | '5', EngineRole['needs']>> = {}) =>
  (['1', '2', '3', '4', '5'] as const).map((role) => ({
    role,
    title: `role ${role}`,
    needs: needs[role] ?? [],
    jobs: [],
    changeUpLine: '',
    keyStep: 0,
  }))

export const counter = (id: string, changes: Partial<EngineCounter> = {}): EngineCounter => ({
  id,
  name: id,
  traits: [],
  roles: roles(),
  rulePacks: ['fiba'],
  liveReps: 30,
  newActions: 0,
  practice: { k: 0, n: 0 },
  record: [],
  ...changes,
})

export const rule = (id: string, changes: Partial<EngineRule> = {}): EngineRule => ({
  id,
  number: null,
  title: id,
  when: { fact: 'available', is: 'at-least', value: 0 },
  then: [{ effect: 'want', trait: 'middle-entry', strength: 'strong' }],
  because: `because of ${id}`,
  unless: null,
  unlessBecause: '',
  starred: false,
  on: true,
  ...changes,
})
