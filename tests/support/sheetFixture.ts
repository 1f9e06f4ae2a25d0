import type { FrozenCounter, FrozenPlan, SheetView } from '@shared/sheets/schemas'
import { DEMO_COUNTERS } from '@server/database/demo/counters'

/** The five of the invented squad who have a role, with last names that no sheet may show. */
export const FIVE = [
  { squadPlayerId: '00000000-0000-4000-8000-000000000001', firstName: 'Nell', lastName: 'Tavish', jersey: 4 },
  { squadPlayerId: '00000000-0000-4000-8000-000000000002', firstName: 'Ada', lastName: 'Marsh', jersey: 11 },
  { squadPlayerId: '00000000-0000-4000-8000-000000000003', firstName: 'Imara', lastName: 'Boyce', jersey: 7 },
  {
    squadPlayerId: '00000000-0000-4000-8000-000000000004',
    firstName: 'Wren',
    lastName: 'Castell',
    jersey: 5,
  },
  {
    squadPlayerId: '00000000-0000-4000-8000-000000000005',
    firstName: 'Tess',
    lastName: 'Okonjo',
    jersey: 22,
  },
] as const

/** A counter of the library as signing off freezes it; players by the order of the roles. */
export function frozenCounter(key: string, players: readonly (string | null)[]): FrozenCounter {
  const counter = DEMO_COUNTERS.find((one) => one.key === key)
  if (!counter) throw new Error(`no counter ${key}`)
  return {
    counterId: '00000000-0000-4000-8000-0000000000c1',
    name: counter.name,
    call: counter.call,
    diagram: counter.diagram,
    looks: counter.looks ?? [],
    roles: counter.roles.map(({ role, title, jobs, changeUpLine, keyStep }, index) => ({
      role,
      title,
      jobs,
      changeUpLine,
      keyStep,
      squadPlayerId: players[index] ?? null,
    })),
  }
}

export function frozenPlan(change: Partial<FrozenPlan> = {}): FrozenPlan {
  const ids = FIVE.map(({ squadPlayerId }) => squadPlayerId)
  return {
    version: 1,
    opponentName: 'Port Selby Gulls',
    tipOff: '2026-03-20T19:15:00Z',
    place: 'home',
    rulePack: 'fiba',
    press: {
      pressed: 24,
      pickup: 'full',
      pickupThin: false,
      mostlyShape: '1-2-1-1',
      zones: [
        { spot: 'coffin-corner', side: 'right', k: 5, n: 11, thin: false, letter: 'A' },
        { spot: 'coffin-corner', side: 'left', k: 2, n: 11, thin: false, letter: 'A' },
        { spot: 'just-over-half', side: 'right', k: 3, n: 9, thin: false, letter: 'B' },
        { spot: 'just-over-half', side: 'left', k: 1, n: 9, thin: true, letter: 'B' },
      ],
      room: 'middle',
      lines: [
        {
          letter: 'A',
          text: 'They trap in the corner.',
          k: 7,
          n: 11,
          ink: 'their',
          habitKey: 'trap-at:coffin-corner:any',
        },
        {
          letter: 'B',
          text: 'They trap again just past half.',
          k: 4,
          n: 9,
          ink: 'their',
          habitKey: 'trap-again',
        },
        {
          letter: 'C',
          text: 'They leave the middle open.',
          k: 5,
          n: 7,
          ink: 'our',
          habitKey: 'leave-open:middle',
        },
      ],
    },
    firstCall: frozenCounter('one-four', ids),
    // Nell catches first in both; the others change places.
    changeUp: frozenCounter(
      'box',
      [0, 3, 2, 4, 1].map((index) => ids[index] ?? null),
    ),
    keys: ['Don’t catch in the corner.', 'Don’t dribble into two.'],
    ...change,
  }
}

/** A sheet as everybody reads it. */
export function sheetView(content: FrozenPlan = frozenPlan(), change: Partial<SheetView> = {}): SheetView {
  return {
    id: '00000000-0000-4000-8000-0000000000a1',
    gameId: '00000000-0000-4000-8000-0000000000b1',
    planNumber: 2,
    createdAt: '2026-03-18T20:00:00Z',
    timeZone: 'Europe/London',
    content,
    players: FIVE.map(({ squadPlayerId, firstName, jersey }) => ({ squadPlayerId, firstName, jersey })),
    mine: null,
    budget: { words: 0, limit: 120, over: false },
    fuller: false,
    recalledAt: null,
    newest: null,
    ...change,
  }
}
