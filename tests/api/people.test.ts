import { randomUUID } from 'node:crypto'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { Counter } from '@server/database/entities/Counter'
import { Membership } from '@server/database/entities/Membership'
import { Person } from '@server/database/entities/Person'
import { Rule } from '@server/database/entities/Rule'
import { DEMO_COUNTERS } from '@server/database/demo/counters'
import { DEMO_RULES } from '@server/database/demo/rules'
import type { MemberRow, PeoplePage } from '@shared/people/schemas'
import { teamUrl } from '../support/fixture'
import { PLAYER, startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let head: Agent
beforeEach(async () => {
  test = await startTestApp()
  head = await test.as('head')
})
afterEach(() => test.stop())

const manager = () => test.context.db.manager
const people = async (agent = head) => (await agent.get(teamUrl('/people'))).body as PeoplePage
async function member(name: string): Promise<MemberRow> {
  const found = (await people()).members.find((row) => row.name === name)
  if (!found) throw new Error(`${name} is no member`)
  return found
}
const change = (id: string, body: object, version: number | null = 1) => {
  const sent = head.patch(teamUrl(`/members/${id}`))
  if (version !== null) void sent.set('If-Match', `"${version}"`)
  return sent.send(body)
}

describe('the page of people', () => {
  it('has members by role, squad players apart from accounts, and no address of a member', async () => {
    const sister = randomUUID()
    const skills = { handle: 2, 'throw-in': 2, 'long-arm': 2, decide: 2, sprint: 2, screen: 2 }
    await head.put(teamUrl(`/squad/${sister}`)).send({ jersey: 9, firstName: 'Ottilie', skills })
    const page = await people()
    expect(page.members.map(({ name, role, you, lastHead }) => [name, role, you, lastHead])).toEqual([
      ['Test head', 'head-coach', true, true],
      ['Test assistant', 'assistant-coach', false, false],
      ['Test both', 'assistant-coach', false, false],
      ['Test player', 'player', false, false],
    ])
    const player = await member('Test player')
    expect(page.players.map(({ jersey, memberId }) => [jersey, memberId])).toEqual([
      [4, player.id],
      [9, null],
    ])
    expect(page.backupDays).toBe(30)
    expect(JSON.stringify(page)).not.toMatch(/club\.example|argon2/)
    expect((await people(await test.as('assistant'))).members).toHaveLength(4)
  })
})

describe('a role', () => {
  it('is changed on the version that was seen, and holds from the next request on', async () => {
    const assistant = await member('Test assistant')
    const agent = await test.as('assistant')
    const rule = { role: 'head-coach' }
    expect((await change(assistant.id, rule, null)).status).toBe(428)
    expect(
      (await agent.get(teamUrl('/erasures/preview')).query({ kind: 'member', subjectId: PLAYER })).status,
    ).toBe(403)
    const changed = await change(assistant.id, rule)
    expect([changed.status, changed.body.role, changed.headers['etag']]).toEqual([200, 'head-coach', '"2"'])
    const stale = await change(assistant.id, { role: 'assistant-coach' })
    expect([stale.status, stale.body.current.role]).toEqual([412, 'head-coach'])
    const now = await agent.get(teamUrl('/erasures/preview')).query({ kind: 'member', subjectId: PLAYER })
    expect(now.status).toBe(404)
  })

  it('of the only head coach stays, of one of two it changes', async () => {
    const me = await member('Test head')
    const refused = await change(me.id, { role: 'assistant-coach' })
    expect(refused.status).toBe(409)
    expect(refused.body.detail).toMatch(/only head coach/)
    await change((await member('Test assistant')).id, { role: 'head-coach' })
    expect((await change(me.id, { role: 'assistant-coach' })).status).toBe(200)
    expect(
      (
        await head
          .patch(teamUrl(`/members/${me.id}`))
          .set('If-Match', '"2"')
          .send({ role: 'head-coach' })
      ).status,
    ).toBe(403)
  })

  it('player belongs to somebody in the squad, and one place has one account', async () => {
    const assistant = await member('Test assistant')
    expect((await change(assistant.id, { role: 'player' })).body.errors).toMatchObject([
      { field: 'squadPlayerId' },
    ])
    const taken = await change(assistant.id, { role: 'player', squadPlayerId: PLAYER })
    expect([taken.status, taken.body.detail]).toEqual([409, 'Nell has an account already.'])
  })
})

describe('leaving', () => {
  it('closes the team at once to whoever is signed in, and leaves the account and its other team', async () => {
    const both = await test.as('both')
    expect((await both.get(teamUrl('/squad'))).status).toBe(200)
    const row = await member('Test both')
    expect((await head.delete(teamUrl(`/members/${row.id}`)).set('If-Match', '"7"')).status).toBe(412)
    expect((await head.delete(teamUrl(`/members/${row.id}`))).status).toBe(204)
    expect((await both.get(teamUrl('/squad'))).status).toBe(404)
    expect((await both.get('/api/session')).body.teams).toHaveLength(1)
    expect(await manager().countBy(Person, { id: row.personId })).toBe(1)
  })

  it('is everybody’s own to do, but not the only head coach’s', async () => {
    const player = await test.as('player')
    expect((await player.delete(teamUrl('/membership'))).status).toBe(204)
    expect((await player.get(teamUrl('/sheets'))).status).toBe(404)
    expect((await head.delete(teamUrl('/membership'))).status).toBe(409)
    expect((await head.delete(teamUrl(`/members/${(await member('Test head')).id}`))).status).toBe(409)
    await change((await member('Test assistant')).id, { role: 'head-coach' })
    expect((await head.delete(teamUrl('/membership'))).status).toBe(204)
    expect(await manager().countBy(Membership, { teamId: TEAM, role: 'head-coach' })).toBe(1)
  })
})

describe('another team', () => {
  const team = {
    name: 'Herons',
    squadName: 'U15 girls',
    timeZone: 'Europe/Oslo',
    season: '2026/27',
    rulePack: 'nfhs84',
  }
  const make = (agent: Agent, body: object = team) => agent.post('/api/teams').send(body)

  it('is made by a head coach, who leads it, with counters and rules to start from', async () => {
    const made = await make(head)
    expect(made.status).toBe(201)
    const teamId = made.body.id as string
    const teams = (await head.get('/api/session')).body.teams as object[]
    expect(teams).toContainEqual(
      expect.objectContaining({
        id: teamId,
        role: 'head-coach',
        rulePack: 'nfhs84',
        timeZone: 'Europe/Oslo',
      }),
    )
    expect(await manager().countBy(Counter, { teamId })).toBe(DEMO_COUNTERS.length)
    expect(await manager().countBy(Rule, { teamId })).toBe(DEMO_RULES.length)
    expect((await make(head)).status).toBe(409)
  })

  it('is made by nobody else, and not from what cannot be read', async () => {
    expect((await test.anonymous().post('/api/teams').send(team)).status).toBe(401)
    expect((await make(await test.as('assistant'))).status).toBe(403)
    const bad = await make(head, { ...team, timeZone: 'Oslo time', squadName: '' })
    expect((bad.body.errors as { field: string }[]).map(({ field }) => field)).toEqual([
      'squadName',
      'timeZone',
    ])
  })
})
