import { describe, it, expect } from 'vitest'
import fc from 'fast-check'
import { assign, assignRoles, fitOf } from '@shared/stats/roles'
import { player, roles, six } from '../../server/engine/builders'

const square = fc.integer({ min: 1, max: 6 }).chain((size) =>
  fc.array(fc.array(fc.integer({ min: 0, max: 30 }), { minLength: size, maxLength: size }), {
    minLength: size,
    maxLength: size,
  }),
)

const sumOf = (values: number[][], columns: (number | null)[]) =>
  columns.reduce<number>((sum, column, row) => sum + (column === null ? 0 : (values[row]?.[column] ?? 0)), 0)

/** Row by row, the best column still free. */
function greedy(values: number[][]): (number | null)[] {
  const taken = new Set<number>()
  return values.map((row) => {
    let best: number | null = null
    row.forEach((value, column) => {
      if (!taken.has(column) && (best === null || value > (row[best] ?? 0))) best = column
    })
    if (best !== null) taken.add(best)
    return best
  })
}

const orders = (columns: number[]): number[][] =>
  columns.length === 0
    ? [[]]
    : columns.flatMap((first) =>
        orders(columns.filter((one) => one !== first)).map((rest) => [first, ...rest]),
      )

describe('assign', () => {
  it('is never worse than taking the best row by row', () => {
    fc.assert(
      fc.property(square, (values) => {
        expect(sumOf(values, assign(values))).toBeGreaterThanOrEqual(sumOf(values, greedy(values)))
      }),
    )
  })

  it('is the best of all orders', () => {
    fc.assert(
      fc.property(square, (values) => {
        fc.pre(values.length <= 5)
        const all = orders(values.map((_, index) => index)).map((order) => sumOf(values, order))
        expect(sumOf(values, assign(values))).toBe(Math.max(...all))
      }),
    )
  })

  it('uses a column once and leaves a row over where columns run out', () => {
    const seats = assign([
      [5, 1],
      [4, 1],
      [3, 2],
    ])
    expect(seats.filter((seat) => seat === null)).toHaveLength(1)
    expect(new Set(seats.filter((seat) => seat !== null)).size).toBe(2)
    expect(assign([[], []])).toEqual([null, null])
  })
})

describe('fitOf', () => {
  const role = roles({
    '1': [
      { skill: 'handle', level: 3 },
      { skill: 'decide', level: 2 },
    ],
  })[0]!

  it('is the mean share of the needs met, a shortfall in part', () => {
    expect(fitOf(player('a', { handle: 3, decide: 3 }), role)).toBe(1)
    expect(fitOf(player('a', { handle: 1, decide: 1 }), role)).toBeCloseTo((1 / 3 + 1 / 2) / 2, 12)
    expect(fitOf(player('a', { handle: 0, decide: 0 }), role)).toBe(0)
  })

  it('is whole where nothing is asked', () => {
    expect(fitOf(player('a', { handle: 0 }), roles()[0]!)).toBe(1)
  })
})

describe('assignRoles', () => {
  const handling = roles({ '1': [{ skill: 'handle', level: 3 }], '4': [{ skill: 'throw-in', level: 2 }] })

  it('puts the one handler and the one thrower where they are needed', () => {
    const squad = [
      player('a', { handle: 0, 'throw-in': 0 }),
      player('b', { handle: 0, 'throw-in': 0 }),
      player('c', { handle: 3, 'throw-in': 0 }),
      player('d', { handle: 0, 'throw-in': 0 }),
      player('e', { handle: 0, 'throw-in': 2 }),
    ]
    const assigned = assignRoles(handling, squad, 0.5)
    expect(assigned.roles.find((one) => one.role === '1')).toMatchObject({ squadPlayerId: 'c', fit: 1 })
    expect(assigned.roles.find((one) => one.role === '4')).toMatchObject({
      squadPlayerId: 'e',
      runnerUpId: null,
    })
    expect(assigned).toMatchObject({ squadTerm: 0, unfillable: null })
  })

  it('names as runner-up the best of those without a role', () => {
    const sprint = [{ skill: 'sprint', level: 2 }] as const
    const asks = roles({
      '1': [{ skill: 'handle', level: 3 }],
      '2': [...sprint],
      '3': [...sprint],
      '4': [...sprint],
      '5': [...sprint],
    })
    const squad = [
      ...['b', 'c', 'd', 'e'].map((id) => player(id, { handle: 0, sprint: 2 })),
      player('last', { handle: 1, sprint: 0 }),
      player('next', { handle: 2, sprint: 0 }),
      player('best', { handle: 3, sprint: 0 }),
    ]
    const [handler, runner] = assignRoles(asks, squad, 0.5).roles
    expect(handler).toMatchObject({ squadPlayerId: 'best', runnerUpId: 'next' })
    expect(runner?.runnerUpId).toBeNull()
  })

  it('gives the role to the one with skill to spare when both meet it', () => {
    const asks = roles({ '1': [{ skill: 'handle', level: 2 }] })
    const squad = [...six(), player('best', { handle: 3 })]
    expect(assignRoles(asks, squad, 0.5).roles[0]?.squadPlayerId).toBe('best')
  })

  it('never uses a player who is out', () => {
    const squad = [player('out', { handle: 3 }, false), ...six({ handle: 2 })]
    const ids = assignRoles(handling, squad, 0.5).roles.flatMap((one) => [one.squadPlayerId, one.runnerUpId])
    expect(ids).not.toContain('out')
  })

  it('says which role nobody available can fill', () => {
    const squad = [player('out', { handle: 3 }, false), ...six({ handle: 1 })]
    expect(assignRoles(handling, squad, 0.5).unfillable).toBe('Nobody available can fill role 1, role 1.')
    expect(assignRoles(handling, squad, 0.3).unfillable).toBeNull()
  })

  it('says so when one player would be needed twice, or there are not five', () => {
    const two = roles({ '1': [{ skill: 'handle', level: 3 }], '2': [{ skill: 'handle', level: 3 }] })
    const squad = [player('only', { handle: 3 }), ...six({ handle: 0 })]
    expect(assignRoles(two, squad, 0.5).unfillable).toContain('nobody is left for role')
    expect(assignRoles(roles(), six().slice(0, 4), 0.5).unfillable).toContain('nobody is left for role')
    expect(assignRoles(roles(), [], 0.5).unfillable).toContain('Nobody available')
  })

  it('fills every role that can be filled before it fills one better', () => {
    const asks = roles({
      '1': [{ skill: 'handle', level: 3 }],
      '2': [
        { skill: 'handle', level: 2 },
        { skill: 'decide', level: 2 },
      ],
    })
    const squad = [
      player('a', { handle: 3, decide: 0 }),
      player('b', { handle: 2, decide: 0 }),
      ...['c', 'd', 'e'].map((id) => player(id, { handle: 0, decide: 0 })),
    ]
    expect(assignRoles(asks, squad, 0.5).unfillable).toBeNull()
  })

  it('takes off more the less the roles are filled, and never more than 1', () => {
    const asks = roles(
      Object.fromEntries(['1', '2', '3', '4', '5'].map((role) => [role, [{ skill: 'handle', level: 3 }]])),
    )
    const term = (handle: number) => assignRoles(asks, six({ handle }), 0.5).squadTerm
    expect(term(3)).toBe(0)
    expect(term(2)).toBeCloseTo(-2 / 3, 12)
    expect(term(1)).toBe(-1)
    expect(term(0)).toBe(-1)
  })
})
