import { effectScope, nextTick } from 'vue'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { PossessionRow, type PossessionBody } from '@shared/possessions/schemas'
import { ApiProblem, OfflineError } from '@/api/problems'
import { bodyOfDraft } from '@/views/possessions/draft'
import { verdictOf } from '@/views/possessions/outbox'
import { useOutbox } from '@/views/possessions/useOutbox'
import { fresh, GAME, press, ROW } from './walk'

const body = (keys = '1 2 1 1 1 4'): PossessionBody => {
  const made = bodyOfDraft(press(fresh(), keys).draft)
  if (made === null) throw new Error('not whole')
  return made
}
const rowOf = (of: PossessionBody, version = 1, id = ROW): PossessionRow =>
  PossessionRow.parse({
    ...of,
    traps: Array.isArray(of.traps)
      ? of.traps.map((trap) => ({ ...trap, spot: 'coffin-corner', side: 'left' }))
      : of.traps,
    id,
    version,
    createdAt: '2026-03-14T10:00:00.000Z',
    updatedAt: '2026-03-14T10:00:00.000Z',
    pressed: true,
    stills: [],
  })
const problem = (status: number, current?: unknown) =>
  new ApiProblem({
    type: 'about:blank',
    title: 't',
    status,
    detail: `fault ${status}`,
    instance: '/',
    current,
  })

describe('what a failed try means', () => {
  it('waits for the signal and for a server in trouble', () => {
    const entry = { body: body(), version: null }
    for (const error of [new OfflineError(), problem(500), problem(429), problem(401), new Error('odd')])
      expect(verdictOf(error, entry).kind).toBe('later')
  })

  it('takes an answer that got lost for what it was', () => {
    const of = body()
    expect(verdictOf(problem(412, rowOf(of, 4)), { body: of, version: 3 })).toMatchObject({
      kind: 'sent',
      row: { version: 4 },
    })
  })

  it('builds on its own first body when the row was changed before it was known to be there', () => {
    expect(verdictOf(problem(409, rowOf(body())), { body: body('1 2 1 8 2'), version: null })).toEqual({
      kind: 'again',
      version: 1,
    })
  })

  it('never writes over a change of somebody else', () => {
    expect(verdictOf(problem(409, rowOf(body(), 2)), { body: body('3 7'), version: null }).kind).toBe(
      'conflict',
    )
    expect(verdictOf(problem(412, rowOf(body(), 2)), { body: body('3 7'), version: 1 }).kind).toBe('conflict')
  })

  it('keeps what the server refuses, with its words', () => {
    const verdict = verdictOf(problem(400), { body: body(), version: null })
    expect(verdict.kind === 'refused' && verdict.error.message).toBe('fault 400')
    expect(verdictOf(problem(409), { body: body(), version: null }).kind).toBe('refused')
  })
})

