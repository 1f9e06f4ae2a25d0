import type { RulePackKey } from '@shared/court/rulePacks'
import type { GameBody, GameRow } from '@shared/games/schemas'
import { calendarDay, instantOf, weekdayAndTime } from '@/composables/when'

/** A game of ours while it is being set, in the team's own time. */
export interface GameForm {
  date: string
  time: string
  place: GameBody['place']
  rulePack: RulePackKey
}

/** The stored row as the body that would have made it. */
export const bodyOfRow = (row: GameRow): GameBody => ({
  opponentId: row.opponentId,
  tipOff: row.tipOff,
  place: row.place,
  rulePack: row.rulePack,
  chooseBy: row.chooseBy,
  due: row.due,
  notes: row.notes,
})

export const formOf = (row: GameRow | null, timeZone: string, pack: RulePackKey): GameForm =>
  row === null
    ? { date: '', time: '', place: 'home', rulePack: pack }
    : {
        date: calendarDay(row.tipOff, timeZone),
        time: weekdayAndTime(row.tipOff, timeZone).split(' ')[1] ?? '',
        place: row.place,
        rulePack: row.rulePack,
      }

/** The body to send: what the form says, and everything else as the row has it. Null while day or time is open. */
export function bodyOfForm(
  form: GameForm,
  row: GameRow | null,
  opponentId: string,
  timeZone: string,
): GameBody | null {
  if (form.date === '' || !/^([01]\d|2[0-3]):[0-5]\d$/.test(form.time)) return null
  const rest =
    row === null
      ? { chooseBy: null, due: { scout: null, read: null, teach: null, review: null }, notes: '' }
      : bodyOfRow(row)
  return {
    ...rest,
    opponentId,
    tipOff: instantOf(form.date, form.time, timeZone),
    place: form.place,
    rulePack: form.rulePack,
  }
}
