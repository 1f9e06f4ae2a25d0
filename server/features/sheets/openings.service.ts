import { randomUUID } from 'node:crypto'
import { In, type EntityManager } from 'typeorm'
import type { OpeningRow } from '@shared/sheets/handOut'
import { Membership } from '../../database/entities/Membership'
import { Opening } from '../../database/entities/Opening'
import { findSheet } from './findSheet'

/** Notes that a person opened a sheet: the first time stays, the last one moves. One row a person. */
export async function noteOpening(
  manager: EntityManager,
  opening: { teamId: string; sheetId: string; personId: string; now: Date },
): Promise<void> {
  const { now, ...who } = opening
  const at = now.toISOString()
  await manager
    .createQueryBuilder()
    .insert()
    .into(Opening)
    .values({ id: randomUUID(), ...who, firstAt: at, lastAt: at })
    .orUpdate(['lastAt'], ['sheetId', 'personId'])
    .execute()
}

/** Who has opened a sheet, the first to do so first; somebody who left the team is not among them. @throws NotFound */
export async function listOpenings(
  manager: EntityManager,
  teamId: string,
  sheetId: string,
): Promise<OpeningRow[]> {
  await findSheet(manager, teamId, sheetId)
  const rows = await manager
    .getRepository(Opening)
    .find({ where: { sheetId }, relations: { person: true }, order: { firstAt: 'ASC' } })
  const members = await manager
    .getRepository(Membership)
    .findBy({ teamId, personId: In(rows.map(({ personId }) => personId)) })
  const memberOf = new Map(members.map((member) => [member.personId, member]))
  return rows.flatMap(({ personId, person, firstAt, lastAt }) => {
    const member = memberOf.get(personId)
    return member && person
      ? [
          {
            personId,
            name: person.name,
            role: member.role,
            squadPlayerId: member.squadPlayerId,
            firstAt,
            lastAt,
          },
        ]
      : []
  })
}
