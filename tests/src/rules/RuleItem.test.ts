import { mount } from '@vue/test-utils'
import { nextTick } from 'vue'
import { describe, expect, it } from 'vitest'
import type { RuleDraft } from '@/views/rules/ruleDraft'
import RuleItem from '@/views/rules/RuleItem.vue'
import { rule } from './rules'

const NOTHING: RuleDraft = { strengths: {}, because: null }

const item = (changes: Partial<InstanceType<typeof RuleItem>['$props']> = {}) =>
  mount(RuleItem, {
    attachTo: document.body,
    props: {
      row: rule(),
      draft: NOTHING,
      changed: false,
      saving: false,
      trouble: null,
      mayChange: true,
      openSlot: null,
      now: null,
      opponent: '',
      changedOn: '',
      ...changes,
    },
  })

describe('a rule on the page', () => {
  it('is read and not touched by who may not change it', () => {
    const page = item({ mayChange: false, row: rule({ on: false }) })
    expect(page.findAll('button, [role="button"], input, textarea, [role="switch"]')).toHaveLength(0)
    expect(page.text()).toContain('off')
    expect(page.find('.rule').text()).toContain('want middle entry, strongly')
  })

  it('opens one slot for each strength and one for the reason, by mouse and by keyboard', async () => {
    const page = item()
    const slots = page.findAll('.rule [aria-expanded]')
    expect(slots.map((slot) => slot.text())).toEqual([
      'how much middle entry: strongly',
      'how much valve behind: clearly',
      'why: the middle is open',
    ])
    await slots[1]?.trigger('click')
    await slots[2]?.trigger('keydown', { key: 'Enter' })
    await slots[2]?.trigger('keydown', { key: ' ' })
    expect(page.emitted('slot')).toEqual([[1], ['reason'], ['reason']])
  })

  it('takes the focus to the open choices, reweighs that demand only, and closes with Esc back on its slot', async () => {
    const page = item()
    await page.setProps({ openSlot: 1 })
    await nextTick()
    expect((document.activeElement as HTMLInputElement).value).toBe('medium')
    await page.find('input[value="light"]').setValue()
    expect(page.emitted('change')).toEqual([[{ strengths: { 1: 'light' }, because: null }]])
    await page.find('input[value="light"]').trigger('keydown', { key: 'Escape' })
    expect(page.emitted('slot')).toEqual([[null]])
    expect(document.activeElement?.textContent).toContain('valve behind')
  })

  it('strikes what stood, and keeps only a reason that fits', async () => {
    const page = item({ changed: true, draft: { strengths: { 0: 'light' }, because: null } })
    expect(page.find('del').text()).toBe('strongly')
    const keep = () => page.findAll('button').find((button) => button.text().startsWith('Keep'))
    expect(keep()?.text()).toBe('Keep rule 14 as it reads')
    await keep()?.trigger('click')
    expect(page.emitted('keep')).toHaveLength(1)
    await page.setProps({ draft: { strengths: {}, because: 'a'.repeat(161) }, openSlot: 'reason' })
    expect(keep()?.attributes('disabled')).toBeDefined()
    expect(page.text()).toContain('1 letter too many')
  })

  it('tells what somebody else changed, and that the own change is still there', () => {
    const page = item({ changed: true, trouble: { error: null, newer: ['It was switched off.'] } })
    expect(page.find('[role="status"]').text()).toMatch(/Somebody else.*It was switched off\..*kept here/s)
  })
})
