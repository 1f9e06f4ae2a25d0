import { randomUUID } from 'node:crypto'
import { readdir } from 'node:fs/promises'
import { join } from 'node:path'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { Still } from '@server/database/entities/Still'
import { Team } from '@server/database/entities/Team'
import { expireStills } from '@server/features/stills/expiry.service'
import { jpeg, teamUrl } from '../support/fixture'
import { faultsIn, newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { startTestApp, TEAM, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let scout: Agent
let possession: string
let still: string
const NOW = '2026-12-01T12:00:00Z'

const put = async () => {
  const id = randomUUID()
  const sent = scout.put(teamUrl(`/possessions/${possession}/stills/${id}`))
  expect((await sent.attach('still', await jpeg(), 'a.jpg')).status).toBe(201)
  return id
}
const setDay = (expiresOn: string, version: number, agent = scout) =>
  agent
    .patch(teamUrl(`/stills/${still}`))
    .set('If-Match', `"${version}"`)
    .send({ expiresOn })
const sweep = (at: string) => expireStills(test.context.db, test.context.stillFiles, new Date(at))
const row = () => scout.get(teamUrl(`/stills/${still}/row`))
const filesOf = async (id: string) =>
  (await readdir(join(test.dataDir, 'stills', TEAM))).filter((name) => name.startsWith(id))

beforeAll(async () => {
  test = await startTestApp({ now: new Date(NOW) })
  scout = await test.as('assistant')
  possession = await newPossession(scout, await newScoutedGame(scout, await newOpponent(scout)))
})
afterAll(() => test.stop())
beforeEach(async () => {
  await test.context.db.manager.update(Team, { id: TEAM }, { timeZone: 'Europe/London' })
  still = await put()
})

describe('the last day of a still', () => {
  it('is the season’s end; staff may shorten it, only the head coach lengthen it, by a year', async () => {
    expect((await row()).body.expiresOn).toBe('2027-06-30')
    expect((await setDay('2027-01-31', 1)).body.expiresOn).toBe('2027-01-31')
    expect(faultsIn((await setDay('2027-07-01', 2)).body)).toEqual({
      expiresOn: 'Only the head coach keeps a still past the season. Choose 2027-06-30 or an earlier day.',
    })
    const head = await test.as('head')
    expect((await setDay('2028-06-30', 2, head)).status).toBe(200)
    expect((await setDay('2028-07-01', 3, head)).status).toBe(400)
    expect(faultsIn((await setDay('2026-11-30', 3, head)).body)['expiresOn']).toContain('This day is over')
    expect(faultsIn((await setDay('30.6.2027', 3)).body)).toEqual({
      expiresOn: 'This is not a day. Write it as 2026-03-20.',
    })
  })

  it('is lived through to its end where the team is; then row and files are gone, no other', async () => {
    const other = await put()
    await setDay('2026-12-05', 1)
    await test.context.db.manager.update(Team, { id: TEAM }, { timeZone: 'America/New_York' })
    // Midnight in New York is five in the morning in UTC.
    expect(await sweep('2026-12-06T04:59:00Z')).toBe(0)
    expect((await row()).status).toBe(200)
    expect(await sweep('2026-12-06T05:00:00Z')).toBe(1)
    expect((await row()).status).toBe(404)
    expect((await scout.get(teamUrl(`/stills/${still}`))).status).toBe(404)
    expect(await filesOf(still)).toEqual([])
    expect(await filesOf(other)).toHaveLength(2)
    expect(await test.context.db.manager.existsBy(Still, { id: other })).toBe(true)
  })

  it('of a still from before there were days is given by the sweep', async () => {
    await test.context.db.manager.update(Still, { id: still }, { expiresOn: null })
    expect((await row()).body.expiresOn).toBeNull()
    expect(await sweep(NOW)).toBe(0)
    expect((await row()).body.expiresOn).toBe('2027-06-30')
  })

  it('a picture that is gone already does not keep the row', async () => {
    await setDay('2026-12-05', 1)
    await test.context.stillFiles.remove(TEAM, still)
    expect(await sweep('2026-12-07T00:00:00Z')).toBe(1)
  })
})
