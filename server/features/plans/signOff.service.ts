import type { DataSource } from 'typeorm'
import type { SignOffBody } from '@shared/plans/schemas'
import { Plan } from '../../database/entities/Plan'
import { Sheet } from '../../database/entities/Sheet'
import { BadInput, Conflict, NeedsIfMatch, NotFound, StaleVersion } from '../../http/problem'
import { freezePlan } from './freeze'
import { planState } from './plans.service'
import { presentPlan } from './plans.presenter'

interface SignOff {
  teamId: string
  gameId: string
  personId: string
  body: SignOffBody
  ifMatch: number | null
  now: Date
}

/**
 * Freezes the open version of a plan and makes its sheet. The same request again changes nothing.
 * @throws NotFound, NeedsIfMatch, StaleVersion, Conflict, BadInput without a first call
 */
export function signOff(
  db: DataSource,
  { teamId, gameId, personId, body, ifMatch, now }: SignOff,
): Promise<void> {
  return db.transaction(async (manager) => {
    const { newest, versions } = await planState(manager, teamId, gameId)
    const asked = versions.find((version) => version.id === body.planId)
    if (!newest || !asked) throw new NotFound('plan')
    if (asked.signedAt !== null) {
      // A repeat may come late, when a newer version is open already.
      const sheet = await manager.getRepository(Sheet).findOneBy({ planId: asked.id })
      if (sheet?.id === body.sheetId) return
      throw new Conflict(`Version ${asked.number} is signed off already.`, presentPlan(newest))
    }
    if (ifMatch === null) throw new NeedsIfMatch()
    if (ifMatch !== newest.version) throw new StaleVersion(presentPlan(newest), newest.version)
    const { firstCallId } = newest
    if (firstCallId === null)
      throw new BadInput([{ field: 'firstCallId', message: 'Pick a first call before you sign off.' }])
    const taken = await manager.getRepository(Sheet).findOneBy({ id: body.sheetId })
    if (taken && taken.teamId !== teamId) throw new NotFound('sheet')
    if (taken) throw new Conflict('Another sheet has this id already. Use a new one.')
    const stamp = now.toISOString()
    const frozen = await freezePlan(manager, Object.assign(newest, { firstCallId }))
    await manager
      .getRepository(Plan)
      .update(
        { id: newest.id },
        { frozen, signedAt: stamp, signedById: personId, updatedAt: stamp, version: newest.version + 1 },
      )
    await manager
      .getRepository(Sheet)
      .insert({ id: body.sheetId, teamId, planId: newest.id, createdAt: stamp })
  })
}
