import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ballBySecond, heldStretch, type Tracked } from '@shared/court/ballBySecond'

const track = (...marks: [t: number, x: number][]): Tracked => ({
  track: marks.map(([t, x]) => ({ t, x })),
  crossedAt: null,
})

describe('ballBySecond', () => {
  it('moves evenly between two marks and guesses nothing past them', () => {
    expect(ballBySecond([track([0, 0.1], [2, 0.3])], 4)).toEqual([
      { second: 1, x: 0.2, n: 1 },
      { second: 2, x: 0.3, n: 1 },
    ])
    expect(ballBySecond([track([1.5, 0.1], [2.5, 0.3])], 2)[0]?.second).toBe(2)
  })

  it('takes the middle one of three, the mean of the two in the middle of four, and tells how many', () => {
    const rows = [0.1, 0.2, 0.6].map((x) => track([1, x]))
    expect(ballBySecond(rows, 1)).toEqual([{ second: 1, x: 0.2, n: 3 }])
    expect(ballBySecond([...rows, track([1, 0.4])], 1)[0]?.x).toBeCloseTo(0.3, 9)
  })

  it('counts only whom a second is known of', () => {
    const ticks = ballBySecond([track([0, 0.1], [4, 0.5]), track([0, 0.2], [1, 0.3])], 3)
    expect(ticks.map(({ n }) => n)).toEqual([2, 1, 1])
  })

  it('takes the crossing as one more mark, at half', () => {
    const crossed: Tracked = { track: [{ t: 0, x: 0.1 }], crossedAt: 4 }
    expect(ballBySecond([crossed], 5).map(({ second, x }) => [second, Math.round(x * 100)])).toEqual([
      [1, 20],
      [2, 30],
      [3, 40],
      [4, 50],
    ])
    expect(ballBySecond([{ track: null, crossedAt: 3 }], 5)).toEqual([{ second: 3, x: 0.5, n: 1 }])
  })

  it('says nothing where nothing was tracked', () => {
    expect(ballBySecond([{ track: null, crossedAt: null }, track()], 8)).toEqual([])
    expect(ballBySecond([], 8)).toEqual([])
  })

  it('stays between the marks, in order of seconds, whatever was logged', () => {
    const mark = fc.record({
      t: fc.double({ min: -10, max: 20, noNaN: true }),
      x: fc.double({ min: -0.1, max: 1.05, noNaN: true }),
    })
    const row = fc.record({
      track: fc.option(fc.array(mark, { maxLength: 8 })),
      crossedAt: fc.option(fc.double({ min: 0, max: 20, noNaN: true })),
    })
    fc.assert(
      fc.property(fc.array(row, { maxLength: 6 }), (rows) => {
        const ticks = ballBySecond(rows)
        const xs = [...rows.flatMap(({ track: marks }) => (marks ?? []).map(({ x }) => x)), 0.5]
        ticks.slice(1).forEach(({ second }, i) => expect(second).toBeGreaterThan(ticks[i]!.second))
        for (const { x, n } of ticks) {
          expect(x).toBeGreaterThanOrEqual(Math.min(...xs) - 1e-9)
          expect(x).toBeLessThanOrEqual(Math.max(...xs) + 1e-9)
          expect(n).toBeGreaterThan(0)
          expect(n).toBeLessThanOrEqual(rows.length)
        }
      }),
    )
  })
})

describe('heldStretch', () => {
  const ticks = (...xs: number[]) => xs.map((x, i) => ({ second: i + 1, x }))

  it('finds where the ball hardly comes on for two seconds or more', () => {
    expect(heldStretch(ticks(0.09, 0.1, 0.12, 0.36, 0.45))).toEqual({ from: 1, to: 3 })
    expect(heldStretch(ticks(0.1, 0.2, 0.21, 0.3))).toBeNull()
    expect(heldStretch(ticks(0.1, 0.11, 0.12, 0.3, 0.31, 0.32, 0.33))).toEqual({ from: 4, to: 7 })
  })

  it('does not bridge a second that nobody speaks for', () => {
    expect(
      heldStretch([
        { second: 1, x: 0.1 },
        { second: 2, x: 0.1 },
        { second: 4, x: 0.1 },
        { second: 5, x: 0.1 },
      ]),
    ).toBeNull()
    expect(heldStretch([])).toBeNull()
  })
})
