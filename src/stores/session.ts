import { computed, ref, shallowRef } from 'vue'
import { defineStore } from 'pinia'
import type { Action, Session, SessionTeam, SignIn } from '@shared/session/schemas'
import { deleteSession, getSession, postSession } from '@/api/session'
import { forgetKept } from '@/api/kept'
import { ApiProblem } from '@/api/problems'

/** Who is signed in, their teams, and the one whose pages are open. What they may do is the server's word. */
export const useSessionStore = defineStore('session', () => {
  const session = shallowRef<Session | null>(null)
  /** False until the server has said once whether anybody is signed in. */
  const known = ref(false)
  const currentTeamId = ref<string | null>(null)

  const isSignedIn = computed(() => session.value !== null)
  const person = computed(() => session.value?.person ?? null)
  const teams = computed<readonly SessionTeam[]>(() => session.value?.teams ?? [])
  const team = computed(() => teams.value.find((each) => each.id === currentTeamId.value) ?? null)

  let loading: Promise<void> | null = null

  /** Asks once; later calls wait for the same answer. Rejects with OfflineError when there is no signal. */
  function load(): Promise<void> {
    if (known.value) return Promise.resolve()
    loading ??= getSession()
      .then((answer) => take(answer))
      .catch((error: unknown) => {
        if (!(error instanceof ApiProblem) || error.status !== 401) throw error
        forget()
      })
      .finally(() => (loading = null))
    return loading
  }

  async function signIn(body: SignIn): Promise<void> {
    await forgetKept()
    take(await postSession(body))
  }

  async function signOut(): Promise<void> {
    await deleteSession()
    await forgetKept()
    forget()
  }

  /** Nobody is signed in as far as this page knows. */
  function forget(): void {
    session.value = null
    currentTeamId.value = null
    known.value = true
  }

  /** Opens a team's pages; false when the person is not on it. */
  function enter(teamId: string): boolean {
    if (!teams.value.some((each) => each.id === teamId)) return false
    currentTeamId.value = teamId
    return true
  }

  /** Whether the server lets this person do it in the team that is open. */
  function can(action: Action): boolean {
    return team.value?.can.includes(action) ?? false
  }

  function take(answer: Session): void {
    session.value = answer
    known.value = true
  }

  return { known, isSignedIn, person, teams, team, currentTeamId, load, signIn, signOut, forget, enter, can }
})

export type SessionStore = ReturnType<typeof useSessionStore>
