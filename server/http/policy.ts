import { ACTIONS, type Action } from '@shared/session/schemas'
import type { TeamRole } from '@shared/vocabulary'

const STAFF: readonly Action[] = [
  'opponent:read',
  'opponent:write',
  'game:read',
  'game:write',
  'scouting:read',
  'scouting:write',
  'counter:read',
  'rule:read',
  'squad:read',
  'plan:read',
  'sheet:read',
  'sheet:hand-out',
  'history:read',
  'counter:write',
  'practice:read',
  'practice:write',
  'game:hand-on',
  'team:read',
  'mail:read',
]

/** The whole of who may do what. Players open what has been handed out, nothing else. */
const TABLE: Record<TeamRole, readonly Action[]> = {
  'head-coach': ACTIONS,
  'assistant-coach': STAFF,
  player: ['sheet:read'],
}

/** What a role may do in its team; the session tells it to the client, which never works it out again. */
export const actionsOf = (role: TeamRole): readonly Action[] => TABLE[role]

export const may = (role: TeamRole, action: Action): boolean => TABLE[role].includes(action)
