import { randomUUID } from 'node:crypto'
import { readdir, readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { makeBackup } from '@server/backup/makeBackup'
import { Copy } from '@server/database/entities/Copy'
import { HandOn } from '@server/database/entities/HandOn'
import { Mail } from '@server/database/entities/Mail'
import { Opening } from '@server/database/entities/Opening'
import { Practice } from '@server/database/entities/Practice'
import { PracticeReps } from '@server/database/entities/PracticeReps'
import { purgeDeleted } from '@server/features/deletion/purge.service'
import type { ChangeRow } from '@shared/history/schemas'
import { makeFixture, teamUrl, type Fixture } from '../support/fixture'
import { created, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'

const START = new Date('2026-03-17T09:42:00Z')
const later = (minutes: number) => new Date(START.getTime() + minutes * 60_000)

let test: TestApp
let head: Agent
let own: Fixture
/** One of our trips in the game. */
let trip: string

beforeEach(async () => {
  test = await startTestApp({ now: START })
  head = await test.as('head')
  own = await makeFixture(test)
  trip = await created(head, 'possessions', {
    gameId: own.game,
    number: 1,
    trigger: 'dead-ball',
    shape: '1-2-1-1',
    outcome: 'through',
    counterId: own.counters[1],
  })
})
afterEach(() => test.stop())

const get = (path: string) => head.get(teamUrl(path))
const remove = (path: string) => head.delete(teamUrl(path))
const purge = (now: Date) => purgeDeleted(test.context.db, test.context.stillFiles, now)
const actions = async (row: string) =>
  ((await get(`/history?row=${row}`)).body.rows as ChangeRow[]).map(({ action }) => action)

describe('after ten minutes', () => {
  const NOTES = ['zq1 their bench shouts', 'zq2 seen from the stands', 'zq3 bring water', 'zq4 limps left']
  const hangers = [Practice, PracticeReps, HandOn, Copy, Opening, Mail]

  const bytesOf = async (folder: string) => {
    const names = (await readdir(folder)).filter((name) => name.startsWith('overtop.sqlite'))
    return Buffer.concat(await Promise.all(names.map((name) => readFile(join(folder, name)))))
  }
  const leftIn = (bytes: Buffer) =>
    [...NOTES, 'zq5 letter', 'zq6 hand-on', own.opponent, own.game, own.sheet, own.still, trip].filter(
      (text) => bytes.includes(text),
    )

  /** Notes in every row below the opponent, and one row in every table that hangs on its games. */
  async function fill() {
    const put = async (path: string, body: object) => {
      const { version } = (await get(path)).body as { version: number }
      const answer = await head.put(teamUrl(path)).set('If-Match', `"${version}"`).send(body)
      expect(answer.status).toBe(200)
    }
    const opponent = { name: 'Port Selby Gulls', shortName: 'Gulls', notes: NOTES[0] }
    await put(`/opponents/${own.opponent}`, opponent)
    await put(`/opponents/${own.opponent}`, { ...opponent, notes: '' })
    const { counts: _c, scout: _s, ...game } = (await get(`/scouted-games/${own.scoutedGame}`)).body
    await put(`/scouted-games/${own.scoutedGame}`, { ...game, notes: NOTES[1] })
    const ours = (await get(`/games/${own.game}`)).body
    await put(`/games/${own.game}`, { ...ours, notes: NOTES[2] })
    const note = { opponentId: own.opponent, jersey: 23, note: NOTES[3] }
    await head.put(teamUrl(`/opponent-players/${randomUUID()}`)).send(note)
    const stamp = START.toISOString()
    const meta = () => ({ id: randomUUID(), teamId: TEAM, version: 1, createdAt: stamp, updatedAt: stamp })
    const { manager } = test.context.db
    const practice = { ...meta(), gameId: own.game, startsAt: stamp, body: {} }
    await manager.insert(Practice, practice)
    const reps = {
      practiceId: practice.id,
      counterId: own.counters[1],
      shape: null,
      kind: 'live',
      n: 3,
      k: 1,
    }
    await manager.insert(PracticeReps, { id: randomUUID(), teamId: TEAM, ...reps } as never)
    const ball = { gameId: own.game, station: 'scout', note: 'zq6 hand-on', at: stamp }
    await manager.insert(HandOn, { id: randomUUID(), teamId: TEAM, ...ball } as never)
    await manager.insert(Copy, { ...meta(), sheetId: own.sheet, number: 99, way: 'paper' })
    const [person]: { id: string }[] = await manager.query('SELECT id FROM people LIMIT 1')
    const opening = { sheetId: own.sheet, personId: person?.id ?? '', firstAt: stamp, lastAt: stamp }
    await manager.insert(Opening, { id: randomUUID(), teamId: TEAM, ...opening })
    await manager.insert(Mail, {
      id: randomUUID(),
      teamId: TEAM,
      kind: 'sheet',
      onceKey: randomUUID(),
      aboutId: own.sheet,
      recipient: 'nell@club.example',
      subject: 'zq5 letter',
      text: '',
      html: '',
      state: 'sent',
      createdAt: stamp,
    })
  }

  it('nothing of an opponent is left: no row, no history, no picture, not one byte', async () => {
    await fill()
    const { manager } = test.context.db
    for (const entity of hangers) expect(await manager.count(entity as typeof Mail)).toBeGreaterThan(0)
    expect(leftIn(await bytesOf(test.dataDir))).toHaveLength(11)
    await remove(`/opponents/${own.opponent}`)
    expect(await purge(later(10))).toBeGreaterThan(6)
    for (const entity of hangers) expect(await manager.count(entity as typeof Mail)).toBe(0)
    expect(leftIn(await bytesOf(test.dataDir))).toEqual([])
    expect(await readdir(join(test.dataDir, 'stills', TEAM))).toEqual([])
    expect(await manager.query('PRAGMA foreign_key_check')).toEqual([])
    const kinds: { kind: string }[] = await manager.query('SELECT DISTINCT kind FROM changes')
    expect(kinds.map(({ kind }) => kind)).toEqual(['squad_players'])
  })

  it('a backup that is made before the sweep has nothing of it either', async () => {
    await fill()
    await remove(`/opponents/${own.opponent}`)
    const early = await makeBackup(test.dataDir, join(test.dataDir, 'safe'), later(9))
    expect(leftIn(await bytesOf(early.folder))).not.toEqual([])
    const { folder, manifest } = await makeBackup(test.dataDir, join(test.dataDir, 'safe'), later(10))
    expect(leftIn(await bytesOf(folder))).toEqual([])
    expect(manifest.rows).toMatchObject({ opponents: 0, possessions: 0, stills: 0, sheets: 0, mails: 0 })
    expect(manifest.files.map(({ path }) => path)).toEqual(['overtop.sqlite'])
  })

  it('other rows and their history are untouched', async () => {
    const other = await newOpponent(head, 'Tarn Valley')
    const row = await newPossession(head, await newScoutedGame(head, other), { note: 'stays' })
    await remove(`/opponents/${own.opponent}`)
    await purge(later(10))
    expect((await get(`/possessions/${row}`)).body.note).toBe('stays')
    expect(await actions(row)).toEqual(['made'])
    expect(await actions(other)).toEqual(['made'])
  })
})
