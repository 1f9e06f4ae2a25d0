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
  it('are the thirteen of the first season, each once', () => {
    expect(DEMO_RULES.map((rule) => rule.number)).toEqual([2, 6, 10, 11, 14, 17, 20, 25, 28, 30, 47, 48, 56])
    expect(new Set(DEMO_RULES.map((rule) => rule.key)).size).toBe(DEMO_RULES.length)
  })

  it.each(DEMO_RULES.map((rule) => [rule.key, rule] as const))(
    '%s is a whole rule as it stands',
    (_, rule) => {
      const { key, ...body } = rule
      expect(key).toBe(`rule-${rule.number}`)
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
    expect(DEMO_RULES.filter((rule) => rule.starred).map((rule) => rule.number)).toEqual([10, 28])
  })
})
