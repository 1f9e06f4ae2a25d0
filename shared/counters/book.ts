import { z } from 'zod'
import { Id } from '../http/common'
import { Paper } from '../sheets/schemas'
import { list } from '../tendencies/schemas'

/** The printed book: all counters, or those named. */
export const BookQuery = z.object({
  paper: Paper.default('a4'),
  counters: list(Id),
})
export type BookQuery = z.infer<typeof BookQuery>
