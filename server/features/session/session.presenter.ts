import type { Session, SessionTeam } from '@shared/session/schemas'
import type { Membership } from '../../database/entities/Membership'
import type { Team } from '../../database/entities/Team'
import { actionsOf } from '../../http/policy'

/** First letters of the first and last word, e.g. "MO". */
export function initialsOf(name: string): string {
  const words = name.trim().split(/\s+/)
  const letters = words.length > 1 ? [words[0], words[words.length - 1]] : [words[0]]
  return letters.map((word) => (word ?? '').charAt(0).toUpperCase()).join('')
}

const presentTeam = (membership: Membership & { team: Team }): SessionTeam => ({
  id: membership.team.id,
  name: membership.team.name,
  squadName: membership.team.squadName,
  timeZone: membership.team.timeZone,
  season: membership.team.season,
  rulePack: membership.team.rulePack,
  role: membership.role,
  can: [...actionsOf(membership.role)],
  squadPlayerId: membership.squadPlayerId,
})

/** Who is signed in and what they may do, team by team. */
export function presentSession(person: { id: string; name: string }, memberships: Membership[]): Session {
  return {
    person: { id: person.id, name: person.name, initials: initialsOf(person.name) },
    teams: memberships
      .filter((membership): membership is Membership & { team: Team } => membership.team != null)
      .map(presentTeam)
      .sort((a, b) => a.name.localeCompare(b.name) || a.squadName.localeCompare(b.squadName)),
  }
}
