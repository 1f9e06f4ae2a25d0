import { describe, it, expect } from 'vitest'
import { assign } from '@shared/stats/roles'

const total = (values: number[][]) =>
  assign(values).reduce<number>(
    (sum, column, row) => sum + (column === null ? 0 : (values[row]?.[column] ?? 0)),
    0,
  )

const least = (costs: number[][]) => -total(costs.map((row) => row.map((cost) => -cost)))

describe('assignment', () => {
  it.each([
    [
      850,
      [
        [400, 150, 400],
        [400, 450, 600],
        [300, 225, 300],
      ],
    ],
    [
      18,
      [
        [10, 10, 8],
        [9, 8, 1],
        [9, 7, 4],
      ],
    ],
  ])('costs %i at least: scipy’s test suite', (expected, costs) => {
    expect(least(costs)).toBe(expected)
  })

  it('rates 27 at most: Kuhn 1955, quoted from memory', () => {
    const ratings = [
      [8, 7, 9, 9],
      [5, 2, 7, 8],
      [6, 1, 4, 9],
      [2, 3, 2, 6],
    ]
    expect(total(ratings)).toBe(27)
  })
})
