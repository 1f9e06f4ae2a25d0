/*
 * A thrown ball without drag: the equations of projectile motion, checked against the three worked examples
 * of OpenStax University Physics 1 that CHECKS.md 'Motion and people' lists.
 */

/** m/s², as the worked examples take it. */
export const GRAVITY = 9.8

const radians = (degrees: number): number => (degrees * Math.PI) / 180

export interface Launch {
  /** m/s */
  speed: number
  /** Degrees above the floor. */
  angle: number
}

/** The top of a throw: seconds from release, metres above it, metres across the floor. */
export function apex({ speed, angle }: Launch): { seconds: number; height: number; across: number } {
  const up = speed * Math.sin(radians(angle))
  const seconds = up / GRAVITY
  return { seconds, height: (up * up) / (2 * GRAVITY), across: speed * Math.cos(radians(angle)) * seconds }
}

/** Seconds until the ball comes down to `rise` metres above its release; null where it never gets so high. */
export function secondsToFall({ speed, angle }: Launch, rise: number): number | null {
  const up = speed * Math.sin(radians(angle))
  const left = up * up - 2 * GRAVITY * rise
  return left < 0 ? null : (up + Math.sqrt(left)) / GRAVITY
}

/** Speed, and angle below the floor's level in degrees, some seconds after release. */
export function velocityAfter({ speed, angle }: Launch, seconds: number): { speed: number; below: number } {
  const across = speed * Math.cos(radians(angle))
  const down = GRAVITY * seconds - speed * Math.sin(radians(angle))
  return { speed: Math.hypot(across, down), below: (Math.atan2(down, across) * 180) / Math.PI }
}

/**
 * The speed that carries a ball `across` metres at an angle, to `rise` metres above its release; null where
 * the straight line at that angle passes under the catch, so that no speed is enough.
 */
export function launchSpeed(across: number, angle: number, rise = 0): number | null {
  const drop = across * Math.tan(radians(angle)) - rise
  if (!(drop > 0)) return null
  return across / Math.cos(radians(angle)) / Math.sqrt((2 * drop) / GRAVITY)
}
