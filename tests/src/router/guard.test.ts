import { createPinia, setActivePinia } from 'pinia'
import { createMemoryHistory, type RouteRecordRaw } from 'vue-router'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import type { Session, SessionTeam } from '@shared/session/schemas'
import { safePath } from '@/router/guard'
import { createAppRouter } from '@/router/router'
import { routes } from '@/router/routes'
import { useSessionStore } from '@/stores/session'

/** The app's own routes with empty pages: the guard is the matter here, not the views. */
const empty = (all: readonly RouteRecordRaw[]): RouteRecordRaw[] =>
  all.map((route) => ({
    ...route,
    ...(route.component ? { component: { render: () => null } } : {}),
    ...(route.children ? { children: empty(route.children) } : {}),
  })) as RouteRecordRaw[]
const newRouter = () => createAppRouter(useSessionStore(), createMemoryHistory(), empty(routes))

const TEAM = '11111111-1111-4111-8111-111111111111'
const OTHER = '22222222-2222-4222-8222-222222222222'
const team = (id: string, role: SessionTeam['role'], can: SessionTeam['can']): SessionTeam => ({
  id,
  name: 'Herons',
  squadName: 'U17 girls',
  timeZone: 'Europe/London',
  season: '2025/26',
  rulePack: 'fiba',
  role,
  can,
  squadPlayerId: null,
})
const staff = team(TEAM, 'head-coach', ['game:read', 'opponent:read', 'sheet:read'])
const player = team(TEAM, 'player', ['sheet:read'])
const of = (...teams: SessionTeam[]): Session => ({
  person: { id: '33333333-3333-4333-8333-333333333333', name: 'Maren Oduya', initials: 'MO' },
  teams,
})

const fetchMock = vi.fn<typeof fetch>()
const answer = (session: Session | null) =>
  fetchMock.mockImplementation(() =>
    Promise.resolve(
      session === null
        ? Response.json(
            { type: 'x', title: 'Not signed in', status: 401, detail: 'Sign in first.', instance: '/' },
            { status: 401 },
          )
        : Response.json(session),
    ),
  )

beforeEach(() => {
  setActivePinia(createPinia())
  fetchMock.mockReset()
  vi.stubGlobal('fetch', fetchMock)
  vi.stubGlobal('scrollTo', () => undefined)
})
afterEach(() => vi.unstubAllGlobals())

async function open(path: string) {
  const router = newRouter()
  await router.push(path)
  return router.currentRoute.value
}

describe('the guard', () => {
  it('keeps the wanted address through sign-in', async () => {
    answer(null)
    const route = await open(`/t/${TEAM}/squad?sort=name#bench`)
    expect(route.name).toBe('sign-in')
    expect(route.query.to).toBe(`/t/${TEAM}/squad?sort=name#bench`)
  })

  it('asks for no address where the first page is meant', async () => {
    answer(null)
    expect((await open('/')).fullPath).toBe('/sign-in')
  })

  it('asks who is signed in only once', async () => {
    answer(of(staff))
    const router = newRouter()
    await router.push(`/t/${TEAM}/squad`)
    await router.push(`/t/${TEAM}/library`)
    expect(fetchMock).toHaveBeenCalledOnce()
    expect(router.currentRoute.value.name).toBe('library')
  })

  it('sends staff to the week, players to their sheets, and who has two teams to choose', async () => {
    answer(of(staff))
    expect((await open('/')).name).toBe('week')
    setActivePinia(createPinia())
    answer(of(player))
    expect((await open('/')).name).toBe('sheets')
    setActivePinia(createPinia())
    answer(of(staff, team(OTHER, 'player', ['sheet:read'])))
    expect((await open('/')).name).toBe('teams')
    expect((await open(`/t/${OTHER}`)).name).toBe('sheets')
  })

  it('shows not-found under the same address for a team that is not theirs', async () => {
    answer(of(staff))
    const route = await open(`/t/${OTHER}/squad?a=1`)
    expect(route.name).toBe('not-found')
    expect(route.fullPath).toBe(`/t/${OTHER}/squad?a=1`)
  })

  it('leads a signed-in person from sign-in to the wanted address, never to a foreign one', async () => {
    answer(of(staff))
    expect((await open(`/sign-in?to=/t/${TEAM}/library`)).name).toBe('library')
    expect((await open('/sign-in?to=https://elsewhere.example/t')).name).toBe('week')
  })

  it('says that there is no signal and keeps the address, when nobody can be asked', async () => {
    fetchMock.mockRejectedValue(new TypeError('Failed to fetch'))
    const route = await open(`/t/${TEAM}/squad`)
    expect(route.name).toBe('no-signal')
    expect(route.query.to).toBe(`/t/${TEAM}/squad`)
  })
})

describe('safePath', () => {
  it.each(['/', '/t/x/squad?sort=name#bench', '/t/x/opponents/y/read'])('takes %s', (path) => {
    expect(safePath(path)).toBe(path)
  })

  it.each([
    'https://elsewhere.example',
    '//elsewhere.example',
    '/\\elsewhere.example',
    '/\t/elsewhere.example',
    'javascript:alert(1)',
    'squad',
    '',
    '/sign-in?to=/x',
    '/a\\b',
    null,
    ['/a', '/b'],
  ])('refuses %j', (wanted) => {
    expect(safePath(wanted)).toBeNull()
  })
})
