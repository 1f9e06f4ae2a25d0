import { flushPromises, mount } from '@vue/test-utils'
import { createPinia } from 'pinia'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import { createMemoryHistory, createRouter } from 'vue-router'
import { OfflineError } from '@/api/problems'
import { useSessionStore } from '@/stores/session'
import ReadView from '@/views/tendencies/ReadView.vue'
import { readOf, tally } from './tally'

const TEAM = '44444444-4444-4444-8444-444444444444'
const OPPONENT = '11111111-1111-4111-8111-111111111111'
const api = vi.hoisted(() => ({ getTendencies: vi.fn(), getEvidence: vi.fn(), postSession: vi.fn() }))
vi.mock('@/api/tendencies', () => api)
vi.mock('@/api/session', () => ({ ...api, getSession: vi.fn(), deleteSession: vi.fn() }))
vi.mock('@/api/games', () => ({ listGames: () => Promise.resolve({ rows: [], total: 0 }) }))
vi.mock('@/api/scoutedGames', () => ({ listScoutedGames: () => Promise.resolve({ rows: [], total: 0 }) }))
vi.mock('@/api/opponents', () => ({
  getOpponent: (_team: string, id: string) =>
    Promise.resolve({ id, name: 'Port Selby Gulls', nextGame: null }),
}))

const situations = [
  { trigger: 'all', pressed: 30, n: 40 },
  { trigger: 'dead-ball', pressed: 4, n: 12 },
] as const
const all = readOf([tally('press', 30, 40)], { situations: [...situations] })
const dead = readOf([tally('press', 4, 12)], { counted: 12, situations: [...situations] })

async function page(query = '') {
  const router = createRouter({
    history: createMemoryHistory(),
    routes: [
      { path: '/t/:team/read/:opponent', name: 'read', component: ReadView, props: true },
      { path: '/t/:team/scout/:opponent', name: 'scouted-games', component: { template: '<i />' } },
      { path: '/t/:team/possessions/:opponent', name: 'possessions', component: { template: '<i />' } },
    ],
  })
  await router.push(`/t/${TEAM}/read/${OPPONENT}${query}`)
  const pinia = createPinia()
  const session = useSessionStore(pinia)
  api.postSession.mockResolvedValue({
    person: { id: OPPONENT, name: 'Maren Oduya', initials: 'MO' },
    teams: [
      {
        id: TEAM,
        name: 'Herons',
        squadName: '',
        timeZone: 'Europe/London',
        season: '',
        rulePack: 'fiba',
        role: 'head-coach',
        can: [],
        squadPlayerId: null,
      },
    ],
  })
  await session.signIn({ email: 'a@b.example', password: 'x' })
  session.enter(TEAM)
  const wrapper = mount(ReadView, { props: { opponent: OPPONENT }, global: { plugins: [pinia, router] } })
  await flushPromises()
  return { wrapper, router }
}

beforeEach(() => {
  vi.stubGlobal(
    'ResizeObserver',
    class {
      observe() {}
      unobserve() {}
      disconnect() {}
    },
  )
  api.getTendencies.mockReset().mockResolvedValue(all)
})

describe('the read of an opponent', () => {
  it('asks for the situation of its address and writes a choice into it', async () => {
    const { wrapper, router } = await page('?period=4')
    expect(api.getTendencies.mock.calls[0]?.slice(0, 3)).toEqual([TEAM, OPPONENT, { period: [4] }])
    await wrapper.findAll('.choice')[1]!.trigger('click')
    await flushPromises()
    expect(router.currentRoute.value.query).toEqual({ trigger: 'dead-ball', period: '4' })
    expect(api.getTendencies.mock.calls[1]?.[2]).toEqual({ trigger: ['dead-ball'], period: [4] })
  })

  it('gives new counts the new situation’s name, and goes back with the address', async () => {
    const { wrapper, router } = await page()
    expect(wrapper.get('.sentence').text()).toContain('They usually press.')
    api.getTendencies.mockResolvedValue(dead)
    await router.push({ query: { trigger: 'dead-ball' } })
    await flushPromises()
    expect(wrapper.get('.sentence').text()).toContain('After dead balls they pressed 4 of 12.')
    api.getTendencies.mockResolvedValue(all)
    await router.push({ query: {} })
    await flushPromises()
    expect(wrapper.get('.sentence').text()).toContain('They usually press.')
  })

  it('never gives old counts the name of a situation that did not come', async () => {
    const { wrapper, router } = await page()
    api.getTendencies.mockRejectedValue(new OfflineError())
    await router.push({ query: { trigger: 'dead-ball' } })
    await flushPromises()
    expect(wrapper.get('.sentence').text()).not.toContain('dead balls')
    expect(wrapper.text()).toContain('Not counted yet.')
  })

  it('leads to Scout when nothing is logged, and out of a filter that nothing fits', async () => {
    api.getTendencies.mockResolvedValue(readOf([], { counted: 0 }))
    const empty = await page()
    expect(empty.wrapper.text()).toContain('Nothing logged yet')
    expect(empty.wrapper.get('.state a').attributes('href')).toBe(`/t/${TEAM}/scout/${OPPONENT}`)
    const narrow = await page('?trigger=live')
    expect(narrow.wrapper.text()).toContain('No possession fits this')
    await narrow.wrapper.get('.state button').trigger('click')
    await flushPromises()
    expect(narrow.router.currentRoute.value.query).toEqual({})
  })
})
