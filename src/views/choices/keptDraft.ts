import type { PlanDraft } from './planDraft'

/** Picks that could not be sent yet, kept on this device until they are, for as long as the window is open. */
export interface KeptDraft {
  /** The version that they were made on; null before the first. */
  planId: string | null
  version: number | null
  base: PlanDraft
  draft: PlanDraft
}

const keyOf = (personId: string, gameId: string) => `overtop.plan.${personId}.${gameId}`

export function keepDraft(personId: string, gameId: string, kept: KeptDraft): void {
  try {
    sessionStorage.setItem(keyOf(personId, gameId), JSON.stringify(kept))
  } catch {
    // A browser that keeps nothing still holds it while the page is open.
  }
}

export function dropDraft(personId: string, gameId: string): void {
  try {
    sessionStorage.removeItem(keyOf(personId, gameId))
  } catch {
    // As above.
  }
}

/** What was kept, or null; also null for a text of another build that no longer fits. */
export function keptDraft(personId: string, gameId: string): KeptDraft | null {
  try {
    const value: unknown = JSON.parse(sessionStorage.getItem(keyOf(personId, gameId)) ?? 'null')
    return isKept(value) ? value : null
  } catch {
    return null
  }
}

function isKept(value: unknown): value is KeptDraft {
  if (typeof value !== 'object' || value === null) return false
  const { base, draft } = value as Partial<KeptDraft>
  return [base, draft].every(
    (each) =>
      each !== undefined &&
      Array.isArray(each.keys) &&
      Array.isArray(each.roles) &&
      Array.isArray(each.notThisGame) &&
      typeof each.reason === 'string',
  )
}
