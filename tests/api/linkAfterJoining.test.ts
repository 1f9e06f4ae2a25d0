import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { Membership } from '@server/database/entities/Membership'
import { teamUrl } from '../support/fixture'
import { OTHER_TEAM, startTestApp, TEAM, type TestApp } from '../support/testApp'

let test: TestApp
beforeAll(async () => {
  test = await startTestApp()
})
afterAll(() => test.stop())

it('a link to a new password, made for somebody of one team, ends when she joins another', async () => {
  const head = await test.as('head')
  const { id } = await test.context.db.manager.findOneByOrFail(Membership, { teamId: TEAM, role: 'player' })
  const made = await head.post(teamUrl(`/members/${id}/password-link`))
  const [, token = ''] = (made.body.url as string).split('#')
  expect(token).not.toBe('')
  const asked = await (
    await test.as('otherHead')
  )
    .put(teamUrl(`/invitations/${randomUUID()}`, OTHER_TEAM))
    .send({ role: 'assistant-coach', way: 'link', days: 7 })
  const [, secret] = (asked.body.link as string).split('#')
  const player = await test.as('player')
  expect((await player.post('/api/invitations/accept').send({ secret })).status).toBe(201)
  const use = await test
    .anonymous()
    .post('/api/password-resets/use')
    .send({ token, password: 'quite another one' })
  expect(use.status).toBe(410)
})
