import { flushPromises, mount } from '@vue/test-utils'
import { z } from 'zod'
import { beforeAll, describe, expect, it, vi } from 'vitest'
import { LIMITS } from '@shared/limits'
import { ApiProblem, OfflineError } from '@/api/problems'
import NotesField from '@/components/notes/NotesField.vue'

/** jsdom knows the element, not what it does. */
beforeAll(() => {
  HTMLDialogElement.prototype.showModal = function () {
    this.open = true
  }
  HTMLDialogElement.prototype.close = function () {
    this.open = false
  }
})

interface Row {
  notes: string
  version: number
  name: string
}
const Row = z.object({ notes: z.string(), version: z.number(), name: z.string() })
const read = (value: unknown) => Row.safeParse(value).data ?? null
const row: Row = { notes: 'They *jump*.', version: 3, name: 'Gulls' }

function field(save: (row: Row, notes: string) => Promise<Row>, more: object = {}) {
  return mount(NotesField<Row>, {
    props: { row, about: 'Gulls', mayWrite: true, save, read, ...more },
    attachTo: document.body,
  })
}
const button = (wrapper: ReturnType<typeof field>, words: string) => {
  const found = wrapper.findAll('button').find((each) => each.text().startsWith(words))
  if (found === undefined) throw new Error(`no button ${words}`)
  return found
}
const conflict = (current: Row) =>
  new ApiProblem({
    type: 'x',
    title: 'Changed meanwhile',
    status: 412,
    detail: 'Changed.',
    instance: '/',
    current,
  })

describe('NotesField', () => {
  it('reads as Markdown, and cannot be changed without the right', () => {
    const wrapper = field(vi.fn(), { mayWrite: false })
    expect(wrapper.find('.notes-text').html()).toContain('<em>jump</em>')
    expect(wrapper.findAll('button')).toHaveLength(0)
  })

  it('keeps what was written only when it is said, by the version it was begun on', async () => {
    const save = vi.fn((base: Row, notes: string) => Promise.resolve({ ...base, notes, version: 4 }))
    const wrapper = field(save)
    await button(wrapper, 'Change').trigger('click')
    await wrapper.find('textarea').setValue('They wait.')
    await button(wrapper, 'See how').trigger('click')
    expect(wrapper.find('.preview').text()).toBe('They wait.')
    expect(save).not.toHaveBeenCalled()
    await wrapper.setProps({ row: { ...row, notes: 'Newer', version: 9 } })
    await wrapper.find('form').trigger('submit')
    await flushPromises()
    expect(save.mock.calls).toEqual([[row, 'They wait.']])
    expect(wrapper.emitted('kept')).toEqual([[{ ...row, notes: 'They wait.', version: 4 }]])
  })

  it('shows both when somebody changed it meanwhile, and keeps mine on top of theirs', async () => {
    const theirs = { ...row, notes: 'They sit.', version: 7, name: 'Port Selby Gulls' }
    const save = vi
      .fn<(base: Row, notes: string) => Promise<Row>>()
      .mockRejectedValueOnce(conflict(theirs))
      .mockImplementation((base, notes) => Promise.resolve({ ...base, notes, version: 8 }))
    const wrapper = field(save)
    await button(wrapper, 'Change').trigger('click')
    await wrapper.find('textarea').setValue('They wait.')
    await wrapper.find('form').trigger('submit')
    await flushPromises()
    expect(wrapper.find('[role=alert]').text()).toContain('They sit.')
    expect(wrapper.find('textarea').element.value).toBe('They wait.')
    await button(wrapper, 'Keep yours').trigger('click')
    await flushPromises()
    expect(save.mock.calls[1]).toEqual([theirs, 'They wait.'])
  })

  it('keeps theirs when that is wanted, and sends nothing', async () => {
    const theirs = { ...row, notes: 'They sit.', version: 7 }
    const save = vi.fn<(base: Row, notes: string) => Promise<Row>>().mockRejectedValueOnce(conflict(theirs))
    const wrapper = field(save)
    await button(wrapper, 'Change').trigger('click')
    await wrapper.find('textarea').setValue('They wait.')
    await wrapper.find('form').trigger('submit')
    await flushPromises()
    await button(wrapper, 'Keep it as it stands').trigger('click')
    expect(wrapper.emitted('kept')).toEqual([[theirs]])
    expect(save).toHaveBeenCalledOnce()
  })

  it('loses nothing without a signal', async () => {
    const wrapper = field(() => Promise.reject(new OfflineError()))
    await button(wrapper, 'Change').trigger('click')
    await wrapper.find('textarea').setValue('They wait.')
    await wrapper.find('form').trigger('submit')
    await flushPromises()
    expect(wrapper.text()).toContain('No signal. What you wrote stays here.')
    expect(wrapper.find('textarea').element.value).toBe('They wait.')
  })

  it('says that something is not kept, also to the page', async () => {
    const wrapper = field(vi.fn())
    await button(wrapper, 'Change').trigger('click')
    await wrapper.find('textarea').setValue('They wait.')
    expect(wrapper.emitted('dirty')).toEqual([[true]])
    await button(wrapper, 'Not now').trigger('click')
    expect(wrapper.find('textarea').exists()).toBe(true)
    await wrapper.find('textarea').setValue(row.notes)
    await button(wrapper, 'Not now').trigger('click')
    expect(wrapper.find('textarea').exists()).toBe(false)
  })

  it('does not send more than fits', async () => {
    const save = vi.fn()
    const wrapper = field(save)
    await button(wrapper, 'Change').trigger('click')
    await wrapper.find('textarea').setValue('x'.repeat(LIMITS.notes + 3))
    expect(wrapper.text()).toContain('3 letters too many.')
    await wrapper.find('form').trigger('submit')
    expect(save).not.toHaveBeenCalled()
  })
})
