import { describe, it, expect } from 'vitest'
import { RuleBody, type Condition } from '@shared/rules/schemas'
import { habitOf } from '@shared/tendencies/habits'
import { DEMO_RULES } from '@server/database/demo/rules'

const habitsIn = (condition: Condition): string[] => {
  if ('all' in condition) return condition.all.flatMap(habitsIn)
  if ('any' in condition) return condition.any.flatMap(habitsIn)
  return 'habit' in condition ? [condition.habit] : []
}

describe('DEMO_RULES', () => {
  it('are those that can be answered today, in order, 8 and 51 in two parts', () => {
    expect(DEMO_RULES.map((rule) => rule.number)).toEqual([
      1, 2, 3, 4, 5, 6, 8, 8, 9, 10, 11, 12, 14, 15, 16, 17, 18, 19, 20, 21, 22, 23, 24, 25, 26, 27, 28, 29,
      30, 32, 33, 34, 35, 36, 37, 38, 39, 40, 41, 42, 46, 47, 48, 50, 51, 51, 52, 56, 57,
    ])
    expect(new Set(DEMO_RULES.map((rule) => rule.key)).size).toBe(DEMO_RULES.length)
  })

  it.each(DEMO_RULES.map((rule) => [rule.key, rule] as const))(
    '%s is a whole rule as it stands',
    (_, rule) => {
      const { key, ...body } = rule
      expect(key).toMatch(new RegExp(`^rule-${rule.number}(-[a-z-]+)?$`))
      expect(RuleBody.parse(body)).toEqual(body)
    },
  )

  it.each(DEMO_RULES.map((rule) => [rule.key, rule] as const))(
    '%s names habits that are counted',
    (_, rule) => {
      const named = [...habitsIn(rule.when), ...(rule.unless ? habitsIn(rule.unless) : [])]
      expect(named.filter((key) => habitOf(key) === undefined)).toEqual([])
    },
  )

  it('say why in one sentence, and why they keep silent where they can', () => {
    for (const rule of DEMO_RULES) {
      expect(rule.because).toMatch(/^[^.]+\.$/)
      expect(rule.unlessBecause !== '').toBe(rule.unless !== null)
    }
  })

  it('star exactly the rules that act on one sighting', () => {
    expect(DEMO_RULES.filter((rule) => rule.starred).map((rule) => rule.number)).toEqual([10, 28, 29, 41, 42])
  })

  it('ask each trait once, the first the most', () => {
    const order = ['strong', 'medium', 'light']
    for (const rule of DEMO_RULES) {
      const demands = rule.then.flatMap((demand) => ('strength' in demand ? [demand] : []))
      const ranks = demands.map(({ strength }) => order.indexOf(strength))
      expect(ranks, rule.key).toEqual([...ranks].sort())
      expect(new Set(demands.map(({ trait }) => trait)).size).toBe(demands.length)
    }
  })
})
