import { describe, expect, it } from 'vitest'
import { CounterBody } from '@shared/counters/schemas'
import { rulePack } from '@shared/court/rulePacks'
import { timeline } from '@shared/court/walk/timeline'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { rulerPlace, secondsAt, stationLabels, type RulerAxis } from '@/components/court/rulerPlaces'
import { stepAt } from '@/components/court/walkClock'
import { walkFit } from '@/components/court/walkFit'

const axis: RulerAxis = { throwIn: { from: 2, to: 102 }, left: 120, pxPerMetre: 30, right: 960 }
const pack = rulePack('fiba')
const lines = DEMO_COUNTERS.map((counter) => timeline(CounterBody.parse(counter).diagram, pack))

describe('a moment on the count ruler', () => {
  it('lies on the throw-in’s count until the first touch, then over the ball', () => {
    for (const line of lines) {
      const touch = line.touch?.seconds ?? expect.fail('never in')
      expect(rulerPlace(line, 0, axis)).toBe(2)
      expect(rulerPlace(line, touch - 0.01, axis)).toBeLessThanOrEqual(102)
      expect(rulerPlace(line, touch, axis)).toBeCloseTo(120 + Math.max(0, line.touch?.at.x ?? 0) * 30, 0)
      expect(rulerPlace(line, line.duration, axis)).toBeLessThanOrEqual(960)
    }
  })

  it('is found again from its place, near the moment that was in hand', () => {
    for (const line of lines)
      for (let at = 0; at <= line.duration; at += 0.2) {
        const found = secondsAt(line, rulerPlace(line, at, axis), axis, at)
        expect(Math.abs(found - at)).toBeLessThan(0.05)
      }
  })

  it('goes to the ends for places past them', () => {
    const [line] = lines
    if (!line) return
    expect(secondsAt(line, -50, axis, 3)).toBeLessThan(0.2)
    expect(rulerPlace(line, secondsAt(line, 5000, axis, 0), axis)).toBeGreaterThan(600)
  })
})

describe('labels of the stations', () => {
  const stations = [0, 2, 4, 300, 310].map((x, i) => ({ x, title: `What they do in ${i}` }))
  const overlapping = (labels: ReturnType<typeof stationLabels>) =>
    labels.some((label, i) => {
      const next = labels[i + 1]
      return next !== undefined && label.left + label.width > next.left + 1e-6
    })

  it.each([1000, 600, 358, 220])('never overlap nor leave a ruler of %i px', (width) => {
    for (const current of [0, 2, 4]) {
      const labels = stationLabels(stations, current, width, 34)
      expect(overlapping(labels)).toBe(false)
      for (const { left, width: wide } of labels) {
        expect(left).toBeGreaterThanOrEqual(0)
        expect(left + wide).toBeLessThanOrEqual(width + 1e-6)
      }
    }
  })

  it('drop titles before they shrink, the one in hand last', () => {
    expect(stationLabels(stations, 1, 1000, 34).every(({ titled }) => titled)).toBe(true)
    expect(stationLabels(stations, 1, 380, 34).map(({ titled }) => titled)).toEqual([
      false,
      true,
      false,
      false,
      false,
    ])
  })

  it('hold twelve steps on a phone', () => {
    const twelve = Array.from({ length: 12 }, (_, i) => ({ x: i, title: 'A step with a long name' }))
    const labels = stationLabels(twelve, 3, 358, 44)
    expect(overlapping(labels)).toBe(false)
    expect((labels.at(-1)?.left ?? 0) + (labels.at(-1)?.width ?? 0)).toBeLessThanOrEqual(358 + 1e-6)
  })
})

describe('the step of a moment', () => {
  it('is the last one that has begun', () => {
    expect(stepAt([0, 0.1, 2], 0)).toBe(0)
    expect(stepAt([0, 0.1, 2], 0.1)).toBe(1)
    expect(stepAt([0, 0.1, 2], 1.9)).toBe(1)
    expect(stepAt([0, 0.1, 2], 9)).toBe(2)
    expect(stepAt([], 1)).toBe(0)
  })
})

describe('the court’s place under its ruler', () => {
  it.each([358, 768, 1040])('fits %i px, with the throw-in’s count left of the endline', (width) => {
    for (const [index, line] of lines.entries()) {
      const { diagram } = CounterBody.parse(DEMO_COUNTERS[index])
      const { axis: found } = walkFit(diagram, line, width)
      expect(found.right).toBeLessThanOrEqual(width + 0.5)
      expect(found.throwIn.to).toBeLessThan(found.left)
      expect(found.throwIn.to - found.throwIn.from).toBeGreaterThan(48)
    }
  })
})
