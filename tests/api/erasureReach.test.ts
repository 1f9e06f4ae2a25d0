import { randomUUID } from 'node:crypto'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { Invitation } from '@server/database/entities/Invitation'
import { Mail } from '@server/database/entities/Mail'
import { Membership } from '@server/database/entities/Membership'
import { Person } from '@server/database/entities/Person'
import { SquadPlayer } from '@server/database/entities/SquadPlayer'
import { eraseDue } from '@server/features/people/erasures.service'
import { seedBook, seedSquad, teamUrl } from '../support/fixture'
import { freshSheet } from '../support/handOut'
import { PLAYER, startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let head: Agent
beforeEach(async () => {
  test = await startTestApp()
  head = await test.as('head')
})
afterEach(() => test.stop())

const manager = () => test.context.db.manager
const tonight = new Date('2026-03-18T00:00:00Z')
const set = (kind: 'member' | 'squad-player', subjectId: string) =>
  head
    .put(teamUrl(`/erasures/${randomUUID()}`))
    .send({ kind, subjectId })
    .expect(201)
const lettersTo = (recipient: string) => manager().countBy(Mail, { recipient })

describe('an erasure reaches', () => {
  it('letters that went to addresses she had before', async () => {
    const { counters } = await seedBook(test)
    await seedSquad(head)
    const her = await manager().findOneByOrFail(SquadPlayer, { teamId: TEAM, firstName: 'P6' })
    await manager().update(SquadPlayer, { id: her.id }, { guardianEmail: 'before@home.example' })
    const sheet = await freshSheet(head, counters)
    await head.post(teamUrl(`/sheets/${sheet}/letters`)).send({ players: [her.id] })
    await manager().update(Mail, { aboutId: sheet }, { state: 'sent' })
    await head.post(teamUrl(`/sheets/${sheet}/recall`)).expect(200)
    expect(await lettersTo('before@home.example')).toBe(2)
    await manager().update(SquadPlayer, { id: her.id }, { guardianEmail: 'after@home.example' })
    await set('squad-player', her.id)
    await eraseDue(test.context.db, tonight)
    expect(await lettersTo('before@home.example')).toBe(0)
  })

  it('somebody who left the team before midnight, account and all', async () => {
    const member = await manager().findOneByOrFail(Membership, { teamId: TEAM, squadPlayerId: PLAYER })
    await set('member', member.personId)
    await head.delete(teamUrl(`/members/${member.id}`)).expect(204)
    await eraseDue(test.context.db, tonight)
    expect(await manager().existsBy(Person, { id: member.personId })).toBe(false)
  })

  it('nothing of her sister’s, who has the same guardian with an account of one’s own', async () => {
    await seedSquad(head)
    const sister = await manager().findOneByOrFail(SquadPlayer, { teamId: TEAM, firstName: 'P6' })
    await manager().update(SquadPlayer, { id: sister.id }, { guardianEmail: 'player@club.example' })
    const invitation = randomUUID()
    await head
      .put(teamUrl(`/invitations/${invitation}`))
      .send({ role: 'player', squadPlayerId: sister.id, way: 'mail', days: 7 })
      .expect(201)
    await set('squad-player', PLAYER)
    await eraseDue(test.context.db, tonight)
    expect(await manager().existsBy(Invitation, { id: invitation })).toBe(true)
    expect(await lettersTo('player@club.example')).toBe(1)
  })
})
