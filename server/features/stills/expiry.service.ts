import { IsNull, LessThan, type DataSource, type EntityManager } from 'typeorm'
import { seasonEnd } from '@shared/stills/expiry'
import type { StillFiles } from '../../adapters/stillFiles'
import { Still } from '../../database/entities/Still'
import { Team } from '../../database/entities/Team'
import { eachAlone } from '../../database/eachAlone'
import { forgetHistory } from '../../database/history'
import { dayInZone } from '../../http/zone'

/** The day until which a team's stills are kept unless somebody says another. */
export async function seasonEndOf(manager: EntityManager, teamId: string, now: Date): Promise<string> {
  const { season, timeZone } = await manager.findOneByOrFail(Team, { id: teamId })
  return seasonEnd(season, dayInZone(now, timeZone))
}

/**
 * Deletes every still whose last day is over where its team is, row and files, files first; gives one without a day
 * its season's end. A still that a restore brought back goes the same way. Returns how many went.
 */
export async function expireStills(db: DataSource, files: StillFiles, now: Date): Promise<number> {
  let gone = 0
  await eachAlone(await db.manager.find(Team), async ({ id: teamId, season, timeZone }) => {
    const today = dayInZone(now, timeZone)
    await db.manager.update(Still, { teamId, expiresOn: IsNull() }, { expiresOn: seasonEnd(season, today) })
    const over = { teamId, expiresOn: LessThan(today) }
    const stills = await db.manager.find(Still, { where: over, select: { id: true } })
    await eachAlone(stills, ({ id }) =>
      db.transaction(async (manager) => {
        // Asked again under the lock: its day may just have been moved.
        if (!(await manager.existsBy(Still, { ...over, id }))) return
        await files.remove(teamId, id)
        await manager.delete(Still, { id })
        await forgetHistory(manager, [id])
        gone += 1
      }),
    )
  })
  return gone
}
