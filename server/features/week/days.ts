import { dayAfter } from '../../http/zone'

/** Monday to Sunday around a calendar day. */
export function weekOf(day: string): string[] {
  const sinceMonday = (new Date(`${day}T00:00:00Z`).getUTCDay() + 6) % 7
  return Array.from({ length: 7 }, (_, index) => dayAfter(day, index - sinceMonday))
}
