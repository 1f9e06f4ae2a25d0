import type { CounterRole } from '@shared/counters/schemas'
import type { SquadPlayerRow } from '@shared/squad/schemas'
import { assignRoles, fitOf, LEAST_FIT } from '@shared/stats/roles'
import { SKILLS, type Skill } from '@shared/counterWords'

type Seat = CounterRole['role']
type Roles = readonly Pick<CounterRole, 'role' | 'title' | 'needs'>[]
type Player = Pick<SquadPlayerRow, 'id' | 'skills' | 'available'>

/** What a counter asks of one skill: each level it asks, the highest first, and the roles that ask it. */
export interface Ask {
  level: number
  roles: Seat[]
}

/** How a player stands to a role: first in it, meets every ask, more than half of them, or less. */
export type Fit = 'first' | 'meets' | 'short' | 'none'

/** One skill of one player beside what is asked. */
export interface Reading {
  level: number
  /** The level that counts for this player; null where the counter asks nothing of this skill. */
  asked: number | null
  /** A role that is this player's asks it. */
  hers: boolean
  met: boolean
}

export function asksOf(roles: Roles): Record<Skill, Ask[]> {
  const asks = Object.fromEntries(SKILLS.map(({ value }) => [value, [] as Ask[]])) as Record<Skill, Ask[]>
  for (const { role, needs } of roles)
    for (const { skill, level } of needs) {
      if (level === 0) continue
      const same = asks[skill].find((ask) => ask.level === level)
      if (same) same.roles.push(role)
      else asks[skill].push({ level, roles: [role] })
    }
  for (const list of Object.values(asks)) list.sort((one, two) => two.level - one.level)
  return asks
}

/**
 * Who fits which role of a counter, by player: the same assignment that the order of counters rests on, and below
 * it who meets every ask of a role, and who more than half of them. Nobody who is out is first in a role.
 */
export function fitsOf(roles: Roles, squad: readonly Player[]): Map<string, Fit[]> {
  const seats = assignRoles(roles, squad, LEAST_FIT).roles
  const firstIn = (player: Player, at: number) =>
    seats[at]?.squadPlayerId === player.id && seats[at].fit >= LEAST_FIT
  return new Map(
    squad.map((player) => [
      player.id,
      roles.map((role, at): Fit => {
        if (firstIn(player, at)) return 'first'
        const fit = fitOf(player, role)
        if (fit >= 1) return 'meets'
        return fit > LEAST_FIT ? 'short' : 'none'
      }),
    ]),
  )
}

/**
 * One skill of a player beside the ask that counts for her: that of the role she is first in, or else of the roles
 * she meets, or else of those she is short in, or else the least that any role asks.
 */
export function readSkill(roles: Roles, fits: readonly Fit[], skill: Skill, level: number): Reading {
  const levels = (of: (fit: Fit) => boolean) =>
    roles.flatMap((role, at) =>
      of(fits[at] ?? 'none')
        ? role.needs.filter((need) => need.skill === skill && need.level > 0).map((need) => need.level)
        : [],
    )
  const nearest = (['first', 'meets', 'short'] as const).find((fit) => fits.includes(fit))
  const own = levels((fit) => fit === nearest)
  const all = own.length > 0 ? own : levels(() => true)
  const asked = all.length === 0 ? null : Math.min(...all)
  return { level, asked, hers: own.length > 0, met: asked !== null && level >= asked }
}

/** "Ada is first in 2; meets every ask of 3 and 4." for readers. */
export function fitWords(roles: Roles, fits: readonly Fit[]): string {
  const named = (fit: Fit) => roles.filter((_, at) => fits[at] === fit).map(({ role }) => role)
  const parts = [
    ['first in', named('first')],
    ['meets every ask of', named('meets')],
    ['falls short in', named('short')],
  ] as const
  const said = parts.filter(([, seats]) => seats.length > 0)
  return said.length === 0
    ? 'fits no role'
    : said.map(([words, seats]) => `${words} ${seats.join(', ')}`).join('; ')
}
