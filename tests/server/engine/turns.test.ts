import { describe, expect, it } from 'vitest'
import { chooseCounters, type ChooseInput } from '@server/engine/choose'
import { tendencies, type HabitCell } from '@server/engine/tendencies'
import { whatWouldTurn } from '@server/engine/turns'
import { counter, rule, six, spread } from './builders'

const MIDDLE = 'leave-open:middle'
const SAFETY = 'safety-leaves-early'

/** Two counters: one lives off the middle, the other off a safety who comes up. */
function input(cells: readonly HabitCell[]): ChooseInput {
  return {
    tendencies: tendencies(cells),
    rules: [
      rule('open', {
        when: { habit: MIDDLE, is: 'above', threshold: 0.5, grade: 'lean' },
        then: [{ effect: 'want', trait: 'middle-entry', strength: 'strong' }],
      }),
      rule('deep', {
        when: { habit: SAFETY, is: 'above', threshold: 0.5, grade: 'lean' },
        then: [{ effect: 'want', trait: 'long-threat', strength: 'strong' }],
      }),
      rule('always', {
        when: { habit: 'trap', is: 'above', threshold: 0.5, grade: 'lean' },
        then: [{ effect: 'want', trait: 'valve-behind', strength: 'light' }],
      }),
    ],
    counters: [
      counter('middle', { traits: ['middle-entry', 'valve-behind'] }),
      counter('long', { traits: ['long-threat', 'valve-behind'] }),
    ],
    squad: six(),
    pack: { key: 'fiba', backcourtCount: 8 },
    own: { k: 20, n: 30 },
  }
}

const open = (k: number, n: number) => spread(MIDDLE, k, n)
const always = spread('trap', 18, 20)

describe('what would turn the order', () => {
  // Both habits are past the threshold by little, so the two counters stand close.
  const cells = [...open(10, 13), ...spread(SAFETY, 10, 13), ...always]

  it('is told of the leader and of whoever would lead, and is true: so many rows turn it and one fewer does not', async () => {
    const now = await chooseCounters(input(cells))
    const turns = await whatWouldTurn(input(cells), cells)
    expect(turns.length).toBeGreaterThan(0)
    const [first] = now.choices
    for (const turn of turns) {
      expect(turn.of).toBe(6)
      expect(turn.leads).not.toBe(first?.counterId)
      expect([first?.counterId, turn.leads]).toContain(turn.counterId)
      const leaderWith = async (rows: number) => {
        const k = turn.is === 'more' ? rows : 6 - rows
        const older = cells.map((cell) =>
          cell.habitKey === turn.habitKey ? { ...cell, gameAge: cell.gameAge + 1 } : cell,
        )
        const next = { habitKey: turn.habitKey, gameId: 'next', gameAge: 0, trigger: 'made-basket', k, n: 6 }
        return (await chooseCounters(input([...older, next]))).choices[0]?.counterId
      }
      expect(await leaderWith(turn.rows)).toBe(turn.leads)
      if (turn.rows > 3) expect(await leaderWith(turn.rows - 1)).toBe(first?.counterId)
    }
  })

  it('is nothing where no six rows would do it', async () => {
    const sure = [...open(60, 60), ...spread(SAFETY, 0, 60), ...always]
    expect(await whatWouldTurn(input(sure), sure)).toEqual([])
  })

  it('is nothing while nothing is known', async () => {
    const few = open(1, 2)
    expect(await whatWouldTurn(input(few), few)).toEqual([])
  })
})
