import { describe, expect, it } from 'vitest'
import { apex, launchSpeed, secondsToFall, velocityAfter } from '@shared/court/walk/projectile'
import { sprintDistance, sprintSeconds, sprintSpeed } from '@shared/court/walk/sprint'
import { DEFAULT_WALK } from '@shared/court/walk/settings'

/** Mechanics against CHECKS.md 'Motion and people'. Each row names where its value was read. */

describe('projectiles (OpenStax University Physics 1, projectile motion: worked examples, primary text)', () => {
  it('70 m/s at 75 degrees: 233 m high after 6.90 s, 125 m across, at the top', () => {
    const top = apex({ speed: 70, angle: 75 })
    expect(top.height).toBeCloseTo(233, 0)
    expect(top.seconds).toBeCloseTo(6.9, 2)
    expect(top.across).toBeCloseTo(125, 0)
  })

  it('30 m/s at 45 degrees, caught 10 m higher: after 3.79 s at 26.5 m/s, 36.9 degrees below the level', () => {
    const launch = { speed: 30, angle: 45 }
    const seconds = secondsToFall(launch, 10) ?? NaN
    expect(seconds).toBeCloseTo(3.79, 2)
    const landing = velocityAfter(launch, seconds)
    expect(landing.speed).toBeCloseTo(26.5, 1)
    expect(landing.below).toBeCloseTo(36.9, 1)
  })

  it('a range of 90 m: 31.9 m/s at 30 degrees, 37.0 m/s at 70 degrees', () => {
    expect(launchSpeed(90, 30)).toBeCloseTo(31.9, 1)
    expect(launchSpeed(90, 70)).toBeCloseTo(37, 1)
  })
})

describe('sprint from rest (own arithmetic, recomputed)', () => {
  const sprint = { topSpeed: 8, runUp: 1 }

  it.each([
    [5, 1.371],
    [10, 2.131],
    [20, 3.469],
  ])('top speed 8 m/s over 1 s: %d m in %f s', (metres, seconds) => {
    expect(sprintSeconds(sprint, metres)).toBeCloseTo(seconds, 3)
    expect(sprintDistance(sprint, seconds)).toBeCloseTo(metres, 1)
  })

  it('has the speed of its formula: 1 - 1/e of the top after one run-up', () => {
    expect(sprintSpeed(sprint, 1)).toBeCloseTo(8 * (1 - Math.exp(-1)), 9)
  })
})

describe('people', () => {
  it('the reaction of a defender lies near 231 ms (Woods 2015, Front Hum Neurosci 9:131, n = 1469, primary text)', () => {
    expect(Math.abs(DEFAULT_WALK.reaction - 0.231)).toBeLessThan(0.05)
  })
})
