import { describe, expect, it } from 'vitest'
import type { Choice, Choices } from '@shared/choices/schemas'
import { orderLines, orderSentence } from '@/views/rules/orderChange'

const choices = (...order: (readonly [id: string, weights: readonly number[]])[]): Choices =>
  ({
    choices: order.map(([counterId, weights], index) => ({
      counterId,
      rank: index + 1,
      reasons: weights.map((weight) => ({ weight })),
    })) as unknown as Choice[],
  }) as Choices
const NAMES: Record<string, string> = { a: 'Box', b: 'Stack', c: 'Middle three', d: 'Line' }
const nameOf = (id: string) => NAMES[id] ?? id

describe('an order before and after', () => {
  const before = choices(['a', [0.4]], ['b', [0.2]], ['c', []], ['d', []])

  it('says that it stays', () => {
    const lines = orderLines(before, before, nameOf)
    expect(lines.map(({ moves }) => moves)).toEqual(['stays', 'stays', 'stays', 'stays'])
    expect(orderSentence(lines)).toBe('The order stays as it is.')
  })

  it('names who rises and who falls, and the first when it stays', () => {
    const after = choices(['a', [0.4]], ['c', [0.7, -0.2]], ['b', [0.2]], ['d', []])
    const lines = orderLines(before, after, nameOf)
    expect(orderSentence(lines)).toBe('Middle three comes second and Stack drops to third. Box stays first.')
    expect(lines.find(({ counterId }) => counterId === 'c')).toMatchObject({
      was: 3,
      is: 2,
      moves: 'rises',
      inFavour: 0.7,
      against: -0.2,
    })
  })

  it('tells of a counter that drops out of the order, and of one that comes in', () => {
    const after = choices(['d', []], ['a', []], ['b', []])
    const lines = orderLines(before, after, nameOf)
    expect(lines.find(({ counterId }) => counterId === 'c')).toMatchObject({
      was: 3,
      is: null,
      moves: 'falls',
    })
    expect(orderSentence(lines)).toBe('Line comes first, Box drops to second and Stack drops to third.')
    expect(orderSentence(orderLines(choices(['a', []]), choices(['b', []], ['a', []]), nameOf))).toBe(
      'Stack comes first and Box drops to second.',
    )
  })
})
