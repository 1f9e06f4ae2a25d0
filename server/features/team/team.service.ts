import { isDeepStrictEqual } from 'node:util'
import type { DataSource, EntityManager } from 'typeorm'
import { ownCourtFaults } from '@shared/court/ownCourt'
import { rulePack } from '@shared/court/rulePacks'
import { FIGURE_KEYS, figureOf } from '@shared/team/figures'
import { settingsOf, type TeamBody } from '@shared/team/settings'
import { Team } from '../../database/entities/Team'
import { fieldsChanged, recordChange } from '../../database/history'
import type { EngineSettings } from '../../engine/settings'
import { ENGINE_DEFAULTS } from '../../engine/settings'
import { BadInput, NeedsIfMatch, StaleVersion } from '../../http/problem'
import { bodyOfTeam, presentTeam } from './team.presenter'

export const getTeam = (manager: EntityManager, teamId: string): Promise<Team> =>
  manager.getRepository(Team).findOneByOrFail({ id: teamId })

/** Changes the team and its settings. @throws NeedsIfMatch, StaleVersion, BadInput for a court that does not fit together */
export function putTeam(
  db: DataSource,
  {
    teamId,
    body,
    ifMatch,
    by,
    now,
  }: { teamId: string; body: TeamBody; ifMatch: number | null; by: string; now: Date },
): Promise<Team> {
  return db.transaction(async (manager) => {
    const row = await getTeam(manager, teamId)
    if (ifMatch === null) throw new NeedsIfMatch()
    if (ifMatch !== row.version) throw new StaleVersion(presentTeam(row), row.version)
    const { ownCourt } = body.settings
    const faults = ownCourt === null ? [] : ownCourtFaults(rulePack(body.rulePack), ownCourt)
    if (faults.length > 0)
      throw new BadInput(
        faults.map(({ field, message }) => ({ field: `settings.ownCourt.${field}`, message })),
      )
    const before = bodyOfTeam(row)
    if (isDeepStrictEqual(before, body)) return row
    Object.assign(row, body, { version: row.version + 1 })
    await manager.update(
      Team,
      { id: teamId },
      { ...body, settings: body.settings as never, version: row.version },
    )
    const fields = fieldsChanged(before, body)
    await recordChange(manager, Team, { teamId, rowId: teamId, action: 'changed', by, now, fields })
    return row
  })
}

/** The engine's figures as a team has them. */
export async function engineSettings(manager: EntityManager, teamId: string): Promise<EngineSettings> {
  const { figures } = settingsOf((await getTeam(manager, teamId)).settings)
  const set = Object.fromEntries(FIGURE_KEYS.map((key) => [key, figureOf(figures, key)])) as Record<
    (typeof FIGURE_KEYS)[number],
    number
  >
  return {
    ...ENGINE_DEFAULTS,
    halfLifeGames: set.halfLifeGames,
    icc: set.icc,
    strengths: { light: set.light, medium: set.medium, strong: set.strong },
    basePrior: { rate: set.baseRate / 10, trips: set.baseTrips },
    priorTrips: set.priorTrips,
    recordWeights: { sameShape: 1, otherShape: set.otherShape, practice: set.practice },
    leastLiveReps: set.leastLiveReps,
  }
}
