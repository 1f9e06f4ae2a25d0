import { afterEach, describe, expect, it, vi } from 'vitest'
import { z } from 'zod'
import { request } from '@/api/http'
import { forgetKept, keptAt } from '@/api/kept'
import { isKept, KEPT_AT, KEPT_CACHE } from '@/worker/kept'

const ID = 'a3bb189e-8bf9-4888-9912-ace4e6543002'
afterEach(() => vi.unstubAllGlobals())

const answer = (headers: HeadersInit) =>
  vi.stubGlobal('fetch', () => Promise.resolve(Response.json({ id: 'a' }, { headers })))

describe('a copy from this device', () => {
  it('is told from a fresh answer, with when it was fetched', async () => {
    answer({ [KEPT_AT]: '2026-03-20T18:42:00.000Z' })
    const copy = await request('GET', '/api/x', z.object({ id: z.string() }))
    expect(keptAt(copy)).toBe(Date.parse('2026-03-20T18:42:00Z'))
    answer({})
    expect(keptAt(await request('GET', '/api/x', z.object({ id: z.string() })))).toBeNull()
    expect([keptAt(null), keptAt('a')]).toEqual([null, null])
  })

  it('is of the session and of sheets only', () => {
    expect(isKept('/api/session')).toBe(true)
    expect(isKept(`/api/teams/${ID}/sheets`)).toBe(true)
    expect(isKept(`/api/teams/${ID}/sheets/${ID}.pdf`)).toBe(true)
    for (const path of ['squad', `sheets/${ID}/openings`, `sheets/${ID}/copies`, 'people', `stills/${ID}`])
      expect(isKept(`/api/teams/${ID}/${path}`), path).toBe(false)
  })

  it('is thrown away whole, and a browser without such a place is no fault', async () => {
    await expect(forgetKept()).resolves.toBeUndefined()
    const gone: string[] = []
    vi.stubGlobal('caches', { delete: (name: string) => Promise.resolve(gone.push(name) > 0) })
    await forgetKept()
    expect(gone).toEqual([KEPT_CACHE])
  })
})
