import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { z } from 'zod'
import { onSignedOut, queryText, request, requestNothing, teamPath, upload } from '@/api/http'
import { ApiProblem, isAbort, OfflineError, UnreadableAnswer } from '@/api/problems'

const Row = z.object({ id: z.string(), version: z.number() })
const row = { id: 'a', version: 3 }

const problem = (status: number, extra: object = {}) =>
  new Response(
    JSON.stringify({
      type: '/problems/x',
      title: 'Changed meanwhile',
      status,
      detail: 'Somebody changed this first.',
      instance: '/api/x',
      ...extra,
    }),
    { status, headers: { 'content-type': 'application/problem+json' } },
  )

const fetchMock = vi.fn<typeof fetch>()
beforeEach(() => {
  fetchMock.mockReset()
  vi.stubGlobal('fetch', fetchMock)
})
afterEach(() => {
  onSignedOut(() => undefined)
  vi.unstubAllGlobals()
})

const caught = async (work: Promise<unknown>): Promise<unknown> => {
  try {
    await work
  } catch (error) {
    return error
  }
  throw new Error('it should have failed')
}

describe('request', () => {
  it('parses the answer with the schema and sends JSON with If-Match', async () => {
    fetchMock.mockResolvedValue(Response.json({ ...row, more: 'left out' }))
    const answer = await request('PUT', '/api/x', Row, { body: { name: 'Gulls' }, version: 3 })
    expect(answer).toEqual(row)
    const [, init] = fetchMock.mock.calls[0]!
    expect(init).toMatchObject({ method: 'PUT', credentials: 'same-origin', body: '{"name":"Gulls"}' })
    expect(init?.headers).toMatchObject({ 'If-Match': '"3"', 'Content-Type': 'application/json' })
  })

  it('sends neither a body nor If-Match where none is given', async () => {
    fetchMock.mockResolvedValue(Response.json(row))
    await request('GET', '/api/x', Row)
    const [, init] = fetchMock.mock.calls[0]!
    expect(init).not.toHaveProperty('body')
    expect(init?.headers).toEqual({ Accept: 'application/json' })
  })

  it('turns a problem document into an ApiProblem with its fields by name', async () => {
    fetchMock.mockResolvedValue(problem(400, { errors: [{ field: 'name', message: 'This name is taken.' }] }))
    const error = await caught(request('GET', '/api/x', Row))
    expect(error).toBeInstanceOf(ApiProblem)
    expect(error).toMatchObject({ status: 400, message: 'Somebody changed this first.', isConflict: false })
    expect((error as ApiProblem).fieldMessage('name')).toBe('This name is taken.')
    expect((error as ApiProblem).fieldMessage('other')).toBeUndefined()
  })

  it('carries the present row of a 412', async () => {
    fetchMock.mockResolvedValue(problem(412, { current: { id: 'a', version: 4 } }))
    const error = (await caught(request('PUT', '/api/x', Row, { body: {}, version: 3 }))) as ApiProblem
    expect(error.isConflict).toBe(true)
    expect(Row.parse(error.current)).toEqual({ id: 'a', version: 4 })
  })

  it('says in our own words what has no problem document', async () => {
    fetchMock.mockResolvedValue(new Response('<h1>Internal Server Error</h1>', { status: 500 }))
    const error = (await caught(request('GET', '/api/x', Row))) as ApiProblem
    expect(error.status).toBe(500)
    expect(error.message).not.toContain('Internal')
  })

  it('is offline when nothing came back, and when a gateway answers for a server that is away', async () => {
    fetchMock.mockRejectedValueOnce(new TypeError('Failed to fetch'))
    expect(await caught(request('GET', '/api/x', Row))).toBeInstanceOf(OfflineError)
    fetchMock.mockResolvedValueOnce(new Response('Bad gateway', { status: 502 }))
    expect(await caught(request('GET', '/api/x', Row))).toBeInstanceOf(OfflineError)
  })

  it('refuses an answer that does not fit the schema', async () => {
    fetchMock.mockResolvedValueOnce(Response.json({ id: 'a' }))
    expect(await caught(request('GET', '/api/x', Row))).toBeInstanceOf(UnreadableAnswer)
    fetchMock.mockResolvedValueOnce(new Response('not JSON'))
    expect(await caught(request('GET', '/api/x', Row))).toBeInstanceOf(UnreadableAnswer)
  })

  it('leaves an abort an abort', async () => {
    const stop = new AbortController()
    fetchMock.mockImplementation(() => {
      stop.abort()
      return Promise.reject(stop.signal.reason as DOMException)
    })
    expect(isAbort(await caught(request('GET', '/api/x', Row, { signal: stop.signal })))).toBe(true)
  })

  it('tells the session on any 401', async () => {
    const told = vi.fn()
    onSignedOut(told)
    fetchMock.mockResolvedValue(problem(401))
    await caught(requestNothing('DELETE', '/api/x'))
    expect(told).toHaveBeenCalledOnce()
  })

  it('takes an empty answer only where none is expected', async () => {
    fetchMock.mockResolvedValue(new Response(null, { status: 204 }))
    await expect(requestNothing('DELETE', '/api/x')).resolves.toBeUndefined()
  })
})

