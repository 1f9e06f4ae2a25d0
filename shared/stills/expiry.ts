import type { TeamRole } from '../vocabulary'

/** Stills go when the season does: at the end of this day, as month and day. */
const LAST_DAY = '06-30'

const full = (text: string): number => (text.length === 2 ? 2000 + Number(text) : Number(text))

/** The year in which a season ends; null where the words do not say. Takes 2026-27, 26/27, 2026 to 2027, 2027. */
function endYear(season: string): number | null {
  const [first, second] = season.match(/(?<!\d)(?:\d{4}|\d{2})(?!\d)/g) ?? []
  if (first === undefined) return null
  if (second === undefined) return first.length === 4 ? full(first) : null
  const [from, to] = [full(first), full(second)]
  return to === from || to === from + 1 ? to : null
}

/**
 * The last day on which pictures of a season are kept: 30 June of the year in which it ends. Where the season's name
 * tells no year, or that day is over, the next 30 June.
 * @param today calendar day in the team's zone
 */
export function seasonEnd(season: string, today: string): string {
  const year = endYear(season)
  const named = year === null ? '' : `${year}-${LAST_DAY}`
  if (named >= today) return named
  const thisYear = `${today.slice(0, 4)}-${LAST_DAY}`
  return thisYear >= today ? thisYear : `${Number(today.slice(0, 4)) + 1}-${LAST_DAY}`
}

/** The same calendar day a year on. */
const yearAfter = (day: string): string => `${Number(day.slice(0, 4)) + 1}${day.slice(4)}`

export interface ExpiryBounds {
  /** The season's end. */
  season: string
  /** The day that the still has now; null where it has none yet. */
  present: string | null
  today: string
}

/**
 * The last day that a role may let a still be kept until. Everybody on the staff may shorten it, and go back to
 * the season's end; past that, up to one year, only the head coach.
 */
export function latestDay(role: TeamRole, { season, present }: ExpiryBounds): string {
  if (role === 'head-coach') return yearAfter(season)
  return present !== null && present > season ? present : season
}

/** Why a role may not let a still go on a day, in words; null when it may. */
export function expiryFault(role: TeamRole, day: string, bounds: ExpiryBounds): string | null {
  if (day < bounds.today) return 'This day is over. Choose today or a later day, or delete the still.'
  const latest = latestDay(role, bounds)
  if (day <= latest) return null
  return role === 'head-coach'
    ? `A still is kept for one year past the season at most. Choose ${latest} or an earlier day.`
    : `Only the head coach keeps a still past the season. Choose ${latest} or an earlier day.`
}
