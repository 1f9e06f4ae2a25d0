import type { PlanBody, PlanRow } from '@shared/plans/schemas'
import type { Plan } from '../../database/entities/Plan'
import { metaOf } from '../../http/present'

export const bodyOfPlan = (row: Plan): PlanBody => ({
  id: row.id,
  firstCallId: row.firstCallId,
  changeUpId: row.changeUpId,
  notThisGame: row.notThisGame,
  roles: row.roles,
  keys: row.keys,
  reason: row.reason,
})

export const presentPlan = (row: Plan): PlanRow => ({
  ...metaOf(row),
  ...bodyOfPlan(row),
  gameId: row.gameId,
  number: row.number,
  signedAt: row.signedAt,
  signedBy: row.signedBy?.name ?? null,
})
