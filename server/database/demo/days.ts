/** The demo's calendar: days and hours of a club's own zone, counted from now. */

const parts = (instant: Date, timeZone: string): Record<string, string> =>
  Object.fromEntries(
    new Intl.DateTimeFormat('en-GB', {
      timeZone,
      hourCycle: 'h23',
      year: 'numeric',
      month: '2-digit',
      day: '2-digit',
      hour: '2-digit',
      minute: '2-digit',
    })
      .formatToParts(instant)
      .map(({ type, value }) => [type, value]),
  )

/** The calendar day, `YYYY-MM-DD`, so many days after the day that `now` is in the zone. */
export function localDay(now: Date, timeZone: string, days: number): string {
  const { year, month, day } = parts(now, timeZone)
  return new Date(Date.UTC(Number(year), Number(month) - 1, Number(day) + days)).toISOString().slice(0, 10)
}

/**
 * The instant, in UTC, at which clocks in the zone show `hour` (`HH:MM`) on that day. An hour that the
 * change to summer time skips reads as the hour after it.
 */
export function localInstant(now: Date, timeZone: string, days: number, hour: string): string {
  const wanted = Date.parse(`${localDay(now, timeZone, days)}T${hour}:00Z`)
  let guess = wanted
  // The offset at the guess may differ from the one at the answer around a clock change: twice is enough.
  for (let round = 0; round < 2; round += 1) {
    const at = parts(new Date(guess), timeZone)
    const shown = Date.parse(`${at.year}-${at.month}-${at.day}T${at.hour}:${at.minute}:00Z`)
    guess += wanted - shown
  }
  return new Date(guess).toISOString()
}

/** The season that a day belongs to, from August to July, e.g. "2025/26". */
export function seasonOf(now: Date, timeZone: string): string {
  const [year = 0, month = 1] = localDay(now, timeZone, 0).split('-').map(Number)
  const first = month >= 8 ? year : year - 1
  return `${first}/${String((first + 1) % 100).padStart(2, '0')}`
}
