import { describe, expect, it } from 'vitest'
import { rulePack } from '@shared/court/rulePacks'
import { datesWords, gamesWords } from '@/views/tendencies/gameChoices'
import { luckWords } from '@/views/tendencies/luckWords'
import { possessionWords, whereWords } from '@/views/tendencies/possessionWords'
import { textOf } from '@/views/tendencies/segments'
import { narrowWords, situationLead } from '@/views/tendencies/situationWords'
import { possession } from './tally'

const fiba = rulePack('fiba')

describe('a possession as a sentence', () => {
  it('says what they did in order, what was open and how it ended', () => {
    const row = possession({
      denied: ['pass-back'],
      traps: [
        {
          x: 0.1,
          y: 0.9,
          t: 2,
          cue: 'on-catch',
          trappers: null,
          result: 'passed-out',
          spot: 'coffin-corner',
          side: 'right',
        },
        {
          x: 0.55,
          y: 0.9,
          t: 6.6,
          cue: null,
          trappers: null,
          result: 'lost',
          spot: 'just-over-half',
          side: 'right',
        },
      ],
      leftOpen: ['middle'],
      outcome: 'lost-live',
      outcomePlace: 'past-half',
    })
    const segments = possessionWords(row)
    expect(textOf(segments)).toBe(
      'After a made basket they pressed full court in a 1-2-1-1, denied the pass back, trapped in the right deep ' +
        'corner on the catch at 2.0 s (passed out), then trapped again on the right sideline just over half at 6.6 s ' +
        '(lost). The middle was open. Lost, live just past half.',
    )
    expect(segments.find(({ ink }) => ink === 'our')?.text).toBe('The middle was open')
  })

  it('says nothing of what was not logged or could not be seen', () => {
    const row = possession({
      trigger: 'live',
      shape: 'dropped-back',
      pickup: null,
      traps: 'not-visible',
      leftOpen: 'not-visible',
      outcome: null,
    })
    expect(textOf(possessionWords(row))).toBe('On a live ball they dropped back.')
  })

  it('says where and when', () => {
    expect(whereWords(possession(), 'v Tarn Valley, 2026-03-14', fiba)).toBe(
      'v Tarn Valley, Sat 14 Mar, Q2 6:44, they trailed by 3',
    )
    expect(whereWords(possession({ period: null, clock: null, margin: null }), 'against us', fiba)).toBe(
      'against us',
    )
  })
})

describe('the words of the situation', () => {
  it('open the sentence', () => {
    expect(situationLead({}, fiba)).toBe('')
    expect(situationLead({ trigger: ['made-free-throw'] }, fiba)).toBe('After made free throws')
    expect(situationLead({ trigger: ['dead-ball'], period: [4, 5], margin: ['behind'] }, fiba)).toBe(
      'After dead balls, in Q4 and OT1, behind by 6 or more,',
    )
    expect(situationLead({ game: ['x'] }, fiba)).toBe('')
  })

  it('stand quietly in the band', () => {
    expect(narrowWords({ trigger: ['live'] }, fiba)).toBe('')
    expect(narrowWords({ period: [4], shape: ['person', '2-2-1'] }, fiba)).toBe('Q4, person or 2-2-1')
  })

  it('name games and their days', () => {
    const games = ['2026-03-14', '2026-03-07', '2026-02-28'].map((playedOn, i) => ({
      id: String(i),
      label: 'v',
      playedOn,
    }))
    expect(gamesWords(undefined, games)).toBe('All 3 games')
    expect(datesWords(undefined, games)).toBe('28 Feb, 7 Mar, 14 Mar')
    expect(gamesWords(['0'], games)).toBe('1 of 3 games')
    expect(datesWords(['0'], games)).toBe('14 Mar')
    expect(gamesWords(undefined, [])).toBe('No games yet')
  })
})

describe('the luck line', () => {
  it('sets the claims against what chance alone would give', () => {
    expect(luckWords({ inView: 20, claimed: 1, byChance: 0.3 }, false)).toBe(
      'Luck: of 20 habits counted here 1 comes out usually or rarely; if each were even, chance alone would give less than one.',
    )
    expect(luckWords({ inView: 20, claimed: 0, byChance: 2.5 }, true)).toContain('10 rows over two games')
    expect(luckWords({ inView: 0, claimed: 0, byChance: 0 }, false)).toBe('')
  })
})
