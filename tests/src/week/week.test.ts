import { describe, expect, it } from 'vitest'
import type { GameRow } from '@shared/games/schemas'
import { GameBody } from '@shared/games/schemas'
import type { WeekEvent, WeekMark } from '@shared/week/schemas'
import { entriesOf, entryFault, withDates } from '@/views/week/dueDates'
import { verdict } from '@/views/week/lastWords'
import { layOut, placeInWeek, widthOf, type Placed } from '@/views/week/rulerPlaces'
import { sinceSentence } from '@/views/week/sinceWords'
import { ended } from '@/views/week/whereEnded'
import { dueWords, standsSentence, weekTitle, withMe } from '@/views/week/weekWords'

const NOW = Date.parse('2026-03-17T09:42:00Z')
const ZONE = 'Europe/London'
const maren = { id: '44444444-4444-4444-8444-000000000201', name: 'Maren Oduya', initials: 'MO' }
const tomas = { id: '44444444-4444-4444-8444-000000000202', name: 'Tomas Reyl', initials: 'TR' }
const game = (more: Partial<GameRow> = {}): GameRow => ({
  id: '44444444-4444-4444-8444-000000000101',
  version: 3,
  createdAt: '2026-03-01T10:00:00.000Z',
  updatedAt: '2026-03-01T10:00:00.000Z',
  opponentId: '44444444-4444-4444-8444-000000000001',
  opponentName: 'Port Selby Gulls',
  tipOff: '2026-03-20T19:15:00.000Z',
  place: 'home',
  rulePack: 'fiba',
  chooseBy: '2026-03-18T18:00:00.000Z',
  due: { scout: null, read: null, teach: null, review: null },
  notes: 'Bus at four.',
  station: 'choose',
  counts: { possessions: 58, scoutedGames: 3, ourGames: 0 },
  plan: null,
  headCoach: maren,
  holder: maren,
  read: { at: '2026-03-16T21:14:00.000Z', by: tomas },
  handedOn: null,
  mayHandOn: true,
  ...more,
})

describe('the head of the week', () => {
  it('counts midnights, not hours, to the next game', () => {
    const title = (tipOff: string) => weekTitle(game({ tipOff }), ZONE, NOW)
    expect(title('2026-03-20T19:15:00.000Z')).toBe('Three days to Port Selby Gulls')
    expect(title('2026-03-18T00:30:00.000Z')).toBe('Tomorrow: Port Selby Gulls')
    expect(title('2026-03-17T19:00:00.000Z')).toBe('Today: Port Selby Gulls')
    expect(weekTitle(undefined, ZONE, NOW)).toBe('This week')
  })

  it('says what is done and who acts, and never that somebody does who does not', () => {
    expect(standsSentence(game(), maren.id)).toBe('The read is signed off. You choose the counter.')
    expect(standsSentence(game({ read: null }), tomas.id)).toBe(
      '58 possessions are counted. Maren chooses the counter.',
    )
    const scout = game({
      station: 'scout',
      holder: null,
      counts: { possessions: 1, scoutedGames: 1, ourGames: 0 },
    })
    expect(standsSentence(scout, maren.id)).toBe('1 possession is counted. Nobody has the ball yet.')
  })
})

describe('due dates in words', () => {
  it.each([
    ['2026-03-18T18:00:00.000Z', 'due tomorrow 18:00'],
    ['2026-03-17T18:00:00.000Z', 'due today 18:00'],
    ['2026-03-19T17:30:00.000Z', 'due Thu 17:30'],
    ['2026-03-17T09:41:00.000Z', 'was due Tue 09:41'],
    [null, ''],
  ])('%s: %s', (due, words) => expect(dueWords(due, ZONE, NOW)).toBe(words))
})

describe('what is with me', () => {
  it('has what is due first on top, a look back last, and nothing of others', () => {
    const back = game({ id: 'back', station: 'review', tipOff: '2026-03-13T19:00:00.000Z', chooseBy: null })
    const later = game({ id: 'later', tipOff: '2026-03-25T19:00:00.000Z', chooseBy: null })
    const others = game({ id: 'others', holder: tomas })
    const list = withMe([later, game(), others], back, maren.id, NOW)
    expect(list.map((each) => each.title)).toEqual([
      'Choose for Port Selby Gulls',
      'Choose for Port Selby Gulls',
      'Look back at Port Selby Gulls',
    ])
    expect(list.map((each) => each.game.id)).toEqual([game().id, 'later', 'back'])
  })

  it('lets go of a game a week after it was played', () => {
    const back = game({ station: 'review', tipOff: '2026-03-09T19:00:00.000Z', chooseBy: null })
    expect(withMe([], back, maren.id, NOW)).toEqual([])
  })
})

