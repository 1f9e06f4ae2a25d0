/** Clock and margin as they are said and as they are typed. Clock: tenths of a second left in the period. */

/** "5:20"; with tenths under a minute when there are any: "0:48.3". */
export function clockWords(tenths: number): string {
  const seconds = Math.floor(tenths / 10)
  const whole = `${Math.floor(seconds / 60)}:${String(seconds % 60).padStart(2, '0')}`
  return seconds < 60 && tenths % 10 !== 0 ? `${whole}.${tenths % 10}` : whole
}

/**
 * Reads "5:20", "5.20", "520", "48.3" (under a minute, with tenths) or "48" as tenths of a second.
 * Null when it is no time on a clock of the given length, minutes.
 */
export function readClock(text: string, longest = 20): number | null {
  const said = text.trim()
  const digits = /^\d{3,4}$/.exec(said)
  const parts =
    digits === null
      ? (/^(?:(\d{1,2})[:.' ])?(\d{2})(?:\.(\d))?$/.exec(said) ?? /^()(\d{1,2})(?:\.(\d))?$/.exec(said))
      : [said, said.slice(0, -2), said.slice(-2), undefined]
  if (parts === null) return null
  const [minutes, seconds, tenths] = [parts[1], parts[2], parts[3]].map((part) => Number(part || 0))
  if (minutes === undefined || seconds === undefined || tenths === undefined) return null
  if (seconds > 59) return null
  const all = (minutes * 60 + seconds) * 10 + tenths
  return all <= longest * 600 ? all : null
}

/** "they lead by 2", "level", "they trail by 2": the pressing team's score minus the other's. */
export function marginWords(margin: number): string {
  if (margin === 0) return 'level'
  return `they ${margin > 0 ? 'lead' : 'trail'} by ${Math.abs(margin)}`
}

/** Reads "-2", "+3", "3", "down 2", "up 3", "level". Null when it is none of these or past 99. */
export function readMargin(text: string): number | null {
  const said = text.trim().toLowerCase()
  if (said === 'level') return 0
  const parts = /^(?:(up|\+|down|-|−)\s*)?(\d{1,2})$/.exec(said)
  if (parts === null) return null
  const points = Number(parts[2])
  if (points === 0) return 0
  return parts[1] !== undefined && ['down', '-', '−'].includes(parts[1]) ? -points : points
}

/** "1.8 s" */
export const secondsWords = (seconds: number): string => `${seconds.toFixed(1)} s`

/** Reads "1.8", "1,8", "1.8 s" as seconds to a tenth; null when it is no number or past the limit. */
export function readSeconds(text: string, most: number): number | null {
  const parts = /^(\d{1,3}(?:[.,]\d+)?)\s*s?$/.exec(text.trim())
  if (parts?.[1] === undefined) return null
  const seconds = Math.round(Number(parts[1].replace(',', '.')) * 10) / 10
  return seconds <= most ? seconds : null
}
