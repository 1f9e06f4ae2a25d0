import { z } from 'zod'
import { Id, RowMeta } from '../http/common'
import { MAIL_STATES } from '../mail/schemas'
import { LIMITS } from '../limits'
import { TEAM_ROLES, valuesOf } from '../vocabulary'
import { Paper } from './schemas'

/** Copies that one request may make, and that one sheet may have in all. */
export const COPIES = { atOnce: 40, ofASheet: 99 } as const

export const COPY_PLACES = ['bag', 'out', 'back'] as const
/** Where a paper is: in the bag until it is given out, and back once it was brought. */
export const CopyPlace = z.enum(COPY_PLACES)
export type CopyPlace = z.infer<typeof CopyPlace>

/** New papers; their numbers are the server's. The same ids again make nothing new. */
export const CopiesBody = z
  .object({
    copies: z
      .array(z.object({ id: Id, squadPlayerId: Id.nullable().default(null) }))
      .min(1)
      .max(COPIES.atOnce),
  })
  .superRefine(({ copies }, ctx) => {
    if (new Set(copies.map(({ id }) => id)).size < copies.length)
      ctx.addIssue({ code: 'custom', path: ['copies'], message: 'Give every copy an id of its own.' })
  })
export type CopiesBody = z.infer<typeof CopiesBody>

export const CopyChange = z.object({
  place: CopyPlace,
  /** Who gets it; left out it stays whose it was. */
  squadPlayerId: Id.nullable().optional(),
})
export type CopyChange = z.infer<typeof CopyChange>

/** One paper or one letter of a sheet. */
export const CopyRow = RowMeta.extend({
  sheetId: z.uuid(),
  /** On the paper's foot; null for a letter. */
  number: z.number().int().nullable(),
  way: z.enum(['paper', 'mail', 'guardian']),
  squadPlayerId: z.uuid().nullable(),
  /** Whose it is: first name of a player or name of a coach; null for everybody's, or once erased. */
  name: z.string().nullable(),
  jersey: z.number().int().nullable(),
  /** Null for a letter. */
  place: CopyPlace.nullable(),
  outAt: z.iso.datetime().nullable(),
  backAt: z.iso.datetime().nullable(),
  letter: z
    .object({
      state: z.enum(MAIL_STATES),
      trouble: z.string().nullable(),
      sentAt: z.iso.datetime().nullable(),
    })
    .nullable(),
})
export type CopyRow = z.infer<typeof CopyRow>
export const CopyList = z.object({ rows: z.array(CopyRow), total: z.number().int() })
export type CopyList = z.infer<typeof CopyList>

export const CopiesPdfQuery = z.object({
  paper: Paper.default('a4'),
  /** Copies to draw, by id and with commas between; without it every paper of the sheet. */
  ids: z
    .string()
    .transform((text): unknown[] => text.split(',').filter(Boolean))
    .pipe(z.array(Id).max(COPIES.ofASheet) as z.ZodType<string[], unknown[]>)
    .optional(),
})
export type CopiesPdfQuery = z.infer<typeof CopiesPdfQuery>

/** Who gets a letter: players by squad player, coaches by membership. */
export const LettersBody = z.object({
  players: z.array(Id).max(LIMITS.pageRows).default([]),
  members: z.array(Id).max(LIMITS.pageRows).default([]),
})
export type LettersBody = z.infer<typeof LettersBody>

/** Every letter of the sheet, and for whom no address is known. */
export const LettersMade = CopyList.extend({
  without: z.array(z.object({ squadPlayerId: z.uuid(), jersey: z.number().int() })),
})
export type LettersMade = z.infer<typeof LettersMade>

/** That somebody opened a sheet: first and last time. For staff alone. */
export const OpeningRow = z.object({
  personId: z.uuid(),
  name: z.string(),
  role: z.enum(valuesOf(TEAM_ROLES)),
  squadPlayerId: z.uuid().nullable(),
  firstAt: z.iso.datetime(),
  lastAt: z.iso.datetime(),
})
export type OpeningRow = z.infer<typeof OpeningRow>
export const OpeningList = z.object({ rows: z.array(OpeningRow), total: z.number().int() })
export type OpeningList = z.infer<typeof OpeningList>

/** What a call back did: papers to be brought back, and how many letters never left. */
export const Recalled = z.object({
  recalledAt: z.iso.datetime(),
  out: z.array(CopyRow),
  withdrawn: z.number().int(),
})
export type Recalled = z.infer<typeof Recalled>

/** The fuller page needs the warning to have been read. */
export const SheetChange = z
  .object({ fuller: z.boolean(), seenWarning: z.boolean().default(false) })
  .superRefine(({ fuller, seenWarning }, ctx) => {
    if (fuller && !seenWarning)
      ctx.addIssue({
        code: 'custom',
        path: ['seenWarning'],
        message: 'Read the warning about fuller pages first.',
      })
  })
export type SheetChange = z.infer<typeof SheetChange>
