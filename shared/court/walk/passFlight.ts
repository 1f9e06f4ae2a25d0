import type { Move } from '../diagram'
import { GRAVITY, apex, launchSpeed } from './projectile'
import type { WalkSettings } from './settings'

export type Flight = Extract<Move, { kind: 'pass' }>['flight']

/** A pass in the air. */
export interface PassFlight {
  seconds: number
  /** How high the ball is at a share (0 to 1) of its flight, metres; null where height plays no part. */
  heightAt: ((share: number) => number) | null
  /** The highest that it gets, metres above the floor; null where height plays no part. */
  top: number | null
}

/**
 * How a pass of some metres flies. Straight and bounce passes keep their speed over the floor; a lob is a
 * projectile at the angle of the settings, its speed whatever carries it there. A lob too short for its
 * angle (the catch is higher than the line) goes straight.
 */
export function passFlight(flight: Flight, metres: number, settings: WalkSettings): PassFlight {
  const { lobAngle: angle, releaseHeight, catchHeight } = settings
  const speed = flight === 'lob' ? launchSpeed(metres, angle, catchHeight - releaseHeight) : null
  if (speed === null) {
    const overFloor = flight === 'bounce' ? settings.bounceSpeed : settings.straightSpeed
    return { seconds: metres / overFloor, heightAt: null, top: null }
  }
  const radians = (angle * Math.PI) / 180
  const seconds = metres / (speed * Math.cos(radians))
  const up = speed * Math.sin(radians)
  const highest = apex({ speed, angle })
  return {
    seconds,
    heightAt: (share) => {
      const t = share * seconds
      return releaseHeight + up * t - (GRAVITY * t * t) / 2
    },
    // Caught on the way up, the ball is at its highest in the hands.
    top: highest.seconds < seconds ? releaseHeight + highest.height : catchHeight,
  }
}
