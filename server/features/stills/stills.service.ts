import { createHash } from 'node:crypto'
import { IsNull, type DataSource, type EntityManager } from 'typeorm'
import { LIMITS } from '@shared/limits'
import type { StillFields } from '@shared/stills/schemas'
import { PictureRefused, preparePicture } from '../../adapters/pictures'
import type { StillFiles } from '../../adapters/stillFiles'
import { Possession } from '../../database/entities/Possession'
import { Still } from '../../database/entities/Still'
import { findInTeam } from '../../database/findInTeam'
import { forgetHistory, recordChange } from '../../database/history'
import { BadInput, Conflict, NotFound } from '../../http/problem'
import { getPossession } from '../possessions/possessions.service'
import { seasonEndOf } from './expiry.service'

interface Upload {
  teamId: string
  possessionId: string
  stillId: string
  fields: StillFields
  bytes: Buffer
  now: Date
  /** Whoever sends it. */
  by: string
}

const REFUSALS: Record<PictureRefused['why'], string> = {
  'not-an-image': 'This is not a picture that can be read. Send a JPEG, PNG or WebP.',
  'too-many-pixels': 'This picture has too many pixels to be unpacked. Send a smaller one.',
}

async function prepare(bytes: Buffer) {
  try {
    return await preparePicture(bytes)
  } catch (error) {
    if (error instanceof PictureRefused)
      throw new BadInput([{ field: 'still', message: REFUSALS[error.why] }])
    throw error
  }
}

/**
 * Keeps a still of a possession. The same picture under the same id again changes nothing; another one
 * is a conflict, for a picture is replaced by a new one, never in place.
 * @throws NotFound, BadInput, Conflict
 */
export async function putStill(
  db: DataSource,
  files: StillFiles,
  upload: Upload,
): Promise<{ still: Still; created: boolean }> {
  const { teamId, possessionId, stillId, fields, now, by } = upload
  const digest = createHash('sha256').update(upload.bytes).digest('hex')
  await getPossession(db.manager, teamId, possessionId)
  const there = await same(db.manager, upload, digest)
  if (there) return { still: there, created: false }
  await checkRoom(db.manager, possessionId)
  const picture = await prepare(upload.bytes)
  let kept = false
  try {
    // Asked again, for meanwhile another request may have had its turn. Row first, then the files, before
    // anybody else's: so the files under an id are always those of its row.
    return await db.transaction(async (manager) => {
      const { stills } = await getPossession(manager, teamId, possessionId)
      const winner = await same(manager, upload, digest)
      if (winner) return { still: winner, created: false }
      await checkRoom(manager, possessionId)
      const columns = {
        id: stillId,
        teamId,
        possessionId,
        position: Math.max(0, ...stills.map((other) => other.position)) + 1,
        t: fields.t,
        caption: fields.caption,
        width: picture.width,
        height: picture.height,
        digest,
        blurred: 0,
        facesLeft: null,
        inReport: false,
        expiresOn: await seasonEndOf(manager, teamId, now),
        version: 1,
        createdAt: now.toISOString(),
      }
      await manager.insert(Still, columns)
      await recordChange(manager, Still, { teamId, rowId: stillId, action: 'made', by, now })
      await files.keep(teamId, stillId, picture)
      kept = true
      return { still: manager.create(Still, columns), created: true }
    })
  } catch (error) {
    if (kept) await files.remove(teamId, stillId)
    throw error
  }
}

/** The still of this id when it is the same one; null when the id is new. */
async function same(
  manager: EntityManager,
  { teamId, possessionId, stillId, fields }: Upload,
  digest: string,
): Promise<Still | null> {
  const found = await manager.findOneBy(Still, { id: stillId })
  if (!found) return null
  if (found.teamId !== teamId) throw new NotFound('still')
  if (
    found.possessionId === possessionId &&
    found.digest === digest &&
    // Once it was worked on, its words are no longer those it was sent with.
    (found.version > 1 || (found.caption === fields.caption && found.t === fields.t))
  )
    return found
  throw new Conflict('Another picture has this id already. Send this one under a new id.')
}

async function checkRoom(manager: EntityManager, possessionId: string): Promise<void> {
  if ((await manager.countBy(Still, { possessionId })) >= LIMITS.stillsAPossession)
    throw new Conflict(
      `A possession holds ${LIMITS.stillsAPossession} stills and these are there. Delete one first.`,
    )
}

/**
 * Row, history and files go at once; a picture of minors is not kept for an undo. Files first, as in a purge: if that
 * fails, the row is still there to try again from. In one transaction, so that a still sent anew under the
 * same id waits and does not lose its files.
 * @throws NotFound
 */
export function deleteStill(
  db: DataSource,
  files: StillFiles,
  which: { teamId: string; possessionId: string; stillId: string },
): Promise<void> {
  return db.transaction(async (manager) => {
    const still = await findInTeam(manager, Still, which.teamId, which.stillId, 'still')
    if (still.possessionId !== which.possessionId) throw new NotFound('still')
    await files.remove(still.teamId, still.id)
    await manager.delete(Still, { id: still.id })
    await forgetHistory(manager, [still.id])
  })
}

/** The still of an id, for serving its file. @throws NotFound, also when its possession was deleted */
export async function findStill(manager: EntityManager, teamId: string, id: string): Promise<Still> {
  const still = await findInTeam(manager, Still, teamId, id, 'still')
  const there = await manager.existsBy(Possession, { id: still.possessionId, deletedAt: IsNull() })
  if (!there) throw new NotFound('still')
  return still
}
