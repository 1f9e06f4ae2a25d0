import { describe, it, expect } from 'vitest'
import type { Condition } from '@shared/rules/schemas'
import { betaCdf } from '@shared/stats/beta'
import { factsOf } from '@server/engine/facts'
import { runRules, type EngineRule } from '@server/engine/rules'
import { player, read, rule, six, type Counts } from './builders'

const facts = factsOf({ squad: six(), pressedRows: 20, backcourtCount: 8 })
const run = (rules: EngineRule[], counts: Counts, games = 2) => runRules(rules, read(counts, games), facts)
const fires = async (when: Condition, counts: Counts, games = 2) =>
  (await run([rule('r', { when })], counts, games)).fired.length === 1

const above = (habit: string, threshold = 0.5, grade: 'sighting' | 'hint' | 'lean' | 'firm' = 'lean') =>
  ({ habit, is: 'above', threshold, grade }) as const

describe('habit conditions', () => {
  it('above needs the grade and the 80 bound past the threshold', async () => {
    expect(await fires(above('trap'), { trap: [8, 10] })).toBe(true)
    expect(await fires(above('trap'), { trap: [7, 10] })).toBe(false)
    expect(await fires(above('trap'), { trap: [8, 9] })).toBe(false)
    expect(await fires(above('trap'), { trap: [10, 10] }, 1)).toBe(false)
    expect(await fires(above('trap', 0.5, 'hint'), { trap: [8, 9] })).toBe(true)
    expect(await fires(above('trap', 0.5, 'firm'), { trap: [15, 19] })).toBe(false)
    expect(await fires(above('trap', 0.5, 'firm'), { trap: [15, 20] })).toBe(true)
  })

  it('above takes the rule’s own threshold', async () => {
    expect(await fires(above('trap', 0.7), { trap: [14, 20] })).toBe(false)
    expect(await fires(above('trap', 0.2), { trap: [7, 20] })).toBe(true)
  })

  it('below needs the upper bound under the threshold', async () => {
    const below = { habit: 'trap', is: 'below', threshold: 0.5, grade: 'lean' } as const
    expect(await fires(below, { trap: [2, 10] })).toBe(true)
    expect(await fires(below, { trap: [3, 10] })).toBe(false)
    expect(await fires(below, {})).toBe(false)
  })

  it('seen is one sighting at any grade, and not a row without it', async () => {
    const seen = { habit: 'trap', is: 'seen', threshold: 0.5, grade: 'lean' } as const
    expect(await fires(seen, { trap: [1, 1] }, 1)).toBe(true)
    expect(await fires(seen, { trap: [0, 30] })).toBe(false)
    expect(await fires(seen, {})).toBe(false)
  })

  it('never fires on a habit that no longer exists', async () => {
    expect(await fires({ habit: 'gone', is: 'below', threshold: 1, grade: 'none' }, { trap: [9, 9] })).toBe(
      false,
    )
  })
})

describe('facts and groups', () => {
  it.each([
    ['equal', 8, true],
    ['equal', 10, false],
    ['at-least', 8, true],
    ['at-least', 9, false],
    ['at-most', 8, true],
    ['at-most', 7, false],
  ] as const)('backcourt count of 8 %s %i: %s', async (is, value, expected) => {
    expect(await fires({ fact: 'backcourtCount', is, value }, {})).toBe(expected)
  })

  it('counts only available players who can do it under pressure', () => {
    const squad = [
      player('a', { handle: 3, 'long-arm': 1, decide: 2 }),
      player('b', { handle: 1, 'long-arm': 3, decide: 0 }),
      player('c', { handle: 3, 'long-arm': 3, decide: 3 }, false),
    ]
    expect(factsOf({ squad, pressedRows: 7, backcourtCount: 10 })).toMatchObject({
      pressedRows: 7,
      handlers: 1,
      longArms: 1,
      middlePlayers: 1,
      backcourtCount: 10,
      available: 2,
      dribblingThrowers: 2,
      bestHandlers: 1,
      otherLongArms: 1,
      sprinters: 2,
    })
  })

  it('never holds on a fact without an answer, either way', async () => {
    const fact = 'filmDays'
    for (const is of ['equal', 'at-least', 'at-most'] as const)
      expect(await fires({ fact, is, value: 0 }, {}), is).toBe(false)
    const given = factsOf({ squad: six(), pressedRows: 20, backcourtCount: 8, given: { filmDays: 0 } })
    const asked = rule('r', { when: { fact, is: 'at-most', value: 0 } })
    expect((await runRules([asked], read({}), given)).fired).toHaveLength(1)
  })

  it('all needs every part, any needs one, and they nest', async () => {
    const both = { all: [above('trap'), above('mirror')] }
    expect(await fires(both, { trap: [9, 10], mirror: [9, 10] })).toBe(true)
    expect(await fires(both, { trap: [9, 10], mirror: [5, 10] })).toBe(false)
    const either = { any: [above('sag'), both] }
    expect(await fires(either, { trap: [9, 10], mirror: [9, 10] })).toBe(true)
    expect(await fires(either, { sag: [9, 10] })).toBe(true)
    expect(await fires(either, { trap: [9, 10] })).toBe(false)
  })
})

