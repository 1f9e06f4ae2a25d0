import { describe, expect, it } from 'vitest'
import { rulePack } from '@shared/court/rulePacks'
import { clockWords, marginWords, readClock, readMargin, readSeconds } from '@/views/possessions/clockWords'
import { readTyped } from '@/views/possessions/typed'

describe('the clock', () => {
  it.each([
    ['5:20', 3200],
    ['5.20', 3200],
    ['520', 3200],
    ['10:00', 6000],
    ['1000', 6000],
    ['48', 480],
    ['48.3', 483],
    ['0:48.3', 483],
    ['7', 70],
  ])('reads %s', (text, tenths) => {
    expect(readClock(text, 10)).toBe(tenths)
  })

  it.each(['', 'five', '5:75', '10:01', '5:2:0', '-3', '99999'])('refuses "%s"', (text) => {
    expect(readClock(text, 10)).toBeNull()
  })

  it('says what it reads', () => {
    for (const tenths of [0, 5, 483, 600, 3200, 6000]) expect(readClock(clockWords(tenths), 10)).toBe(tenths)
  })
})

describe('the margin', () => {
  it.each([
    ['-2', -2],
    ['+3', 3],
    ['3', 3],
    ['down 2', -2],
    ['Up 11', 11],
    ['level', 0],
    ['-0', 0],
  ])('reads %s', (text, margin) => {
    expect(Object.is(readMargin(text), margin)).toBe(true)
  })

  it('refuses what is no score', () => {
    expect(readMargin('100')).toBeNull()
    expect(readMargin('two')).toBeNull()
  })

  it('says who leads', () => {
    expect([marginWords(2), marginWords(0), marginWords(-7)]).toEqual([
      'they lead by 2',
      'level',
      'they trail by 7',
    ])
  })
})

describe('seconds', () => {
  it('takes a comma, the unit and one decimal', () => {
    expect([
      readSeconds('1,8', 60),
      readSeconds('1.84 s', 60),
      readSeconds('61', 60),
      readSeconds('x', 60),
    ]).toEqual([1.8, 1.8, null, null])
  })
})

describe('what is typed', () => {
  const pack = rulePack('fiba')

  it('is told as a fault with its remedy', () => {
    expect(readTyped({ field: 'clock' }, '12:00', pack)).toEqual({
      fault: 'Write the time left as 5:20, at most 10:00.',
    })
    expect(readTyped({ field: 'crossedAt' }, '90', pack)).toHaveProperty('fault')
  })

  it('takes the value out when nothing is left', () => {
    expect(readTyped({ field: 'margin' }, ' ', pack)).toMatchObject({ do: 'set', value: null })
  })
})
