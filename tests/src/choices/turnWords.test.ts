import { describe, expect, it } from 'vitest'
import type { Turn } from '@shared/choices/schemas'
import { turnSentence } from '@/views/choices/turnWords'

const turn = (more: Partial<Turn>): Turn => ({
  counterId: 'a',
  habitKey: 'leave-open:middle',
  is: 'less',
  rows: 4,
  of: 6,
  leads: 'b',
  ...more,
})
const nameOf = (id: string) => ({ a: 'Box', b: '1-4 across' })[id] ?? id

describe('what would turn it', () => {
  it('names who would take over from the first', () => {
    expect(turnSentence(turn({}), true, nameOf)).toBe(
      'If they leave the middle open on the trap in only 2 of the next 6, 1-4 across would lead.',
    )
    expect(turnSentence(turn({ rows: 6 }), true, nameOf)).toContain('in none of the next 6')
  })

  it('says what would put another one first', () => {
    const sentence = turnSentence(turn({ habitKey: 'safety-leaves-early', is: 'more' }), false, nameOf)
    expect(sentence).toBe('If their safety leaves early in 4 of the next 6, it would lead.')
  })

  it('says so where nothing would', () => {
    expect(turnSentence(undefined, false, nameOf)).toBe('Nothing seen so far would put it first.')
    expect(turnSentence(undefined, true, nameOf)).toContain('Nothing')
  })
})
