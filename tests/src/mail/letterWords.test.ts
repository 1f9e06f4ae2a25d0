import { describe, expect, it } from 'vitest'
import type { MailRow } from '@shared/mail/schemas'
import { againWord, canStop, pageInQuery, stateInQuery, stateOf, totalWords } from '@/views/mail/letterWords'

const letter = (more: Partial<MailRow> = {}): MailRow => ({
  id: '11111111-1111-4111-8111-111111111111',
  kind: 'invitation',
  recipient: 'zoe@club.example',
  subject: 'Join us',
  state: 'waiting',
  tries: 0,
  trouble: null,
  createdAt: '2026-03-17T09:42:00.000Z',
  nextTryAt: '2026-03-17T09:42:00.000Z',
  sentAt: null,
  text: null,
  attached: false,
  ...more,
})
const London = 'Europe/London'

describe('where a letter stands', () => {
  it('says when the next try is, in the team’s own zone, and why the last did not work', () => {
    const row = letter({
      tries: 2,
      trouble: 'The mail server hung up. It is tried again.',
      nextTryAt: '2026-03-30T09:47:00.000Z',
    })
    expect(stateOf(row, London, true).detail).toBe(
      'The mail server hung up. It is tried again. Tried 2 times. Next on Mon 30 March, 10:47.',
    )
    expect(stateOf(letter(), London, true).detail).toBe('It leaves within a minute.')
  })

  it('flags what somebody has to look at and nothing else', () => {
    const flagged = (['waiting', 'sending', 'sent', 'failed', 'kept', 'withdrawn'] as const).filter(
      (state) => stateOf(letter({ state }), London, true).flag,
    )
    expect(flagged).toEqual(['failed', 'kept'])
  })

  it('offers what the server would take, and only where there is a mail server', () => {
    const offers = (server: boolean) =>
      (['waiting', 'sending', 'sent', 'failed', 'kept', 'withdrawn'] as const).map((state) =>
        againWord(letter({ state, tries: 1 }), server),
      )
    expect(offers(true)).toEqual(['Try again', null, null, 'Try again', 'Send it', null])
    expect(offers(false)).toEqual([null, null, null, null, null, null])
    expect(againWord(letter({ tries: 0 }), true)).toBeNull()
    expect(canStop(letter({ state: 'sent' }))).toBe(false)
    expect(canStop(letter({ state: 'kept' }))).toBe(true)
  })
})

describe('the address of the page', () => {
  it('takes a state and a page that there are, and nothing else', () => {
    expect([
      stateInQuery('failed'),
      stateInQuery('toString'),
      stateInQuery(undefined),
      stateInQuery(['sent']),
    ]).toEqual(['failed', null, null, null])
    expect([pageInQuery('3'), pageInQuery('0'), pageInQuery('1.5'), pageInQuery('two')]).toEqual([3, 1, 1, 1])
  })

  it('counts in words', () => {
    expect(totalWords(1, null)).toBe('1 letter, newest first.')
    expect(totalWords(4, 'failed')).toBe('4 letters: did not arrive.')
  })
})
