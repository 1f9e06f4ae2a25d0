import { describe, expect, it } from 'vitest'
import { GameBody, type GameRow } from '@shared/games/schemas'
import { bodyOfForm, bodyOfRow, formOf } from '@/views/opponents/gameForm'

const OPPONENT = '44444444-4444-4444-8444-000000000001'
const row: GameRow = {
  id: '44444444-4444-4444-8444-000000000101',
  version: 2,
  createdAt: '2026-03-01T10:00:00.000Z',
  updatedAt: '2026-03-01T10:00:00.000Z',
  opponentId: OPPONENT,
  opponentName: 'Port Selby Gulls',
  tipOff: '2026-03-30T18:15:00.000Z',
  place: 'away',
  rulePack: 'fiba',
  chooseBy: '2026-03-28T18:00:00.000Z',
  due: { scout: null, read: '2026-03-27T18:00:00.000Z', teach: null, review: null },
  notes: 'Bus at **four**.',
  station: 'choose',
  counts: { possessions: 0, scoutedGames: 0, ourGames: 0 },
  plan: null,
  headCoach: null,
  holder: null,
  read: null,
  handedOn: null,
  mayHandOn: false,
}

describe('a game of ours on its form', () => {
  it('comes back the same, with its notes and dates', () => {
    const form = formOf(row, 'Europe/London', 'fiba')
    expect(form).toMatchObject({ date: '2026-03-30', time: '19:15' })
    expect(GameBody.parse(bodyOfForm(form, row, OPPONENT, 'Europe/London'))).toEqual(bodyOfRow(row))
  })

  it('moves in the zone of the team and keeps the rest', () => {
    const form = { ...formOf(row, 'Europe/London', 'fiba'), date: '2026-03-27', place: 'home' as const }
    expect(bodyOfForm(form, row, OPPONENT, 'Europe/London')).toEqual({
      ...bodyOfRow(row),
      tipOff: '2026-03-27T19:15:00.000Z',
      place: 'home',
    })
  })

  it('is no game while its day or time is open', () => {
    const fresh = formOf(null, 'UTC', 'fiba')
    expect(bodyOfForm(fresh, null, OPPONENT, 'UTC')).toBeNull()
    expect(bodyOfForm({ ...fresh, date: '2026-03-27', time: '7 pm' }, null, OPPONENT, 'UTC')).toBeNull()
    const body = bodyOfForm({ ...fresh, date: '2026-03-27', time: '19:15' }, null, OPPONENT, 'UTC')
    expect(GameBody.parse(body)).toMatchObject({ notes: '', chooseBy: null })
  })
})
