import { mount } from '@vue/test-utils'
import { reactive } from 'vue'
import { describe, expect, it, vi } from 'vitest'
import { ApiProblem, OfflineError } from '@/api/problems'
import AsyncRegion from '@/components/AsyncRegion.vue'
import ProblemNote from '@/components/ProblemNote.vue'
import type { Async } from '@/composables/useAsync'

const source = (state: Partial<Async<string>>): Async<string> =>
  reactive({
    data: null,
    error: null,
    pending: false,
    loading: false,
    slow: false,
    offline: false,
    loadedAt: null,
    reload: vi.fn(() => Promise.resolve()),
    set: vi.fn(),
    ...state,
  })
const problem = (status: number, errors?: { field: string; message: string }[]) =>
  new ApiProblem({
    type: 'x',
    title: 'Title for support',
    status,
    detail: 'In our words.',
    instance: '/',
    errors,
  })

const region = (state: Partial<Async<string>>) => {
  const given = source(state)
  const wrapper = mount(AsyncRegion<string>, {
    props: { source: given, name: 'The read', safe: 'All 58 throw-ins are safe.' },
    slots: { default: ({ data }: { data: string }) => `counted: ${data}` },
  })
  return { wrapper, given }
}

describe('AsyncRegion', () => {
  it('shows nothing before 300 ms have passed, then that it is on its way, then what is slow', async () => {
    const { wrapper, given } = region({ pending: true })
    expect(wrapper.text()).toBe('')
    Object.assign(given, { loading: true })
    await wrapper.vm.$nextTick()
    expect(wrapper.get('[role=status]').text()).toContain('Opening')
    Object.assign(given, { slow: true })
    await wrapper.vm.$nextTick()
    expect(wrapper.text()).toContain('longer than usual')
  })

  it('says what is safe and asks again, without a code in the words', async () => {
    const { wrapper, given } = region({ error: problem(500) })
    expect(wrapper.get('.flag').text()).toBe('The read did not open.')
    expect(wrapper.text()).toContain('All 58 throw-ins are safe.')
    expect(wrapper.text()).not.toMatch(/500|Title for support/)
    await wrapper.get('button').trigger('click')
    expect(given.reload).toHaveBeenCalledOnce()
  })

  it('tells no signal, not allowed and not there apart', () => {
    expect(region({ error: new OfflineError(), offline: true }).wrapper.text()).toContain('No signal.')
    expect(region({ error: problem(403) }).wrapper.text()).toContain('not open to you')
    const gone = region({ error: problem(404) }).wrapper
    expect(gone.text()).toContain('is not here')
    expect(gone.find('button').exists()).toBe(false)
  })

  it('keeps the old answer when a newer one fails, and says how old it is', () => {
    const loadedAt = new Date(2026, 2, 16, 21, 14).getTime()
    const { wrapper } = region({ data: '58', error: new OfflineError(), offline: true, loadedAt })
    expect(wrapper.text()).toContain('counted: 58')
    expect(wrapper.text()).toContain('This is the copy from Mon 16 Mar, 21:14.')
  })

  it('leaves the day out of a copy of today', () => {
    const loadedAt = new Date().setHours(0, 5, 0, 0)
    const { wrapper } = region({ data: '58', error: new OfflineError(), offline: true, loadedAt })
    expect(wrapper.text()).toContain('This is the copy from 00:05.')
  })
})

describe('ProblemNote', () => {
  const note = (error: Error | null) =>
    mount(ProblemNote, {
      props: { error, safe: 'What you typed is kept.', labels: { name: 'Name' } },
    })

  it('names the fields as the page does', () => {
    const wrapper = note(problem(400, [{ field: 'name', message: 'This name is taken.' }]))
    expect(wrapper.get('li').text()).toBe('Name: This name is taken.')
    expect(wrapper.text()).toContain('What you typed is kept.')
  })

  it('shows no foreign message', () => {
    expect(note(new TypeError('x is not a function')).text()).not.toContain('function')
    expect(note(new OfflineError()).text()).toContain('No signal.')
    expect(note(null).text()).toBe('')
  })
})
