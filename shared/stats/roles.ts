import { munkres } from 'munkres'
import type { RoleFit } from '../choices/schemas'
import type { CounterRole } from '../counters/schemas'
import type { SquadPlayerRow } from '../squad/schemas'

/** What the assignment needs of a squad player. */
export type RolePlayer = Pick<SquadPlayerRow, 'id' | 'skills' | 'available'>

/** Share of a role's needs that a player must meet to fill it, unless it is set otherwise (common practice, no source). */
export const LEAST_FIT = 0.5

/** What the assignment needs of a counter's role. */
export type EngineRole = Pick<CounterRole, 'role' | 'title' | 'needs'>

export interface Assignment {
  roles: RoleFit[]
  /** Logit term: 0 when every role is well filled, down to -1 (RECORD.md section 5). */
  squadTerm: number
  /** Why the counter cannot be run, or null. */
  unfillable: string | null
}

/** Skill to spare breaks ties only: far below the smallest difference between two fits. */
const SPARE = 0.001
/** Filling a role at all comes before filling another one better. */
const FILLED = 10

/**
 * How much of a role a player meets, 0 to 1: the mean over its needs of skill / level, each at most 1.
 * A shortfall so counts in part; a role without needs is met by anybody (common practice, no source).
 */
export function fitOf(player: RolePlayer, role: EngineRole): number {
  if (role.needs.length === 0) return 1
  const met = role.needs.map(({ skill, level }) =>
    level === 0 ? 1 : Math.min(1, player.skills[skill] / level),
  )
  return met.reduce((sum, share) => sum + share, 0) / met.length
}

const spareOf = (player: RolePlayer, role: EngineRole): number =>
  role.needs.reduce((sum, { skill, level }) => sum + Math.max(0, player.skills[skill] - level), 0) /
  Math.max(1, role.needs.length)

/**
 * Players for the rows of a table of values, each player (column) at most once, so that the sum is the
 * greatest possible. Null where there are fewer players than rows.
 */
export function assign(values: readonly (readonly number[])[]): (number | null)[] {
  const seats: (number | null)[] = values.map(() => null)
  if ((values[0]?.length ?? 0) === 0) return seats
  for (const [row, column] of munkres(values.map((row) => row.map((value) => -value)))) seats[row] = column
  return seats
}

/**
 * The available players in a counter's roles, by the greatest total fit, and the runner-up of each role:
 * the best of those without one. A role counts as filled when its player meets at least `leastFit` of its
 * needs (setting); roles that somebody can fill are filled before any other is filled better.
 */
export function assignRoles(
  roles: readonly EngineRole[],
  squad: readonly RolePlayer[],
  leastFit: number,
): Assignment {
  const available = squad.filter((player) => player.available)
  const worth = (player: RolePlayer, role: EngineRole) => {
    const fit = fitOf(player, role)
    return (fit >= leastFit ? FILLED : 0) + fit + SPARE * spareOf(player, role)
  }
  const seats = assign(roles.map((role) => available.map((player) => worth(player, role))))
  const seated = new Set(seats.filter((seat) => seat !== null))
  const bench = available.filter((_, index) => !seated.has(index))

  const fits = roles.map((role, index): RoleFit => {
    const seat = seats[index] ?? null
    const player = seat === null ? undefined : available[seat]
    const runnerUp = bench
      .filter((candidate) => fitOf(candidate, role) >= leastFit)
      .reduce<RolePlayer | null>(
        (best, candidate) => (best && worth(best, role) >= worth(candidate, role) ? best : candidate),
        null,
      )
    return {
      role: role.role,
      title: role.title,
      squadPlayerId: player?.id ?? null,
      runnerUpId: runnerUp?.id ?? null,
      fit: player ? fitOf(player, role) : 0,
    }
  })
  return {
    roles: fits,
    squadTerm: squadTermOf(fits, leastFit),
    unfillable: unfillableOf(roles, fits, available, leastFit),
  }
}

/** 0 at full fit everywhere, -1 once the mean fit is down to the least that still fills a role. */
function squadTermOf(fits: readonly RoleFit[], leastFit: number): number {
  if (fits.length === 0) return 0
  const mean = fits.reduce((sum, role) => sum + role.fit, 0) / fits.length
  const missing = (1 - mean) / Math.max(1 - leastFit, Number.EPSILON)
  return missing === 0 ? 0 : -Math.min(1, missing)
}

function unfillableOf(
  roles: readonly EngineRole[],
  fits: readonly RoleFit[],
  available: readonly RolePlayer[],
  leastFit: number,
): string | null {
  const nobody = roles.find((role) => !available.some((player) => fitOf(player, role) >= leastFit))
  if (nobody) return `Nobody available can fill role ${nobody.role}, ${nobody.title}.`
  const left = fits.find((fit) => fit.fit < leastFit)
  return left ? `With the other roles filled, nobody is left for role ${left.role}, ${left.title}.` : null
}
