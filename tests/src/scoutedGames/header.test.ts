import { describe, expect, it } from 'vitest'
import { ScoutedGameBody } from '@shared/scoutedGames/schemas'
import {
  bodyOf,
  coverageWords,
  emptyHeader,
  faultsOf,
  headerOf,
  headerSentence,
  nextSlot,
} from '@/views/scoutedGames/header'
import { daysBefore, readDay } from '@/views/scoutedGames/playedDay'

const OPPONENT = '6f1f7c9e-3f53-4a9e-9a53-0d1f6f0b7f10'
const TODAY = '2026-03-16'
const whole = { ...emptyHeader('fiba'), foe: ' Tarn Valley ', playedOn: '2026-03-14', seen: 'film' as const }

describe('the header of a scouted game', () => {
  it('asks what it cannot guess, in the order of the sentence', () => {
    expect(nextSlot(emptyHeader('fiba'))).toBe('foe')
    expect(nextSlot({ ...emptyHeader('fiba'), foe: 'Tarn Valley' })).toBe('playedOn')
    expect(nextSlot({ ...whole, seen: '' })).toBe('seen')
    expect(nextSlot(whole)).toBeNull()
  })

  it('reads as one sentence', () => {
    expect(
      headerSentence({ ...whole, coverage: 'minutes', from: '8', to: '32', theirs: '61', foeScore: '58' }),
    ).toBe(
      'We watched them against Tarn Valley on Sat 14 March, on film, under 8-second rules, and logged from minute 8 to 32. It ended 61 to 58 and was a contest.',
    )
  })

  it('makes a body that the server takes and comes back the same', () => {
    const said = {
      ...whole,
      foe: 'Tarn Valley',
      coverage: 'minutes' as const,
      from: '8',
      to: '32',
      theirs: '61',
      foeScore: '58',
      notes: 'Their **12** never tires.',
    }
    const body = bodyOf(said, OPPONENT, TODAY)
    expect(ScoutedGameBody.safeParse(body).success).toBe(true)
    const row = {
      ...ScoutedGameBody.parse(body),
      id: OPPONENT,
      version: 1,
      createdAt: '2026-03-16T10:00:00.000Z',
      updatedAt: '2026-03-16T10:00:00.000Z',
      scout: null,
      counts: { possessions: 0, pressed: 0, stills: 0 },
    }
    expect(headerOf(row)).toEqual(said)
  })

  it.each([
    [{ playedOn: '2026-03-17' }, 'playedOn'],
    [{ coverage: 'minutes' as const }, 'coverage'],
    [{ coverage: 'minutes' as const, from: '20', to: '20' }, 'coverage'],
    [{ coverage: 'minutes' as const, from: '20', to: '81' }, 'coverage'],
    [{ theirs: '61' }, 'score'],
    [{ theirs: '61', foeScore: '251' }, 'score'],
    [{ foe: 'x'.repeat(81) }, 'foe'],
  ])('names the slot at fault for %o and sends nothing', (change, slot) => {
    const header = { ...whole, ...change }
    expect(Object.keys(faultsOf(header, TODAY))).toEqual([slot])
    expect(bodyOf(header, OPPONENT, TODAY)).toBeNull()
  })

  it('says the coverage in words', () => {
    expect(coverageWords({ kind: 'throw-ins' })).toBe('throw-ins only')
    expect(coverageWords({ kind: 'minutes', from: 0, to: 20 })).toBe('minutes 0 to 20')
  })
})

describe('the day they played', () => {
  it.each([
    ['14 March', '2026-03-14'],
    ['Sat 14 Mar', '2026-03-14'],
    ['14.3.', '2026-03-14'],
    ['14/3/26', '2026-03-14'],
    ['2026-3-4', '2026-03-04'],
    ['20 december', '2025-12-20'],
    ['16 March', '2026-03-16'],
    ['17 March', '2025-03-17'],
  ])('reads %s', (text, date) => {
    expect(readDay(text, TODAY)).toBe(date)
  })

  it.each(['', '31 feb', '14 Smarch', 'yesterday', '2026-13-01', '99'])('refuses "%s"', (text) => {
    expect(readDay(text, TODAY)).toBeNull()
  })

  it('counts back over the turn of a month', () => {
    expect(daysBefore('2026-03-01', 1)).toBe('2026-02-28')
  })
})
