import type { DefenderId, Diagram, Move, Place, Step } from '@shared/court/diagram'
import type { Role } from '@shared/vocabulary'

/** Short hands for writing a counter's steps; places are fractions of the landmark court (RECORD.md section 2). */
type Spot = readonly [x: number, y: number]
type Options = { beat?: number; bend?: number }

const place = ([x, y]: Spot): Place => ({ x, y })

export const cut = (who: Role, to: Spot, { beat = 0, bend = 0 }: Options = {}): Move => ({
  kind: 'cut',
  who,
  to: place(to),
  bend,
  beat,
})

export const dribble = (who: Role, to: Spot, { beat = 0, bend = 0 }: Options = {}): Move => ({
  kind: 'dribble',
  who,
  to: place(to),
  bend,
  beat,
})

export const pass = (
  from: Role,
  to: Role,
  { beat = 0, flight = 'straight' }: { beat?: number; flight?: 'straight' | 'lob' | 'bounce' } = {},
): Move => ({ kind: 'pass', from, to, flight, throwIn: false, beat })

export const throwIn = (
  from: Role,
  to: Role,
  { beat = 0, flight = 'straight' }: { beat?: number; flight?: 'straight' | 'lob' | 'bounce' } = {},
): Move => ({ kind: 'pass', from, to, flight, throwIn: true, beat })

export const screen = (
  who: Role,
  mate: Role,
  to: Spot,
  { beat = 0, blind = false }: { beat?: number; blind?: boolean } = {},
): Move => ({ kind: 'screen', who, for: mate, to: place(to), blind, beat })

export const theirs = (who: DefenderId, to: Spot, { beat = 0, bend = 0 }: Options = {}): Move => ({
  kind: 'theirs',
  who,
  to: place(to),
  bend,
  beat,
})

export const step = (title: string, ...moves: Move[]): Step => ({ title, moves })

/** Where ten stand, the role that throws in, and the steps. */
export function diagram(
  ball: Role,
  ours: Record<Role, Spot>,
  defenders: Record<DefenderId, Spot>,
  ...steps: Step[]
): Diagram {
  return {
    version: 1,
    frame: 1,
    start: {
      ours: (Object.entries(ours) as [Role, Spot][]).map(([role, at]) => ({ role, at: place(at) })),
      theirs: (Object.entries(defenders) as [DefenderId, Spot][]).map(([id, at]) => ({ id, at: place(at) })),
      ball,
    },
    steps,
  }
}
