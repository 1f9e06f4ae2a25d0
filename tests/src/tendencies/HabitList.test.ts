import { mount } from '@vue/test-utils'
import { describe, expect, it } from 'vitest'
import HabitList from '@/views/tendencies/HabitList.vue'
import { readOf, tally } from './tally'

const list = (tendencies: ReturnType<typeof tally>[], over = {}) =>
  mount(HabitList, {
    props: { read: readOf(tendencies, over), open: null, shown: 'short', inSituation: false, given: [] },
  })
const spoken = (text: string) => text.replace(/\s+/g, ' ').trim()

describe('the list of habits', () => {
  it('says k of n over g games, what n counts, grade and claim', () => {
    const row = list([tally('pickup:full', 18, 22, 3)]).get('.habit')
    const text = spoken(row.text())
    expect(text).toContain('18 of 22')
    expect(text).toContain('over 3 games')
    expect(text).toContain('Firm')
    expect(text).toContain('pressed, pick-up logged')
    expect(text).toContain('usually')
    expect(row.classes()).not.toContain('is-thin')
    expect(row.get('[role=img]').attributes('aria-label')).toMatch(
      /^18 of 22, likely between \d+ and \d+ in 100$/,
    )
  })

  it('shows thin as thin: the word, the weight and the hollow bar', () => {
    const row = list([tally('deny:near', 3, 4, 1)]).get('.habit')
    expect(row.classes()).toContain('is-thin')
    expect(spoken(row.text())).toContain('Thin. Sighting, over 1 game.')
    expect(row.find('.interval.is-thin').exists()).toBe(true)
    expect(spoken(row.text())).not.toContain('usually')
  })

  it('gives the room they leave our ink', () => {
    const row = list([tally('leave-open:middle', 13, 18)]).get('.habit')
    expect(row.classes()).toContain('is-our')
    expect(row.find('.interval.is-our').exists()).toBe(true)
  })

  it('opens a habit and tells which is open', async () => {
    const wrapper = list([tally('press', 20, 30)])
    await wrapper.get('.habit').trigger('click')
    expect(wrapper.emitted('open')).toEqual([['press']])
    await wrapper.setProps({ open: 'press' })
    expect(wrapper.get('.habit').attributes('aria-expanded')).toBe('true')
  })

  it('tells luck, what the marks mean and what was not covered, without a percent sign', () => {
    const text = spoken(
      list([tally('press', 20, 30)], {
        notCovered: 12,
        ball: [],
        luck: { inView: 54, claimed: 14, byChance: 6.4 },
      }).text(),
    )
    expect(text).toContain('Diamond or dot: what we counted.')
    expect(text).toContain('95 times in 100')
    expect(text).toContain('of 54 habits counted here 14 come out usually or rarely')
    expect(text).toContain('chance alone would give about 6')
    expect(text).toContain('12 rows were outside what was covered and are not counted.')
    expect(text).not.toContain('%')
  })

  it('shows all in groups and what was never seen', async () => {
    const wrapper = list([tally('press', 20, 30), tally('fake', 0, 30), tally('trap-again', 4, 9)])
    await wrapper.get('.foot .link').trigger('click')
    expect(wrapper.emitted('shown')).toEqual([['all']])
    await wrapper.setProps({ shown: 'all' })
    expect(wrapper.findAll('h3').map((title) => title.text())).toEqual(['How often and how far up', 'Traps'])
    expect(spoken(wrapper.get('.never').text())).toBe(
      '0 of 30, which still allows 11 in 100: Show a press and leave.',
    )
  })
})
