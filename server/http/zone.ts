/** The calendar day, e.g. 2026-03-20, of an instant in an IANA zone. */
export function dayInZone(instant: Date, timeZone: string): string {
  // The Swedish locale writes ISO 8601 dates.
  return new Intl.DateTimeFormat('sv-SE', { timeZone, dateStyle: 'short' }).format(instant)
}

const DAY_MS = 86_400_000

/** The calendar day so many days after another. */
export const dayAfter = (day: string, days: number): string =>
  new Date(Date.parse(`${day}T00:00:00Z`) + days * DAY_MS).toISOString().slice(0, 10)

/** The first instant of a calendar day in an IANA zone; a day without midnight begins when its clocks begin. */
export function startOfDay(day: string, timeZone: string): Date {
  const midnight = Date.parse(`${day}T00:00:00Z`)
  // No zone is further off than 14 hours; zones stand on quarters of an hour.
  for (let at = midnight - 14 * 3_600_000; at <= midnight + 14 * 3_600_000; at += 900_000)
    if (dayInZone(new Date(at), timeZone) === day) return new Date(at)
  return new Date(midnight)
}