describe('a fired rule', () => {
  it('keeps the facts that fired it with their counts', async () => {
    const when: Condition = {
      all: [{ any: [above('trap'), above('sag')] }, { fact: 'handlers', is: 'at-least', value: 2 }],
    }
    const { fired } = await run([rule('r', { when })], { trap: [9, 12], sag: [1, 12] })
    expect(fired[0]?.facts).toEqual([
      expect.objectContaining({ kind: 'habit', key: 'trap', k: 9, n: 12, games: 2, thin: false }),
      { kind: 'fact', fact: 'handlers', value: 6, credence: 1 },
    ])
  })

  it('believes as much as the adjusted rate is past the threshold', async () => {
    const list = read({ trap: [9, 12] })
    const posterior = list.find((tendency) => tendency.key === 'trap')?.posterior ?? { a: 1, b: 1 }
    const when = above('trap', 0.4)
    const { fired } = await runRules([rule('r', { when })], list, facts)
    expect(fired[0]?.credence).toBeCloseTo(1 - betaCdf(0.4, posterior), 12)
    expect(fired[0]?.credence).toBeGreaterThan(0.8)
    expect(fired[0]?.credence).toBeLessThan(1)
  })

  it('is as sure as its least sure part, and wholly sure on our own facts or a star', async () => {
    const counts: Counts = { trap: [9, 12], mirror: [19, 20] }
    const sure = async (changes: Partial<EngineRule>) =>
      (await run([rule('r', changes)], counts)).fired[0]?.credence ?? 0
    const trap = await sure({ when: above('trap') })
    const mirror = await sure({ when: above('mirror') })
    expect(mirror).toBeGreaterThan(trap)
    expect(await sure({ when: { all: [above('trap'), above('mirror')] } })).toBe(trap)
    expect(await sure({ when: { any: [above('trap'), above('mirror')] } })).toBe(mirror)
    expect(await sure({})).toBe(1)
    expect(await sure({ when: above('trap'), starred: true })).toBe(1)
  })

  it('acts on one sighting when it is starred', async () => {
    const starred = rule('r', { when: above('trap'), starred: true })
    expect((await run([starred], { trap: [1, 3] }, 1)).fired).toHaveLength(1)
    expect((await run([starred], { trap: [0, 3] }, 1)).fired).toHaveLength(0)
  })
})

describe('contra-facts and switches', () => {
  const unless: Condition = above('safety-home')
  const contra = rule('r', { when: above('trap'), unless, unlessBecause: 'The safety waits for it.' })

  it('silence a rule that would fire, and say why', async () => {
    const result = await run([contra], { trap: [9, 10], 'safety-home': [9, 10] })
    expect(result.fired).toEqual([])
    expect(result.silenced).toMatchObject([
      {
        rule: { id: 'r' },
        because: 'The safety waits for it.',
        facts: [{ key: 'safety-home', k: 9, n: 10 }],
      },
    ])
  })

  it('say nothing about a rule that would not fire, or when they do not hold', async () => {
    expect(await run([contra], { 'safety-home': [9, 10] })).toEqual({ fired: [], silenced: [] })
    const free = await run([contra], { trap: [9, 10], 'safety-home': [5, 10] })
    expect(free.fired).toHaveLength(1)
    expect(free.silenced).toEqual([])
  })

  it('a rule that is off neither fires nor is silenced', async () => {
    const off = { ...contra, on: false }
    expect(await run([off], { trap: [9, 10], 'safety-home': [9, 10] })).toEqual({ fired: [], silenced: [] })
  })

  it('keeps the order of the rules', async () => {
    const rules = ['c', 'a', 'b'].map((id) => rule(id))
    expect((await run(rules, {})).fired.map((one) => one.rule.id)).toEqual(['c', 'a', 'b'])
  })
})
