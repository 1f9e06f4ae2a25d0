import { createHash, randomUUID } from 'node:crypto'
import type { EntityManager } from 'typeorm'
import { preparePicture } from '../../adapters/pictures'
import type { StillFiles } from '../../adapters/stillFiles'
import { seasonEnd } from '@shared/stills/expiry'
import { dayInZone } from '../../http/zone'
import { Still } from '../entities/Still'
import { Team } from '../entities/Team'
import { DEMO_STILLS, renderStill } from './stills'
import { marksOn } from './stills/marks'

/** Draws the demo's stills and keeps them as if a scout had sent them. */
export async function loadDemoStills(
  manager: EntityManager,
  files: StillFiles,
  now: Date,
  idOf: (possessionKey: string) => string,
  teamId: string,
): Promise<void> {
  const positions = new Map<string, number>()
  const { season, timeZone } = await manager.findOneByOrFail(Team, { id: teamId })
  const expiresOn = seasonEnd(season, dayInZone(now, timeZone))
  for (const { possessionKey, t, caption, spec } of DEMO_STILLS) {
    const drawn = await renderStill(spec)
    const picture = await preparePicture(drawn)
    const id = randomUUID()
    const position = (positions.get(possessionKey) ?? 0) + 1
    positions.set(possessionKey, position)
    await files.keep(teamId, id, picture)
    await manager.insert(Still, {
      id,
      teamId,
      possessionId: idOf(possessionKey),
      position,
      t,
      caption,
      marks: marksOn(spec),
      blurred: 0,
      // Drawn figures have no faces.
      facesLeft: 0,
      inReport: spec.pass !== null,
      expiresOn,
      version: 1,
      width: picture.width,
      height: picture.height,
      digest: createHash('sha256').update(drawn).digest('hex'),
      createdAt: now.toISOString(),
    })
  }
}
