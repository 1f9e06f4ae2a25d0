import type { TeamRole } from '@shared/vocabulary'

/** The head coach gives and takes the ball at any time; an assistant while it is with her. */
export const mayHandOn = (
  caller: { personId: string; role: TeamRole },
  holder: { id: string } | null,
): boolean =>
  caller.role === 'head-coach' || (caller.role === 'assistant-coach' && holder?.id === caller.personId)
