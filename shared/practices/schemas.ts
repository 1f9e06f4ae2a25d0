import { z } from 'zod'
import { Id, Instant, RowMeta } from '../http/common'
import { LIMITS } from '../limits'
import { SHAPES, valuesOf } from '../vocabulary'

export const PART_KINDS = ['talk', 'walk', 'overload', 'drink', 'live'] as const
/** Parts of a practice as they get harder; `overload` is five against six. */
export const PartKind = z.enum(PART_KINDS)
export type PartKind = z.infer<typeof PartKind>

export const REP_KINDS = ['walk', 'overload', 'live'] as const
export const RepKind = z.enum(REP_KINDS)
export type RepKind = z.infer<typeof RepKind>

const Minutes = z.number().min(0).max(LIMITS.practiceMinutes)

export const ScriptPart = z.object({
  kind: PartKind,
  /** Minutes from the start. */
  from: Minutes,
  minutes: z.number().int().min(1).max(LIMITS.practiceMinutes),
  /** Initials of whoever leads it; empty where nobody was named. */
  leader: z.string().trim().max(3).default(''),
})
export type ScriptPart = z.infer<typeof ScriptPart>

/** One look that the scout team shows, how often it came, and how many reps it gets. */
export const ScriptLook = z.object({
  shape: z.enum(valuesOf(SHAPES)),
  k: z.number().int().min(0),
  n: z.number().int().min(0),
  /** As shared out. */
  proposed: z.number().int().min(0).max(200),
  /** Changed by hand; null is as proposed. */
  changed: z.number().int().min(0).max(200).nullable().default(null),
})
export type ScriptLook = z.infer<typeof ScriptLook>

/** A rep at its minute. */
export const ScriptRep = z.object({
  at: Minutes,
  shape: z.enum(valuesOf(SHAPES)),
  kind: RepKind,
  call: z.enum(['firstCall', 'changeUp']),
})
export type ScriptRep = z.infer<typeof ScriptRep>

export const Caution = z.object({
  at: Minutes,
  title: z.string().max(80),
  text: z.string().max(400),
})
export type Caution = z.infer<typeof Caution>

export const Script = z.object({
  minutes: z.number().int().min(10).max(LIMITS.practiceMinutes),
  parts: z.array(ScriptPart).min(1).max(12),
  looks: z.array(ScriptLook).max(8),
  reps: z.array(ScriptRep).max(400),
  cautions: z.array(Caution).max(12),
})
export type Script = z.infer<typeof Script>

/** What was run, counted afterwards; k got through, null where nobody defended. */
export const RepsLogged = z
  .object({
    counterId: Id,
    shape: z.enum(valuesOf(SHAPES)).nullable().default(null),
    kind: RepKind,
    n: z.number().int().min(0).max(500),
    k: z.number().int().min(0).max(500).nullable().default(null),
  })
  .superRefine(({ kind, n, k }, ctx) => {
    if (k !== null && k > n)
      ctx.addIssue({
        code: 'custom',
        path: ['k'],
        message: 'More got through than were run. Check both numbers.',
      })
    if (k !== null && kind === 'walk')
      ctx.addIssue({ code: 'custom', path: ['k'], message: 'Nobody defends a walked rep. Leave this empty.' })
  })
export type RepsLogged = z.infer<typeof RepsLogged>

export const PracticeBody = z
  .object({
    gameId: Id,
    startsAt: Instant,
    script: Script,
    reps: z.array(RepsLogged).max(60).default([]),
  })
  .superRefine(({ reps }, ctx) => {
    const seen = new Set<string>()
    reps.forEach(({ counterId, shape, kind }, index) => {
      const key = `${counterId} ${shape} ${kind}`
      if (seen.has(key))
        ctx.addIssue({
          code: 'custom',
          path: ['reps', index, 'kind'],
          message: 'This counter, look and part is there twice. Put both into one line.',
        })
      seen.add(key)
    })
  })
export type PracticeBody = z.infer<typeof PracticeBody>
export type PracticeInput = z.input<typeof PracticeBody>

export const PracticeRow = RowMeta.extend({ ...PracticeBody.shape })
export type PracticeRow = z.infer<typeof PracticeRow>
export const PracticeList = z.object({ rows: z.array(PracticeRow), total: z.number().int() })
export type PracticeList = z.infer<typeof PracticeList>

export const ScriptQuery = z.object({
  minutes: z.coerce.number().int().min(10).max(LIMITS.practiceMinutes).default(40),
  /** When it starts; without it the day before the game is taken for who is out. */
  startsAt: Instant.optional(),
})
export type ScriptQuery = z.infer<typeof ScriptQuery>

/** A script as the server shares it out, and what it stands on. */
export const ScriptProposal = z.object({
  script: Script,
  /** Throw-ins that were counted. */
  counted: z.number().int(),
})
export type ScriptProposal = z.infer<typeof ScriptProposal>
