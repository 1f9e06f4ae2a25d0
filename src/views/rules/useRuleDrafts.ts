import { reactive, shallowReactive } from 'vue'
import { RuleRow, type RuleRow as Row } from '@shared/rules/schemas'
import { putRule } from '@/api/rules'
import { ApiProblem } from '@/api/problems'
import { forget, keep, keyOf, recall } from '@/composables/kept'
import { bodyOf, changeSentences, draftLeft, NOTHING_CHANGED, readDraft, type RuleDraft } from './ruleDraft'

/** What stands beside a rule after a try to keep it. */
export interface RuleTrouble {
  error: Error | null
  /** What somebody else changed meanwhile, a sentence each. */
  newer: string[]
}

/**
 * Changes of rules that are not kept yet, by rule; each is held on this device until it is kept or put back, so that
 * neither a reload nor a lost signal takes it. `put` takes a row that the server answered.
 */
export function useRuleDrafts(options: { teamId: string; personId: string; put: (row: Row) => void }) {
  const { teamId, personId, put } = options
  const drafts = shallowReactive(new Map<string, RuleDraft>())
  const troubles = shallowReactive(new Map<string, RuleTrouble>())
  const saving = reactive(new Set<string>())
  const looked = new Set<string>()
  const key = (id: string) => keyOf('rules', personId, teamId, id)

  /** Takes up what this device kept for rules that are seen for the first time. */
  function takeUp(rows: readonly Row[]): void {
    for (const row of rows) {
      if (looked.has(row.id)) continue
      looked.add(row.id)
      const kept = recall(key(row.id), readDraft)
      if (kept !== null) change(row, kept)
    }
  }

  const draftOf = (row: Row): RuleDraft => drafts.get(row.id) ?? NOTHING_CHANGED

  function change(row: Row, draft: RuleDraft): void {
    const left = draftLeft(row, draft)
    if (left === null) return putBack(row)
    drafts.set(row.id, left)
    keep(key(row.id), left)
  }

  function putBack(row: Row): void {
    drafts.delete(row.id)
    troubles.delete(row.id)
    forget(key(row.id))
  }

  /** Sends a rule; false when it was not taken. A newer row that somebody else kept is taken up and told. */
  async function send(row: Row, draft: RuleDraft, on: boolean): Promise<boolean> {
    if (saving.has(row.id)) return false
    saving.add(row.id)
    try {
      const saved = await putRule(teamId, row.id, bodyOf(row, draft, on), row.version)
      troubles.delete(row.id)
      put(saved)
      const unsent = drafts.get(row.id)
      if (unsent !== undefined) change(saved, unsent)
      return true
    } catch (reason) {
      failed(row, reason)
      return false
    } finally {
      saving.delete(row.id)
    }
  }

  function failed(row: Row, reason: unknown): void {
    const error = reason instanceof Error ? reason : new Error(String(reason))
    const current =
      error instanceof ApiProblem && error.isConflict ? RuleRow.safeParse(error.current) : undefined
    if (current?.success !== true) {
      troubles.set(row.id, { error, newer: [] })
      return
    }
    put(current.data)
    const mine = drafts.get(row.id)
    if (mine !== undefined) change(current.data, mine)
    troubles.set(row.id, { error: null, newer: changeSentences(row, current.data) })
  }

  return {
    drafts,
    troubles,
    saving,
    takeUp,
    draftOf,
    change,
    putBack,
    /** Keeps what is changed of a rule. */
    keepRule: (row: Row) => send(row, draftOf(row), row.on),
    /** Switches a rule at once; what is changed of it besides stays a draft. */
    switchRule: (row: Row, on: boolean) => send(row, NOTHING_CHANGED, on),
  }
}
