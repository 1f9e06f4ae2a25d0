import type { RuleRow } from '@shared/rules/schemas'

/** A rule as the server sends it, changed where a test says so. */
export const rule = (changes: Partial<RuleRow> = {}): RuleRow => ({
  id: '00000000-0000-4000-8000-000000000014',
  version: 1,
  createdAt: '2026-01-12T10:00:00.000Z',
  updatedAt: '2026-01-12T10:00:00.000Z',
  number: 14,
  title: '2-2-1: fill the middle',
  when: { habit: 'shape:2-2-1', is: 'above', threshold: 0.5, grade: 'lean' },
  then: [
    { effect: 'want', trait: 'middle-entry', strength: 'strong' },
    { effect: 'want', trait: 'valve-behind', strength: 'medium' },
  ],
  because: 'The middle is open.',
  unless: null,
  unlessBecause: '',
  starred: false,
  on: true,
  ...changes,
})

export const above = (habit: string, threshold = 0.5, grade: 'lean' | 'firm' = 'lean') =>
  ({ habit, is: 'above', threshold, grade }) as const
