import { describe, expect, it } from 'vitest'
import { stepOfKey, stepOfQuery } from '@/views/counters/stepQuery'

describe('the step in the address', () => {
  it('counts from one there and from nought inside', () => {
    expect(stepOfQuery('2', 5)).toBe(1)
  })

  it('takes the nearest step for everything else', () => {
    expect([undefined, 'x', '0', '-3'].map((value) => stepOfQuery(value, 5))).toEqual([0, 0, 0, 0])
    expect(stepOfQuery('99', 5)).toBe(4)
    expect(stepOfQuery('2', 0)).toBe(0)
  })
})

describe('arrow keys', () => {
  const key = (name: string, target: EventTarget = document.body, more: KeyboardEventInit = {}) => {
    const event = new KeyboardEvent('keydown', { key: name, bubbles: true, ...more })
    target.dispatchEvent(event)
    return event
  }

  it('turn the steps and stop at both ends', () => {
    expect(stepOfKey(key('ArrowRight'), 1, 3)).toBe(2)
    expect(stepOfKey(key('ArrowRight'), 2, 3)).toBe(2)
    expect(stepOfKey(key('ArrowLeft'), 0, 3)).toBe(0)
    expect(stepOfKey(key('a'), 1, 3)).toBeNull()
  })

  it('belong to a field that has the focus, and to the browser with another key held', () => {
    const field = document.body.appendChild(document.createElement('input'))
    expect(stepOfKey(key('ArrowRight', field), 0, 3)).toBeNull()
    expect(stepOfKey(key('ArrowLeft', document.body, { altKey: true }), 1, 3)).toBeNull()
  })
})
