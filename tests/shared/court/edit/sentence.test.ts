import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { stateAt } from '@shared/court/diagramWalk'
import { moveWords } from '@shared/court/diagramWords'
import { blankDiagram } from '@shared/court/edit/blank'
import { choicesFor, nextMove } from '@shared/court/edit/choices'
import { applyEdit } from '@shared/court/edit/edits'
import { pullBall, pullPlayer } from '@shared/court/edit/gestures'
import { moveOf, NOTHING_SAID, openSlot, say, sentenceOf, textOf } from '@shared/court/edit/sentence'
import { metresBetween, snapped, SPOTS } from '@shared/court/edit/snap'
import { placeWords } from '@shared/court/placeWords'
import { rulePack } from '@shared/court/rulePacks'
import { anyMove, anyPack, anyPlace } from '../arbitraries'

const fiba = rulePack('fiba')

/** Says the sentence by keys, as a hand on the keyboard does. */
const typed = (keys: string, diagram = blankDiagram(), step = 0) => {
  let sentence = NOTHING_SAID
  for (const key of keys) {
    const slot = openSlot(sentence)
    if (slot === null) throw new Error(`nothing open before ${key}`)
    const choice = choicesFor(diagram, step, sentence, slot).find((one) => one.key === key)
    if (!choice) throw new Error(`no ${key} for ${slot}`)
    sentence = say(sentence, slot, choice.value)
  }
  return sentence
}

describe('a sentence', () => {
  it('of any drawn move is the move in its own words, and draws it again', () => {
    fc.assert(
      fc.property(anyMove, (move) => {
        const sentence = sentenceOf(move)
        expect(textOf(sentence)).toBe(moveWords(move))
        expect(openSlot(sentence)).toBeNull()
        expect(moveOf(sentence, { x: 0.5, y: 0.5 }, move)).toEqual(move)
      }),
    )
  })

  it('asks for its next slot until it can be drawn', () => {
    expect(textOf(NOTHING_SAID)).toBe('who?')
    expect(textOf(typed('2'))).toBe('2 does what?')
    expect(textOf(typed('2s'))).toBe('2 screens for whom?')
    expect(textOf(typed('1c'))).toBe('1 cuts to where?')
    expect(openSlot(typed('2s1'))).toBeNull()
  })

  it('draws a screen beside whoever it is for, and the first pass as the throw-in', () => {
    const screen = nextMove(blankDiagram(), 0, typed('2s1'), fiba)
    expect(screen).toMatchObject({ kind: 'screen', who: '2', for: '1' })
    const one = stateAt(blankDiagram(), 0).after.ours.get('1')
    if (screen?.kind !== 'screen' || !one) throw new Error('no screen')
    expect(metresBetween(fiba, screen.to, one)).toBeCloseTo(0.9, 1)
    const pass = nextMove(blankDiagram(), 0, typed('5p1'), fiba)
    expect(pass).toMatchObject({ kind: 'pass', from: '5', to: '1', throwIn: true })
    if (!pass) throw new Error('no pass')
    const thrown = applyEdit(blankDiagram(), { do: 'add-move', step: 0, move: pass })
    expect(nextMove(thrown, 0, typed('1p2', thrown), fiba)).toMatchObject({ throwIn: false })
  })

  it('offers only what can happen: who has the ball does not cut, nobody else passes', () => {
    const verbs = (who: string) =>
      choicesFor(blankDiagram(), 0, say(NOTHING_SAID, 'who', who), 'does').map(({ word }) => word)
    expect(verbs('5')).toEqual(['passes', 'cuts'])
    expect(verbs('1')).toEqual(['cuts', 'screens'])
    expect(verbs('X1')).toEqual(['goes'])
    expect(() => typed('2s2')).toThrow()
  })

  it('has one key for each choice of a slot, and one word for each', () => {
    for (const keys of ['', '5', '1c', '2s', '5p']) {
      const sentence = typed(keys)
      const list = choicesFor(blankDiagram(), 0, sentence, openSlot(sentence) ?? 'how')
      expect(new Set(list.map(({ key }) => key)).size).toBe(list.length)
      expect(new Set(list.map(({ word }) => word)).size).toBe(list.length)
    }
  })
})

describe('pulling', () => {
  const drawn = (edit: ReturnType<typeof pullPlayer>, diagram = blankDiagram()) =>
    edit ? applyEdit(diagram, edit) : diagram

  it('a player is a cut, the same player again the end of it, with the ball a dribble', () => {
    const once = drawn(pullPlayer(blankDiagram(), 0, '1', { x: 0.3, y: 0.3 }, fiba))
    expect(once.steps[0]?.moves).toMatchObject([{ kind: 'cut', who: '1', to: { x: 0.3, y: 0.3 } }])
    const again = drawn(pullPlayer(once, 0, '1', { x: 0.1, y: 0.6 }, fiba), once)
    expect(again.steps[0]?.moves).toMatchObject([{ kind: 'cut', who: '1', to: { x: 0.1, y: 0.6 } }])
    const passed = drawn(pullBall(again, 0, '1'), again)
    const on = drawn(pullPlayer(passed, 0, '1', { x: 0.4, y: 0.5 }, fiba, { again: true }), passed)
    expect(on.steps[0]?.moves.map(({ kind, beat }) => [kind, beat])).toEqual([
      ['cut', 0],
      ['pass', 1],
      ['dribble', 2],
    ])
  })

  it('held, it is a screen for whoever is nearest', () => {
    const held = drawn(pullPlayer(blankDiagram(), 0, '2', { x: 0.2, y: 0.4 }, fiba, { screen: true }))
    expect(held.steps[0]?.moves).toMatchObject([{ kind: 'screen', who: '2', for: '1' }])
  })

  it('at the start it sets up: a place, and who throws in', () => {
    const moved = drawn(pullPlayer(blankDiagram(), 'start', 'X1', { x: 0.5, y: 0.5 }, fiba))
    expect(moved.start.theirs[0]).toEqual({ id: 'X1', at: { x: 0.5, y: 0.5 } })
    expect(pullBall(blankDiagram(), 'start', '4')).toEqual({ do: 'thrower', role: '4' })
    expect(pullBall(blankDiagram(), 0, '5')).toBeNull()
  })
})

describe('snapping', () => {
  it('finds a spot from beside it, by the name that the sentence says', () => {
    for (const spot of SPOTS) {
      const found = snapped({ x: spot.x + 0.005, y: spot.y - 0.005 }, fiba)
      expect(found).toEqual({ place: spot, spot: placeWords(spot) })
    }
  })

  it('finds the lines, two at once where they cross, and nothing in the open', () => {
    expect(snapped({ x: 0.507, y: 0.5 }, fiba)).toMatchObject({ place: { x: 0.5 }, spot: 'half court' })
    expect(snapped({ x: 0.21, y: 0.8 }, fiba)).toMatchObject({ spot: 'the free-throw line extended' })
    expect(snapped({ x: 0.498, y: 0.03 }, fiba).spot).toBe('half court, the left sideline')
    expect(snapped({ x: 0.34, y: 0.5 }, fiba)).toEqual({ place: { x: 0.34, y: 0.5 }, spot: null })
  })

  it('never moves a place by more than its reach, and stays where it is once there', () => {
    fc.assert(
      fc.property(anyPack, anyPlace, (pack, place) => {
        const once = snapped(place, pack)
        expect(metresBetween(pack, once.place, place)).toBeLessThan(0.61)
        expect(snapped(once.place, pack).place).toEqual(once.place)
      }),
    )
  })
})
