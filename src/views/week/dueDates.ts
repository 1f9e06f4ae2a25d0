import type { GameBody, GameRow } from '@shared/games/schemas'
import type { Station } from '@shared/vocabulary'
import { calendarDay, instantOf, weekdayAndTime } from '@/composables/when'

/** A due date while it is being set: a calendar day and a time of the team's zone, each empty until it is said. */
export interface DueEntry {
  date: string
  time: string
}
export type DueEntries = Record<Station, DueEntry>

const STATIONS: readonly Station[] = ['scout', 'read', 'choose', 'teach', 'review']

const entryOf = (instant: string | null, timeZone: string): DueEntry =>
  instant === null
    ? { date: '', time: '' }
    : { date: calendarDay(instant, timeZone), time: weekdayAndTime(instant, timeZone).split(' ')[1] ?? '' }

export function entriesOf(
  { chooseBy, due }: Pick<GameRow, 'chooseBy' | 'due'>,
  timeZone: string,
): DueEntries {
  const of = (instant: string | null) => entryOf(instant, timeZone)
  return {
    scout: of(due.scout),
    read: of(due.read),
    choose: of(chooseBy),
    teach: of(due.teach),
    review: of(due.review),
  }
}

/** A day and a readable time are both said, or neither is. */
export function entryFault({ date, time }: DueEntry): string {
  if (date === '' && time === '') return ''
  if (date === '') return 'Choose the day, or take the time out.'
  return /^([01]\d|2[0-3]):[0-5]\d$/.test(time) ? '' : 'Write the time as 19:15.'
}

/** The body of a game with these dates, everything else as it stands; null while one is at fault. */
export function withDates(row: GameRow, entries: DueEntries, timeZone: string): GameBody | null {
  if (STATIONS.some((station) => entryFault(entries[station]) !== '')) return null
  const at = ({ date, time }: DueEntry) => (date === '' ? null : instantOf(date, time, timeZone))
  return {
    opponentId: row.opponentId,
    tipOff: row.tipOff,
    place: row.place,
    rulePack: row.rulePack,
    notes: row.notes,
    chooseBy: at(entries.choose),
    due: {
      scout: at(entries.scout),
      read: at(entries.read),
      teach: at(entries.teach),
      review: at(entries.review),
    },
  }
}
