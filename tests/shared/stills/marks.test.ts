import { describe, it, expect } from 'vitest'
import { marksOf, mendRegion, NO_MARKS, Region, StillMarks } from '@shared/stills/marks'
import { movedTo } from '@shared/stills/order'
import { Caption, upToEight } from '@shared/stills/words'

const ring = { x: 0.3, y: 0.7, rx: 0.08, ry: 0.03 }
const pass = { from: { x: 0.3, y: 0.4 }, to: { x: 0.6, y: 0.6 } }

describe('marks as they are stored', () => {
  it('come back as they were', () => {
    const marks = { version: 1, ring, shade: { x: 0.5, y: 0.5, w: 0.3, h: 0.2 }, pass }
    expect(marksOf(StillMarks.parse(marks))).toEqual(marks)
  })

  it.each([[null], [undefined], ['ring'], [[]], [{ version: 2, ring }]])('%j are no marks', (stored) => {
    expect(marksOf(stored)).toEqual(NO_MARKS)
  })

  it('a mark that cannot be read is left out, the others stay', () => {
    expect(marksOf({ version: 1, ring: { x: 'left' }, shade: 7, pass })).toEqual({ ...NO_MARKS, pass })
  })

  it('what reaches past the picture is brought back', () => {
    const marks = marksOf({
      version: 1,
      ring: { x: -1, y: 2, rx: 0, ry: 9 },
      shade: { x: 0.9, y: 0.9, w: 0.4, h: 0.4 },
      pass: { from: { x: 3, y: 0.5 }, to: { x: 0.5, y: -3 } },
    })
    expect(marks.ring).toEqual({ x: 0, y: 1, rx: 0.01, ry: 0.5 })
    expect(marks.shade).toEqual({ x: 0.6, y: 0.6, w: 0.4, h: 0.4 })
    expect(marks.pass).toEqual({ from: { x: 1, y: 0.5 }, to: { x: 0.5, y: 0 } })
    expect(StillMarks.safeParse(marks).success).toBe(true)
  })

  it('a mended part is always one that would be taken, whatever it was', () => {
    for (const x of [-0.3, 0, 0.33, 0.99, 4])
      for (const w of [-1, 0, 0.34, 0.7, 5])
        expect(Region.safeParse(mendRegion({ x, y: x, w, h: w })).success, `${x} ${w}`).toBe(true)
  })
})

describe('the words on a still', () => {
  const eight = 'They trap her and leave the middle open'
  it('are eight at most, and the fault says how many to take out', () => {
    expect(Caption.parse(`  ${eight} `)).toBe(eight)
    expect(Caption.parse(eight.replaceAll(' ', '\n  '))).toContain('middle')
    const messages = (text: string) => Caption.safeParse(text).error?.issues.map(({ message }) => message)
    expect(messages(`${eight} now`)).toEqual(['At most 8 words stand on a still. Take one out.'])
    expect(messages(`${eight} now and then`)).toEqual(['At most 8 words stand on a still. Take 3 out.'])
  })

  it('the ninth is not taken while typing, and a space after the eighth does not eat it', () => {
    expect(upToEight(`${eight} n`)).toBe(eight)
    expect(upToEight(`${eight} `)).toBe(`${eight} `)
    expect(upToEight('')).toBe('')
  })
})

describe('another place in the order', () => {
  const list = ['a', 'b', 'c', 'd'].map((id) => ({ id }))
  const order = (id: string, place: number) =>
    movedTo(list, id, place)
      .map((each) => each.id)
      .join('')
  it.each([
    ['a', 3, 'bcad'],
    ['d', 1, 'dabc'],
    ['b', 2, 'abcd'],
    ['b', 99, 'acdb'],
    ['c', -4, 'cabd'],
    ['x', 1, 'abcd'],
  ] as const)('%s to %i is %s', (id, place, expected) => expect(order(id, place)).toBe(expected))
})
