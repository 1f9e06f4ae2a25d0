import type { Account } from '@shared/session/account'
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

const hasTeam = (membership: Membership): membership is Membership & { team: Team } => membership.team != null

const byName = (a: { name: string; squadName: string }, b: { name: string; squadName: string }): number =>
  a.name.localeCompare(b.name) || a.squadName.localeCompare(b.squadName)

/** What a person may see and change of their own account. */
export const presentAccount = (
  { name, email }: { name: string; email: string },
  memberships: Membership[],
): Account => ({
  name,
  email,
  teams: memberships
    .filter(hasTeam)
    .map(({ team, role, mail }) => ({ id: team.id, name: team.name, squadName: team.squadName, role, mail }))
    .sort(byName),
})

/** Who is signed in and what they may do, team by team. */
export function presentSession(person: { id: string; name: string }, memberships: Membership[]): Session {
  return {
    person: { id: person.id, name: person.name, initials: initialsOf(person.name) },
    teams: memberships.filter(hasTeam).map(presentTeam).sort(byName),
  }
}
