import type { Caller } from '../../http/endpoint'

export interface Subject {
  kind: 'squad-player' | 'member'
  id: string
}

/** Whose keeping a caller may take out as a file: a head coach anybody's of the team, anybody else their own. */
export const mayExport = (
  caller: Pick<Caller, 'role' | 'personId' | 'squadPlayerId'>,
  subject: Subject,
): boolean =>
  caller.role === 'head-coach' ||
  subject.id === (subject.kind === 'member' ? caller.personId : caller.squadPlayerId)
