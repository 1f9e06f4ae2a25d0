import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { readOpponent } from '@server/features/tendencies/readOpponent'
import { StripList, stripOf } from '@shared/opponents/strips'
import { teamUrl } from '../support/fixture'
import { newOpponent, newPossession, newScoutedGame } from '../support/scouted'
import { startTestApp, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let head: Agent
beforeAll(async () => {
  test = await startTestApp()
  head = await test.as('head')
})
afterAll(() => test.stop())

describe('the strips of a list', () => {
  it('say of each opponent what its whole read says, and nothing of one that was deleted', async () => {
    const ids = [
      await newOpponent(head, 'Gulls'),
      await newOpponent(head, 'Otters'),
      await newOpponent(head, 'Gone'),
    ]
    for (const [index, id] of ids.entries()) {
      const game = await newScoutedGame(head, id)
      for (let number = 1; number <= 6 + index; number += 1)
        await newPossession(head, game, { number, leftOpen: number % 2 ? ['middle'] : ['long'] })
    }
    await head.delete(teamUrl(`/opponents/${ids[2] ?? ''}`)).expect(204)
    const { rows } = StripList.parse((await head.get(teamUrl('/strips'))).body)
    expect(rows.map(({ opponentId }) => opponentId).sort()).toEqual(ids.slice(0, 2).sort())
    for (const { opponentId, ...strip } of rows) {
      expect(strip).toEqual(stripOf(await readOpponent(test.context.db.manager, opponentId, {})))
      expect(strip.zones.length).toBeGreaterThan(0)
      expect(strip.room).not.toBeNull()
    }
  })
})
