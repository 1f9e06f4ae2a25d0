import type { SquadPlayerBody, SquadPlayerRow } from '@shared/squad/schemas'
import type { SquadPlayer } from '../../database/entities/SquadPlayer'
import { metaOf } from '../../http/present'

export const bodyOfSquadPlayer = (row: SquadPlayer): SquadPlayerBody => ({
  jersey: row.jersey,
  firstName: row.firstName,
  lastName: row.lastName,
  skills: row.skills,
  outUntil: row.outUntil,
  guardianEmail: row.guardianEmail,
  pictureConsent: row.pictureConsent,
  sprint20: row.sprint20,
})

/** `day` is the calendar day asked about, in the team's zone: out through `outUntil`, back the day after. */
const isAvailable = (row: Pick<SquadPlayer, 'outUntil'>, day: string): boolean =>
  row.outUntil === null || row.outUntil < day

export const presentSquadPlayer = (row: SquadPlayer, day: string): SquadPlayerRow => ({
  ...metaOf(row),
  ...bodyOfSquadPlayer(row),
  available: isAvailable(row, day),
})
