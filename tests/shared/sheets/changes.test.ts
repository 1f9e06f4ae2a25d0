import { describe, expect, it } from 'vitest'
import { changesBetween } from '@shared/sheets/changes'
import { FIVE, frozenCounter, frozenPlan } from '../../support/sheetFixture'

const ids = FIVE.map(({ squadPlayerId }) => squadPlayerId)
const nameOf = (id: string) => FIVE.find(({ squadPlayerId }) => squadPlayerId === id)?.firstName ?? null

describe('what changed between two versions', () => {
  it('is nothing between equals', () => {
    expect(changesBetween(frozenPlan(), frozenPlan(), nameOf)).toEqual([])
  })

  it('names reminders, calls, roles and counts, each with what it was', () => {
    const older = frozenPlan({ keys: ['Pass early.', 'Look middle.'] })
    const swapped = [ids[1] ?? null, ids[0] ?? null, ...ids.slice(2)]
    const newer = frozenPlan({
      keys: ['Pass early.'],
      firstCall: frozenCounter('one-four', swapped),
      changeUp: null,
      press: {
        ...older.press,
        lines: older.press.lines.map((line) => (line.letter === 'A' ? { ...line, k: 8, n: 12 } : line)),
      },
    })
    expect(changesBetween(older, newer, nameOf)).toEqual([
      { what: 'Change-up', from: older.changeUp?.name, to: null },
      { what: 'Role 1', from: 'Nell', to: 'Ada' },
      { what: 'Role 2', from: 'Ada', to: 'Nell' },
      { what: 'Second reminder', from: 'Look middle.', to: null },
      { what: 'Line A', from: 'They trap in the corner. 7 of 11', to: 'They trap in the corner. 8 of 12' },
    ])
  })

  it('does not compare the roles of two different calls, and names nobody who was erased', () => {
    const other = { ...frozenCounter('box', ids), counterId: '00000000-0000-4000-8000-0000000000c2' }
    expect(
      changesBetween(frozenPlan(), frozenPlan({ firstCall: other }), nameOf).map(({ what }) => what),
    ).toEqual(['First call'])
    const left = frozenPlan({ firstCall: frozenCounter('one-four', [null, ...ids.slice(1)]) })
    expect(changesBetween(frozenPlan(), left, () => null)[0]).toEqual({
      what: 'Role 1',
      from: 'somebody who left',
      to: null,
    })
  })
})
