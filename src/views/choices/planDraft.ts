import type { Role } from '@shared/vocabulary'
import type { PlanInput, PlanRow, RoleGiven } from '@shared/plans/schemas'

/** What the head coach decides for one game, as the page holds it. */
export interface PlanDraft {
  firstCallId: string | null
  changeUpId: string | null
  notThisGame: readonly string[]
  /** Players given by hand, also for counters that are not picked. */
  roles: readonly RoleGiven[]
  keys: readonly string[]
  reason: string
}

export type PickedAs = 'first' | 'change' | 'not'

/** Who stands in the roles of a counter where the head coach gave none. */
export type Suggested = (counterId: string) => readonly { role: Role; squadPlayerId: string | null }[]

export const NO_PICKS: PlanDraft = {
  firstCallId: null,
  changeUpId: null,
  notThisGame: [],
  roles: [],
  keys: [],
  reason: '',
}

export function draftOf(row: PlanRow | null): PlanDraft {
  if (row === null) return NO_PICKS
  const { firstCallId, changeUpId, notThisGame, roles, keys, reason } = row
  return { firstCallId, changeUpId, notThisGame, roles, keys, reason }
}

/** What a counter is picked as, or null. */
export function pickOf(draft: PlanDraft, counterId: string): PickedAs | null {
  if (draft.firstCallId === counterId) return 'first'
  if (draft.changeUpId === counterId) return 'change'
  return draft.notThisGame.includes(counterId) ? 'not' : null
}

/** Picks a counter, or takes its pick off with null; whichever held that place before is undecided again. */
export function pick(draft: PlanDraft, counterId: string, as: PickedAs | null): PlanDraft {
  const free = (id: string | null) => (id === counterId ? null : id)
  const others = draft.notThisGame.filter((id) => id !== counterId)
  return {
    ...draft,
    firstCallId: as === 'first' ? counterId : free(draft.firstCallId),
    changeUpId: as === 'change' ? counterId : free(draft.changeUpId),
    notThisGame: as === 'not' ? [...others, counterId] : others,
  }
}

/** Who stands in each role: given by hand, else suggested unless that player was given another role by hand. */
export function seatsOf(draft: PlanDraft, counterId: string, suggested: Suggested): Map<Role, string | null> {
  const given = draft.roles.filter((one) => one.counterId === counterId)
  const taken = new Set(given.map((one) => one.squadPlayerId))
  return new Map(
    suggested(counterId).map(({ role, squadPlayerId }) => {
      const own = given.find((one) => one.role === role)
      if (own) return [role, own.squadPlayerId]
      return [role, squadPlayerId !== null && taken.has(squadPlayerId) ? null : squadPlayerId]
    }),
  )
}

/** Gives a role to a player. Who already stands in another role of the counter changes places. */
export function giveRole(draft: PlanDraft, given: RoleGiven, suggested: Suggested): PlanDraft {
  const { counterId, role, squadPlayerId } = given
  const seats = seatsOf(draft, counterId, suggested)
  const from = [...seats].find(([other, player]) => other !== role && player === squadPlayerId)?.[0]
  const before = seats.get(role) ?? null
  seats.set(role, squadPlayerId)
  if (from !== undefined) seats.set(from, before)
  const rest = draft.roles.filter((one) => one.counterId !== counterId)
  return { ...draft, roles: [...rest, ...rolesIn(counterId, seats)] }
}

const rolesIn = (counterId: string, seats: ReadonlyMap<Role, string | null>): RoleGiven[] =>
  [...seats].flatMap(([role, squadPlayerId]) =>
    squadPlayerId === null ? [] : [{ counterId, role, squadPlayerId }],
  )

/** What is sent: the roles of the two picked counters as they stand on the page, keys without empty lines. */
export function bodyOf(draft: PlanDraft, id: string, suggested: Suggested): PlanInput {
  const picked = [draft.firstCallId, draft.changeUpId].filter((one) => one !== null)
  return {
    id,
    firstCallId: draft.firstCallId,
    changeUpId: draft.changeUpId,
    notThisGame: [...draft.notThisGame],
    roles: picked.flatMap((counterId) => rolesIn(counterId, seatsOf(draft, counterId, suggested))),
    keys: draft.keys.map((key) => key.trim()).filter((key) => key !== ''),
    reason: draft.reason.trim(),
  }
}

const sameKeys = (one: readonly string[], two: readonly string[]) => one.join('\n') === two.join('\n')

/**
 * Somebody else saved first: their version is taken, keys and reason that were typed here and not yet sent
 * stay. `keptKeys` says whether there were such keys.
 */
export function mergeNewer(
  base: PlanDraft,
  mine: PlanDraft,
  newer: PlanDraft,
): { draft: PlanDraft; keptKeys: boolean } {
  const typed = (draft: PlanDraft) => draft.keys.map((key) => key.trim()).filter((key) => key !== '')
  const keptKeys = !sameKeys(typed(base), typed(mine)) && !sameKeys(typed(mine), typed(newer))
  const keptReason = mine.reason.trim() !== base.reason.trim()
  return {
    draft: {
      ...newer,
      keys: keptKeys ? mine.keys : newer.keys,
      reason: keptReason ? mine.reason : newer.reason,
    },
    keptKeys,
  }
}

/** What somebody else changed between two versions, one short sentence each; empty when nothing that shows. */
export function changeSentences(
  before: PlanDraft,
  after: PlanDraft,
  nameOf: (counterId: string) => string,
): string[] {
  const sentences: string[] = []
  const named = (id: string | null, place: string) =>
    sentences.push(id === null ? `The ${place} is open again.` : `The ${place} is now ${nameOf(id)}.`)
  if (before.firstCallId !== after.firstCallId) named(after.firstCallId, 'first call')
  if (before.changeUpId !== after.changeUpId) named(after.changeUpId, 'change-up')
  for (const id of after.notThisGame)
    if (!before.notThisGame.includes(id)) sentences.push(`${nameOf(id)} is not for this game.`)
  for (const id of before.notThisGame)
    if (!after.notThisGame.includes(id) && pickOf(after, id) === null)
      sentences.push(`${nameOf(id)} is open again.`)
  const seats = (draft: PlanDraft) =>
    draft.roles
      .map((one) => `${one.counterId} ${one.role} ${one.squadPlayerId}`)
      .sort()
      .join('\n')
  if (seats(before) !== seats(after)) sentences.push('Roles were given to other players.')
  if (!sameKeys(before.keys, after.keys)) sentences.push('The keys were changed.')
  if (before.reason !== after.reason) sentences.push('The reason was changed.')
  return sentences
}
