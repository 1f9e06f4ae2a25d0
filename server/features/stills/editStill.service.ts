import type { DataSource, EntityManager } from 'typeorm'
import { isDeepStrictEqual } from 'node:util'
import { expiryFault } from '@shared/stills/expiry'
import { marksOf } from '@shared/stills/marks'
import { movedTo } from '@shared/stills/order'
import type { BlurBody, StillPatch } from '@shared/stills/schemas'
import type { TeamRole } from '@shared/vocabulary'
import { blurPicture } from '../../adapters/pictures'
import type { StillFiles } from '../../adapters/stillFiles'
import { Still } from '../../database/entities/Still'
import { Team } from '../../database/entities/Team'
import { fieldsChanged, recordChange } from '../../database/history'
import { BadInput, Conflict, NeedsIfMatch, StaleVersion } from '../../http/problem'
import { dayInZone } from '../../http/zone'
import { presentStill } from '../possessions/possessions.presenter'
import { seasonEndOf } from './expiry.service'
import { findStill } from './stills.service'

export interface StillEdit {
  teamId: string
  id: string
  ifMatch: number | null
  role: TeamRole
  by: string
  now: Date
}

/** The still as it is, if the edit was made on it. @throws NotFound, NeedsIfMatch, StaleVersion */
async function openFor(manager: EntityManager, { teamId, id, ifMatch }: StillEdit): Promise<Still> {
  const still = await findStill(manager, teamId, id)
  if (ifMatch === null) throw new NeedsIfMatch()
  if (ifMatch !== still.version) throw new StaleVersion(presentStill(still), still.version)
  return still
}

type Columns = Pick<Still, 'marks' | 'caption' | 't' | 'facesLeft' | 'inReport' | 'expiresOn'>

const columnsOf = (still: Still): Columns => ({
  marks: marksOf(still.marks),
  caption: still.caption,
  t: still.t,
  facesLeft: still.facesLeft,
  inReport: still.inReport,
  expiresOn: still.expiresOn,
})

/** Every still shows another club, whose consent nobody here holds: nothing with a face leaves the staff. */
function checkReport(still: Still, facesLeft: number | null): void {
  if (facesLeft === 0) return
  throw new Conflict(
    facesLeft === null
      ? 'Nobody has counted the faces on this still. Count them and blur them, then take it into the report.'
      : `${facesLeft} ${facesLeft === 1 ? 'face' : 'faces'} on this still can be made out. Blur ${facesLeft === 1 ? 'it' : 'them'} first, then take it into the report.`,
    presentStill(still),
  )
}

async function checkExpiry(manager: EntityManager, still: Still, day: string, edit: StillEdit) {
  if (day === still.expiresOn) return
  const { timeZone } = await manager.findOneByOrFail(Team, { id: edit.teamId })
  const season = await seasonEndOf(manager, edit.teamId, edit.now)
  const bounds = { season, present: still.expiresOn, today: dayInZone(edit.now, timeZone) }
  const message = expiryFault(edit.role, day, bounds)
  if (message !== null) throw new BadInput([{ field: 'expiresOn', message }])
}

/** Puts the still in its place and numbers all stills of its possession from 1. Returns its new place. */
async function move(manager: EntityManager, still: Still, place: number): Promise<number> {
  const { possessionId } = still
  const list = await manager.find(Still, {
    where: { possessionId },
    order: { position: 'ASC', createdAt: 'ASC' },
  })
  const order = movedTo(list, still.id, place)
  for (const [index, { id, position }] of order.entries())
    if (position !== index + 1) await manager.update(Still, { id }, { position: index + 1 })
  return order.findIndex(({ id }) => id === still.id) + 1
}

const record = (manager: EntityManager, { teamId, id, by, now }: StillEdit, from: object, to: object) =>
  recordChange(manager, Still, {
    teamId,
    rowId: id,
    action: 'changed',
    by,
    now,
    fields: fieldsChanged(from, to),
  })

/**
 * Changes some fields of a still. A face that is found on one in the report takes it out of the report.
 * @throws NotFound, NeedsIfMatch, StaleVersion, Conflict, BadInput
 */
export function patchStill(db: DataSource, edit: StillEdit, patch: StillPatch): Promise<Still> {
  return db.transaction(async (manager) => {
    const still = await openFor(manager, edit)
    const { position, ...fields } = patch
    const before = columnsOf(still)
    const after: Columns = { ...before, ...fields }
    if (patch.inReport === true) checkReport(still, after.facesLeft)
    if (after.facesLeft !== 0) after.inReport = false
    if (patch.expiresOn !== undefined) await checkExpiry(manager, still, patch.expiresOn, edit)
    const place = position === undefined ? still.position : await move(manager, still, position)
    if (place === still.position && isDeepStrictEqual(before, after)) return still
    const version = still.version + 1
    await manager.update(Still, { id: still.id }, { ...after, version } as never)
    await record(manager, edit, { ...before, position: still.position }, { ...after, position: place })
    return manager.create(Still, { ...still, ...after, position: place, version } as Still)
  })
}

/**
 * Burns parts of a still away, in both sizes; what was under them is nowhere kept. Under the lock, so that neither a
 * second blur nor a deletion comes between reading and writing.
 * @throws NotFound, NeedsIfMatch, StaleVersion
 */
export function blurStill(
  db: DataSource,
  files: StillFiles,
  edit: StillEdit,
  { regions, facesLeft }: BlurBody,
): Promise<Still> {
  return db.transaction(async (manager) => {
    const still = await openFor(manager, edit)
    const picture = await blurPicture(await files.read(still.teamId, still.id), regions)
    const left = still.facesLeft === null ? null : Math.max(0, still.facesLeft - regions.length)
    const columns = {
      blurred: still.blurred + regions.length,
      facesLeft: facesLeft ?? left,
      version: still.version + 1,
    }
    await manager.update(Still, { id: still.id }, columns)
    const { version: _version, ...told } = columns
    await record(manager, edit, still, told)
    // Last: if the row cannot be written, the picture is not touched.
    await files.replace(still.teamId, still.id, picture)
    return manager.create(Still, { ...still, ...columns })
  })
}
