import { effectScope, type EffectScope } from 'vue'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import type { PlanBody, PlanRow } from '@shared/plans/schemas'
import { usePlan } from '@/views/choices/usePlan'

const id = (last: number) => `00000000-0000-4000-8000-${String(last).padStart(12, '0')}`
const [box, stack, game] = [id(1), id(2), id(3)]
const NOW = '2026-12-01T12:00:00.000Z'

/** A server with one plan, as the real one answers: 201 and 200, 409 without a version, 412 for a stale one. */
function fakeServer() {
  const server = {
    row: null as PlanRow | null,
    online: true,
    puts: [] as { body: PlanBody; ifMatch: string | null }[],
    save(body: PlanBody, number = 1): PlanRow {
      const version = (server.row?.version ?? 0) + 1
      const { id: planId, ...rest } = body
      const stamp = { createdAt: NOW, updatedAt: NOW }
      server.row = {
        ...stamp,
        ...rest,
        id: planId,
        version,
        gameId: game,
        number,
        signedAt: null,
        signedBy: null,
      }
      return server.row
    },
  }
  const problem = (status: number) => ({
    type: '/problems/x',
    title: 'x',
    status,
    detail: 'Somebody changed this.',
    instance: '/',
    current: server.row,
  })
  vi.stubGlobal('fetch', async (path: string, init: RequestInit) => {
    if (!server.online) throw new TypeError('no network')
    const ifMatch = new Headers(init.headers).get('If-Match')
    const body = JSON.parse(String(init.body)) as PlanBody
    const answer = (status: number, value: unknown) => new Response(JSON.stringify(value), { status })
    if (path.endsWith('/sign-off')) {
      const row = server.row as PlanRow
      server.row = { ...row, version: row.version + 1, signedAt: NOW, signedBy: 'Maren' }
      return answer(200, { plan: server.row, versions: [] })
    }
    server.puts.push({ body, ifMatch })
    const open = server.row
    if (open !== null && open.id === body.id && ifMatch !== `"${open.version}"`)
      return answer(412, problem(412))
    if (open !== null && open.id !== body.id && open.signedAt === null) return answer(409, problem(409))
    const number = open === null ? 1 : open.id === body.id ? open.number : open.number + 1
    return answer(200, server.save(body, number))
  })
  return server
}

describe('a plan while it is worked on', () => {
  let scope: EffectScope
  let server: ReturnType<typeof fakeServer>
  const start = (row: PlanRow | null = null) => {
    const plan = scope.run(() =>
      usePlan({
        teamId: id(9),
        gameId: game,
        personId: id(8),
        row,
        suggested: () => [{ role: '1', squadPlayerId: id(101) }],
        nameOf: (counter) => (counter === box ? 'Box' : 'Stack'),
      }),
    )
    if (plan === undefined) throw new Error('the scope has ended')
    return plan
  }
  const settle = () => vi.advanceTimersByTimeAsync(1000)

  beforeEach(() => {
    vi.useFakeTimers()
    sessionStorage.clear()
    server = fakeServer()
    scope = effectScope()
  })
  afterEach(() => {
    scope.stop()
    vi.useRealTimers()
    vi.unstubAllGlobals()
  })

  it('saves a pick at once, with its roles, and edits the same version after', async () => {
    const plan = start()
    plan.pick(box, 'first')
    await settle()
    expect(server.row).toMatchObject({ firstCallId: box, number: 1 })
    expect(server.row?.roles).toEqual([{ counterId: box, role: '1', squadPlayerId: id(101) }])
    plan.pick(stack, 'change')
    await settle()
    expect(server.puts.map((put) => put.ifMatch)).toEqual([null, '"1"'])
    expect(new Set(server.puts.map((put) => put.body.id)).size).toBe(1)
    expect(plan.unsent.value).toBe(false)
  })

  it('sends typing once it rests, not letter by letter', async () => {
    const plan = start()
    for (const text of ['L', 'Lo', 'Look']) plan.setKeys([text])
    await settle()
    expect(server.puts.map((put) => put.body.keys)).toEqual([['Look']])
  })

  it('takes a newer version and keeps the keys typed here until they are saved over it', async () => {
    const row = server.save({
      id: id(50),
      firstCallId: box,
      changeUpId: null,
      notThisGame: [],
      roles: [],
      keys: ['Look long'],
      reason: '',
    })
    const plan = start(row)
    server.save({ ...row, firstCallId: stack, keys: ['Stop short'] })
    plan.setKeys(['Catch high'])
    await settle()
    expect(plan.newer.value).toEqual({
      sentences: ['The first call is now Stack.', 'The keys were changed.'],
      keptKeys: true,
    })
    expect(plan.draft.value).toMatchObject({ firstCallId: stack, keys: ['Catch high'] })
    expect(server.row?.keys).toEqual(['Stop short'])
    await plan.save()
    expect(server.row).toMatchObject({ firstCallId: stack, keys: ['Catch high'] })
  })

  it('takes over a version that somebody else began first', async () => {
    const plan = start()
    server.save({
      id: id(51),
      firstCallId: stack,
      changeUpId: null,
      notThisGame: [],
      roles: [],
      keys: [],
      reason: '',
    })
    plan.pick(box, 'first')
    await settle()
    expect(plan.newer.value?.sentences).toEqual(['The first call is now Stack.'])
    plan.pick(box, 'first')
    await settle()
    expect(server.row).toMatchObject({ id: id(51), firstCallId: box })
  })

  it('keeps everything without a signal and sends it when the signal is back', async () => {
    const plan = start()
    server.online = false
    plan.pick(box, 'first')
    await settle()
    expect([plan.offline.value, plan.unsent.value]).toEqual([true, true])
    server.online = true
    window.dispatchEvent(new Event('online'))
    await settle()
    expect([plan.offline.value, plan.unsent.value]).toEqual([false, false])
    expect(server.row?.firstCallId).toBe(box)
  })

  it('remembers unsent picks over a fresh start of the page', async () => {
    server.online = false
    start().pick(box, 'first')
    await settle()
    scope.stop()
    scope = effectScope()
    server.online = true
    const plan = start()
    expect(plan.draft.value.firstCallId).toBe(box)
    await settle()
    expect(server.row?.firstCallId).toBe(box)
    expect(sessionStorage).toHaveLength(0)
  })

  it('signs what is saved, then changes nothing until the next version is begun', async () => {
    const plan = start()
    plan.pick(box, 'first')
    const sheet = await plan.signOff()
    expect(plan.signed.value).toBe(true)
    plan.pick(stack, 'first')
    await settle()
    expect(server.row?.firstCallId).toBe(box)
    await plan.startNext()
    expect(server.row).toMatchObject({ firstCallId: box, number: 2, signedAt: null })
    expect(new Set(server.puts.map((put) => put.body.id)).size).toBe(2)
    plan.pick(stack, 'first')
    await settle()
    expect(server.row).toMatchObject({ firstCallId: stack, number: 2 })
    expect(await plan.signOff()).not.toBe(sheet)
  })
})
