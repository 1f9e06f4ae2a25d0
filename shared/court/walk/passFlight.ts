import type { Move } from '../diagram'
import { GRAVITY, launchSpeed } from './projectile'
import type { WalkSettings } from './settings'

export type Flight = Extract<Move, { kind: 'pass' }>['flight']

/** A pass in the air. */
export interface PassFlight {
  seconds: number
  /** How high the ball is at a share (0 to 1) of its flight, metres; null where height plays no part. */
  heightAt: ((share: number) => number) | null
}

/**
 * How a pass of some metres flies. Straight and bounce passes keep their speed over the floor; a lob is a
 * projectile at the angle of the settings, its speed whatever carries it there. A lob too short for its
 * angle (the catch is higher than the line) goes straight.
 */
export function passFlight(flight: Flight, metres: number, settings: WalkSettings): PassFlight {
  if (flight === 'bounce') return { seconds: metres / settings.bounceSpeed, heightAt: null }
  const { lobAngle, releaseHeight, catchHeight } = settings
  const speed = flight === 'lob' ? launchSpeed(metres, lobAngle, catchHeight - releaseHeight) : null
  if (speed === null) return { seconds: metres / settings.straightSpeed, heightAt: null }
  const angle = (lobAngle * Math.PI) / 180
  const seconds = metres / (speed * Math.cos(angle))
  const up = speed * Math.sin(angle)
  return {
    seconds,
    heightAt: (share) => {
      const t = share * seconds
      return releaseHeight + up * t - (GRAVITY * t * t) / 2
    },
  }
}
