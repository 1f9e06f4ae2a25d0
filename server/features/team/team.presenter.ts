import { settingsOf, type TeamBody, type TeamRow } from '@shared/team/settings'
import type { Team } from '../../database/entities/Team'

/** The stored row as the body that would have made it. */
export const bodyOfTeam = (row: Team): TeamBody => ({
  name: row.name,
  squadName: row.squadName,
  timeZone: row.timeZone,
  season: row.season,
  rulePack: row.rulePack,
  settings: settingsOf(row.settings),
})

export const presentTeam = (row: Team): TeamRow => ({ id: row.id, version: row.version, ...bodyOfTeam(row) })
