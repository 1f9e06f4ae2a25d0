import fc from 'fast-check'
import { Diagram, type Move } from '@shared/court/diagram'
import { RulePackKey, rulePack } from '@shared/court/rulePacks'
import { SPOT_CELLS } from '@shared/court/trapSpots'
import { DENIED, LANES, PICKUPS, ROLES, valuesOf } from '@shared/vocabulary'
import type { TrapZone } from '@shared/court/trapZones'

/** Any rule set. */
export const anyPack = fc.constantFrom(...RulePackKey.options).map(rulePack)

const fraction = (min: number, max: number) => fc.double({ min, max, noNaN: true })

/** Any place that a diagram may hold. */
export const anyPlace = fc.record({ x: fraction(-0.08, 1.02), y: fraction(-0.06, 1.06) })

const role = fc.constantFrom(...ROLES)
const defender = fc.constantFrom('X1', 'X2', 'X3', 'X4', 'X5')
const bend = fraction(-0.6, 0.6)
const beat = fc.integer({ min: 0, max: 5 })

/** Any move that a diagram may hold. */
export const anyMove: fc.Arbitrary<Move> = fc.oneof(
  fc.record({ kind: fc.constant('cut' as const), who: role, to: anyPlace, bend, beat }),
  fc.record({ kind: fc.constant('dribble' as const), who: role, to: anyPlace, bend, beat }),
  fc.record({
    kind: fc.constant('pass' as const),
    from: role,
    to: role,
    flight: fc.constantFrom('straight' as const, 'lob' as const, 'bounce' as const),
    throwIn: fc.boolean(),
    beat,
  }),
  fc.record({
    kind: fc.constant('screen' as const),
    who: role,
    to: anyPlace,
    for: role,
    blind: fc.boolean(),
    beat,
  }),
  fc.record({ kind: fc.constant('theirs' as const), who: defender, to: anyPlace, bend, beat }),
) as fc.Arbitrary<Move>

/** Anything that may be written on the court. */
export const anyWord = fc.record({
  text: fc.string({ minLength: 1, maxLength: 24 }).filter((text) => text.trim() !== ''),
  at: anyPlace,
})

/** Any diagram that the schema lets in, faults and all: twins, strangers, balls that nobody has. */
export const anyDiagram = fc
  .record({
    version: fc.constant(1),
    frame: fc.constant(1),
    start: fc.record({
      ours: fc.array(fc.record({ role, at: anyPlace }), { minLength: 5, maxLength: 5 }),
      theirs: fc.array(fc.record({ id: defender, at: anyPlace }), { maxLength: 5 }),
      ball: role,
    }),
    steps: fc.array(
      fc.record(
        {
          title: fc.constant('A step'),
          moves: fc.array(anyMove, { maxLength: 12 }),
          words: fc.array(anyWord, { minLength: 1, maxLength: 3 }),
        },
        { requiredKeys: ['title', 'moves'] },
      ),
      {
        minLength: 1,
        maxLength: 6,
      },
    ),
  })
  .map((raw) => Diagram.parse(raw))

const counted = fc
  .tuple(fc.integer({ min: 0, max: 60 }), fc.integer({ min: 0, max: 60 }), fc.boolean())
  .map(([a, b, thin]) => ({ k: Math.min(a, b), n: Math.max(a, b), thin }))

export const anyZones: fc.Arbitrary<TrapZone[]> = fc
  .subarray(SPOT_CELLS.map(({ spot, side }) => ({ spot, side })))
  .chain((spots) => fc.tuple(...spots.map((spot) => counted.map((count) => ({ ...spot, ...count })))))

/** What a press court may be asked to show. */
export const anyPress = fc.record({
  pack: anyPack,
  pxPerMetre: fraction(14, 40),
  zones: anyZones,
  pickup: fc.option(
    fc.tuple(counted, fc.constantFrom(...valuesOf(PICKUPS))).map(([count, at]) => ({ ...count, at })),
  ),
  room: fc.option(
    fc.tuple(counted, fc.constantFrom(...valuesOf(LANES))).map(([count, lane]) => ({ ...count, lane })),
  ),
  denied: fc
    .subarray([...valuesOf(DENIED)], { maxLength: 3 })
    .chain((lanes) => fc.tuple(...lanes.map((lane) => counted.map((count) => ({ ...count, lane }))))),
})