describe('paths and queries', () => {
  it('joins lists by commas and leaves out what is not asked', () => {
    expect(queryText({ trigger: ['break', 'live'], period: [], shape: undefined, limit: 20 })).toBe(
      '?trigger=break%2Clive&limit=20',
    )
    expect(queryText({})).toBe('')
  })

  it('escapes ids, so that none leaves its place in the path', () => {
    expect(teamPath('t', 'games', '../rules')).toBe('/api/teams/t/games/..%2Frules')
  })
})

class FakeXhr {
  static last: FakeXhr
  upload: { onprogress?: (event: object) => void } = {}
  headers: Record<string, string> = {}
  status = 0
  responseText = ''
  onload?: () => void
  onerror?: () => void
  onabort?: () => void
  onloadend?: () => void
  constructor() {
    FakeXhr.last = this
  }
  open(method: string, path: string) {
    this.headers.request = `${method} ${path}`
  }
  setRequestHeader(name: string, value: string) {
    this.headers[name] = value
  }
  send() {}
  abort() {
    this.onabort?.()
  }
  answer(status: number, text: string) {
    this.status = status
    this.responseText = text
    this.onload?.()
    this.onloadend?.()
  }
}

describe('upload', () => {
  beforeEach(() => vi.stubGlobal('XMLHttpRequest', FakeXhr))

  it('tells how much has gone and parses the answer', async () => {
    const shares: number[] = []
    const work = upload('/api/still', new FormData(), Row, { onProgress: (share) => shares.push(share) })
    FakeXhr.last.upload.onprogress?.({ lengthComputable: true, loaded: 30, total: 120 })
    FakeXhr.last.upload.onprogress?.({ lengthComputable: false, loaded: 1, total: 0 })
    FakeXhr.last.answer(201, JSON.stringify(row))
    expect(await work).toEqual(row)
    expect(shares).toEqual([0.25])
    expect(FakeXhr.last.headers.request).toBe('PUT /api/still')
  })

  it('fails as a request does', async () => {
    const refused = upload('/api/still', new FormData(), Row)
    FakeXhr.last.answer(413, await problem(413).text())
    expect(await caught(refused)).toMatchObject({ name: 'ApiProblem', status: 413 })

    const lost = upload('/api/still', new FormData(), Row)
    FakeXhr.last.onerror?.()
    expect(await caught(lost)).toBeInstanceOf(OfflineError)

    const stop = new AbortController()
    const stopped = upload('/api/still', new FormData(), Row, { signal: stop.signal })
    stop.abort()
    expect(isAbort(await caught(stopped))).toBe(true)
  })
})
