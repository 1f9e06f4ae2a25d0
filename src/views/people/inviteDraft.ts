import type { z } from 'zod'
import type { InvitationBody, PlayerLine } from '@shared/people/schemas'
import { Email } from '@shared/session/schemas'
import type { TeamRole } from '@shared/vocabulary'

/** The sentence of an invitation as far as it has been said. */
export interface InviteDraft {
  role: TeamRole | null
  squadPlayerId: string | null
  way: 'mail' | 'link' | null
  email: string
  days: number | null
}
export type InviteSlot = 'role' | 'player' | 'way' | 'email' | 'days'

export const EMPTY_DRAFT: Readonly<InviteDraft> = {
  role: null,
  squadPlayerId: null,
  way: null,
  email: '',
  days: null,
}

/** The slots that this sentence has, in the order they are said. */
export function slotsOf(draft: InviteDraft): InviteSlot[] {
  return [
    'role',
    ...(draft.role === 'player' ? (['player'] as const) : []),
    'way',
    ...(draft.way === 'mail' ? (['email'] as const) : []),
    'days',
  ]
}

const isSaid = (draft: InviteDraft, slot: InviteSlot): boolean =>
  slot === 'player'
    ? draft.squadPlayerId !== null
    : slot === 'email'
      ? Email.safeParse(draft.email).success
      : draft[slot] !== null

/** The one slot that is said next; null once the sentence is whole. */
export const nextSlot = (draft: InviteDraft): InviteSlot | null =>
  slotsOf(draft).find((slot) => !isSaid(draft, slot)) ?? null

/** For a player her guardian's address stands in until another one is written. */
export function withPlayer(draft: InviteDraft, player: PlayerLine): InviteDraft {
  return { ...draft, squadPlayerId: player.id, email: player.guardianEmail ?? draft.email }
}

/** What is sent; null while a slot is still to say. */
export function bodyOf(draft: InviteDraft): z.input<typeof InvitationBody> | null {
  const { role, way, days } = draft
  if (nextSlot(draft) !== null || role === null || way === null || days === null) return null
  return {
    role,
    way,
    days,
    squadPlayerId: role === 'player' ? draft.squadPlayerId : null,
    email: way === 'mail' ? draft.email.trim() : null,
  }
}

/** Whether anything was said that would be lost. */
export const isBegun = (draft: InviteDraft): boolean => JSON.stringify(draft) !== JSON.stringify(EMPTY_DRAFT)
