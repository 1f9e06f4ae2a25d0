import { randomUUID } from 'node:crypto'
import { mkdtemp, readFile, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import request from 'supertest'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { makeBackup } from '@server/backup/makeBackup'
import { restoreBackup } from '@server/backup/restoreBackup'
import { openDatabase } from '@server/database/dataSource'
import { Change } from '@server/database/entities/Change'
import { Membership } from '@server/database/entities/Membership'
import { Person } from '@server/database/entities/Person'
import { Plan } from '@server/database/entities/Plan'
import { Possession } from '@server/database/entities/Possession'
import { SquadPlayer } from '@server/database/entities/SquadPlayer'
import { eraseDue } from '@server/features/people/erasures.service'
import { makeFixture, teamUrl } from '../support/fixture'
import { newOpponent } from '../support/scouted'
import {
  OTHER_PLAYER,
  PASSWORD,
  PLAYER,
  startTestApp,
  TEAM,
  type Agent,
  type TestApp,
} from '../support/testApp'

const START = new Date('2026-03-17T09:42:00Z')
/** London is on UTC in March before the 29th. */
const MIDNIGHT = new Date('2026-03-18T00:00:00Z')
/** What the bytes are searched for: a first name, a last name, two addresses. */
const NAME = 'Quintessa'
const LAST = 'Zymberline'
const GUARDIAN = 'zq7.guardian@post.example'
const OWN = 'zq8.herself@post.example'

const skills = { handle: 2, 'throw-in': 2, 'long-arm': 2, decide: 2, sprint: 2, screen: 2 }
const player = { jersey: 21, firstName: NAME, lastName: LAST, skills, guardianEmail: GUARDIAN }

let test: TestApp
let head: Agent
let assistant: Agent
let her: string
beforeEach(async () => {
  test = await startTestApp({ now: START })
  head = await test.as('head')
  assistant = await test.as('assistant')
  her = randomUUID()
  await head
    .put(teamUrl(`/squad/${her}`))
    .send(player)
    .expect(201)
})
afterEach(() => test.stop())

const manager = () => test.context.db.manager
const set = (body: object, id = randomUUID()) => head.put(teamUrl(`/erasures/${id}`)).send(body)
const preview = async (kind: string, id: string) =>
  (await head.get(teamUrl(`/erasures/preview?kind=${kind}&subjectId=${id}`))).body as {
    name: string
    dueAt: string
    backupsUntil: string
    goes: { key: string; count: number }[]
    stays: { key: string; count: number }[]
  }
const asRecord = (rows: { key: string; count: number }[]) =>
  Object.fromEntries(rows.map(({ key, count }) => [key, count]))

/** The database's file and its log, as they lie on the disk. */
async function bytes(): Promise<Buffer> {
  const files = ['overtop.sqlite', 'overtop.sqlite-wal'].map((name) =>
    readFile(join(test.dataDir, name)).catch(() => Buffer.alloc(0)),
  )
  return Buffer.concat(await Promise.all(files))
}

/** An account of hers, by an invitation that went to her guardian. */
async function withAccount(): Promise<Agent> {
  const made = await head
    .put(teamUrl(`/invitations/${randomUUID()}`))
    .send({ role: 'player', squadPlayerId: her, way: 'link' })
  await head
    .put(teamUrl(`/invitations/${randomUUID()}`))
    .send({ role: 'assistant-coach', way: 'mail', email: GUARDIAN })
  const agent = request.agent(test.app)
  await agent
    .post('/api/invitations/accept')
    .send({
      secret: String(made.body.link).split('#')[1],
      name: `${NAME} ${LAST}`,
      email: OWN,
      password: PASSWORD,
    })
    .expect(201)
  return agent
}

describe('an erasure', () => {
  it('says before what goes and what stays, counted, and until when backups hold it', async () => {
    await withAccount()
    await head
      .put(teamUrl(`/squad/${her}`))
      .set('If-Match', '"1"')
      .send({ ...player, pictureConsent: 'no' })
    const { name, dueAt, backupsUntil, goes, stays } = await preview('squad-player', her)
    expect({ name, dueAt, backupsUntil }).toEqual({
      name: `${NAME} ${LAST}`,
      dueAt: MIDNIGHT.toISOString(),
      backupsUntil: '2026-04-17',
    })
    expect(asRecord(goes)).toEqual({
      name: 1,
      skills: 1,
      guardian: 1,
      consent: 1,
      account: 1,
      sessions: 1,
      history: 2,
      invitations: 2,
      letters: 1,
    })
    expect(asRecord(stays)).toEqual({ changes: 1 })
    expect(await manager().countBy(SquadPlayer, { id: her })).toBe(1)
  })

  it('at midnight leaves no byte of the name or the addresses in the file or its log', async () => {
    const agent = await withAccount()
    await head
      .put(teamUrl(`/squad/${her}`))
      .set('If-Match', '"1"')
      .send({ ...player, firstName: `${NAME}e` })
    for (const word of [NAME, LAST, GUARDIAN, OWN]) expect((await bytes()).includes(word)).toBe(true)
    await set({ kind: 'squad-player', subjectId: her }).expect(201)
    expect(await eraseDue(test.context.db, new Date(MIDNIGHT.getTime() - 1))).toBe(0)
    expect((await head.get(teamUrl('/squad'))).body.total).toBe(2)
    expect(await eraseDue(test.context.db, MIDNIGHT)).toBe(1)
    const left = await bytes()
    for (const word of [NAME, LAST, GUARDIAN, OWN]) expect([word, left.includes(word)]).toEqual([word, false])
    expect((await agent.get('/api/session')).status).toBe(401)
    expect((await head.get(teamUrl(`/squad/${her}`))).status).toBe(404)
    const people = (await head.get(teamUrl('/people'))).body
    expect([people.erasures, people.invitations]).toEqual([[], []])
    expect(await eraseDue(test.context.db, MIDNIGHT)).toBe(0)
  })

  it('can be stopped by a second person until then, and once it is done by nobody', async () => {
    const id = randomUUID()
    const body = { kind: 'squad-player', subjectId: her }
    await set(body, id).expect(201)
    await set(body, id).expect(200)
    expect((await set(body)).status).toBe(409)
    expect((await set({ kind: 'squad-player', subjectId: PLAYER }, id)).status).toBe(409)
    const stopped = await assistant.post(teamUrl(`/erasures/${id}/stop`))
    expect(stopped.body).toMatchObject({ stoppedBy: 'Test assistant', askedBy: 'Test head', doneAt: null })
    expect(await eraseDue(test.context.db, MIDNIGHT)).toBe(0)
    const second = randomUUID()
    await set(body, second).expect(201)
    await eraseDue(test.context.db, MIDNIGHT)
    expect((await assistant.post(teamUrl(`/erasures/${second}/stop`))).status).toBe(409)
  })

  it('is of this team only', async () => {
    expect((await set({ kind: 'squad-player', subjectId: OTHER_PLAYER })).status).toBe(404)
    const { personId } = await manager().findOneByOrFail(Membership, { role: 'head-coach', teamId: TEAM })
    expect((await set({ kind: 'squad-player', subjectId: personId })).status).toBe(404)
  })

  it('of a sister leaves the address that both have, and what was sent to it about her', async () => {
    await head.put(teamUrl(`/squad/${randomUUID()}`)).send({ ...player, jersey: 22, firstName: 'Ottilie' })
    await set({ kind: 'squad-player', subjectId: her })
    await eraseDue(test.context.db, MIDNIGHT)
    const squad = (await head.get(teamUrl('/squad'))).body.rows as { guardianEmail: string | null }[]
    expect(squad.map(({ guardianEmail }) => guardianEmail)).toEqual([null, GUARDIAN])
  })
})

describe('what stays', () => {
  it('signed plans keep a gap where her number stood; drafts give her place up; possessions stay', async () => {
    const rows = await makeFixture(test)
    const plan = await manager().findOneByOrFail(Plan, { id: rows.plan })
    const frozen = plan.frozen as { firstCall: { roles: { squadPlayerId: string | null }[] } }
    const seat =
      frozen.firstCall.roles.find(({ squadPlayerId }) => squadPlayerId !== null)?.squadPlayerId ?? ''
    const draft = randomUUID()
    const counterId = rows.counters[0] ?? ''
    await head
      .put(teamUrl(`/games/${rows.game}/plan`))
      .send({
        id: draft,
        firstCallId: counterId,
        roles: [{ counterId, role: '1', squadPlayerId: seat }],
        keys: ['Look middle first.'],
      })
      .expect(201)
    expect(asRecord((await preview('squad-player', seat)).stays)).toMatchObject({ plans: 1, possessions: 1 })
    await set({ kind: 'squad-player', subjectId: seat })
    await eraseDue(test.context.db, MIDNIGHT)
    expect((await manager().findOneByOrFail(Plan, { id: draft })).roles).toEqual([])
    expect(await manager().count(Possession)).toBe(1)
    const sheet = await head.get(teamUrl(`/sheets/${rows.sheet}`))
    expect(sheet.status).toBe(200)
    const players = sheet.body.players as { squadPlayerId: string }[]
    expect(players.map(({ squadPlayerId }) => squadPlayerId)).not.toContain(seat)
    expect((await head.get(teamUrl(`/sheets/${rows.sheet}.pdf`))).status).toBe(200)
    expect((await head.get(teamUrl(`/games/${rows.game}/choices`))).status).toBe(200)
  })

  it('an account with another team stays there, and lets go of this one', async () => {
    await newOpponent(await test.as('both'))
    const both = await manager().findOneByOrFail(Person, { name: 'Test both' })
    const shown = await preview('member', both.id)
    expect(asRecord(shown.goes)).toMatchObject({ membership: 1 })
    expect(asRecord(shown.goes)).not.toHaveProperty('account')
    await set({ kind: 'member', subjectId: both.id }).expect(201)
    await eraseDue(test.context.db, MIDNIGHT)
    const session = (await (await test.as('both')).get('/api/session')).body
    expect(session.teams).toHaveLength(1)
    expect(await manager().countBy(Change, { personId: both.id })).toBe(0)
  })

  it('the only head coach is not erased, not even when the other one has gone meanwhile', async () => {
    const me = await manager().findOneByOrFail(Membership, { role: 'head-coach', teamId: TEAM })
    expect((await set({ kind: 'member', subjectId: me.personId })).status).toBe(409)
    const second = await manager().findOneByOrFail(Person, { name: 'Test assistant' })
    await manager().update(Membership, { personId: second.id }, { role: 'head-coach' })
    await set({ kind: 'member', subjectId: me.personId }).expect(201)
    await manager().update(Membership, { personId: second.id }, { role: 'assistant-coach' })
    await eraseDue(test.context.db, MIDNIGHT)
    expect(await manager().countBy(Membership, { personId: me.personId })).toBe(1)
    expect((await head.get(teamUrl('/people'))).body.erasures).toEqual([])
  })
})

describe('a backup that was made before', () => {
  it('does not bring anybody back: a restore erases again, and says when it cannot know', async () => {
    const safe = await mkdtemp(join(tmpdir(), 'overtop-safe-'))
    const empty = await mkdtemp(join(tmpdir(), 'overtop-empty-'))
    try {
      await withAccount()
      const { folder: backup } = await makeBackup(test.dataDir, safe, START)
      await set({ kind: 'squad-player', subjectId: her })
      await eraseDue(test.context.db, MIDNIGHT)
      await test.context.db.destroy()
      const where = { backup, replace: true, now: MIDNIGHT }
      expect((await restoreBackup({ ...where, dataDir: test.dataDir })).erasedAgain).toBe(1)
      const left = await bytes()
      for (const word of [NAME, LAST, GUARDIAN, OWN])
        expect([word, left.includes(word)]).toEqual([word, false])
      // The restored data remembers for the next restore.
      expect((await restoreBackup({ ...where, now: START, dataDir: test.dataDir })).erasedAgain).toBe(1)
      expect((await restoreBackup({ ...where, dataDir: empty })).erasedAgain).toBeNull()
    } finally {
      await rm(safe, { recursive: true, force: true })
      await rm(empty, { recursive: true, force: true })
      test.context.db = await openDatabase(join(test.dataDir, 'overtop.sqlite'))
    }
  })
})
