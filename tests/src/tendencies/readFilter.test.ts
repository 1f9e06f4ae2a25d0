import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { MARGINS, TendencyFilter } from '@shared/tendencies/schemas'
import { PICKUPS, SHAPES, TRIGGERS, valuesOf } from '@shared/vocabulary'
import { filterOf, narrowedBy, queryOf, toggled } from '@/views/tendencies/readFilter'

const some = <T>(list: readonly T[]) =>
  fc.option(fc.subarray([...list], { minLength: 1 }), { nil: undefined })

describe('the filter in the address', () => {
  it('comes back as it went', () => {
    const filters = fc.record({
      trigger: some(valuesOf(TRIGGERS)),
      period: some([1, 2, 3, 4, 5]),
      margin: some(MARGINS),
      pickup: some(valuesOf(PICKUPS)),
      shape: some(valuesOf(SHAPES)),
      game: fc.option(fc.uniqueArray(fc.uuid(), { minLength: 1, maxLength: 4 }), { nil: undefined }),
    })
    fc.assert(
      fc.property(filters, (filter) => {
        expect(filterOf(queryOf(filter))).toEqual(JSON.parse(JSON.stringify(filter)))
        // What the address holds is also what the server takes.
        expect(TendencyFilter.parse(queryOf(filter))).toEqual(JSON.parse(JSON.stringify(filter)))
      }),
    )
  })

  it('drops what it does not know and keeps the rest', () => {
    expect(
      filterOf({
        trigger: 'made-basket,old-word',
        period: '4,4,0,99,x',
        margin: null,
        shape: ['2-2-1', 'person'],
        game: 'not-an-id',
        habit: 'trap',
      }),
    ).toEqual({ trigger: ['made-basket'], period: [4], shape: ['person', '2-2-1'] })
  })

  it('writes nothing where nothing is chosen', () => {
    expect(queryOf({})).toEqual({})
    expect(queryOf({ trigger: [] })).toEqual({})
    expect(toggled(['a'], 'a')).toBeUndefined()
    expect(toggled(undefined, 'a')).toEqual(['a'])
  })

  it('counts what narrows besides the trigger', () => {
    expect(narrowedBy({ trigger: ['live'] })).toBe(0)
    expect(narrowedBy({ trigger: ['live'], period: [4], shape: ['person'] })).toBe(2)
  })
})
