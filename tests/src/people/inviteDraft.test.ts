import { describe, expect, it } from 'vitest'
import { InvitationBody, type PlayerLine } from '@shared/people/schemas'
import { bodyOf, EMPTY_DRAFT, isBegun, nextSlot, slotsOf, withPlayer } from '@/views/people/inviteDraft'

const ID = '00000000-0000-4000-8000-000000000001'
const player = (guardianEmail: string | null): PlayerLine => ({
  id: ID,
  jersey: 4,
  firstName: 'Nell',
  lastName: 'Tavish',
  guardianEmail,
  pictureConsent: 'yes',
  memberId: null,
  since: null,
})

describe('the sentence of an invitation', () => {
  it('asks one slot after the other, and who only of a player, where only of a letter', () => {
    expect(nextSlot(EMPTY_DRAFT)).toBe('role')
    const staff = { ...EMPTY_DRAFT, role: 'assistant-coach' as const }
    expect(slotsOf(staff)).toEqual(['role', 'way', 'days'])
    expect(nextSlot(staff)).toBe('way')
    const letter = { ...EMPTY_DRAFT, role: 'player' as const, way: 'mail' as const }
    expect(slotsOf(letter)).toEqual(['role', 'player', 'way', 'email', 'days'])
    expect(nextSlot({ ...letter, squadPlayerId: ID, days: 7 })).toBe('email')
    expect(nextSlot({ ...letter, squadPlayerId: ID, days: 7, email: 'jo@' })).toBe('email')
  })

  it('takes her guardian’s address when it is known, and keeps what was written when it is not', () => {
    const draft = { ...EMPTY_DRAFT, role: 'player' as const, email: 'typed@post.example' }
    expect(withPlayer(draft, player('ewa@post.example'))).toMatchObject({
      squadPlayerId: ID,
      email: 'ewa@post.example',
    })
    expect(withPlayer(draft, player(null)).email).toBe('typed@post.example')
  })

  it('is sent only when it is whole, and then as the server takes it', () => {
    const draft = {
      ...EMPTY_DRAFT,
      role: 'assistant-coach' as const,
      way: 'link' as const,
      email: 'left@over',
    }
    expect(bodyOf(draft)).toBeNull()
    expect(InvitationBody.parse(bodyOf({ ...draft, days: 3, squadPlayerId: ID }))).toEqual({
      role: 'assistant-coach',
      squadPlayerId: null,
      way: 'link',
      email: null,
      days: 3,
    })
  })

  it('knows whether leaving would lose something', () => {
    expect(isBegun(EMPTY_DRAFT)).toBe(false)
    expect(isBegun({ ...EMPTY_DRAFT, role: 'player' })).toBe(true)
  })
})
