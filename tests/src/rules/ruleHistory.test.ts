import { describe, expect, it } from 'vitest'
import type { ChangeRow } from '@shared/history/schemas'
import { ruleHistory } from '@/views/rules/ruleHistory'

const ID = 'a3bb189e-8bf9-4888-9912-ace4e6543002'
const entry = (more: Partial<ChangeRow>): ChangeRow => ({
  id: ID,
  kind: 'rules',
  rowId: ID,
  action: 'changed',
  who: { id: ID, name: 'Maren Oduya', initials: 'MO' },
  at: '2026-02-24T10:00:00.000Z',
  batchId: null,
  fields: [],
  ...more,
})
const want = (strength: string) => [{ effect: 'want', trait: 'middle-entry', strength }]

describe('what was done to a rule', () => {
  it('is told as corrections: struck, then what it is now', () => {
    const [line] = ruleHistory([
      entry({
        fields: [
          { field: 'then', from: want('medium'), to: want('strong') },
          { field: 'on', from: true, to: false },
          { field: 'because', from: 'Old.', to: 'New.' },
        ],
      }),
    ])
    expect(line?.who).toBe('Maren')
    expect(line?.corrections).toEqual([
      { of: 'middle entry', from: 'clearly', to: 'strongly' },
      { of: '', from: 'on', to: 'off' },
      { of: 'because', from: 'Old.', to: 'New.' },
    ])
  })

  it('says who wrote it, and names nobody who was erased', () => {
    expect(ruleHistory([entry({ action: 'made' })])[0]).toMatchObject({ who: 'Maren', words: 'wrote it' })
    expect(ruleHistory([entry({ who: null })])[0]?.who).toBe('Somebody')
  })

  it('says that it asks something else where there are no words for a field', () => {
    const lines = ruleHistory([
      entry({ fields: [{ field: 'when', from: {}, to: {} }] }),
      entry({ fields: [{ field: 'then', from: 'x', to: 3 }] }),
    ])
    expect(lines.map(({ words }) => words)).toEqual(['changed what it asks', 'changed what it asks'])
  })
})
