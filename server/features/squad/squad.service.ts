import type { DataSource, EntityManager } from 'typeorm'
import type { SquadPlayerBody, SquadPlayerRow } from '@shared/squad/schemas'
import { SquadPlayer } from '../../database/entities/SquadPlayer'
import { Team } from '../../database/entities/Team'
import { putRow, type Put } from '../../database/putRow'
import { dayInZone } from '../../http/zone'
import { Conflict } from '../../http/problem'
import { bodyOfSquadPlayer, presentSquadPlayer } from './squad.presenter'

/** Today's calendar day where the team is. */
export async function teamDay(manager: EntityManager, teamId: string, instant: Date): Promise<string> {
  const team = await manager.getRepository(Team).findOneByOrFail({ id: teamId })
  return dayInZone(instant, team.timeZone)
}

/** The squad by shirt number; availability as of today. */
export async function listSquad(db: DataSource, teamId: string, now: Date): Promise<SquadPlayerRow[]> {
  const day = await teamDay(db.manager, teamId, now)
  const rows = await db.getRepository(SquadPlayer).find({ where: { teamId }, order: { jersey: 'ASC' } })
  return rows.map((row) => presentSquadPlayer(row, day))
}

/** @throws NotFound, Conflict (also for a number that is worn), StaleVersion */
export function putSquadPlayer(
  db: DataSource,
  options: {
    id: string
    teamId: string
    body: SquadPlayerBody
    ifMatch: number | null
    now: Date
    by: string
  },
): Promise<Put<SquadPlayer>> {
  return db.transaction(async (manager) => {
    const wearer = await manager.findOneBy(SquadPlayer, {
      teamId: options.teamId,
      jersey: options.body.jersey,
    })
    if (wearer && wearer.id !== options.id)
      throw new Conflict(
        `Number ${options.body.jersey} is worn by ${wearer.firstName}. Choose another number.`,
      )
    return putRow<SquadPlayer, SquadPlayerBody>({
      ...options,
      manager,
      entity: SquadPlayer,
      what: 'player',
      bodyOf: bodyOfSquadPlayer,
      columnsOf: (body) => body,
      present: async (row) => presentSquadPlayer(row, await teamDay(manager, options.teamId, options.now)),
    })
  })
}
