import { z } from 'zod'
import { ROLES } from '../vocabulary'

/**
 * A counter as drawn: where ten stand, who has the ball, then steps of moves. Places are fractions of
 * the landmark court (RECORD.md section 2): x 0 at the throw-in's endline to 1, y 0 at the left
 * sideline to 1; x < 0 is out of bounds at the throw-in.
 */
export const Place = z.object({ x: z.number().min(-0.08).max(1.02), y: z.number().min(-0.06).max(1.06) })
export type Place = z.infer<typeof Place>

export const Role = z.enum(ROLES)
export const DefenderId = z.enum(['X1', 'X2', 'X3', 'X4', 'X5'])
export type DefenderId = z.infer<typeof DefenderId>

/** Order inside a step: moves of one beat happen together, the next beat follows. */
const beat = z.number().int().min(0).max(5).default(0)
/** Sideways swing of a path as a share of its length; + is to the right of the way walked. */
const bend = z.number().min(-0.6).max(0.6).default(0)

export const Move = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('cut'), who: Role, to: Place, bend, beat }),
  z.object({ kind: z.literal('dribble'), who: Role, to: Place, bend, beat }),
  z.object({
    kind: z.literal('pass'),
    from: Role,
    to: Role,
    flight: z.enum(['straight', 'lob', 'bounce']).default('straight'),
    throwIn: z.boolean().default(false),
    beat,
  }),
  z.object({
    kind: z.literal('screen'),
    who: Role,
    to: Place,
    for: Role,
    blind: z.boolean().default(false),
    beat,
  }),
  z.object({ kind: z.literal('theirs'), who: DefenderId, to: Place, bend, beat }),
])
export type Move = z.infer<typeof Move>

/** A word or two written on the court; the place is the text's middle. */
export const Word = z.object({ text: z.string().trim().min(1).max(24), at: Place })
export type Word = z.infer<typeof Word>

export const Step = z.object({
  /** What happens, in a few words, sentence case. */
  title: z.string().trim().min(1).max(60),
  moves: z.array(Move).max(12),
  /** Written on the court while the step is on; absent in drawings without. */
  words: z.array(Word).max(3).optional(),
})
export type Step = z.infer<typeof Step>

export const Diagram = z.object({
  version: z.literal(1),
  frame: z.literal(1),
  start: z.object({
    ours: z.array(z.object({ role: Role, at: Place })).length(5),
    theirs: z.array(z.object({ id: DefenderId, at: Place })).max(5),
    ball: Role,
  }),
  steps: z.array(Step).min(1).max(12),
})
export type Diagram = z.infer<typeof Diagram>
