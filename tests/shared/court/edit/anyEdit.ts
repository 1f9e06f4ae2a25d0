import fc from 'fast-check'
import { DefenderId } from '@shared/court/diagram'
import type { Edit } from '@shared/court/edit/edits'
import { ROLES } from '@shared/vocabulary'
import { anyMove } from '../arbitraries'

/** Also far off the court, as a hand that slips. */
const place = fc.record({
  x: fc.double({ min: -3, max: 3, noNaN: true }),
  y: fc.double({ min: -3, max: 3, noNaN: true }),
})
const role = fc.constantFrom(...ROLES)
const id = fc.constantFrom(...DefenderId.options)
const step = fc.integer({ min: -1, max: 12 })
const index = fc.integer({ min: -1, max: 12 })
const by = fc.constantFrom(-1 as const, 1 as const)

/** Any edit, sensible or not. */
export const anyEdit: fc.Arbitrary<Edit> = fc.oneof(
  fc.record({ do: fc.constant('place' as const), who: fc.oneof(role, id), at: place }),
  fc.record({ do: fc.constant('thrower' as const), role }),
  fc.record({ do: fc.constant('add-defender' as const), id, at: place }),
  fc.record({ do: fc.constant('remove-defender' as const), id }),
  fc.record({ do: fc.constant('add-move' as const), step, move: anyMove }),
  fc.record({ do: fc.constant('add-move' as const), step, move: anyMove, then: fc.boolean() }),
  fc.record({ do: fc.constant('change-move' as const), step, index, move: anyMove }),
  fc.record({ do: fc.constant('remove-move' as const), step, index }),
  fc.record({ do: fc.constant('order-move' as const), step, index, by }),
  fc.record({ do: fc.constant('join-move' as const), step, index, then: fc.boolean() }),
  fc.record({ do: fc.constant('aim' as const), step, index, to: place }),
  fc.record({
    do: fc.constant('bend' as const),
    step,
    index,
    bend: fc.double({ min: -4, max: 4, noNaN: true }),
  }),
  fc.record({ do: fc.constant('add-step' as const), after: step }),
  fc.record({ do: fc.constant('duplicate-step' as const), step }),
  fc.record({ do: fc.constant('remove-step' as const), step }),
  fc.record({ do: fc.constant('order-step' as const), step, by }),
  fc.record({ do: fc.constant('title' as const), step, title: fc.string({ maxLength: 90 }) }),
  fc.record({ do: fc.constant('add-word' as const), step, text: fc.string({ maxLength: 40 }), at: place }),
  fc.record({ do: fc.constant('change-word' as const), step, index, text: fc.string({ maxLength: 40 }) }),
  fc.record({ do: fc.constant('move-word' as const), step, index, at: place }),
  fc.record({ do: fc.constant('remove-word' as const), step, index }),
  fc.record({ do: fc.constant('mirror' as const) }),
)
