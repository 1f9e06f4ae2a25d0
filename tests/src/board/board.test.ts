import { describe, expect, it } from 'vitest'
import { CounterRow } from '@shared/counters/schemas'
import { inMetres, toMetres } from '@shared/court/frame'
import { rulePack } from '@shared/court/rulePacks'
import {
  bodyOfRow,
  copyOf,
  differences,
  leftToSay,
  newBody,
  pointsOfDrawing,
  textOfBody,
} from '@/views/board/boardBody'
import { bendThrough, editOfHand, handAt, handByKey, takenUp } from '@/views/board/hand'
import { readKeptDrawing } from '@/views/board/useKeeping'
import { ACROSS } from '../../shared/court/diagrams'

const fiba = rulePack('fiba')
const row = CounterRow.parse({
  ...newBody('fiba'),
  name: 'Harrow sweep',
  diagram: ACROSS,
  id: '66666666-6666-4666-8666-666666666666',
  version: 3,
  createdAt: '2026-03-01T10:00:00.000Z',
  updatedAt: '2026-03-01T10:00:00.000Z',
  liveReps: 14,
  practice: { k: 9, n: 12 },
  logged: { n: 10, counted: 8, k: 6 },
  record: [],
})

describe('what the board writes back', () => {
  it('is without what practices logged, which is added when it is read', () => {
    expect(bodyOfRow(row)).toMatchObject({ liveReps: 4, practice: { k: 3, n: 4 } })
    expect(bodyOfRow(row)).not.toHaveProperty('logged')
  })

  it('is the same text whatever its order, so that opening a board changes nothing', () => {
    const { diagram, name, ...rest } = bodyOfRow(row)
    expect(textOfBody({ ...rest, diagram, name })).toBe(textOfBody(bodyOfRow(row)))
    expect(textOfBody({ ...bodyOfRow(row), call: 'Two' })).not.toBe(textOfBody(bodyOfRow(row)))
  })

  it('comes back from this device as it was kept, and not from anything else', () => {
    const kept = { version: 3, body: bodyOfRow(row) }
    expect(readKeptDrawing(JSON.parse(JSON.stringify(kept)))).toEqual(kept)
    expect(readKeptDrawing({ version: 'x', body: bodyOfRow(row) })).toBeNull()
    expect(readKeptDrawing({ version: 1, body: { name: 'half' } })).toBeNull()
  })
})

it('a copy is a play of its own, without reps', () => {
  expect(copyOf(row)).toMatchObject({ name: 'Harrow sweep copy', liveReps: 0, practice: { k: 0, n: 0 } })
  expect(differences(copyOf(row), bodyOfRow(row))).toEqual(['the name', 'live reps'])
})

it('says what is left before the book', () => {
  const { diagram: _diagram, ...card } = newBody('fiba')
  expect(leftToSay(card, 2)).toEqual([
    'Give it a name.',
    'Say at least one look.',
    '2 faults are left in the drawing.',
  ])
  expect(leftToSay({ ...card, name: 'A', looks: ['1'] }, 0)).toEqual([])
})

it('drafts what to tell them from the drawing, a line a step, none too long', () => {
  const points = pointsOfDrawing(ACROSS)
  expect(points).toHaveLength(4)
  expect(points[1]).toMatch(/^2 screens for 1, then 1 cuts/)
  for (const point of points) expect(point.length).toBeLessThanOrEqual(90)
})

describe('the hand', () => {
  const from = toMetres(fiba, { x: 0.22, y: 0.36 })
  const one = takenUp({ kind: 'player', who: '1', again: false }, from, fiba)

  it('draws what it lets go, on a spot where one is near', () => {
    const near = toMetres(fiba, { x: 0.083, y: 0.66 })
    const hand = handAt(one, near, fiba, false)
    expect(hand).toMatchObject({ moved: true, spot: 'the right block', place: { x: 0.08, y: 0.663 } })
    expect(editOfHand(hand, ACROSS, 0, fiba)).toMatchObject({
      do: 'add-move',
      move: { kind: 'cut', who: '1' },
    })
  })

  it('that only stirs has not pulled', () => {
    expect(handAt(one, inMetres(from.x + 0.2, from.y), fiba, false).moved).toBe(false)
  })

  it('goes half a metre by a key', () => {
    const hand = handByKey(one, 'ArrowRight', fiba)
    expect((hand?.at.x ?? 0) - from.x).toBeCloseTo(0.5, 2)
    expect(handByKey(one, 'a', fiba)).toBeNull()
  })

  it('passes the ball to whoever is near, and to nobody in the open', () => {
    const ball = takenUp({ kind: 'ball' }, inMetres(-1, 10), fiba)
    const at = (place: { x: number; y: number }) =>
      editOfHand(handAt(ball, toMetres(fiba, place), fiba, false), ACROSS, 0, fiba)
    expect(at({ x: 0.22, y: 0.38 })).toMatchObject({
      do: 'add-move',
      move: { kind: 'pass', from: '5', to: '1' },
    })
    expect(at({ x: 0.8, y: 0.5 })).toBeNull()
  })

  it('bends a way through where its middle is pulled, to the right of the way walked', () => {
    const [a, b] = [inMetres(2, 5), inMetres(12, 5)]
    expect(bendThrough(a, b, inMetres(7, 8))).toBeCloseTo(0.3)
    expect(bendThrough(a, b, inMetres(7, 5.1))).toBe(0)
  })
})
