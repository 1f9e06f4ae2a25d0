import { describe, it, expect } from 'vitest'
import type { SheetRow } from '@shared/sheets/schemas'
import { listed, nextSheet } from '@/views/sheets/sheetOrder'

const sheet = (
  id: string,
  gameId: string,
  planNumber: number,
  tipOff: string,
  createdAt: string,
): SheetRow => ({
  id,
  gameId,
  planId: `plan-${id}`,
  planNumber,
  opponentName: 'Gulls',
  tipOff,
  createdAt,
  signedBy: null,
  fuller: false,
  recalledAt: null,
})

const rows = [
  sheet('old', 'played', 1, '2026-03-01T19:00:00Z', '2026-02-27T10:00:00Z'),
  sheet('first', 'gulls', 1, '2026-03-20T19:15:00Z', '2026-03-17T10:00:00Z'),
  sheet('second', 'gulls', 2, '2026-03-20T19:15:00Z', '2026-03-18T10:00:00Z'),
  sheet('later', 'rovers', 1, '2026-03-25T19:15:00Z', '2026-03-18T12:00:00Z'),
]

describe('the list of sheets', () => {
  it('is newest first, and an older plan says what took its place', () => {
    expect(listed(rows).map(({ row, replacedBy }) => [row.id, replacedBy])).toEqual([
      ['later', null],
      ['second', null],
      ['first', 2],
      ['old', null],
    ])
  })

  it('opens on the sheet in force of the next game, not on the newest one', () => {
    expect(nextSheet(rows, Date.parse('2026-03-19T12:00:00Z'))?.id).toBe('second')
  })

  it('keeps a game that is being played, then goes on to the next, then to none', () => {
    expect(nextSheet(rows, Date.parse('2026-03-20T21:00:00Z'))?.id).toBe('second')
    expect(nextSheet(rows, Date.parse('2026-03-20T22:30:00Z'))?.id).toBe('later')
    expect(nextSheet(rows, Date.parse('2026-04-01T12:00:00Z'))).toBeNull()
    expect(nextSheet([], 0)).toBeNull()
  })
})
