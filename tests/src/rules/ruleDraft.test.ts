import { beforeEach, describe, expect, it, vi } from 'vitest'
import { RuleBody, type RuleRow } from '@shared/rules/schemas'
import { ApiProblem, OfflineError } from '@/api/problems'
import { putRule } from '@/api/rules'
import {
  bodyOf,
  changeSentences,
  draftLeft,
  readDraft,
  reasonFault,
  withDraft,
} from '@/views/rules/ruleDraft'
import { useRuleDrafts } from '@/views/rules/useRuleDrafts'
import { rule } from './rules'

vi.mock('@/api/rules', () => ({ putRule: vi.fn() }))
const put = vi.mocked(putRule)

const lighter = { strengths: { 0: 'light' }, because: null } as const
const staleOf = (current: RuleRow) =>
  new ApiProblem({ type: 'about:blank', title: 'Changed', status: 412, detail: '', instance: '', current })

describe('a change that is not kept yet', () => {
  it('reads in the rule, and leaves it as it was', () => {
    const row = rule()
    expect(withDraft(row, { ...lighter, because: 'Why not.' })).toMatchObject({
      because: 'Why not.',
      then: [{ strength: 'light' }, { strength: 'medium' }],
    })
    expect(row).toEqual(rule())
  })

  it('is nothing once it says what the rule says', () => {
    expect(draftLeft(rule(), { strengths: { 0: 'strong' }, because: 'The middle is open.' })).toBeNull()
    expect(draftLeft(rule(), { strengths: { 0: 'light', 1: 'medium', 7: 'light' }, because: null })).toEqual(
      lighter,
    )
  })

  it('goes out as a whole body, without the row’s own fields', () => {
    const body = bodyOf(rule(), { ...lighter, because: '  Why not.  ' })
    expect(RuleBody.strict().parse(body)).toEqual(body)
    expect(body.because).toBe('Why not.')
  })

  it('names what is wrong with a reason and the remedy', () => {
    expect(reasonFault('a'.repeat(160))).toBe('')
    expect(reasonFault('a'.repeat(161))).toBe('1 letter too many. Make it shorter.')
    expect(reasonFault('  ')).toBe('Say why, in one sentence.')
  })

  it('comes back from the device only when it fits', () => {
    expect(readDraft(JSON.parse(JSON.stringify(lighter)))).toEqual(lighter)
    expect(readDraft({ strengths: { 0: 'huge' }, because: 'x' })).toEqual({ strengths: {}, because: 'x' })
    for (const other of [null, 'x', { strengths: null, because: null }, { strengths: {}, because: 3 }])
      expect(readDraft(other)).toBeNull()
  })

  it('tells what somebody else changed', () => {
    const after = rule({
      on: false,
      because: 'Else.',
      then: [{ effect: 'want', trait: 'middle-entry', strength: 'light' }],
    })
    expect(changeSentences(rule(), after)).toEqual([
      'It was switched off.',
      'middle entry: strongly became a little.',
      'The reason now reads: Else.',
    ])
    expect(changeSentences(rule(), rule({ title: 'Other' }))).toEqual(['What it asks was changed.'])
  })
})

describe('keeping a rule', () => {
  let rows: RuleRow[]
  const open = () => useRuleDrafts({ teamId: 't', personId: 'p', put: (row) => (rows = [row]) })

  beforeEach(() => {
    localStorage.clear()
    put.mockReset()
    rows = [rule()]
  })

  it('holds a change on the device until it is kept', async () => {
    open().change(rule(), lighter)
    const again = open()
    again.takeUp(rows)
    expect(again.draftOf(rule())).toEqual(lighter)
    put.mockResolvedValueOnce(rule({ version: 2, then: withDraft(rule(), lighter).then }))
    expect(await again.keepRule(rule())).toBe(true)
    expect(put).toHaveBeenCalledWith('t', rule().id, expect.objectContaining({ on: true }), 1)
    expect(again.drafts.size).toBe(0)
    const third = open()
    third.takeUp(rows)
    expect(third.drafts.size).toBe(0)
  })

  it('keeps what was changed when there is no signal', async () => {
    const edit = open()
    edit.change(rule(), lighter)
    put.mockRejectedValueOnce(new OfflineError())
    expect(await edit.keepRule(rule())).toBe(false)
    expect(edit.troubles.get(rule().id)?.error).toBeInstanceOf(OfflineError)
    expect(edit.draftOf(rule())).toEqual(lighter)
    expect(edit.saving.size).toBe(0)
  })

  it('takes up the newer row on a stale version, tells it, and keeps the change on top', async () => {
    const edit = open()
    edit.change(rule(), lighter)
    const newer = rule({ version: 2, because: 'Else.' })
    put.mockRejectedValueOnce(staleOf(newer))
    expect(await edit.keepRule(rule())).toBe(false)
    expect(rows).toEqual([newer])
    expect(edit.troubles.get(newer.id)).toEqual({ error: null, newer: ['The reason now reads: Else.'] })
    expect(edit.draftOf(newer)).toEqual(lighter)
    put.mockResolvedValueOnce(rule({ version: 3, because: 'Else.', then: withDraft(newer, lighter).then }))
    expect(await edit.keepRule(newer)).toBe(true)
    expect(put.mock.lastCall?.[2]).toMatchObject({ because: 'Else.', then: [{ strength: 'light' }, {}] })
    expect(put.mock.lastCall?.[3]).toBe(2)
    expect(edit.troubles.size).toBe(0)
  })

  it('switches without sending what is not kept yet, and does not lose it', async () => {
    const edit = open()
    edit.change(rule(), lighter)
    put.mockResolvedValueOnce(rule({ version: 2, on: false }))
    expect(await edit.switchRule(rule(), false)).toBe(true)
    expect(put.mock.lastCall?.[2]).toEqual(bodyOf(rule(), { strengths: {}, because: null }, false))
    expect(rows[0]?.on).toBe(false)
    expect(edit.draftOf(rule())).toEqual(lighter)
  })

  it('puts back what stood, on the device too', () => {
    const edit = open()
    edit.change(rule(), lighter)
    edit.putBack(rule())
    const again = open()
    again.takeUp(rows)
    expect([edit.drafts.size, again.drafts.size]).toEqual([0, 0])
  })
})
