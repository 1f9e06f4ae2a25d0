/** The calendar day, e.g. 2026-03-20, of an instant in an IANA zone. */
export function dayInZone(instant: Date, timeZone: string): string {
  // The Swedish locale writes ISO 8601 dates.
  return new Intl.DateTimeFormat('sv-SE', { timeZone, dateStyle: 'short' }).format(instant)
}
