import { describe, expect, it } from 'vitest'
import { drawnMarks } from '@shared/stills/drawing'
import { NO_MARKS, StillMarks } from '@shared/stills/marks'
import { facesWords, goesWords, whoseWords } from '@/components/stills/cautionWords'
import { nudged, placed, sized, stroked, takenOff, type Mark } from '@/components/stills/markMoves'

const MARKS: readonly Mark[] = ['ring', 'shade', 'pass']

describe('marks by hand and by key', () => {
  it('stay inside the picture and takeable, wherever they are pushed', () => {
    let marks = NO_MARKS
    for (const mark of MARKS) {
      for (const at of [0, 1, 0.333_33]) marks = placed(marks, mark, { x: at, y: 1 - at })
      for (let n = 0; n < 150; n++) marks = nudged(marks, mark, { x: 0.01, y: -0.01 }, n % 2 === 0)
      for (const by of [1.2, 1.2, 1.2, 1.2, 1.2, 1.2, 1.2, 0.1, 0.1]) {
        marks = sized(marks, mark, by)
        expect(StillMarks.safeParse(marks).error?.issues ?? []).toEqual([])
      }
    }
    expect(MARKS.every((mark) => marks[mark] !== null)).toBe(true)
    expect(takenOff(marks, 'shade')).toEqual({ ...marks, shade: null })
  })

  it('the first key puts a mark into the middle, the next ones move it', () => {
    const first = nudged(NO_MARKS, 'ring', { x: 0.01, y: 0 })
    expect(first.ring).toMatchObject({ x: 0.5, y: 0.6 })
    expect(nudged(first, 'ring', { x: 0.01, y: 0 }).ring?.x).toBeCloseTo(0.51, 3)
  })

  it('a shade is drawn from any corner to the other; a pass flies from the ball over the ring', () => {
    const shade = stroked(NO_MARKS, 'shade', { x: 0.8, y: 0.7 }, { x: 0.5, y: 0.2 }).shade
    expect(shade).toEqual({ x: 0.5, y: 0.2, w: 0.3, h: 0.5 })
    const ring = placed(NO_MARKS, 'ring', { x: 0.3, y: 0.8 })
    const { pass } = placed(ring, 'pass', { x: 0.7, y: 0.6 })
    expect(pass).toEqual({ from: { x: 0.3, y: 0.44 }, to: { x: 0.7, y: 0.6 } })
  })
})

describe('marks as they are drawn', () => {
  it('have the sizes of a picture 920 px wide, and scale with it', () => {
    const marks = placed(placed(NO_MARKS, 'ring', { x: 0.5, y: 0.5 }), 'pass', { x: 0.9, y: 0.5 })
    const [small, large] = [drawnMarks(marks, 920, 518), drawnMarks(marks, 1840, 1036)]
    expect(small.pens).toMatchObject({ ring: 5, shade: 4 })
    expect(small.pass?.dashes).toEqual([19, 13])
    expect(large.pens.ring).toBe(10)
    expect(large.ring?.cx).toBe(920)
    // The head's tip is where the pass lands, its sides before it.
    expect(large.pass?.head[1]).toEqual(large.pass?.to)
  })
})

describe('the words of the caution', () => {
  it('say how many faces are left, and that nobody has counted', () => {
    expect(facesWords({ facesLeft: null, blurred: 0 })).toContain('Nobody has counted')
    expect(facesWords({ facesLeft: 4, blurred: 2 })).toBe(
      'Only staff see this picture until all six faces are blurred. Two are done.',
    )
    expect(facesWords({ facesLeft: 1, blurred: 0 })).toContain('until its one face is blurred. None is done.')
    expect(facesWords({ facesLeft: 0, blurred: 0 })).toContain('No face can be made out')
  })

  it('say whose players and whose consent', () => {
    expect(whoseWords(false, 'Gulls', null).join(' ')).toBe(
      'Minors of two other clubs, one of them Gulls. We hold no consent for them.',
    )
    expect(whoseWords(true, 'Gulls', { yes: 8, no: 2, notAsked: 1 })[1]).toContain(
      'two said no and one has not answered',
    )
    expect(goesWords('2027-06-30')).toBe('It goes for good after Wed 30 June 2027.')
  })
})
