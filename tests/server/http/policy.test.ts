import { describe, expect, it } from 'vitest'
import { actionsOf, may } from '@server/http/policy'
import { mayDrawFor } from '@server/features/sheets/sheets.policy'
import { ACTIONS, type Action } from '@shared/session/schemas'
import { TEAM_ROLES } from '@shared/vocabulary'
import { WHO_MAY } from '../../support/whoMay'

describe('the policy table', () => {
  it('knows every action and every role, and no other', () => {
    expect(Object.keys(WHO_MAY).sort()).toEqual([...ACTIONS].sort())
    expect(TEAM_ROLES.map(({ value }) => value)).toEqual(['head-coach', 'assistant-coach', 'player'])
  })

  it.each(Object.entries(WHO_MAY) as [Action, (typeof WHO_MAY)[Action]][])('%s', (action, roles) => {
    for (const { value: role } of TEAM_ROLES)
      expect([role, may(role, action)]).toEqual([role, roles.includes(role)])
  })

  it('tells a session exactly what it allows', () => {
    for (const { value: role } of TEAM_ROLES)
      expect([...actionsOf(role)].sort()).toEqual(ACTIONS.filter((action) => may(role, action)).sort())
  })
})

describe('whose copy of a sheet', () => {
  const me = '33333333-3333-4333-8333-333333333333'
  const other = '44444444-4444-4444-8444-444444444444'
  it.each([
    ['player', me, me, true],
    ['player', me, null, true],
    ['player', me, other, false],
    ['player', null, other, false],
    ['player', null, null, true],
    ['assistant-coach', null, other, true],
    ['head-coach', null, other, true],
    ['head-coach', null, null, true],
  ] as const)('a %s who is %s draws the copy of %s: %s', (role, squadPlayerId, whose, allowed) => {
    expect(mayDrawFor({ role, squadPlayerId }, whose)).toBe(allowed)
  })
})
