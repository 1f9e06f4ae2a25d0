import type { z } from 'zod'
import type { OpponentPlayerBody } from '@shared/opponents/players'
import type { PressFive } from './film'

export type DemoOpponentPlayer = Omit<z.input<typeof OpponentPlayerBody>, 'opponentId'> & {
  opponentKey: string
}

/** Their press by shirt number. */
export const PRESS_FIVES = {
  gulls: { mirror: 7, trappers: [5, 11], thieves: [9], safety: 14, bench: [4, 8, 15] },
  lowmoor: { mirror: 6, trappers: [10, 12], thieves: [8], safety: 13, bench: [5, 9] },
  otters: { mirror: 4, trappers: [7, 15], thieves: [11, 7], safety: 20, bench: [8, 12] },
} as const satisfies Record<string, PressFive>

const one = (
  opponentKey: string,
  jersey: number,
  does: DemoOpponentPlayer['does'],
  note = '',
): DemoOpponentPlayer => ({ opponentKey, jersey, does, note })

/** What the scouts wrote about theirs: numbers, never names. */
export const DEMO_OPPONENT_PLAYERS: readonly DemoOpponentPlayer[] = [
  one('gulls', 5, ['trapper'], 'Comes from the right wing, arms high.'),
  one('gulls', 7, ['mirror', 'handler'], 'Jumps with the ball. Tires after the half.'),
  one('gulls', 9, ['thief'], 'Reads the middle pass; look her off first.'),
  one('gulls', 11, ['trapper', 'foul-trouble'], 'Reaches. Two fouls by half time in both games on film.'),
  one('gulls', 14, ['safety'], 'Stays home until the second trap.'),
  one('lowmoor', 6, ['mirror']),
  one('lowmoor', 8, ['thief'], 'Sits on the pass back.'),
  one('lowmoor', 10, ['trapper', 'handler']),
  one('lowmoor', 13, ['safety'], 'Comes up early on the ball side.'),
  one('otters', 4, ['mirror'], 'Often leaves the thrower free.'),
  one('otters', 7, ['trapper', 'thief']),
  one('otters', 15, ['trapper']),
  one('otters', 20, ['safety']),
]
