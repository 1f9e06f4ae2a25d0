import 'reflect-metadata'
import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { TendencyRead } from '@shared/tendencies/schemas'
import { makeFixture, opponentBody, possessionBody, scoutedGameBody, teamUrl } from '../support/fixture'
import { startTestApp, type TestApp } from '../support/testApp'

let test: TestApp
const opponent = randomUUID()
const game = randomUUID()

beforeAll(async () => {
  test = await startTestApp()
  await makeFixture(test)
  const head = await test.as('head')
  await head.put(teamUrl(`/opponents/${opponent}`)).send(opponentBody('Tracked'))
  await head.put(teamUrl(`/scouted-games/${game}`)).send(scoutedGameBody(opponent))
  const add = async (number: number, more: Parameters<typeof possessionBody>[1]) => {
    const answer = await head
      .put(teamUrl(`/possessions/${randomUUID()}`))
      .send(possessionBody(game, { number, ...more }))
    expect(answer.status, JSON.stringify(answer.body)).toBe(201)
  }
  const track = (at1: number, at2: number) => [
    { t: 0, x: 0.1, y: 0.5, kind: 'pass' as const },
    { t: 1, x: at1, y: 0.5, kind: 'pass' as const },
    { t: 2, x: at2, y: 0.5, kind: 'pass' as const },
  ]
  await add(1, { track: track(0.2, 0.3) })
  await add(2, { track: track(0.3, 0.5), trigger: 'made-free-throw' })
  await add(3, { track: track(0.4, 0.45) })
  // Not pressed, and pressed without a track: neither says where the ball is against the press.
  await add(4, { shape: 'dropped-back', pickup: null, traps: [], track: track(0.8, 0.9) })
  await add(5, { track: null })
})
afterAll(() => test.stop())

const read = async (query = ''): Promise<TendencyRead> => {
  const answer = await (await test.as('head')).get(teamUrl(`/opponents/${opponent}/tendencies${query}`))
  expect(answer.status).toBe(200)
  return answer.body as TendencyRead
}

describe('where the ball is against their press', () => {
  it('is the median of the pressed rows with a track, second by second', async () => {
    expect((await read()).ball).toEqual([
      { second: 1, x: 0.3, n: 3 },
      { second: 2, x: 0.45, n: 3 },
    ])
  })

  it('follows the situation, and is empty where nothing was tracked', async () => {
    expect((await read('?trigger=made-free-throw')).ball).toEqual([
      { second: 1, x: 0.3, n: 1 },
      { second: 2, x: 0.5, n: 1 },
    ])
    expect((await read('?trigger=live')).ball).toEqual([])
  })
})
