import { z } from 'zod'

/** One reason for or against a picked counter, as it stood when the plan was signed off. */
export const Ground = z.object({
  counterId: z.uuid(),
  ruleId: z.uuid(),
  ruleNumber: z.number().int().nullable(),
  title: z.string(),
  because: z.string(),
  asked: z.string(),
  /** Signed, on the logit scale. */
  weight: z.number(),
  /** What fired the rule; each habit with the possessions that were counted for it. */
  habits: z.array(
    z.object({
      key: z.string(),
      k: z.number().int(),
      n: z.number().int(),
      games: z.number().int(),
      /** Rows of k, then of n beside them. */
      rowIds: z.array(z.uuid()),
      otherIds: z.array(z.uuid()),
    }),
  ),
})
export type Ground = z.infer<typeof Ground>

/** What a signed plan stood on; kept with it, for staff only. */
export const Grounds = z.object({ rows: z.array(Ground), total: z.number().int() })
export type Grounds = z.infer<typeof Grounds>

/** Which version is asked about. */
export const GroundsQuery = z.object({ plan: z.uuid().optional() })
