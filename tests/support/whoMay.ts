import type { Action } from '@shared/session/schemas'
import type { TeamRole } from '@shared/vocabulary'

const STAFF: readonly TeamRole[] = ['assistant-coach', 'head-coach']
const HEAD: readonly TeamRole[] = ['head-coach']
const ALL: readonly TeamRole[] = ['player', 'assistant-coach', 'head-coach']

/**
 * The whole of who may do what, written out a second time: a change of the policy has to be made here too. The
 * policy's own test and the matrix over every endpoint both stand on it. Least role first.
 */
export const WHO_MAY: Record<Action, readonly TeamRole[]> = {
  'opponent:read': STAFF,
  'opponent:write': STAFF,
  'game:read': STAFF,
  'game:write': STAFF,
  'game:hand-on': STAFF,
  'scouting:read': STAFF,
  'scouting:write': STAFF,
  'history:read': STAFF,
  'counter:read': STAFF,
  'counter:write': STAFF,
  'rule:read': STAFF,
  'rule:write': HEAD,
  'squad:read': STAFF,
  'squad:write': HEAD,
  'plan:read': STAFF,
  'plan:write': HEAD,
  'plan:sign-off': HEAD,
  'sheet:read': ALL,
  'sheet:hand-out': STAFF,
  'sheet:recall': HEAD,
  'practice:read': STAFF,
  'practice:write': STAFF,
  'mail:read': STAFF,
  'team:read': STAFF,
  'team:write': HEAD,
  'person:erase': HEAD,
}
