import { describe, expect, it } from 'vitest'
import type { Role } from '@shared/vocabulary'
import { gapsOf } from '@/views/choices/planGaps'

const squad = new Map([
  ['nell', { firstName: 'Nell', outUntil: null }],
  ['freya', { firstName: 'Freya', outUntil: '2026-03-20' }],
])
const seats = new Map<Role, string | null>([
  ['1', 'nell'],
  ['2', 'freya'],
  ['3', null],
  ['4', 'gone'],
])

describe('gaps in the five', () => {
  it('names a role nobody has and a player who is out through that day', () => {
    expect(gapsOf('Box', seats, squad, '2026-03-20')).toEqual([
      'Box: Freya is out and has role 2.',
      'Box: nobody has role 3.',
      'Box: nobody has role 4.',
    ])
  })

  it('counts a player as back on the day after', () => {
    expect(gapsOf('Box', seats, squad, '2026-03-21').join()).not.toContain('Freya')
  })
})
