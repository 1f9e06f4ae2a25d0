import { describe, expect, it } from 'vitest'
import type { InvitationRow } from '@shared/people/schemas'
import { invitationWords, invitedName, peopleSentence } from '@/views/people/peopleWords'

const row: InvitationRow = {
  id: '00000000-0000-4000-8000-000000000001',
  version: 1,
  createdAt: '2026-03-16T19:40:00.000Z',
  updatedAt: '2026-03-17T19:40:00.000Z',
  role: 'assistant-coach',
  squadPlayerId: null,
  playerName: null,
  email: null,
  expiresAt: '2026-03-23T23:30:00.000Z',
  invitedBy: 'Maren Oduya',
  state: 'out',
  usedAt: null,
  usedBy: null,
  letter: null,
}

describe('an invitation in words', () => {
  it('says the way, that it works once, and its last day where the team is', () => {
    expect(invitationWords(row, 'Europe/London')).toBe(
      'assistant coach, copied Mon 16 Mar. Works once, ends Mon 23 Mar.',
    )
    expect(invitationWords({ ...row, email: 'jo@club.example', letter: 'kept' }, 'Europe/Oslo')).toBe(
      'assistant coach, by mail Mon 16 Mar. Works once, ends Tue 24 Mar. The letter is kept under Letters: no mail server is set.',
    )
  })

  it('says what became of it', () => {
    const used = { ...row, state: 'used' as const, usedAt: row.updatedAt, usedBy: 'Jo Abara' }
    expect([invitedName(used), invitationWords(used, 'UTC')]).toEqual([
      'Jo Abara',
      'assistant coach, used Tue 17 Mar, cannot be used again',
    ])
    expect(invitationWords({ ...row, state: 'revoked' }, 'UTC')).toBe(
      'assistant coach, taken back Tue 17 Mar',
    )
    const hers = { ...row, role: 'player' as const, playerName: 'Nell', state: 'expired' as const }
    expect([invitedName(hers), invitationWords(hers, 'UTC')]).toEqual([
      'A link for Nell',
      'player Nell, ended Mon 23 Mar and was not used',
    ])
  })
})

it('the line under the title counts staff, players, accounts and what is out', () => {
  const member = { role: 'head-coach' as const }
  const page = { members: [member, { role: 'player' }], players: [{ memberId: 'x' }, { memberId: null }] }
  expect(
    peopleSentence({ ...page, invitations: [row] } as unknown as Parameters<typeof peopleSentence>[0]),
  ).toBe('One on the staff and two players, one has an account. One invitation is out.')
})
