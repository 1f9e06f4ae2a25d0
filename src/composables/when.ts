/** Dates as coaches say them, in the team's own time zone. Day names and order are ours, whatever the browser speaks. */

type Form = Record<'weekday' | 'day' | 'month' | 'time', string>

const CALENDAR_DAY = /^\d{4}-\d{2}-\d{2}$/
const DAY_MS = 86_400_000

function parts(when: string, timeZone: string, month: 'long' | 'short'): Form {
  // A calendar day has no zone: it is the same day wherever it is read.
  const bare = CALENDAR_DAY.test(when)
  const format = new Intl.DateTimeFormat('en-GB', {
    timeZone: bare ? 'UTC' : timeZone,
    weekday: 'short',
    day: 'numeric',
    month,
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
  })
  const found = new Map(
    format.formatToParts(new Date(bare ? `${when}T00:00:00Z` : when)).map((part) => [part.type, part.value]),
  )
  const of = (type: Intl.DateTimeFormatPartTypes) => found.get(type) ?? ''
  return {
    weekday: of('weekday'),
    day: of('day'),
    month: of('month'),
    time: `${of('hour')}:${of('minute')}`,
  }
}

/** "Fri 20 March"; takes an instant, or a calendar day such as "2026-03-20". */
export function day(when: string, timeZone = 'UTC'): string {
  const { weekday, day: date, month } = parts(when, timeZone, 'long')
  return `${weekday} ${date} ${month}`
}

/** "Fri 20 Mar" */
export function shortDay(when: string, timeZone = 'UTC'): string {
  const { weekday, day: date, month } = parts(when, timeZone, 'short')
  return `${weekday} ${date} ${month === 'Sept' ? 'Sep' : month}`
}

/** "Fri 20 March, 19:15" */
export function dayAndTime(instant: string, timeZone: string): string {
  return `${day(instant, timeZone)}, ${parts(instant, timeZone, 'long').time}`
}

/** "Fri 19:15" */
export function weekdayAndTime(instant: string, timeZone: string): string {
  const { weekday, time } = parts(instant, timeZone, 'long')
  return `${weekday} ${time}`
}

/** The calendar day of an instant in the zone, "2026-03-20". */
export function calendarDay(instant: string | number, timeZone: string): string {
  return new Intl.DateTimeFormat('en-CA', {
    timeZone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
  }).format(new Date(instant))
}

/** Days from `now` to the instant, counted in midnights of the zone; negative when it is past. */
export function daysUntil(instant: string, timeZone: string, now: number): number {
  const midnight = (when: string | number) => Date.parse(`${calendarDay(when, timeZone)}T00:00:00Z`)
  return Math.round((midnight(instant) - midnight(now)) / DAY_MS)
}

/** "in 3 days", "tomorrow", "today", "yesterday", "3 days ago" */
export function inDays(instant: string, timeZone: string, now: number): string {
  const days = daysUntil(instant, timeZone, now)
  if (days === 0) return 'today'
  if (days === 1) return 'tomorrow'
  if (days === -1) return 'yesterday'
  return days > 0 ? `in ${days} days` : `${-days} days ago`
}

const PLACES = { home: 'at home', away: 'away', neutral: 'on neutral floor' } as const

/** How a game's place is said: "at home", "away", "on neutral floor". */
export function placeWord(place: keyof typeof PLACES): string {
  return PLACES[place]
}

/**
 * The instant of a wall-clock time in a zone. A time that the clocks skip moves on with them; one that comes twice is
 * the first.
 * @param date calendar day, "2026-03-20"
 * @param time "19:15"
 */
export function instantOf(date: string, time: string, timeZone: string): string {
  const wanted = Date.parse(`${date}T${time}:00Z`)
  // Off by the zone's offset at first; a second look lands on the right side of a change of clocks.
  const first = wanted - offsetAt(wanted, timeZone)
  return new Date(wanted - offsetAt(first, timeZone)).toISOString()
}

/** Milliseconds that the zone's wall clock is ahead of UTC at an instant. */
function offsetAt(instant: number, timeZone: string): number {
  const found = new Map(
    new Intl.DateTimeFormat('en-CA', {
      timeZone,
      year: 'numeric',
      month: '2-digit',
      day: '2-digit',
      hour: '2-digit',
      minute: '2-digit',
      second: '2-digit',
      hourCycle: 'h23',
    })
      .formatToParts(instant)
      .map((part) => [part.type, part.value]),
  )
  const of = (type: Intl.DateTimeFormatPartTypes) => found.get(type) ?? '00'
  const wall = Date.parse(
    `${of('year')}-${of('month')}-${of('day')}T${of('hour')}:${of('minute')}:${of('second')}Z`,
  )
  return wall - Math.floor(instant / 1000) * 1000
}
