import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import type { Ground } from '@shared/plans/grounds'
import { makeFixture, teamUrl } from '../support/fixture'
import { newPossession, newScoutedGame } from '../support/scouted'
import { startTestApp } from '../support/testApp'

describe('what a signed plan stood on', () => {
  it('is kept with its possessions, whatever is logged or thrown away later, and is for staff only', async () => {
    const fresh = await startTestApp()
    try {
      const rows = await makeFixture(fresh)
      const coach = await fresh.as('head')
      const second = await newScoutedGame(coach, rows.opponent)
      for (let number = 2; number <= 14; number += 1)
        await newPossession(coach, number % 2 === 0 ? rows.scoutedGame : second, {
          number,
          leftOpen: ['middle'],
          goalie: 'home',
        })
      const body = { id: randomUUID(), firstCallId: rows.counters[0], changeUpId: rows.counters[1] }
      const put = await coach.put(teamUrl(`/games/${rows.game}/plan`)).send(body)
      const sheetId = randomUUID()
      const signed = await coach
        .post(teamUrl(`/games/${rows.game}/plan/sign-off`))
        .set('If-Match', put.headers['etag'] as string)
        .send({ planId: body.id, sheetId })
      expect(signed.status).toBe(200)
      const at = teamUrl(`/games/${rows.game}/plan/grounds`)
      const grounds = (await coach.get(at)).body.rows as Ground[]
      const habits = grounds.flatMap((ground) => ground.habits)
      expect(habits.length).toBeGreaterThan(0)
      for (const { k, n, rowIds, otherIds } of habits) {
        expect(rowIds).toHaveLength(k)
        expect(rowIds.length + otherIds.length).toBe(n)
      }
      await coach.delete(teamUrl(`/possessions/${rows.possession}`))
      expect((await coach.get(at)).body.rows).toEqual(grounds)
      const nell = await fresh.as('player')
      expect((await nell.get(at)).status).toBe(403)
      expect(JSON.stringify((await nell.get(teamUrl(`/sheets/${sheetId}`))).body)).not.toContain('grounds')
    } finally {
      await fresh.stop()
    }
  })
})
