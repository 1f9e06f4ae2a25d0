import { describe, expect, it } from 'vitest'
import { SPOT_CELLS, spotCentre } from '@shared/court/trapSpots'
import { OUTCOMES, PICKUPS, SHAPES, TRIGGERS } from '@shared/vocabulary'
import { emptyDraft } from '@/views/possessions/draft'
import { lineOf, openSlot, type Line } from '@/views/possessions/line'
import { setParts, textOf, type SlotPart } from '@/views/possessions/parts'
import { sentenceOf, whenParts } from '@/views/possessions/sentence'
import { shortSentence } from '@/views/possessions/shortSentence'
import { stripOf } from '@/views/possessions/strip'
import { trapWords } from '@/views/possessions/words'
import { FIBA, fresh, GAME, press, ROW, said } from './walk'

const slots = (line: Line) => sentenceOf(line).filter((part): part is SlotPart => part.kind === 'slot')
const short = (line: Line) =>
  shortSentence(line.draft)
    .map((run) => run.text)
    .join('')

describe('the call line', () => {
  it('has one open slot until the row is whole', () => {
    for (const keys of ['1', '1 2', '1 2 1', '1 2 1 8', '1 1 .', '1 2 1 1 1 8'])
      expect(
        slots(press(fresh(), keys)).filter((part) => part.state === 'next'),
        keys,
      ).toHaveLength(1)
    expect(slots(press(fresh(), '1 2 1 8 2')).some((part) => part.state === 'next')).toBe(false)
  })

  it('underlines each word in the ink of whoever did it', () => {
    const inks = Object.fromEntries(
      slots(press(fresh(), '1 2 1 1 1 4 3 1')).map((part) => [part.slot.field, part.ink]),
    )
    expect(inks).toEqual({
      trigger: 'plain',
      shape: 'their',
      pickup: 'their',
      trap: 'their',
      outcome: 'plain',
      leftOpen: 'our',
    })
  })

  it('reads as English for every shape, pick-up and ending', () => {
    for (const trigger of TRIGGERS)
      for (const shape of SHAPES)
        for (const pickup of PICKUPS)
          for (const outcome of OUTCOMES) {
            const draft = {
              ...emptyDraft(GAME, 1),
              trigger: trigger.value,
              shape: shape.value,
              pickup: pickup.value,
              traps: [],
              outcome: outcome.value,
            }
            const text = textOf(sentenceOf(lineOf(ROW, draft, 1)))
            expect(text).toMatch(/^(After|From) a [^.]*\.$/)
            expect(text).not.toMatch(/ {2}| ,|, ,|undefined|null|\?/)
          }
  })

  it('says what film added after it', () => {
    const line = press(fresh(), '1 2 1 1 1 4 1 2 2 1 . 3 1 2 . 4 1 5 2 6 2')
    expect(said(line)).toBe(
      'After a made basket they picked up full court in a 1-2-1-1, trapped in the left deep corner, and it ended lost, live. They mirrored the thrower, denied the near receiver, left the middle and the sideline open and pressured the ball. A weak handler had the ball. The safety left early.',
    )
  })

  it('says person to person with its kind', () => {
    expect(said(press(fresh(), '3 1 . 5 2 8 6'))).toBe(
      'After a dead ball they picked up three-quarter, person to person, jump-trap, no trap, and it ended count called.',
    )
  })

  it('keeps punctuation with its word and loses nothing', () => {
    const parts = sentenceOf(press(fresh(), '1 2 1 1 1 4 8 2'))
    const set = setParts(parts)
    expect(set.map(({ part, after }) => part.text + after).join('')).toBe(textOf(parts))
    for (const { part } of set) if (part.kind === 'text') expect(part.text).not.toMatch(/^[,.]/)
  })

  it('tells period, clock and margin, and which of them were only taken over', () => {
    const line = { ...fresh(), draft: { ...fresh().draft, period: 3, clock: 3200, margin: -2 } }
    expect(whenParts({ ...line, carried: ['clock'] }, FIBA).map((part) => [part.text, part.carried])).toEqual(
      [
        ['Q3', false],
        ['5:20', true],
        ['they trail by 2', false],
      ],
    )
  })

  it('asks a typed slot in its place', () => {
    const open = openSlot(press(fresh(), '1 2 1 8 2'), { field: 'crossedAt' })
    expect(said(open)).toContain(' Over half at when?.')
  })
})

describe('places of traps', () => {
  it('have words with an article for every spot', () => {
    for (const cell of SPOT_CELLS) {
      const centre = spotCentre(cell.spot, cell.side)
      if (centre === null) throw new Error(cell.spot)
      const { lead, word } = trapWords(centre)
      expect(lead).toMatch(/^ (in|on) the $/)
      expect(word).toContain(cell.side === 'middle' ? 'middle lane' : cell.side)
    }
    expect(trapWords({ x: 0.7, y: 0.5 })).toEqual({ lead: ' ', word: 'elsewhere' })
  })
})

describe('a row flattened', () => {
  it('reads in one line', () => {
    expect(short(press(fresh(), '3 3 2 8 2'))).toBe(
      'After a dead ball, three-quarter, 2-2-1, no trap. Through.',
    )
    expect(short(press(fresh(), '1 7'))).toBe('After a made basket they dropped back.')
    expect(short(press(fresh(), '1 2 1 1 1 8 4 2 1'))).toBe(
      'After a made basket, full, 1-2-1-1, traps left deep corner and right sideline just over half. Through, with numbers.',
    )
  })

  it('shows where it went: traps in place, the end past them', () => {
    const lost = stripOf(press(fresh(), '1 2 1 1 1 4').draft)
    expect(lost.traps).toEqual([0.08])
    expect(lost.end?.kind).toBe('lost')
    expect(lost.end?.x).toBeGreaterThan(0.08)
    expect(stripOf(press(fresh(), '1 2 1 8 1').draft).end).toEqual({ x: 0.93, kind: 'numbers' })
    expect(stripOf(press(fresh(), '1 2 1 6 1 2').draft).end?.x).toBeGreaterThan(0.92)
  })

  it('ends on the side of half that the outcome says', () => {
    for (const [key, most] of [
      ['3', 0.5],
      ['6', 0.5],
    ] as const)
      expect(stripOf(press(fresh(), `1 2 1 8 ${key}`).draft).end?.x).toBeLessThan(most)
    expect(stripOf(press(fresh(), '1 2 1 8 2').draft).end?.x).toBeGreaterThan(0.5)
    expect(stripOf(press(fresh(), '1 7').draft).end).toBeNull()
  })
})
