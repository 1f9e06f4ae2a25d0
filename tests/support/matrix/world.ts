import { randomUUID } from 'node:crypto'
import { Mail } from '@server/database/entities/Mail'
import { Membership } from '@server/database/entities/Membership'
import { Person } from '@server/database/entities/Person'
import { SquadPlayer } from '@server/database/entities/SquadPlayer'
import type { TeamRole } from '@shared/vocabulary'
import { makeFixture, teamUrl, type Fixture } from '../fixture'
import { TEAM, type TestApp } from '../testApp'

/** One of everything in a team, and what only the matrix asks about. */
export interface World extends Fixture {
  /** Two letters that wait. */
  again: string
  withdraw: string
  /** Somebody's membership, and another's who is to be taken out. */
  member: string
  leaver: string
  invitation: string
  erasure: string
  /** Whom the erasure is about. */
  leaving: string
  headCoach: string
  /** The person of each role; of the other team only its head coach is asked for. */
  people: Partial<Record<TeamRole, string>>
}

export const invitation = { role: 'assistant-coach', way: 'link' }

/** Fills a team, up to a signed sheet whose game is with its assistant coach. */
export async function makeWorld(test: TestApp, teamId = TEAM): Promise<World> {
  const fixture = await makeFixture(test, teamId)
  const own = teamId === TEAM
  const { manager } = test.context.db
  const letters = { again: randomUUID(), withdraw: randomUUID() }
  for (const id of Object.values(letters))
    await manager.insert(Mail, {
      id,
      teamId,
      kind: 'invitation',
      onceKey: id,
      recipient: 'someone@club.example',
      subject: 'Join us',
      text: 'Join us',
      html: '<p>Join us</p>',
      state: 'failed',
      createdAt: test.context.clock().toISOString(),
    })
  const personOf = async (who: string) => (await manager.findOneByOrFail(Person, { name: `Test ${who}` })).id
  const membershipOf = async (personId: string) =>
    (await manager.findOneByOrFail(Membership, { personId, teamId })).id
  const headCoach = await personOf(own ? 'head' : 'otherHead')
  const assistant = await personOf('assistant')
  const { id: leaving } = await manager.findOneByOrFail(SquadPlayer, { teamId, jersey: 10 })
  const made = { invitation: randomUUID(), erasure: randomUUID() }
  const head = await test.as(own ? 'head' : 'otherHead')
  const url = (path: string) => teamUrl(path, teamId)
  await head
    .put(url(`/invitations/${made.invitation}`))
    .send(invitation)
    .expect(201)
  await head
    .put(url(`/erasures/${made.erasure}`))
    .send({ kind: 'squad-player', subjectId: leaving })
    .expect(201)
  if (own)
    await head
      .post(url(`/games/${fixture.game}/hand-on`))
      .send({ toId: assistant })
      .expect(200)
  return {
    ...fixture,
    ...letters,
    ...made,
    leaving,
    headCoach,
    member: await membershipOf(own ? assistant : headCoach),
    leaver: await membershipOf(await personOf('both')),
    people: own
      ? { 'head-coach': headCoach, 'assistant-coach': assistant, player: await personOf('player') }
      : { 'head-coach': headCoach },
  }
}
