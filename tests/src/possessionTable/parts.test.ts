import { mount } from '@vue/test-utils'
import { describe, expect, it } from 'vitest'
import type { ChangeRow } from '@shared/history/schemas'
import type { BatchDraft } from '@/views/possessionTable/batch'
import BatchBar from '@/views/possessionTable/BatchBar.vue'
import RowHistory from '@/views/possessionTable/RowHistory.vue'
import { FIBA, idOf, rowOf } from './rows'

const rows = [rowOf(4), rowOf(8), rowOf(10, { tookAway: ['middle'] }), rowOf(21)]

function batchBar(given = rows) {
  const wrapper = mount(BatchBar, {
    props: {
      modelValue: { field: null } as BatchDraft,
      'onUpdate:modelValue': (draft: BatchDraft) => wrapper.setProps({ modelValue: draft }),
      rows: given,
      here: [4, 8, 10].map(idOf),
      pack: FIBA,
      busy: false,
    },
    attachTo: document.body,
  })
  const sentence = () => wrapper.get('.sentence').text().replaceAll(' ', ' ').replace(/\s+/g, ' ')
  const slot = (words: string) => wrapper.findAll('.slot').find((each) => each.text().includes(words))!
  const choice = (words: string) =>
    wrapper.findAll('.choices button').find((each) => each.get('.word').text() === words)!
  const change = () => wrapper.get('.do .button')
  return { wrapper, sentence, slot, choice, change }
}

describe('the batch sentence', () => {
  it('asks one slot after the other, and the button says how many rows it changes', async () => {
    const { wrapper, sentence, slot, choice, change } = batchBar()
    expect(sentence()).toContain('In 4 marked rows change')
    expect(wrapper.findAll('.is-next').map((each) => each.text())).toEqual(['which column: which column?'])
    expect(change().attributes('disabled')).toBeDefined()

    await slot('which column?').trigger('click')
    await choice('took away').trigger('click')
    expect(wrapper.get('.is-next').text()).toBe('from: from what?')
    expect(choice('not logged').text()).toContain('3 rows')
    await choice('not logged').trigger('click')
    await choice('pass back').trigger('click')

    expect(wrapper.find('.panel').exists()).toBe(false)
    expect(wrapper.find('.is-next').exists()).toBe(false)
    expect(change().text()).toBe('Change 3 rows')
    expect(wrapper.text()).toContain('1 row does not hold it and stays as it is.')
    expect(wrapper.text()).toContain('3 are on the screen, no. 21 is elsewhere.')
    await change().trigger('click')
    const [sent] = wrapper.emitted('change')![0] as unknown as [{ number: number }[]]
    expect(sent.map(({ number }) => number)).toEqual([4, 8, 21])
    wrapper.unmount()
  })

  it('does not ask from what where all rows hold the same', async () => {
    const { wrapper, slot, choice } = batchBar([rowOf(4), rowOf(8)])
    await slot('which column?').trigger('click')
    await choice('took away').trigger('click')
    expect(wrapper.get('.is-next').text()).toBe('to: to what?')
    wrapper.unmount()
  })

  it('takes a typed number, and says what to type instead of another word', async () => {
    const { wrapper, slot, choice, change } = batchBar([rowOf(4), rowOf(8)])
    await slot('which column?').trigger('click')
    await choice('passes').trigger('click')
    await wrapper.get('input').setValue('many')
    await wrapper.get('form').trigger('submit')
    expect(wrapper.get('[role="alert"]').text()).toBe('Write a whole number from 0 to 30.')
    await wrapper.get('input').setValue('4')
    await wrapper.get('form').trigger('submit')
    expect(change().text()).toBe('Change 2 rows')
    wrapper.unmount()
  })
})

describe('the history of a row', () => {
  const who = { id: idOf(60), name: 'Tomas Reinholt', initials: 'TR' }
  const changed: ChangeRow = {
    id: idOf(70),
    kind: 'possession',
    rowId: idOf(8),
    action: 'changed',
    who,
    at: '2026-03-15T19:33:00.000Z',
    batchId: null,
    fields: [{ field: 'tookAway', from: null, to: ['pass-back'] }],
  }
  const history = (more: { changes?: ChangeRow[]; canWrite?: boolean } = {}) =>
    mount(RowHistory, {
      props: {
        number: 8,
        changes: [changed],
        madeAt: '2026-03-14T14:41:00.000Z',
        pack: FIBA,
        timeZone: 'UTC',
        canWrite: true,
        busy: false,
        ...more,
      },
    })

  it('starts with how it was logged, strikes what was and says it to readers', () => {
    const wrapper = history()
    const [first, second] = wrapper.findAll('li')
    expect(first!.text()).toContain('Sat 14 March, 14:41')
    expect(first!.text()).toContain('It was logged.')
    expect(first!.find('button').exists()).toBe(false)
    expect(second!.get('s').text()).toBe('not logged')
    expect(second!.get('b').text()).toBe('pass back')
    expect(second!.get('.what > .sr-only').text()).toBe('took away: was not logged, now pass back, Tomas')
  })

  it('puts one field of one line back, for whom may write', async () => {
    const wrapper = history()
    await wrapper.get('button').trigger('click')
    expect(wrapper.emitted('putBack')).toEqual([[{ changeId: idOf(70), field: 'tookAway' }]])
    expect(history({ canWrite: false }).find('button').exists()).toBe(false)
  })
})
