import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Choices } from '@shared/choices/schemas'
import type { RuleRow } from '@shared/rules/schemas'
import { makeFixture, teamUrl, type Fixture } from '../support/fixture'
import { newPossession } from '../support/scouted'
import { startTestApp, type Agent, type TestApp } from '../support/testApp'

let test: TestApp
let rows: Fixture
let head: Agent
const asked = (rule: RuleRow, more: Partial<RuleRow> = {}) => {
  const { id, version: _v, createdAt: _c, updatedAt: _u, ...body } = { ...rule, ...more }
  return { id, rule: body }
}
const order = (choices: Choices) => choices.choices.map(({ counterId }) => counterId)
const reasonsOf = (choices: Choices, ruleId: string) =>
  choices.choices.flatMap(({ reasons }) => reasons.filter((reason) => reason.ruleId === ruleId))

beforeAll(async () => {
  test = await startTestApp()
  rows = await makeFixture(test)
  head = await test.as('head')
  // Ten pressed rows with the middle open: enough for a rule of lean to speak.
  const [other] = [randomUUID()]
  await head
    .put(teamUrl(`/scouted-games/${other}`))
    .send({ opponentId: rows.opponent, foe: 'Larks', playedOn: '2026-03-12', seen: 'film', rulePack: 'fiba' })
  for (let number = 2; number <= 13; number += 1)
    await newPossession(head, number % 2 === 0 ? rows.scoutedGame : other, { number, leftOpen: ['middle'] })
}, 60_000)
afterAll(() => test.stop())

const rules = async () => (await head.get(teamUrl('/rules'))).body.rows as RuleRow[]
const choices = async () => (await head.get(teamUrl(`/games/${rows.game}/choices`))).body as Choices
const preview = async (body: object) =>
  (await head.post(teamUrl(`/games/${rows.game}/choices/preview`)).send(body)).body as Choices

describe('a rule as it would read', () => {
  it('gives the present order when nothing is changed', async () => {
    const [rule] = await rules()
    expect(await preview(asked(rule as RuleRow))).toEqual(await choices())
  })

  it('takes its reasons out when it would be off, and keeps nothing', async () => {
    const before = await choices()
    const speaking = (await rules()).find(({ id }) => reasonsOf(before, id).length > 0) as RuleRow
    const after = await preview(asked(speaking, { on: false }))
    expect(reasonsOf(after, speaking.id)).toEqual([])
    expect(order(after).sort()).toEqual(order(before).sort())
    expect(await choices()).toEqual(before)
    expect((await rules()).find(({ id }) => id === speaking.id)).toEqual(speaking)
  })

  it('weighs it as it would be written', async () => {
    const before = await choices()
    const speaking = (await rules()).find(({ id }) => reasonsOf(before, id).length > 0) as RuleRow
    const lighter = speaking.then.map((demand) =>
      'strength' in demand ? { ...demand, strength: 'light' as const } : demand,
    )
    const after = await preview(asked(speaking, { then: lighter }))
    for (const reason of reasonsOf(after, speaking.id))
      expect(Math.abs(reason.weight)).toBeLessThanOrEqual(0.2)
  })

  it('may be a rule that is not there yet', async () => {
    const [rule] = await rules()
    const after = await preview({
      ...asked({ ...(rule as RuleRow), when: { fact: 'available', is: 'at-least', value: 1 }, unless: null }),
      id: randomUUID(),
    })
    expect(after.choices).toHaveLength((await choices()).choices.length)
  })
})

describe('what would turn the order', () => {
  it('names a habit, how many of the next six, and who would lead', async () => {
    const { body } = await head.get(teamUrl(`/games/${rows.game}/turns`))
    const known = new Set(order(await choices()))
    for (const turn of body.rows) {
      expect(turn.rows).toBeLessThanOrEqual(turn.of)
      expect(known.has(turn.leads)).toBe(true)
      expect(known.has(turn.counterId)).toBe(true)
    }
  })
})
