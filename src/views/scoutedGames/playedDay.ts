/** The day a game was played, as it is typed. Days are calendar days, "2026-03-14". */

const MONTHS = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec']
const DAY_MS = 86_400_000

/** The calendar day some days before another one. */
export function daysBefore(today: string, days: number): string {
  return new Date(Date.parse(`${today}T00:00:00Z`) - days * DAY_MS).toISOString().slice(0, 10)
}

/**
 * Reads "2026-03-14", "14 March", "Sat 14 Mar 2026", "14.3." or "14/3/26", day before month. Without a year it is the
 * latest such day that is not after today. Null when it is no day.
 */
export function readDay(text: string, today: string): string | null {
  const said = text.trim().toLowerCase()
  const iso = /^(\d{4})-(\d{1,2})-(\d{1,2})$/.exec(said)
  if (iso !== null) return dayOf(Number(iso[1]), Number(iso[2]), Number(iso[3]))
  const words = /^(?:[a-z]{2,9},?\s+)?(\d{1,2})\.?\s+([a-z]{3,9})\.?(?:\s+(\d{2,4}))?$/.exec(said)
  const numbers = /^(\d{1,2})[./-](\d{1,2})[./-]?(\d{2,4})?$/.exec(said)
  const parts = words ?? numbers
  if (parts === null) return null
  const month = words === null ? Number(parts[2]) : MONTHS.indexOf((parts[2] ?? '').slice(0, 3)) + 1
  if (month < 1) return null
  const day = Number(parts[1])
  if (parts[3] !== undefined) return dayOf(Number(parts[3]) + (parts[3].length === 2 ? 2000 : 0), month, day)
  const year = Number(today.slice(0, 4))
  const thisYear = dayOf(year, month, day)
  if (thisYear !== null && thisYear <= today) return thisYear
  return dayOf(year - 1, month, day)
}

function dayOf(year: number, month: number, day: number): string | null {
  const date = new Date(Date.UTC(year, month - 1, day))
  const same = date.getUTCFullYear() === year && date.getUTCMonth() === month - 1 && date.getUTCDate() === day
  return same && year >= 1900 && year < 10_000 ? date.toISOString().slice(0, 10) : null
}
