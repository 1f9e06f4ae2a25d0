import type { DataSource } from 'typeorm'
import type { NewTeam } from '@shared/people/schemas'
import { Membership } from '../../database/entities/Membership'
import type { Team } from '../../database/entities/Team'
import { Conflict, NotAllowed } from '../../http/problem'
import { insertTeam } from './newTeam'

/** Another team of somebody who is a head coach already. @throws NotAllowed, Conflict for the same team twice */
export function addTeam(db: DataSource, team: NewTeam, personId: string, now: Date): Promise<string> {
  return db.transaction(async (manager) => {
    const mine = await manager.find(Membership, {
      where: { personId, role: 'head-coach' },
      relations: { team: true },
    })
    if (mine.length === 0) throw new NotAllowed('Only a head coach makes another team.')
    const { name, squadName, season } = team
    const same = (one: Team | undefined) =>
      one?.name === name && one.squadName === squadName && one.season === season
    if (mine.some((row) => same(row.team)))
      throw new Conflict(`You have ${name}, ${squadName} in ${season} already.`)
    return insertTeam(manager, team, personId, now)
  })
}
