import { describe, expect, it } from 'vitest'
import {
  calendarDay,
  day,
  dayAndTime,
  daysUntil,
  inDays,
  instantOf,
  shortDay,
  weekdayAndTime,
} from '@/composables/when'

describe('dates in the zone of the team', () => {
  it('says an instant as the clock on the wall of the team has it', () => {
    expect(dayAndTime('2026-03-20T19:15:00.000Z', 'Europe/London')).toBe('Fri 20 March, 19:15')
    expect(dayAndTime('2026-03-20T19:15:00.000Z', 'Asia/Tokyo')).toBe('Sat 21 March, 04:15')
    expect(weekdayAndTime('2026-03-20T00:05:00.000Z', 'UTC')).toBe('Fri 00:05')
  })

  it('leaves a calendar day the day it is, wherever it is read', () => {
    expect(day('2026-03-14', 'America/Los_Angeles')).toBe('Sat 14 March')
    expect(shortDay('2026-09-05')).toBe('Sat 5 Sep')
  })

  it('counts days by midnights of the zone, not by 24 hours', () => {
    const late = Date.parse('2026-03-17T23:30:00Z')
    expect(daysUntil('2026-03-18T00:10:00Z', 'UTC', late)).toBe(1)
    expect(inDays('2026-03-18T00:10:00Z', 'UTC', late)).toBe('tomorrow')
    expect(inDays('2026-03-17T01:00:00Z', 'UTC', late)).toBe('today')
    expect(inDays('2026-03-20T19:15:00Z', 'UTC', late)).toBe('in 3 days')
    expect(inDays('2026-03-15T19:15:00Z', 'UTC', late)).toBe('2 days ago')
    expect(calendarDay('2026-03-20T23:30:00Z', 'Europe/Berlin')).toBe('2026-03-21')
  })
})

describe('instantOf', () => {
  it('reads a wall clock on both sides of a change of clocks', () => {
    // London goes to summer time on 29 March 2026 at 01:00 UTC.
    expect(instantOf('2026-03-28', '19:15', 'Europe/London')).toBe('2026-03-28T19:15:00.000Z')
    expect(instantOf('2026-03-29', '19:15', 'Europe/London')).toBe('2026-03-29T18:15:00.000Z')
    expect(instantOf('2026-05-02', '14:00', 'America/New_York')).toBe('2026-05-02T18:00:00.000Z')
    expect(instantOf('2026-05-02', '00:30', 'Asia/Kolkata')).toBe('2026-05-01T19:00:00.000Z')
  })

  it('is the inverse of what is said', () => {
    for (const zone of ['Europe/London', 'Australia/Adelaide', 'America/St_Johns'])
      for (const date of ['2026-01-31', '2026-04-05', '2026-10-04', '2026-11-01'])
        expect(dayAndTime(instantOf(date, '19:15', zone), zone)).toContain('19:15')
  })
})
