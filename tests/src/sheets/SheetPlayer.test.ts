import { describe, it, expect } from 'vitest'
import { flushPromises, mount } from '@vue/test-utils'
import { createMemoryHistory, createRouter } from 'vue-router'
import { readBy } from '@shared/sheets/reader'
import type { SheetView } from '@shared/sheets/schemas'
import BudgetLine from '@/views/sheets/BudgetLine.vue'
import SheetPlayer from '@/views/sheets/SheetPlayer.vue'
import { yourMoves } from '@/views/sheets/yourMoves'
import { FIVE, frozenPlan, sheetView } from '../../support/sheetFixture'

async function open(view: SheetView, address = '/sheet') {
  const router = createRouter({
    history: createMemoryHistory(),
    routes: [{ path: '/sheet', component: SheetPlayer }],
  })
  await router.push(address)
  const page = mount(SheetPlayer, { props: { view, team: 'team' }, global: { plugins: [router] } })
  const next = async () => {
    await page.get('.foot .is-our').trigger('click')
    await flushPromises()
  }
  return { page, router, next }
}

const nell = readBy(sheetView(), FIVE[0].squadPlayerId)

describe('the phone page', () => {
  it('begins with their press and its counts', async () => {
    const { page } = await open(nell)
    expect(page.get('h2').text()).toContain('They trap in the corner.')
    expect(page.findAll('.count').map((count) => count.text())).toEqual(['7 of 11', '4 of 9', '5 of 7'])
    expect(page.get('[aria-current=page]').text()).toBe('Their press')
  })

  it('leads through every step, the change-up and the job, all in the address', async () => {
    const { page, router, next } = await open(nell)
    const seen: string[] = []
    for (let i = 0; i < 7; i += 1) {
      await next()
      seen.push(router.currentRoute.value.fullPath)
    }
    expect(seen).toEqual([
      '/sheet?tab=way',
      '/sheet?tab=way&step=2',
      '/sheet?tab=way&step=3',
      '/sheet?tab=way&step=4',
      '/sheet?tab=way&step=5',
      '/sheet?tab=way&step=6',
      '/sheet?tab=job',
    ])
    expect(page.text()).toContain('You are 1.')
    expect(page.text()).toContain('Don’t dribble into two.')
    expect(page.get('.foot .is-our').attributes('href')).toBe(
      `/api/teams/team/sheets/${nell.id}.pdf?paper=a4`,
    )
  })

  it('opens where the address says and goes back one step', async () => {
    const { page, router } = await open(nell, '/sheet?tab=way&step=3')
    expect(page.text()).toContain('Two come, look middle.')
    expect(page.text()).toContain('Pass to 2.')
    expect(page.text()).toContain('You decide here.')
    await page.get('.step-back').trigger('click')
    await flushPromises()
    expect(router.currentRoute.value.query).toEqual({ tab: 'way', step: '2' })
    expect(page.text()).not.toContain('You decide here.')
  })

  it('has no change-up step where the plan has none', async () => {
    const { page } = await open(
      readBy(sheetView(frozenPlan({ changeUp: null })), FIVE[0].squadPlayerId),
      '/sheet?tab=way&step=6',
    )
    expect(page.text()).toContain('Step 5 of 5')
    expect(page.get('.foot .is-our').text()).toBe('Next: my job')
  })

  it('shows the five to somebody without a role', async () => {
    const { page } = await open(sheetView(), '/sheet?tab=job')
    expect(page.get('[aria-current=page]').text()).toBe('The five')
    for (const { firstName, lastName } of FIVE) {
      expect(page.text()).toContain(`${firstName}.`)
      expect(page.text()).not.toContain(lastName)
    }
  })
})

describe('moves said to whoever makes them', () => {
  const { diagram } = frozenPlan().firstCall
  it('takes hers alone, in order', () => {
    expect(yourMoves(diagram, 1, '1')).toEqual([
      'Come off 2’s screen.',
      'Cut to the right block.',
      'Catch from 5.',
    ])
    expect(yourMoves(diagram, 1, '2')).toEqual(['Screen for 1.'])
    expect(yourMoves(diagram, 1, '5')).toEqual(['Throw in to 1.'])
    expect(yourMoves(diagram, 1, '3')).toEqual([])
    expect(yourMoves(diagram, 40, '3')).toEqual([])
  })
})

describe('the budget line', () => {
  it('gives the count, and warns only when it is over', () => {
    const within = mount(BudgetLine, { props: { budget: { words: 112, limit: 120, over: false } } })
    expect(within.text()).toContain('112 of 120 words')
    expect(within.find('.flag').exists()).toBe(false)
    const over = mount(BudgetLine, { props: { budget: { words: 134, limit: 120, over: true } } })
    expect(over.get('.flag').text()).toMatch(/five to seven things.*134 words, 14 too many/s)
  })
})
