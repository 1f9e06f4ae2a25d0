import { describe, expect, it } from 'vitest'
import { proposeScript } from '@shared/practices/script'
import {
  clockAt,
  firstDraft,
  startOf,
  tickWords,
  timeOf,
  weekdayOf,
  withReps,
} from '@/views/teach/scriptDraft'

const script = proposeScript({
  minutes: 40,
  looks: [
    { shape: '1-2-1-1', k: 12 },
    { shape: 'person', k: 8 },
  ],
  changeUp: true,
  blindScreens: [],
  out: [],
  shortTurns: [],
})

describe('when', () => {
  it('is the evening before the game in the team’s own zone, and comes back as it was', () => {
    const draft = firstDraft(script, '2026-03-20T00:30:00Z', 'America/New_York')
    expect([draft.day, draft.time]).toEqual(['2026-03-18', '17:30'])
    const instant = startOf(draft, 'America/New_York')
    expect(instant).toBe('2026-03-18T21:30:00.000Z')
    expect(timeOf(instant, 'America/New_York')).toBe('17:30')
    expect(weekdayOf(draft.day)).toBe('Wednesday')
  })

  it('counts minutes past the hour and past midnight', () => {
    expect([clockAt('17:30', 42), clockAt('23:50', 20)]).toEqual(['18:12', '00:10'])
  })
})

describe('reps by hand', () => {
  it('are a correction until they are as shared out again', () => {
    const changed = withReps(script, 'person', 4)
    expect(changed.looks.find(({ shape }) => shape === 'person')).toMatchObject({ changed: 4 })
    expect(changed.reps.filter(({ shape }) => shape === 'person')).toHaveLength(4)
    expect(changed.reps.some(({ call }) => call === 'changeUp')).toBe(true)
    const was = script.looks.find(({ shape }) => shape === 'person')?.proposed ?? 0
    expect(withReps(changed, 'person', was)).toEqual(script)
  })

  it('are told in words for whoever cannot see the ticks', () => {
    const words = tickWords(script, 'person', 'Box')
    const own = script.reps.filter(({ shape }) => shape === 'person')
    const live = own.filter(({ kind }) => kind === 'live').length
    expect(words).toContain(`${live} live`)
    expect(words).toMatch(/; \d on Box$/)
    expect(tickWords(withReps(script, 'person', 0), 'person', 'Box')).toBe('no reps')
  })
})
