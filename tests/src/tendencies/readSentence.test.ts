import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { HABITS } from '@shared/tendencies/habits'
import { readSentence } from '@/views/tendencies/readSentence'
import { textOf } from '@/views/tendencies/segments'
import { tally } from './tally'

describe('the reading sentence', () => {
  it('says usually for what is claimed so, joins place and cue, and gives the room our ink', () => {
    const segments = readSentence([
      tally('press', 35, 40),
      tally('pickup:full', 26, 34),
      tally('trap', 28, 34),
      tally('trap-at:coffin-corner:any', 27, 34),
      tally('cue:on-catch', 20, 25),
      tally('deny:pass-back', 16, 20),
      tally('leave-open:middle', 16, 20),
    ])
    expect(textOf(segments)).toBe(
      'They usually press. When they press, they usually pick up full court, trap in a deep corner on the catch ' +
        'and deny the pass back. They usually leave the middle open on the trap.',
    )
    expect(segments.filter(({ ink }) => ink === 'our').map(({ text }) => text)).toEqual([
      'They usually leave the middle open on the trap.',
    ])
    expect(segments.some(({ ink, text }) => ink === 'their' && text.includes('deny the pass back'))).toBe(
      true,
    )
  })

  it('gives the count instead of a word where the press is unclear', () => {
    const text = textOf(readSentence([tally('press', 12, 27), tally('trap', 6, 12)], 'After dead balls'))
    expect(text).toContain('After dead balls they pressed 12 of 27.')
    expect(text).toContain('How they do it is not clear yet.')
    expect(text).not.toContain('usually')
  })

  it('says that not enough was seen, however one-sided a sighting is', () => {
    expect(textOf(readSentence([tally('press', 4, 4), tally('trap', 3, 3)]))).toBe(
      'Not enough seen to say anything.',
    )
    const text = textOf(readSentence([tally('press', 9, 11), tally('leave-open:middle', 3, 3)]))
    expect(text).toContain('Not enough seen to say how.')
    expect(text).toContain('Not enough seen to say where they leave room.')
  })

  it('calls a claim from one game a hint', () => {
    const text = textOf(readSentence([tally('press', 8, 8, 1), tally('pickup:full', 8, 8, 1)]))
    expect(text).toContain('A hint so far: they usually press.')
    expect(text).toContain('A hint so far: when they press, they usually pick up full court.')
  })

  it('leaves out what the situation itself asks for', () => {
    const text = textOf(
      readSentence(
        [tally('press', 20, 20), tally('shape:2-2-1', 20, 20), tally('trap', 18, 20)],
        'In their 2-2-1',
        ['press', 'shape'],
      ),
    )
    expect(text).toContain('In their 2-2-1 they usually trap.')
    expect(text).not.toMatch(/press|stand/)
  })

  it('never says usually or rarely without a claim, whatever the counts', () => {
    const counts = fc.array(
      fc.record({
        key: fc.constantFrom(...HABITS.map(({ key }) => key)),
        n: fc.integer({ min: 0, max: 40 }),
        share: fc.double({ min: 0, max: 1, noNaN: true }),
        games: fc.integer({ min: 1, max: 4 }),
      }),
      { maxLength: 30 },
    )
    fc.assert(
      fc.property(counts, (rows) => {
        const tendencies = rows.map(({ key, n, share, games }) => tally(key, Math.round(n * share), n, games))
        const text = textOf(readSentence(tendencies))
        const known = tendencies.filter(({ n }) => n >= 5)
        if (!known.some(({ claim }) => claim === 'usually')) expect(text).not.toContain('usually')
        if (!known.some(({ claim }) => claim === 'rarely')) expect(text).not.toContain('rarely')
        expect(text).toMatch(/^[A-Z].*\.$/)
        expect(text).not.toMatch(/%|undefined|NaN| {2}/)
      }),
    )
  })
})
