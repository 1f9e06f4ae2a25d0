import { mount } from '@vue/test-utils'
import { describe, expect, it } from 'vitest'
import IntervalBar from '@/components/IntervalBar.vue'
import TickRow from '@/components/TickRow.vue'
import { likelyOfTen } from '@/components/tenCircles'

const words = (props: InstanceType<typeof IntervalBar>['$props']) =>
  mount(IntervalBar, { props }).attributes('aria-label')

describe('IntervalBar', () => {
  it('says the count and its likely range in hundredths', () => {
    expect(words({ k: 7, n: 11, low: 0.3538, high: 0.8483 })).toBe('7 of 11, likely between 35 and 85 in 100')
    expect(words({ k: 1, n: 3, low: 0.06, high: 0.79, thin: true })).toMatch(/Thin$/)
    expect(words({ k: 0, n: 0, low: null, high: null })).toBe('nothing counted')
  })

  it('draws theirs hatched with a diamond and ours solid with a dot', () => {
    const theirs = mount(IntervalBar, { props: { k: 7, n: 11, low: 0.35, high: 0.85 } })
    expect(theirs.find('.hatch').attributes('d')).toMatch(/^M/)
    expect(theirs.find('circle').exists()).toBe(false)
    const ours = mount(IntervalBar, { props: { k: 7, n: 11, low: 0.35, high: 0.85, ink: 'our' } })
    expect(ours.find('.hatch').exists()).toBe(false)
    expect(ours.find('circle.mark').exists()).toBe(true)
  })

  it('leaves the hatch out of what is thin', () => {
    const thin = mount(IntervalBar, { props: { k: 1, n: 3, low: 0.06, high: 0.79, thin: true } })
    expect(thin.find('.hatch').exists()).toBe(false)
    expect(thin.classes()).toContain('is-thin')
  })

  it('draws the axis and nothing on it where nothing was counted', () => {
    const none = mount(IntervalBar, { props: { k: 0, n: 0, low: null, high: null } })
    expect(none.findAll('rect, .mark')).toHaveLength(0)
  })

  it('puts the mark where the count is, between the ends of the axis', () => {
    const at = (k: number) =>
      Number(
        mount(IntervalBar, { props: { k, n: 10, low: 0.1, high: 0.9, ink: 'our', width: 216 } })
          .find('circle')
          .attributes('cx'),
      )
    expect(at(0)).toBe(8)
    expect(at(5)).toBe(108)
    expect(at(10)).toBe(208)
  })
})

describe('TickRow', () => {
  const subpaths = (d: string | undefined) => (d?.match(/M/g) ?? []).length

  it('has one tick a possession, filled where they pressed', () => {
    const row = mount(TickRow, { props: { pressed: 35, total: 58 } })
    expect(subpaths(row.find('.pressed').attributes('d'))).toBe(35)
    expect(subpaths(row.find('.dropped').attributes('d'))).toBe(23)
    expect(row.text()).toBe('')
  })

  it('groups many and says how many a tick stands for', () => {
    const row = mount(TickRow, { props: { pressed: 90, total: 180, most: 60 } })
    expect(subpaths(row.find('.pressed').attributes('d'))).toBe(30)
    expect(subpaths(row.find('.dropped').attributes('d'))).toBe(30)
    expect(row.text()).toBe('one tick is 3')
  })
})

describe('likelyOfTen', () => {
  it('fills up to the low end, half-fills up to the estimate, outlines up to the high end', () => {
    const ten = likelyOfTen(18 / 22, 0.6148, 0.9271)
    expect(ten.join(' ')).toBe('full full full full full full half half open faint')
  })

  it('has ten circles at the ends of the scale too', () => {
    expect(likelyOfTen(0, 0, 0.28).filter((circle) => circle === 'open')).toHaveLength(3)
    expect(likelyOfTen(1, 1, 1)).toEqual(Array(10).fill('full'))
  })
})
