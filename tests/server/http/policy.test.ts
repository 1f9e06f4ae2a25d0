import { describe, expect, it } from 'vitest'
import { actionsOf, may } from '@server/http/policy'
import { mayDrawFor } from '@server/features/sheets/sheets.policy'
import { ACTIONS, type Action } from '@shared/session/schemas'
import { TEAM_ROLES } from '@shared/vocabulary'

/** The whole of who may do what, written out: a change of the policy has to be made here too. */
const TABLE: Record<Action, { head: boolean; assistant: boolean; player: boolean }> = {
  'opponent:read': { head: true, assistant: true, player: false },
  'opponent:write': { head: true, assistant: true, player: false },
  'game:read': { head: true, assistant: true, player: false },
  'game:write': { head: true, assistant: true, player: false },
  'scouting:read': { head: true, assistant: true, player: false },
  'scouting:write': { head: true, assistant: true, player: false },
  'counter:read': { head: true, assistant: true, player: false },
  'rule:read': { head: true, assistant: true, player: false },
  'rule:write': { head: true, assistant: false, player: false },
  'squad:read': { head: true, assistant: true, player: false },
  'squad:write': { head: true, assistant: false, player: false },
  'plan:read': { head: true, assistant: true, player: false },
  'plan:write': { head: true, assistant: false, player: false },
  'plan:sign-off': { head: true, assistant: false, player: false },
  'sheet:read': { head: true, assistant: true, player: true },
  'sheet:hand-out': { head: true, assistant: true, player: false },
  'sheet:recall': { head: true, assistant: false, player: false },
  'history:read': { head: true, assistant: true, player: false },
  'counter:write': { head: true, assistant: true, player: false },
  'practice:read': { head: true, assistant: true, player: false },
  'practice:write': { head: true, assistant: true, player: false },
  'game:hand-on': { head: true, assistant: true, player: false },
  'team:read': { head: true, assistant: true, player: false },
  'team:write': { head: true, assistant: false, player: false },
  'person:erase': { head: true, assistant: false, player: false },
  'mail:read': { head: true, assistant: true, player: false },
}

describe('the policy table', () => {
  it('knows every action and every role, and no other', () => {
    expect(Object.keys(TABLE).sort()).toEqual([...ACTIONS].sort())
    expect(TEAM_ROLES.map(({ value }) => value)).toEqual(['head-coach', 'assistant-coach', 'player'])
  })

  it.each(Object.entries(TABLE) as [Action, (typeof TABLE)[Action]][])('%s', (action, row) => {
    expect({
      head: may('head-coach', action),
      assistant: may('assistant-coach', action),
      player: may('player', action),
    }).toEqual(row)
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
