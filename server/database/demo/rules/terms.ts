import type { FactCondition, HabitCondition, RuleBody } from '@shared/rules/schemas'

/** A rule with the key that the demo's ids are made from. */
export type DemoRule = RuleBody & { key: string }

/** Their habit is past the threshold, from a lean up. */
export const above = (habit: string, threshold = 0.5): HabitCondition => ({
  habit,
  is: 'above',
  threshold,
  grade: 'lean',
})
/** Their habit is under one half, from a lean up. */
export const below = (habit: string): HabitCondition => ({
  habit,
  is: 'below',
  threshold: 0.5,
  grade: 'lean',
})
/** They have done it once. */
export const seen = (habit: string): HabitCondition => ({
  habit,
  is: 'seen',
  threshold: 0.5,
  grade: 'sighting',
})
export const atMost = (fact: FactCondition['fact'], value: number): FactCondition => ({
  fact,
  is: 'at-most',
  value,
})
export const atLeast = (fact: FactCondition['fact'], value: number): FactCondition => ({
  fact,
  is: 'at-least',
  value,
})
export const exactly = (fact: FactCondition['fact'], value: number): FactCondition => ({
  fact,
  is: 'equal',
  value,
})

/** What most rules are: on, never silenced, and not acting on one sighting. */
export const plain = { unless: null, unlessBecause: '', starred: false, on: true } as const
