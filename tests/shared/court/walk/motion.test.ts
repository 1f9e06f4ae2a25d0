import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { passFlight } from '@shared/court/walk/passFlight'
import { apex, GRAVITY, launchSpeed, secondsToFall } from '@shared/court/walk/projectile'
import { DEFAULT_WALK, WALK_SETTINGS, WalkSettings } from '@shared/court/walk/settings'
import { runnersOf, sprintDistance, sprintSeconds, timedSprint } from '@shared/court/walk/sprint'

const anySprint = fc.record({
  topSpeed: fc.double({ min: 3, max: 11, noNaN: true }),
  runUp: fc.double({ min: 0.3, max: 2, noNaN: true }),
})
const metres = fc.double({ min: 0, max: 40, noNaN: true })

describe('a sprint', () => {
  it('takes as long as its distance needs, to the millimetre', () => {
    fc.assert(
      fc.property(anySprint, metres, (sprint, far) => {
        expect(sprintDistance(sprint, sprintSeconds(sprint, far))).toBeCloseTo(far, 3)
      }),
    )
  })

  it('is never faster than its top speed and never goes back', () => {
    fc.assert(
      fc.property(anySprint, metres, metres, (sprint, a, b) => {
        const [short, long] = a < b ? [a, b] : [b, a]
        expect(sprintSeconds(sprint, short)).toBeLessThanOrEqual(sprintSeconds(sprint, long) + 1e-5)
        expect(sprintSeconds(sprint, long)).toBeGreaterThanOrEqual(long / sprint.topSpeed)
      }),
    )
  })
})

describe('a player’s own sprint', () => {
  it('takes as long over 20 m as it was timed', () => {
    fc.assert(
      fc.property(fc.double({ min: 2.8, max: 5, noNaN: true }), (seconds) => {
        expect(sprintSeconds(timedSprint(20, seconds, 1), 20)).toBeCloseTo(seconds, 6)
      }),
    )
    expect(timedSprint(20, 3.469, 1).topSpeed).toBeCloseTo(8, 2)
  })

  it('is held to what people run, and leaves those who were not timed at the default', () => {
    expect(timedSprint(20, 2, 1).topSpeed).toBe(WALK_SETTINGS.ourTopSpeed.most)
    const runners = runnersOf(
      [
        ['1', { sprint20: 3.4 }],
        ['2', { sprint20: null }],
      ],
      DEFAULT_WALK,
    )
    expect(Object.keys(runners)).toEqual(['1'])
    expect(WalkSettings.safeParse({ runners }).success).toBe(true)
  })
})

describe('a flight', () => {
  it('of a lob leaves and comes down at the heights of the settings, over both of them between', () => {
    fc.assert(
      fc.property(fc.double({ min: 3, max: 28, noNaN: true }), (far) => {
        const { heightAt, seconds, top } = passFlight('lob', far, DEFAULT_WALK)
        expect(top).toBeCloseTo(heightAt?.(0.5) ?? NaN, 9)
        expect(heightAt?.(0)).toBeCloseTo(DEFAULT_WALK.releaseHeight, 9)
        expect(heightAt?.(1)).toBeCloseTo(DEFAULT_WALK.catchHeight, 9)
        const speed = launchSpeed(far, DEFAULT_WALK.lobAngle) ?? NaN
        expect(heightAt?.(0.5)).toBeCloseTo(
          DEFAULT_WALK.releaseHeight + apex({ speed, angle: DEFAULT_WALK.lobAngle }).height,
          9,
        )
        expect(seconds).toBeCloseTo(secondsToFall({ speed, angle: DEFAULT_WALK.lobAngle }, 0) ?? NaN, 9)
      }),
    )
  })

  it('of a straight pass is its length over its speed; a lob is slower, a bounce between', () => {
    const seconds = (kind: 'straight' | 'bounce' | 'lob') => passFlight(kind, 13, DEFAULT_WALK).seconds
    expect(seconds('straight')).toBeCloseTo(1, 9)
    expect(seconds('bounce')).toBeGreaterThan(seconds('straight'))
    expect(seconds('lob')).toBeGreaterThan(seconds('bounce'))
  })

  it('of a lob that cannot come down to the catch goes straight', () => {
    const settings = { ...DEFAULT_WALK, releaseHeight: 1, catchHeight: 3, lobAngle: 30 }
    expect(passFlight('lob', 1, settings)).toEqual({
      seconds: 1 / settings.straightSpeed,
      heightAt: null,
      top: null,
    })
  })

  it('is never higher than its top, also where it is caught on the way up', () => {
    const settings = { ...DEFAULT_WALK, releaseHeight: 1, catchHeight: 3 }
    for (const far of [2.6, 3, 6, 15]) {
      const { heightAt, top } = passFlight('lob', far, settings)
      const heights = Array.from({ length: 21 }, (_, i) => heightAt?.(i / 20) ?? NaN)
      expect(Math.max(...heights)).toBeLessThanOrEqual((top ?? NaN) + 1e-9)
      expect(heightAt?.(1)).toBeCloseTo(3, 9)
    }
  })

  it('knows where no speed is enough', () => {
    expect(launchSpeed(2, 45, 2)).toBeNull()
    expect(secondsToFall({ speed: 5, angle: 90 }, (5 * 5) / (2 * GRAVITY) + 0.01)).toBeNull()
  })
})

describe('the settings', () => {
  it('have a default inside their own bounds, and say that each is an assumption', () => {
    for (const [key, { value, least, most, label, note }] of Object.entries(WALK_SETTINGS)) {
      expect(DEFAULT_WALK).toHaveProperty(key, value)
      expect(value, label).toBeGreaterThanOrEqual(least)
      expect(value, label).toBeLessThanOrEqual(most)
      expect(note).toMatch(/^Assumption/)
    }
  })

  it('refuse what no player does', () => {
    expect(WalkSettings.safeParse({ ourTopSpeed: 14 }).success).toBe(false)
    expect(WalkSettings.safeParse({ runners: { 9: { topSpeed: 7, runUp: 1 } } }).success).toBe(false)
    expect(WalkSettings.parse({ runners: { 3: { topSpeed: 8.4, runUp: 0.9 } } }).runners['3']?.topSpeed).toBe(
      8.4,
    )
  })
})
