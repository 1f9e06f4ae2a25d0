import type { Sprint } from './settings'

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
