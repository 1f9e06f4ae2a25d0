import { describe, expect, it } from 'vitest'
import { PlanBody } from '@shared/plans/schemas'
import { ROLES, type Role } from '@shared/vocabulary'
import {
  bodyOf,
  changeSentences,
  giveRole,
  mergeNewer,
  NO_PICKS,
  pick,
  pickOf,
  seatsOf,
  type PlanDraft,
} from '@/views/choices/planDraft'

const id = (last: number) => `00000000-0000-4000-8000-${String(last).padStart(12, '0')}`
const [box, stack] = [id(1), id(2)]
const player = (number: number) => id(100 + number)
const suggested = () => ROLES.map((role) => ({ role, squadPlayerId: player(Number(role)) }))
const roleOf = (seats: Map<Role, string | null>) => [...seats.values()]

describe('picks', () => {
  it('takes the place from whoever had it', () => {
    const draft = pick(pick(NO_PICKS, box, 'first'), stack, 'first')
    expect(pickOf(draft, stack)).toBe('first')
    expect(pickOf(draft, box)).toBeNull()
  })

  it('moves one counter from place to place and never leaves it in two', () => {
    const moved = pick(pick(pick(NO_PICKS, box, 'first'), box, 'change'), box, 'not')
    expect(moved).toMatchObject({ firstCallId: null, changeUpId: null, notThisGame: [box] })
    expect(pick(moved, box, 'first')).toMatchObject({ firstCallId: box, notThisGame: [] })
    expect(pickOf(pick(moved, box, null), box)).toBeNull()
  })
})

describe('roles', () => {
  it('lets two players of one counter change places', () => {
    const draft = giveRole(NO_PICKS, { counterId: box, role: '1', squadPlayerId: player(4) }, suggested)
    expect(roleOf(seatsOf(draft, box, suggested))).toEqual([4, 2, 3, 1, 5].map(player))
  })

  it('brings in a player from outside and leaves the rest', () => {
    const draft = giveRole(NO_PICKS, { counterId: box, role: '5', squadPlayerId: player(9) }, suggested)
    expect(roleOf(seatsOf(draft, box, suggested))).toEqual([1, 2, 3, 4, 9].map(player))
    expect(roleOf(seatsOf(draft, stack, suggested))).toEqual([1, 2, 3, 4, 5].map(player))
  })

  it('leaves a seat empty when its suggestion was given another role by hand', () => {
    const draft: PlanDraft = { ...NO_PICKS, roles: [{ counterId: box, role: '1', squadPlayerId: player(2) }] }
    expect(roleOf(seatsOf(draft, box, suggested))).toEqual([player(2), null, player(3), player(4), player(5)])
  })
})

describe('what is sent', () => {
  it('carries the roles of the picked counters only, and passes the contract', () => {
    const given = giveRole(NO_PICKS, { counterId: stack, role: '2', squadPlayerId: player(9) }, suggested)
    const draft = { ...pick(given, box, 'first'), keys: [' Look long first ', '', 'Stop short'] }
    const body = PlanBody.parse(bodyOf(draft, id(50), suggested))
    expect(body.roles).toHaveLength(5)
    expect(new Set(body.roles.map((role) => role.counterId))).toEqual(new Set([box]))
    expect(body.keys).toEqual(['Look long first', 'Stop short'])
    const both = PlanBody.parse(bodyOf(pick(draft, stack, 'change'), id(50), suggested))
    expect(both.roles).toHaveLength(10)
    expect(both.roles).toContainEqual({ counterId: stack, role: '2', squadPlayerId: player(9) })
  })
})

describe('a version that somebody else saved first', () => {
  const base: PlanDraft = { ...pick(NO_PICKS, box, 'first'), keys: ['Look long first'] }
  const theirs = { ...pick(base, stack, 'first'), keys: ['Stop short'] }

  it('is taken, with keys typed here kept', () => {
    const mine = { ...pick(base, stack, 'change'), keys: ['Catch high'] }
    const { draft, keptKeys } = mergeNewer(base, mine, theirs)
    expect(draft).toMatchObject({ firstCallId: stack, changeUpId: null, keys: ['Catch high'] })
    expect(keptKeys).toBe(true)
  })

  it('replaces keys that were not touched here', () => {
    const { draft, keptKeys } = mergeNewer(base, { ...base, changeUpId: stack }, theirs)
    expect(draft.keys).toEqual(['Stop short'])
    expect(keptKeys).toBe(false)
  })

  it('keeps a reason typed here', () => {
    expect(mergeNewer(base, { ...base, reason: 'We ran it well' }, theirs).draft.reason).toBe(
      'We ran it well',
    )
  })

  it('is told in sentences, and an untouched plan in none', () => {
    const nameOf = (counter: string) => (counter === box ? 'Box' : 'Stack')
    expect(changeSentences(base, theirs, nameOf)).toEqual([
      'The first call is now Stack.',
      'The keys were changed.',
    ])
    expect(changeSentences(base, pick(base, stack, 'not'), nameOf)).toEqual(['Stack is not for this game.'])
    expect(changeSentences(pick(base, stack, 'not'), base, nameOf)).toEqual(['Stack is open again.'])
    expect(changeSentences(base, { ...base }, nameOf)).toEqual([])
  })
})
