import { computed } from 'vue'
import type { Action, SessionTeam } from '@shared/session/schemas'
import { useSessionStore } from '@/stores/session'

/**
 * The team whose pages are open, for views below /t/:team: its row, its id for the api functions, and what the
 * person may do in it.
 * @throws when used outside those pages
 */
export function useTeam() {
  const session = useSessionStore()
  const open = session.team
  if (open === null) throw new Error('useTeam needs a page below /t/:team')
  // The last team stays readable while the page leaves, when the store may already have forgotten it.
  let last: SessionTeam = open
  const team = computed(() => (last = session.team ?? last))
  return { team, teamId: open.id, can: (action: Action) => session.can(action) }
}
