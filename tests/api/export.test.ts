import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { Person } from '@server/database/entities/Person'
import { makeFixture, teamUrl, type Fixture } from '../support/fixture'
import { OTHER_PLAYER, PLAYER, startTestApp, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let head: Agent
let rows: Fixture
beforeEach(async () => {
  test = await startTestApp()
  head = await test.as('head')
  rows = await makeFixture(test)
})
afterEach(() => test.stop())

const take = (agent: Agent, kind: string, id: string) =>
  agent.get(teamUrl('/people/export')).query({ kind, id })
const personId = async (name: string) => (await test.context.db.manager.findOneByOrFail(Person, { name })).id

describe('what is kept on one person', () => {
  it('is a file with every field of a squad player, her history and her account, and nobody else', async () => {
    const before = (await head.get(teamUrl(`/squad/${PLAYER}`))).body
    const { id: _id, version: _v, createdAt: _c, updatedAt: _u, available: _a, ...body } = before
    await head
      .put(teamUrl(`/squad/${PLAYER}`))
      .set('If-Match', '"1"')
      .send({ ...body, guardianEmail: 'ewa@post.example', pictureConsent: 'no', sprint20: 3.4 })
    const answer = await take(head, 'squad-player', PLAYER)
    expect(answer.headers['content-disposition']).toContain('attachment')
    expect(answer.body.squadPlayer).toMatchObject({
      id: PLAYER,
      jersey: 4,
      firstName: 'Nell',
      lastName: 'Tavish',
      guardianEmail: 'ewa@post.example',
      pictureConsent: 'no',
      sprint20: 3.4,
      history: [
        {
          action: 'changed',
          fields: expect.arrayContaining([{ field: 'guardianEmail', from: null, to: 'ewa@post.example' }]),
        },
      ],
    })
    expect(answer.body.account).toMatchObject({
      name: 'Test player',
      email: 'player@club.example',
      membership: { role: 'player' },
    })
    const text = JSON.stringify(answer.body)
    expect(text).not.toMatch(/Test head|head@club|Secretname|argon2/)
    expect(answer.body.notKnown).toMatch(/still/)
  })

  it('of a coach has what was done, by row and time, and no words about others', async () => {
    const answer = await take(head, 'member', await personId('Test head'))
    expect(answer.body.squadPlayer).toBeNull()
    expect(answer.body.account.plansSigned).toMatchObject([{ gameId: rows.game, version: 1 }])
    const kinds = (answer.body.account.changes as { kind: string }[]).map(({ kind }) => kind)
    expect(kinds).toContain('possessions')
    expect(JSON.stringify(answer.body)).not.toContain('Secretname')
  })

  it('is for the head coach, and for oneself; for nobody else', async () => {
    const player = await test.as('player')
    const assistant = await test.as('assistant')
    const mine = await personId('Test player')
    expect((await take(player, 'squad-player', PLAYER)).status).toBe(200)
    expect((await take(player, 'member', mine)).status).toBe(200)
    expect((await take(player, 'member', await personId('Test head'))).status).toBe(403)
    expect((await take(assistant, 'squad-player', PLAYER)).status).toBe(403)
    expect((await take(assistant, 'member', await personId('Test assistant'))).status).toBe(200)
    expect((await take(head, 'squad-player', OTHER_PLAYER)).status).toBe(404)
    expect((await take(head, 'member', await personId('Test otherHead'))).status).toBe(404)
  })
})
