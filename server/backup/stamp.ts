/** The names of backup folders: an instant in UTC that every file system takes, e.g. 2026-03-17T094200Z. */
const STAMP = /^(\d{4}-\d{2}-\d{2}T)(\d{2})(\d{2})(\d{2})Z$/

/** An instant as a name, to the second. */
export const stampOf = (instant: Date): string => instant.toISOString().replace(/:|\.\d+/g, '')

/** The instant behind a name, or null for any other name. */
export function instantOf(stamp: string): Date | null {
  const [, day, hour, minute, second] = STAMP.exec(stamp) ?? []
  const instant = new Date(`${day ?? ''}${hour ?? ''}:${minute ?? ''}:${second ?? ''}Z`)
  return Number.isNaN(instant.getTime()) ? null : instant
}
