import { randomUUID } from 'node:crypto'
import { mkdir } from 'node:fs/promises'
import { join } from 'node:path'
import { pino } from 'pino'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { Change } from '@server/database/entities/Change'
import { Erasure } from '@server/database/entities/Erasure'
import { Invitation } from '@server/database/entities/Invitation'
import { Mail } from '@server/database/entities/Mail'
import { SquadPlayer } from '@server/database/entities/SquadPlayer'
import { Still } from '@server/database/entities/Still'
import { sweepOnce } from '@server/housekeeping'
import { makeFixture, teamUrl } from '../support/fixture'
import { PLAYER, startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let head: Agent
beforeEach(async () => {
  test = await startTestApp()
  head = await test.as('head')
})
afterEach(() => test.stop())

const broken = () => Promise.reject(new Error('the disk says no'))

describe('housekeeping', () => {
  it('does every other part where one fails, and says in the log which one did', async () => {
    const own = await makeFixture(test)
    await head.delete(teamUrl(`/possessions/${own.possession}`)).expect(204)
    await head
      .put(teamUrl(`/erasures/${randomUUID()}`))
      .send({ kind: 'squad-player', subjectId: PLAYER })
      .expect(201)
    await head
      .put(teamUrl(`/invitations/${randomUUID()}`))
      .send({ role: 'assistant-coach', way: 'mail', email: 'new@club.example', days: 7 })
      .expect(201)
    const { manager } = test.context.db
    await manager.update(Mail, { kind: 'invitation' }, { state: 'waiting' })
    test.setNow(new Date('2026-03-18T01:00:00Z'))
    const lines: string[] = []
    const log = pino({ level: 'error' }, { write: (line) => void lines.push(line) })
    await sweepOnce({ ...test.context, log, stillFiles: { ...test.context.stillFiles, remove: broken } })
    expect(await manager.existsBy(SquadPlayer, { id: PLAYER })).toBe(false)
    expect((await manager.findOneByOrFail(Mail, { kind: 'invitation' })).state).toBe('kept')
    expect(lines.map((line) => (JSON.parse(line) as { part: string }).part)).toEqual(['deletions'])
  })

  it('lets the other erasures of a night be done where one fails', async () => {
    await makeFixture(test)
    const { manager } = test.context.db
    const [one, two] = await manager.find(SquadPlayer, { where: { teamId: TEAM }, order: { jersey: 'ASC' } })
    for (const player of [one, two])
      await head
        .put(teamUrl(`/erasures/${randomUUID()}`))
        .send({ kind: 'squad-player', subjectId: player?.id })
        .expect(201)
    await manager.query(
      `CREATE TRIGGER keeps_one BEFORE DELETE ON squad_players WHEN OLD.id = '${one?.id}'
       BEGIN SELECT RAISE(ABORT, 'no'); END`,
    )
    test.setNow(new Date('2026-03-18T01:00:00Z'))
    await sweepOnce(test.context)
    expect(await manager.existsBy(SquadPlayer, { id: two?.id ?? '' })).toBe(false)
    expect((await manager.findOneByOrFail(Erasure, { subjectId: one?.id ?? '' })).doneAt).toBeNull()
  })

  it('forgets whom an invitation went to once it has opened nothing for ninety days', async () => {
    const [old, open] = [randomUUID(), randomUUID()]
    const body = { role: 'assistant-coach', way: 'mail', email: 'new@club.example', days: 7 }
    await head
      .put(teamUrl(`/invitations/${old}`))
      .send(body)
      .expect(201)
    await head.delete(teamUrl(`/invitations/${old}`)).expect(204)
    test.setNow(new Date('2026-06-16T09:00:00Z'))
    await sweepOnce(test.context)
    const { manager } = test.context.db
    expect(await manager.existsBy(Invitation, { id: old })).toBe(false)
    expect(await manager.existsBy(Change, { rowId: old })).toBe(false)
    await manager.insert(Invitation, {
      id: open,
      teamId: TEAM,
      role: 'assistant-coach',
      email: 'new@club.example',
      tokenHash: 'digest',
      expiresAt: '2026-06-20T09:00:00.000Z',
      version: 1,
      createdAt: '2026-06-13T09:00:00.000Z',
      updatedAt: '2026-06-13T09:00:00.000Z',
    } as never)
    await sweepOnce(test.context)
    expect(await manager.existsBy(Invitation, { id: open })).toBe(true)
  })

  it('lets every other still go where the files of one cannot be removed', async () => {
    const own = await makeFixture(test)
    const { manager } = test.context.db
    const [first] = await manager.findBy(Still, { id: own.still })
    // Before and after it, whatever order they come in.
    const others = ['00000000-0000-4000-8000-000000000001', 'ffffffff-ffff-4fff-8fff-ffffffffffff']
    for (const id of others) await manager.insert(Still, { ...first, id, position: 2 } as never)
    await manager.update(Still, { teamId: TEAM }, { expiresOn: '2026-03-16' })
    const stuck = test.context.stillFiles.pathOf(TEAM, own.still, 'full')
    await mkdir(join(`${stuck}.part`, 'in-the-way'), { recursive: true })
    await sweepOnce(test.context)
    for (const id of others) expect(await manager.existsBy(Still, { id })).toBe(false)
    expect(await manager.existsBy(Still, { id: own.still })).toBe(true)
  })
})