describe('the ruler', () => {
  const days = [
    '2026-03-23',
    '2026-03-24',
    '2026-03-25',
    '2026-03-26',
    '2026-03-27',
    '2026-03-28',
    '2026-03-29',
  ]

  it('places an instant by the clocks of the zone, also after they change', () => {
    expect(placeInWeek('2026-03-23T12:00:00.000Z', days, ZONE)).toBe(0.5)
    expect(placeInWeek('2026-03-29T17:00:00.000Z', days, ZONE)).toBe(6.75)
    expect(placeInWeek('2026-03-30T12:00:00.000Z', days, ZONE)).toBeNull()
  })

  it('lays no words over others and none past the edges', () => {
    const placed = [0, 0.1, 3, 3, 3.05, 6.4, 6.9, 7].map((at, index): Placed => ({
      mark: {} as WeekMark,
      days: at,
      title: `Choose, due 18:0${index}`,
      under: 'Gulls',
    }))
    const labels = layOut(placed, 900)
    for (const [index, one] of labels.entries()) {
      expect(one.left).toBeGreaterThanOrEqual(0)
      expect(one.left + widthOf(one)).toBeLessThanOrEqual(900)
      for (const other of labels.slice(index + 1))
        if (other.lane === one.lane)
          expect(one.left + one.width <= other.left || other.left + other.width <= one.left).toBe(true)
    }
  })

  it('turns words to the left of their marks where that saves a lane', () => {
    const at = (days: number): Placed => ({
      mark: { kind: 'due' } as WeekMark,
      days,
      title: 'Choose, due 18:00',
      under: 'Gulls',
    })
    const lanes = (labels: { lane: number }[]) => Math.max(...labels.map(({ lane }) => lane)) + 1
    // Two marks at nearly one place: one's words to the left, one's to the right, in one lane.
    expect(lanes(layOut([at(3), at(3.3)], 1400))).toBe(1)
    expect(lanes(layOut([at(3), at(3.05), at(3.1), at(3.15)], 1400))).toBe(2)
    expect(layOut([at(1)], 1400)[0]?.before).toBe(false)
  })
})

describe('where each trip ended', () => {
  it('draws every trip once, inside its part, none over another', () => {
    for (const count of [0, 1, 3, 9, 20, 60]) {
      const marks = ended(count, [72, 230], 28)
      expect(marks).toHaveLength(count)
      for (const [index, { x, y, r }] of marks.entries()) {
        expect(x).toBeGreaterThanOrEqual(72)
        expect(x).toBeLessThanOrEqual(230)
        for (const other of marks.slice(index + 1))
          expect(Math.hypot(x - other.x, y - other.y)).toBeGreaterThan(2 * r)
      }
    }
  })
})

describe('since yesterday', () => {
  const event = (more: Partial<WeekEvent>): WeekEvent => ({
    who: tomas,
    kind: 'possessions',
    action: 'made',
    count: 12,
    of: null,
    about: 'Gulls against Tarn',
    to: null,
    at: '2026-03-16T21:00:00.000Z',
    ...more,
  })
  it.each([
    [event({}), 'Tomas logged 12 possessions, Gulls against Tarn.'],
    [event({ count: 1, action: 'deleted' }), 'Tomas threw away 1 possession, Gulls against Tarn.'],
    [
      event({ who: maren, kind: 'plans', action: 'signed', about: 'Gulls' }),
      'You signed off the plan for Gulls.',
    ],
    [event({ kind: 'read', action: 'signed', about: 'Gulls' }), 'Tomas signed off the read of Gulls.'],
    [
      event({ kind: 'ball', action: 'handed-on', about: 'Gulls', to: 'Priya Lund' }),
      'Tomas handed Gulls to Priya.',
    ],
    [
      event({ who: null, kind: 'sheets', action: 'opened', count: 9, of: 12, about: 'Gulls' }),
      '9 of 12 players opened the sheet for Gulls.',
    ],
    [event({ who: null }), 'Somebody logged 12 possessions, Gulls against Tarn.'],
  ])('%#: %s', (each, words) => expect(sinceSentence(each, maren.id)).toBe(words))
})

describe('dates that are set', () => {
  it('come back as they were, with everything else of the game untouched', () => {
    const body = withDates(game(), entriesOf(game(), ZONE), ZONE)
    const { opponentId, tipOff, place, rulePack, chooseBy, due, notes } = game()
    expect(GameBody.parse(body)).toEqual({ opponentId, tipOff, place, rulePack, chooseBy, due, notes })
  })

  it('are read in the zone of the team', () => {
    const entries = { ...entriesOf(game(), ZONE), teach: { date: '2026-03-30', time: '17:30' } }
    expect(withDates(game(), entries, ZONE)?.due.teach).toBe('2026-03-30T16:30:00.000Z')
  })

  it('need a day and a time, or neither', () => {
    expect(entryFault({ date: '', time: '' })).toBe('')
    expect(entryFault({ date: '2026-03-30', time: '' })).not.toBe('')
    expect(entryFault({ date: '2026-03-30', time: '25:00' })).not.toBe('')
    expect(entryFault({ date: '', time: '18:00' })).not.toBe('')
    expect(
      withDates(game(), { ...entriesOf(game(), ZONE), read: { date: '', time: '18:00' } }, ZONE),
    ).toBeNull()
  })
})

describe('the verdict', () => {
  it('takes both ends of the range as expected', () => {
    const at = (k: number) => verdict({ k, expected: { low: 5, high: 8 } })
    expect([at(4), at(5), at(8), at(9)]).toEqual([
      'fewer than expected',
      'as expected',
      'as expected',
      'more than expected',
    ])
  })
})
