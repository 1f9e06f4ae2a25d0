import { claim, grade, thin } from '@shared/stats/evidence'
import { wilson } from '@shared/stats/wilson'
import type { Tendency, TendencyRead } from '@shared/tendencies/schemas'
import type { PossessionRow } from '@shared/possessions/schemas'

/** A tendency as the server counts it, by the same formulas. */
export const tally = (key: string, k: number, n: number, games = 3): Tendency => ({
  key,
  k,
  n,
  games,
  rate: n === 0 ? null : k / n,
  interval: wilson(k, n),
  grade: grade(n, games),
  claim: claim(k, n),
  thin: thin(k, n, games),
  adjusted: null,
})

export const readOf = (tendencies: Tendency[], over: Partial<TendencyRead> = {}): TendencyRead => ({
  opponentId: '11111111-1111-4111-8111-111111111111',
  counted: 40,
  notCovered: 0,
  games: [],
  situations: [],
  tendencies,
  pickup: null,
  spots: [],
  ball: [],
  luck: { inView: tendencies.length, claimed: 2, byChance: 1.2 },
  ...over,
})

export const possession = (over: Partial<PossessionRow> = {}): PossessionRow => ({
  id: '22222222-2222-4222-8222-222222222222',
  version: 1,
  createdAt: '2026-03-14T12:00:00.000Z',
  updatedAt: '2026-03-14T12:00:00.000Z',
  frame: 1,
  scoutedGameId: '33333333-3333-4333-8333-333333333333',
  gameId: null,
  tripId: null,
  number: 1,
  period: 2,
  clock: 4040,
  margin: -3,
  trigger: 'made-basket',
  shape: '1-2-1-1',
  shapeVariant: null,
  pickup: 'full',
  traps: [],
  outcome: 'through',
  outcomePlace: null,
  throwerGuard: null,
  denied: null,
  tookAway: null,
  leftOpen: null,
  onBall: null,
  handler: null,
  goalie: null,
  shownShape: null,
  crossedAt: null,
  track: null,
  note: '',
  counterId: null,
  rightCall: null,
  runWell: null,
  pressed: true,
  stills: [],
  ...over,
})
