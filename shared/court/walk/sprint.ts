import type { Role } from '../../vocabulary'
import { WALK_SETTINGS, type Sprint, type WalkSettings } from './settings'

/*
 * A sprint from rest approaches its top speed exponentially: v(t) = V (1 - exp(-t / T)), so that
 * s(t) = V (t - T (1 - exp(-t / T))). CHECKS.md 'Motion and people' has the values it must reproduce.
 */

/** Metres run after some seconds; 0 before the start. */
export function sprintDistance({ topSpeed, runUp }: Sprint, seconds: number): number {
  if (!(seconds > 0)) return 0
  // expm1 keeps the first centimetres exact, where t and T (1 - exp(-t / T)) are all but equal.
  return topSpeed * (seconds + runUp * Math.expm1(-seconds / runUp))
}

/** Speed after some seconds, m/s. */
export const sprintSpeed = ({ topSpeed, runUp }: Sprint, seconds: number): number =>
  seconds > 0 ? -topSpeed * Math.expm1(-seconds / runUp) : 0

/** Seconds that a distance in metres takes from rest; undoes sprintDistance. */
export function sprintSeconds(sprint: Sprint, metres: number): number {
  if (!(metres > 0)) return 0
  // The curve is convex, and this start lies past the answer: Newton's steps come down to it and never cross.
  let seconds = metres / sprint.topSpeed + sprint.runUp
  for (let round = 0; round < 60; round += 1) {
    const over = sprintDistance(sprint, seconds) - metres
    if (Math.abs(over) < 1e-10) break
    seconds -= over / sprintSpeed(sprint, seconds)
  }
  return seconds
}

/**
 * A player's own sprint from one timed run: how fast at most, if speed is gathered over `runUp` seconds. Held to
 * what the settings allow, so that a slip of the watch makes no world record.
 */
export function timedSprint(metres: number, seconds: number, runUp: number): Sprint {
  const topSpeed = metres / sprintDistance({ topSpeed: 1, runUp }, seconds)
  const { least, most } = WALK_SETTINGS.ourTopSpeed
  return { topSpeed: Math.min(most, Math.max(least, topSpeed)), runUp }
}

/** The squad's own sprints for the roles that are played; a player who was not timed has the default. */
export function runnersOf(
  five: Iterable<readonly [Role, { sprint20: number | null }]>,
  settings: WalkSettings,
): WalkSettings['runners'] {
  const runners: WalkSettings['runners'] = {}
  for (const [role, { sprint20 }] of five)
    if (sprint20 !== null) runners[role] = timedSprint(20, sprint20, settings.ourRunUp)
  return runners
}
