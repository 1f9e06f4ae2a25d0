import { beforeEach, describe, expect, it } from 'vitest'
import type { Choice } from '@shared/choices/schemas'
import { rulePack } from '@shared/court/rulePacks'
import { DEFAULT_WALK, WALK_SETTINGS } from '@shared/court/walk/settings'
import type { PlanRow } from '@shared/plans/schemas'
import type { SquadPlayerRow } from '@shared/squad/schemas'
import { counterFive, sprintWords } from '@/views/counters/counterFive'
import { courtsOf } from '@/views/counters/courtsOf'
import { changedIn, useWalkSettings } from '@/views/counters/walkSettings'

describe('the courts of a counter', () => {
  it('are the books it names, the team’s own first, and our hall last', () => {
    const courts = courtsOf(['nfhs84', 'fiba'], 'fiba', { length: 26, backcourtSeconds: 10 })
    expect(courts.map(({ value }) => value)).toEqual(['fiba', 'nfhs84', 'own'])
    expect(courts[2]?.label).toBe('Our court, 10 s')
    expect(courts[2]?.pack.court).toEqual({ length: 26, width: rulePack('fiba').court.width })
  })

  it('are never none: a draft that names no book stands on the team’s', () => {
    expect(courtsOf([], 'fiba', null).map(({ value }) => value)).toEqual(['fiba'])
  })
})

describe('who runs it', () => {
  const players = ['Nell', 'Ada'].map(
    (firstName, i) =>
      ({ id: firstName, firstName, sprint20: i === 0 ? 3.4 : null }) as unknown as SquadPlayerRow,
  )
  const choices = [
    {
      counterId: 'c',
      roles: [
        { role: '1', squadPlayerId: 'Ada' },
        { role: '2', squadPlayerId: 'Nell' },
        { role: '3', squadPlayerId: null },
      ],
    },
  ] as unknown as Choice[]
  const plan = { roles: [{ counterId: 'c', role: '1', squadPlayerId: 'Nell' }] } as unknown as PlanRow

  it('is whom the plan names, else who fits best; nobody without a game ahead', () => {
    const seats = (five: ReturnType<typeof counterFive>) => five.map(([role, { id }]) => `${role} ${id}`)
    expect(seats(counterFive('c', { plan: null, choices }, players))).toEqual(['1 Ada', '2 Nell'])
    expect(seats(counterFive('c', { plan, choices }, players))[0]).toBe('1 Nell')
    expect(counterFive('c', null, players)).toEqual([])
  })

  it('is said for those who were timed only', () => {
    expect(sprintWords(counterFive('c', { plan: null, choices }, players))).toContain('Nell as 2')
    expect(sprintWords([])).toBe('')
  })
})

describe('what the walk assumes', () => {
  beforeEach(() => localStorage.clear())

  it('is kept on this device, held to its bounds, and goes back to how it came', () => {
    const walk = useWalkSettings()
    walk.set('straightSpeed', 15)
    walk.set('reaction', 99)
    walk.set('stride', Number.NaN)
    expect(walk.settings.value.reaction).toBe(WALK_SETTINGS.reaction.most)
    expect(changedIn(walk.settings.value)).toBe(2)
    expect(useWalkSettings().settings.value.straightSpeed).toBe(15)
    walk.reset()
    expect(useWalkSettings().settings.value).toEqual(DEFAULT_WALK)
  })

  it('is the default where what was kept can no longer be read', () => {
    localStorage.setItem('overtop.kept.walk', '{"straightSpeed":"fast"}')
    expect(useWalkSettings().settings.value).toEqual(DEFAULT_WALK)
  })
})
