import type { RulePackKey } from '@shared/court/rulePacks'
import type { TeamRole } from '@shared/vocabulary'
import { seasonOf } from './days'

export interface DemoTeam {
  key: string
  name: string
  squadName: string
  timeZone: string
  season: string
  rulePack: RulePackKey
}

export interface DemoPerson {
  key: string
  name: string
  email: string
  /** In the clear: it is printed at start; the loader hashes it. */
  password: string
  memberships: { teamKey: string; role: TeamRole; squadKey: string | null }[]
}

/** One password for every demo account. */
export const DEMO_PASSWORD = 'over-the-top'
export const DEMO_TIME_ZONE = 'Europe/London'
/** The team that the whole scenario belongs to. */
export const DEMO_TEAM_KEY = 'u17'

/** Two teams of one invented club, each with its own rules. The second has nothing in it yet. */
export function demoTeams(now: Date): DemoTeam[] {
  const season = seasonOf(now, DEMO_TIME_ZONE)
  const club = { name: 'Harrow Creek Herons', timeZone: DEMO_TIME_ZONE, season }
  return [
    { key: DEMO_TEAM_KEY, ...club, squadName: 'U17 girls', rulePack: 'fiba' },
    { key: 'u15', ...club, name: 'Harrow Creek U15', squadName: 'U15 girls', rulePack: 'nfhs84' },
  ]
}

const person = (key: string, name: string, ...memberships: DemoPerson['memberships']): DemoPerson => ({
  key,
  name,
  email: `${key}@harrowcreek.example`,
  password: DEMO_PASSWORD,
  memberships,
})

/** Who signs in. Priya is assistant in both teams; Nell's account is tied to her place in the squad. */
export const DEMO_PEOPLE: readonly DemoPerson[] = [
  person('maren', 'Maren Oduya', { teamKey: DEMO_TEAM_KEY, role: 'head-coach', squadKey: null }),
  person('tomas', 'Tomas Reinholt', { teamKey: DEMO_TEAM_KEY, role: 'assistant-coach', squadKey: null }),
  person(
    'priya',
    'Priya Lundgren',
    { teamKey: DEMO_TEAM_KEY, role: 'assistant-coach', squadKey: null },
    { teamKey: 'u15', role: 'assistant-coach', squadKey: null },
  ),
  person('nell', 'Nell Tavish', { teamKey: DEMO_TEAM_KEY, role: 'player', squadKey: 'nell' }),
  person('ines', 'Ines Calder', { teamKey: 'u15', role: 'head-coach', squadKey: null }),
]

/** What is printed at start: who to sign in as, and what that shows. */
export const DEMO_SIGN_INS: readonly { email: string; says: string }[] = [
  { email: 'maren@harrowcreek.example', says: 'head coach: picks the counter and signs off' },
  { email: 'tomas@harrowcreek.example', says: 'assistant coach: logs and reads' },
  { email: 'priya@harrowcreek.example', says: 'assistant coach in two teams' },
  { email: 'nell@harrowcreek.example', says: 'player: opens her sheet' },
  { email: 'ines@harrowcreek.example', says: 'head coach of the other team, nothing in it yet' },
]
