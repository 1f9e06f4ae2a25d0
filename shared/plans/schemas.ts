import { z } from 'zod'
import { Id, RowMeta } from '../http/common'
import { LIMITS } from '../limits'
import { Role } from '../court/diagram'

export const RoleGiven = z.object({ counterId: Id, role: Role, squadPlayerId: Id })
export type RoleGiven = z.infer<typeof RoleGiven>

export const PlanBody = z
  .object({
    id: Id,
    firstCallId: Id.nullable().default(null),
    changeUpId: Id.nullable().default(null),
    notThisGame: z.array(Id).max(40).default([]),
    roles: z.array(RoleGiven).max(10).default([]),
    /** Said to the players in the loudest line of the sheet. */
    keys: z.array(z.string().trim().min(1).max(LIMITS.key)).max(LIMITS.keys).default([]),
    /** Kept when the head coach picks against the order. */
    reason: z.string().trim().max(LIMITS.reason).default(''),
  })
  .superRefine((plan, ctx) => {
    if (plan.firstCallId !== null && plan.firstCallId === plan.changeUpId)
      ctx.addIssue({
        code: 'custom',
        path: ['changeUpId'],
        message: 'The change-up must be another counter than the first call.',
      })
    const picked = [plan.firstCallId, plan.changeUpId]
    for (const id of plan.notThisGame)
      if (picked.includes(id))
        ctx.addIssue({
          code: 'custom',
          path: ['notThisGame'],
          message: 'A picked counter cannot also be left out. Take it off one of the two.',
        })
    const seats = new Set<string>()
    const players = new Set<string>()
    plan.roles.forEach((given, index) => {
      const seat = `${given.counterId} ${given.role}`
      const player = `${given.counterId} ${given.squadPlayerId}`
      if (seats.has(seat))
        ctx.addIssue({
          code: 'custom',
          path: ['roles', index, 'role'],
          message: 'This role is given twice. Keep one player for it.',
        })
      if (players.has(player))
        ctx.addIssue({
          code: 'custom',
          path: ['roles', index, 'squadPlayerId'],
          message: 'This player has two roles in one counter. Give one of them to somebody else.',
        })
      seats.add(seat)
      players.add(player)
    })
  })
export type PlanBody = z.infer<typeof PlanBody>
export type PlanInput = z.input<typeof PlanBody>

export const PlanRow = RowMeta.extend({
  gameId: z.uuid(),
  /** Version number of the plan of this game, from 1. */
  number: z.number().int(),
  firstCallId: z.uuid().nullable(),
  changeUpId: z.uuid().nullable(),
  notThisGame: z.array(z.uuid()),
  roles: z.array(z.object({ counterId: z.uuid(), role: Role, squadPlayerId: z.uuid() })),
  keys: z.array(z.string()),
  reason: z.string(),
  signedAt: z.iso.datetime().nullable(),
  signedBy: z.string().nullable(),
})
export type PlanRow = z.infer<typeof PlanRow>

/** The newest version, and the list of all of them. `plan` is null before the first pick. */
export const PlanState = z.object({
  plan: PlanRow.nullable(),
  versions: z.array(
    z.object({ id: z.uuid(), number: z.number().int(), signedAt: z.iso.datetime().nullable() }),
  ),
})
export type PlanState = z.infer<typeof PlanState>

/** Signing off freezes the version and makes its sheet; both ids are the caller's, so a repeat changes nothing. */
export const SignOffBody = z.object({ planId: Id, sheetId: Id })
export type SignOffBody = z.infer<typeof SignOffBody>