describe('the outbox', () => {
  let scope = effectScope()
  beforeEach(() => {
    localStorage.clear()
    vi.useFakeTimers()
    scope = effectScope()
  })
  afterEach(() => {
    scope.stop()
    vi.useRealTimers()
  })
  const settle = async () => {
    for (let turn = 0; turn < 8; turn += 1) await Promise.resolve()
    await nextTick()
  }
  const open = (send: (id: string, body: PossessionBody, version?: number) => Promise<PossessionRow>) => {
    const sent: PossessionRow[] = []
    const box = scope.run(() => useOutbox({ person: 'p', game: GAME, send, sent: (row) => sent.push(row) }))
    if (box === undefined) throw new Error('no scope')
    return { box, sent }
  }
  const second = '0b0c7c0e-8a8e-4d58-9d5f-1d9a3a1f0a02'

  it('keeps a row on the device until the server has it', async () => {
    let there: (row: PossessionRow) => void = () => undefined
    const { box, sent } = open(() => new Promise((resolve) => (there = resolve)))
    box.put(ROW, body(), null)
    expect(Object.keys(localStorage)).toHaveLength(1)
    there(rowOf(body()))
    await settle()
    expect(sent).toHaveLength(1)
    expect(box.entries.value).toEqual([])
    expect(Object.keys(localStorage)).toHaveLength(0)
  })

  it('sends again, under the same id, when the signal is back', async () => {
    let signal = false
    const ids: string[] = []
    const { box, sent } = open((id, of) => {
      ids.push(id)
      return signal ? Promise.resolve(rowOf(of, 1, id)) : Promise.reject(new OfflineError())
    })
    box.put(ROW, body(), null)
    await settle()
    box.put(second, { ...body(), number: 2 }, null)
    await settle()
    expect(box.offline.value).toBe(true)
    expect(box.waiting.value).toHaveLength(2)
    signal = true
    window.dispatchEvent(new Event('online'))
    await settle()
    await settle()
    expect(sent.map((row) => row.id)).toEqual([ROW, second])
    expect(new Set(ids)).toEqual(new Set([ROW, second]))
    expect(box.offline.value).toBe(false)
  })

  it('finds the rows of an earlier visit, and only those of this person and game', async () => {
    const first = open(() => Promise.reject(new OfflineError()))
    first.box.put(ROW, body(), null)
    await settle()
    scope.stop()
    scope = effectScope()
    const { sent } = open((id, of) => Promise.resolve(rowOf(of, 1, id)))
    await settle()
    expect(sent.map((row) => row.id)).toEqual([ROW])
    const other = scope.run(() =>
      useOutbox({
        person: 'another',
        game: GAME,
        send: () => Promise.reject(new OfflineError()),
        sent: () => undefined,
      }),
    )
    expect(other?.entries.value).toEqual([])
  })

  it('does not lose a change made while the row was under way', async () => {
    const answers: ((row: PossessionRow) => void)[] = []
    const versions: (number | undefined)[] = []
    const { box, sent } = open((_, __, version) => {
      versions.push(version)
      return new Promise((resolve) => answers.push(resolve))
    })
    box.put(ROW, body(), null)
    box.put(ROW, body('1 2 1 8 2'), null)
    answers[0]?.(rowOf(body()))
    await settle()
    expect(versions).toEqual([undefined, 1])
    answers[1]?.(rowOf(body('1 2 1 8 2'), 2))
    await settle()
    expect(sent.at(-1)?.version).toBe(2)
    expect(box.entries.value).toEqual([])
  })

  it('goes past a row that is refused and keeps it with the reason', async () => {
    const { box, sent } = open((id, of) =>
      id === ROW ? Promise.reject(problem(400)) : Promise.resolve(rowOf(of, 1, id)),
    )
    box.put(ROW, body(), null)
    box.put(second, { ...body(), number: 2 }, null)
    await settle()
    await settle()
    expect(sent.map((row) => row.id)).toEqual([second])
    expect(box.find(ROW)).toMatchObject({ state: 'refused', why: 'fault 400' })
  })

  it('lets the scout say which of two versions holds', async () => {
    let stale = true
    const versions: (number | undefined)[] = []
    const { box, sent } = open((_, of, version) => {
      versions.push(version)
      return stale ? Promise.reject(problem(412, rowOf(body('3 7'), 5))) : Promise.resolve(rowOf(of, 6))
    })
    box.put(ROW, body(), 4)
    await settle()
    expect(box.find(ROW)?.state).toBe('conflict')
    stale = false
    box.settle(ROW, 'ours')
    await settle()
    expect(versions).toEqual([4, 5])
    expect(sent.at(-1)?.outcome).toBe('lost-live')
    expect(box.entries.value).toEqual([])
  })

  it('takes theirs without sending anything', async () => {
    const send = vi.fn(() => Promise.reject(problem(412, rowOf(body('3 7'), 5))))
    const { box, sent } = open(send)
    box.put(ROW, body(), 4)
    await settle()
    box.settle(ROW, 'theirs')
    await settle()
    expect(send).toHaveBeenCalledTimes(1)
    expect(sent.at(-1)).toMatchObject({ version: 5, shape: 'dropped-back' })
  })
})
