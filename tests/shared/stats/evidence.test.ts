import { describe, it, expect } from 'vitest'
import fc from 'fast-check'
import { claim, grade, reaches, thin } from '@shared/stats/evidence'

describe('grade', () => {
  it.each([
    [0, 0, 'none'],
    [1, 1, 'sighting'],
    [4, 4, 'sighting'],
    [5, 1, 'hint'],
    [9, 3, 'hint'],
    [10, 2, 'lean'],
    [19, 3, 'lean'],
    [20, 2, 'firm'],
  ] as const)('%i rows over %i games are %s', (n, games, expected) => {
    expect(grade(n, games)).toBe(expected)
  })

  it('never passes a hint on one game', () => {
    fc.assert(
      fc.property(fc.integer({ min: 5, max: 10_000 }), (n) => {
        expect(grade(n, 1)).toBe('hint')
      }),
    )
  })

  it('orders the grades', () => {
    expect(reaches('lean', 'lean')).toBe(true)
    expect(reaches('firm', 'lean')).toBe(true)
    expect(reaches('hint', 'lean')).toBe(false)
    expect(reaches('none', 'sighting')).toBe(false)
  })
})

describe('claim', () => {
  it('is unclear when nothing was counted', () => {
    expect(claim(0, 0)).toBe('unclear')
  })

  it('says rarely exactly where the failures would say usually', () => {
    fc.assert(
      fc.property(
        fc
          .integer({ min: 1, max: 400 })
          .chain((n) => fc.tuple(fc.integer({ min: 0, max: n }), fc.constant(n))),
        ([k, n]) => {
          expect(claim(k, n) === 'rarely').toBe(claim(n - k, n) === 'usually')
        },
      ),
    )
  })

  it('asks more of a higher threshold, and rarely of its mirror', () => {
    expect(claim(7, 10)).toBe('unclear')
    expect(claim(16, 20, 0.7)).toBe('unclear')
    expect(claim(18, 20, 0.7)).toBe('usually')
    expect(claim(5, 20, 0.7)).toBe('unclear')
    expect(claim(2, 20, 0.7)).toBe('rarely')
  })
})

describe('thin', () => {
  it('is a sighting, one game or a wide range', () => {
    expect(thin(0, 0, 0)).toBe(true)
    expect(thin(4, 4, 2)).toBe(true)
    expect(thin(30, 40, 1)).toBe(true)
    // 2 of 5 allows .12 to .77: 65 points; 5 of 5 allows .57 to 1
    expect(thin(2, 5, 2)).toBe(true)
    expect(thin(5, 5, 2)).toBe(false)
    expect(thin(3, 8, 2)).toBe(false)
  })
})
