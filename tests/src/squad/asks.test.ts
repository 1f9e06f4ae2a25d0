import { describe, it, expect } from 'vitest'
import type { Skill } from '@shared/counterWords'
import { asksOf, fitsOf, fitWords, readSkill } from '@/views/squad/asks'

const NONE = { handle: 0, 'throw-in': 0, 'long-arm': 0, decide: 0, sprint: 0, screen: 0 }
const player = (id: string, skills: Partial<Record<Skill, number>>, available = true) => ({
  id,
  available,
  skills: { ...NONE, ...skills },
})
const role = (seat: '1' | '2' | '3' | '4' | '5', ...needs: [Skill, number][]) => ({
  role: seat,
  title: `role ${seat}`,
  needs: needs.map(([skill, level]) => ({ skill, level })),
})
const ROLES = [
  role('1', ['handle', 2], ['decide', 1]),
  role('2', ['decide', 2], ['handle', 2]),
  role('3', ['sprint', 2]),
  role('4', ['sprint', 1]),
  role('5', ['throw-in', 2]),
]

describe('what a counter asks', () => {
  it('lists each level once, the highest first, with the roles that ask it', () => {
    const asks = asksOf(ROLES)
    expect(asks.handle).toEqual([{ level: 2, roles: ['1', '2'] }])
    expect(asks.decide).toEqual([
      { level: 2, roles: ['2'] },
      { level: 1, roles: ['1'] },
    ])
    expect(asks.screen).toEqual([])
  })

  it('leaves out a level of nothing', () => {
    expect(asksOf([role('1', ['screen', 0])]).screen).toEqual([])
  })
})

describe('who fits', () => {
  const guard = player('guard', { handle: 3, decide: 3 })
  const second = player('second', { handle: 2, decide: 1 })
  const out = player('out', { sprint: 3 }, false)
  const fits = fitsOf(ROLES, [guard, second, out])

  it('puts one player in a role, and shows what else each could fill', () => {
    expect(fits.get('second')?.slice(0, 2)).toEqual(['first', 'short'])
    expect(fits.get('guard')?.slice(0, 2)).toEqual(['meets', 'first'])
  })

  it('puts nobody who is out first, but says what she meets', () => {
    expect(fits.get('out')).toEqual(['none', 'none', 'meets', 'meets', 'none'])
  })

  it('does not put somebody first in a role she cannot fill', () => {
    expect(fitsOf(ROLES, [player('new', {})]).get('new')).not.toContain('first')
  })

  it('says it in words', () => {
    expect(fitWords(ROLES, ['meets', 'first', 'none', 'none', 'short'])).toBe(
      'first in 2; meets every ask of 1; falls short in 5',
    )
    expect(fitWords(ROLES, ['none', 'none', 'none', 'none', 'none'])).toBe('fits no role')
  })
})

describe('one skill beside what is asked', () => {
  it('takes the ask of the role she is first in', () => {
    const fits = ['first', 'meets', 'none', 'none', 'none'] as const
    expect(readSkill(ROLES, fits, 'decide', 1)).toEqual({ level: 1, asked: 1, hers: true, met: true })
  })

  it('falls back to the least that is asked where no role of hers asks it', () => {
    const fits = ['first', 'none', 'none', 'none', 'none'] as const
    expect(readSkill(ROLES, fits, 'sprint', 0)).toEqual({ level: 0, asked: 1, hers: false, met: false })
  })

  it('says that nobody asks it', () => {
    expect(readSkill(ROLES, [], 'screen', 3)).toEqual({ level: 3, asked: null, hers: false, met: false })
  })
})
