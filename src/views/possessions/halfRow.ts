import { z } from 'zod'
import { CARRIED, emptyDraft, type Draft } from './draft'
import { isComplete, lineOf, newLine, type Line } from './line'
import { QUICK, type Before } from './slots'
import type { LogGame } from './logGame'
import type { LogRow } from './logRows'

type GameOf = Pick<LogGame, 'id' | 'ours'>

/** A row that is half said, as this device keeps it. Its fields are checked loosely: the sentence shows them anyway. */
const HalfRow = z.object({
  id: z.uuid(),
  version: z.number().int().nullable(),
  draft: z.looseObject({ number: z.number().int(), note: z.string() }),
  passed: z.array(z.enum(QUICK)),
  carried: z.array(z.enum(CARRIED)),
})
export const HalfRows = z.object({ fresh: HalfRow.nullable(), edit: HalfRow.nullable() })
export type HalfRows = z.infer<typeof HalfRows>

export const readHalfRows = (value: unknown): HalfRows | null => HalfRows.safeParse(value).data ?? null

const bare = ({ id, version, draft, passed, carried }: Line): z.infer<typeof HalfRow> => ({
  id,
  version,
  draft: { ...draft },
  passed: [...passed],
  carried: [...carried],
})

/** Whether anything was said of a new row that the last one did not bring. */
export const isBegun = (line: Line): boolean =>
  line.draft.trigger !== null || line.draft.note !== '' || line.past.length > 0

export function halfRowsOf(fresh: Line, edit: Line | null): HalfRows | null {
  if (!isBegun(fresh) && edit === null) return null
  return { fresh: isBegun(fresh) ? bare(fresh) : null, edit: edit === null ? null : bare(edit) }
}

/** A kept half row as a call line again, with the slot open that comes next. */
export function lineOfHalf(half: z.infer<typeof HalfRow>, game: GameOf, before: Before | null): Line {
  const draft: Draft = { ...emptyDraft(game.id, half.draft.number, null, game.ours), ...half.draft }
  const line = lineOf(half.id, draft, half.version, before)
  const told = { ...line, passed: half.passed, carried: half.carried }
  return { ...told, open: isComplete(told) ? null : line.open }
}

/** The next empty row after all that are saved or kept here. */
export function nextLine(id: string, game: GameOf, rows: readonly LogRow[]): Line {
  return newLine(
    id,
    game.id,
    rows.map(({ draft }) => ({
      number: draft.number,
      period: draft.period,
      clock: draft.clock,
      margin: draft.margin,
      onFloor: draft.onFloor,
      tripId: draft.tripId,
    })),
    game.ours,
  )
}

/** A new row keeps what is said and moves behind the others when its number is taken by now. */
export function renumbered(line: Line, rows: readonly LogRow[]): Line {
  const others = rows.filter((row) => row.id !== line.id).map((row) => row.draft.number)
  if (line.version !== null || !others.includes(line.draft.number)) return line
  return { ...line, draft: { ...line.draft, number: Math.max(...others) + 1 } }
}
