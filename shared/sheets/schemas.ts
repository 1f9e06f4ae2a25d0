import { z } from 'zod'
import { Diagram, Role } from '../court/diagram'
import { RulePackKey } from '../court/rulePacks'
import { SpotName, SpotSide } from '../court/trapSpots'
import { Id } from '../http/common'

export const Paper = z.enum(['a4', 'letter'])
export type Paper = z.infer<typeof Paper>

/** One counter as it was on the day the plan was signed. */
export const FrozenCounter = z.object({
  counterId: z.uuid(),
  name: z.string(),
  call: z.string(),
  diagram: Diagram,
  /** Passing options in order; older sheets were frozen without them. */
  looks: z.array(z.string()).default([]),
  roles: z.array(
    z.object({
      role: Role,
      title: z.string(),
      jobs: z.array(z.string()),
      changeUpLine: z.string(),
      keyStep: z.number().int(),
      squadPlayerId: z.uuid().nullable(),
    }),
  ),
})
export type FrozenCounter = z.infer<typeof FrozenCounter>

/**
 * What signing off freezes. No player's name is in it: names are looked up by id, so that erasing a
 * person reaches frozen plans too.
 */
export const FrozenPlan = z.object({
  version: z.literal(1),
  opponentName: z.string(),
  tipOff: z.iso.datetime(),
  place: z.enum(['home', 'away', 'neutral']),
  rulePack: RulePackKey,
  press: z.object({
    /** Rows behind the drawing. */
    pressed: z.number().int(),
    pickup: z.enum(['full', 'three-quarter', 'half']).nullable(),
    pickupThin: z.boolean(),
    mostlyShape: z.string().nullable(),
    zones: z.array(
      z.object({
        spot: SpotName,
        side: SpotSide,
        k: z.number().int(),
        n: z.number().int(),
        thin: z.boolean(),
        /** The line below that speaks of this zone; several zones may share one. */
        letter: z.enum(['A', 'B', 'C']).nullable(),
      }),
    ),
    room: z.enum(['middle', 'sideline', 'long', 'pass-back', 'far-side']).nullable(),
    /** At most three sentences, each with its count; letters A to C link them to the drawing. */
    lines: z
      .array(
        z.object({
          letter: z.enum(['A', 'B', 'C']),
          text: z.string(),
          k: z.number().int(),
          n: z.number().int(),
          ink: z.enum(['their', 'our']),
          habitKey: z.string(),
        }),
      )
      .max(3),
  }),
  firstCall: FrozenCounter,
  changeUp: FrozenCounter.nullable(),
  keys: z.array(z.string()).max(3),
})
export type FrozenPlan = z.infer<typeof FrozenPlan>

/** A sheet as one reader sees it. `mine` is the reader's own role, when the reader plays. */
export const SheetView = z.object({
  id: z.uuid(),
  gameId: z.uuid(),
  planNumber: z.number().int(),
  createdAt: z.iso.datetime(),
  timeZone: z.string(),
  content: FrozenPlan,
  /** Who has a role, by first name and number; somebody who was erased since is not among them. */
  players: z.array(z.object({ squadPlayerId: z.uuid(), firstName: z.string(), jersey: z.number().int() })),
  mine: z
    .object({ squadPlayerId: z.uuid(), firstCallRole: Role.nullable(), changeUpRole: Role.nullable() })
    .nullable(),
  budget: z.object({ words: z.number().int(), limit: z.number().int(), over: z.boolean() }),
  /** The head coach chose the fuller page for paper. */
  fuller: z.boolean().default(false),
  /** When it was called back; null while it holds. */
  recalledAt: z.iso.datetime().nullable().default(null),
  /** The newest sheet of the same game, when that is another one. */
  newest: z.object({ id: z.uuid(), planNumber: z.number().int() }).nullable().default(null),
})
export type SheetView = z.infer<typeof SheetView>

export const SheetRow = z.object({
  id: z.uuid(),
  gameId: z.uuid(),
  planId: z.uuid(),
  planNumber: z.number().int(),
  opponentName: z.string(),
  tipOff: z.iso.datetime(),
  createdAt: z.iso.datetime(),
  /** Who signed the plan; null once that person was erased. */
  signedBy: z.string().nullable().default(null),
  fuller: z.boolean().default(false),
  recalledAt: z.iso.datetime().nullable().default(null),
})
export type SheetRow = z.infer<typeof SheetRow>
export const SheetList = z.object({ rows: z.array(SheetRow), total: z.number().int() })
export type SheetList = z.infer<typeof SheetList>

export const SheetPdfQuery = z.object({
  paper: Paper.default('a4'),
  /** Whose copy; staff may ask for anyone's, a player's own is taken by itself. */
  player: Id.optional(),
  /** Copy number, printed small at the foot. */
  copy: z.coerce.number().int().min(1).max(99).optional(),
})
export type SheetPdfQuery = z.infer<typeof SheetPdfQuery>
