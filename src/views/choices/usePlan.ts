import { computed, onScopeDispose, ref, shallowRef } from 'vue'
import { useEventListener } from '@vueuse/core'
import { PlanRow, type PlanState, type RoleGiven } from '@shared/plans/schemas'
import { putPlan, signOffPlan } from '@/api/plans'
import { ApiProblem, OfflineError } from '@/api/problems'
import { newId } from '@/composables/newId'
import { dropDraft, keepDraft, keptDraft } from './keptDraft'
import {
  bodyOf,
  changeSentences,
  draftOf,
  giveRole,
  mergeNewer,
  pick,
  type PickedAs,
  type PlanDraft,
  type Suggested,
} from './planDraft'

/** Typing is sent this long after the last letter; picks are sent at once. */
const TYPED_MS = 700
/** Without a signal it is tried again this often, and at once when the signal is back. */
const AGAIN_MS = 15_000

export interface PlanOptions {
  teamId: string
  gameId: string
  personId: string
  row: PlanRow | null
  suggested: Suggested
  nameOf: (counterId: string) => string
}

/** The plan of one game while it is worked on: every decision is saved at once, and none is lost. */
export function usePlan(options: PlanOptions) {
  const { teamId, gameId, personId, suggested, nameOf } = options
  const saved = shallowRef<PlanRow | null>(options.row)
  const draft = shallowRef<PlanDraft>(draftOf(options.row))
  const saving = ref(false)
  const unsent = ref(false)
  const error = shallowRef<Error | null>(null)
  /** What somebody else changed meanwhile, and whether keys typed here are still to be sent. */
  const newer = shallowRef<{ sentences: string[]; keptKeys: boolean } | null>(null)

  const signed = computed(() => saved.value !== null && saved.value.signedAt !== null)
  const offline = computed(() => error.value instanceof OfflineError)

  // Kept until the server has them, so that a repeat is the same request.
  let nextPlanId: string = newId()
  let sheetId: string = newId()
  let timer: ReturnType<typeof setTimeout> | undefined
  let running: Promise<void> | null = null

  function change(next: PlanDraft, when: 'now' | 'typed' = 'now'): void {
    if (signed.value) return
    draft.value = next
    unsent.value = true
    keep()
    later(when === 'now' ? 0 : TYPED_MS)
  }

  function keep(): void {
    const base = draftOf(saved.value)
    const { id: planId = null, version = null } = saved.value ?? {}
    keepDraft(personId, gameId, { planId, version, base, draft: draft.value })
  }

  function later(ms: number): void {
    clearTimeout(timer)
    timer = setTimeout(() => void save(), ms)
  }

  /** Sends what is unsent; calls while one is under way wait for it and send the rest. */
  function save(): Promise<void> {
    clearTimeout(timer)
    running ??= sendAll().finally(() => (running = null))
    return running
  }

  async function sendAll(): Promise<void> {
    saving.value = true
    try {
      while (unsent.value) {
        const sent = draft.value
        const open = saved.value !== null && !signed.value ? saved.value : null
        saved.value = await putPlan(
          teamId,
          gameId,
          bodyOf(sent, open?.id ?? nextPlanId, suggested),
          open?.version,
        )
        if (open === null) nextPlanId = newId()
        error.value = null
        if (draft.value === sent) {
          unsent.value = false
          dropDraft(personId, gameId)
        }
      }
    } catch (reason) {
      failed(reason)
    }
    saving.value = false
  }

  function failed(reason: unknown): void {
    if (reason instanceof ApiProblem && reason.isConflict && takeNewer(reason)) return
    error.value = reason instanceof Error ? reason : new Error(String(reason))
    if (reason instanceof OfflineError) later(AGAIN_MS)
  }

  /** Takes the version that somebody else saved; false when the answer carries none. */
  function takeNewer(problem: ApiProblem): boolean {
    const current = PlanRow.safeParse(problem.current)
    if (!current.success) return false
    const base = draftOf(saved.value)
    const theirs = draftOf(current.data)
    const merged = mergeNewer(base, draft.value, theirs)
    const wasSigned = signed.value
    saved.value = current.data
    draft.value = merged.draft
    unsent.value = merged.keptKeys && current.data.signedAt === null
    error.value = null
    const sentences = changeSentences(base, theirs, nameOf)
    const signedNow = current.data.signedAt !== null && !wasSigned
    newer.value = {
      sentences: signedNow ? [...sentences, `Version ${current.data.number} was signed off.`] : sentences,
      keptKeys: unsent.value,
    }
    if (unsent.value) keep()
    else dropDraft(personId, gameId)
    return true
  }

  /** Freezes the saved version; resolves to its sheet's id. @throws what the server answered */
  async function signOff(): Promise<string> {
    await save()
    const row = saved.value
    if (error.value !== null) throw error.value
    if (row === null) throw new Error('Nothing is picked yet.')
    try {
      accept(await signOffPlan(teamId, gameId, { planId: row.id, sheetId }, row.version))
    } catch (reason) {
      failed(reason)
      throw reason
    }
    const made = sheetId
    sheetId = newId()
    return made
  }

  function accept({ plan }: PlanState): void {
    saved.value = plan
    draft.value = draftOf(plan)
  }

  /** Opens the next version with the same content. */
  async function startNext(): Promise<void> {
    saving.value = true
    try {
      saved.value = await putPlan(teamId, gameId, bodyOf(draft.value, nextPlanId, suggested))
      nextPlanId = newId()
      error.value = null
    } catch (reason) {
      failed(reason)
    }
    saving.value = false
  }

  function recall(): void {
    const kept = keptDraft(personId, gameId)
    if (kept === null) return
    const row = saved.value
    if (kept.planId === (row?.id ?? null) && kept.version === (row?.version ?? null)) {
      draft.value = kept.draft
      unsent.value = true
      later(0)
      return
    }
    // The plan went on meanwhile: theirs is taken, keys typed here stay.
    const theirs = draftOf(row)
    const merged = mergeNewer(kept.base, kept.draft, theirs)
    draft.value = signed.value ? theirs : merged.draft
    unsent.value = merged.keptKeys && !signed.value
    newer.value = { sentences: changeSentences(kept.base, theirs, nameOf), keptKeys: unsent.value }
    if (!unsent.value) dropDraft(personId, gameId)
  }

  recall()
  useEventListener(window, 'online', () => unsent.value && void save())
  useEventListener(window, 'beforeunload', (event) => {
    if (unsent.value && !offline.value) event.preventDefault()
  })
  onScopeDispose(() => {
    clearTimeout(timer)
    if (unsent.value) void save()
  })

  return {
    saved,
    draft,
    saving,
    unsent,
    error,
    offline,
    newer,
    signed,
    pick: (counterId: string, as: PickedAs | null) => change(pick(draft.value, counterId, as)),
    give: (role: RoleGiven) => change(giveRole(draft.value, role, suggested)),
    setKeys: (keys: readonly string[]) => change({ ...draft.value, keys }, 'typed'),
    setReason: (reason: string) => change({ ...draft.value, reason }, 'typed'),
    save,
    signOff,
    startNext,
    understood: () => (newer.value = null),
  }
}
