import { describe, expect, it } from 'vitest'
import { PossessionBody } from '@shared/possessions/schemas'
import { bodyOfDraft } from '@/views/possessions/draft'
import { applyAct, courtTap, isComplete, lineOf, newLine, openSlot, stepBack } from '@/views/possessions/line'
import { answersOf } from '@/views/possessions/answers'
import { fresh, FIBA, GAME, keysOf, press, ROW, said } from './walk'

describe('five touches', () => {
  it('asks trigger, shape, pick-up, trap and outcome in turn', () => {
    const fields: unknown[] = []
    let line = fresh()
    for (const key of ['1', '2', '1', '8', '2']) {
      fields.push(line.open?.field)
      line = press(line, key)
    }
    expect(fields).toEqual(['trigger', 'shape', 'pickup', 'trap', 'outcome'])
    expect(line.open).toBeNull()
    expect(isComplete(line)).toBe(true)
    expect(said(line)).toBe(
      'After a made basket they picked up full court in a 1-2-1-1, no trap, and it ended through.',
    )
  })

  it('makes a row that the server takes', () => {
    const line = press(fresh(), '1 2 1 1 1 4')
    const body = PossessionBody.safeParse(bodyOfDraft(line.draft))
    expect(body.success).toBe(true)
    expect(body.data).toMatchObject({
      trigger: 'made-basket',
      shape: '1-2-1-1',
      pickup: 'full',
      outcome: 'lost-live',
      traps: [{ x: 0.08, y: 0.11, t: null, cue: null, trappers: null, result: null }],
      number: 1,
      tripId: ROW,
    })
  })

  it('is done after two touches when they dropped back', () => {
    const line = press(fresh(), '3 7')
    expect(isComplete(line)).toBe(true)
    expect(said(line)).toBe('After a dead ball they dropped back.')
  })

  it('is not complete while a quick field is open', () => {
    expect(isComplete(press(fresh(), '1 2 1 8'))).toBe(false)
    expect(bodyOfDraft(fresh().draft)).toBeNull()
  })
})

describe('what could not be seen', () => {
  it('is stored as not visible where the record has a word for it', () => {
    const line = press(fresh(), '1 2 0 0 2')
    expect(line.draft).toMatchObject({ pickup: 'not-visible', traps: 'not-visible' })
    expect(said(line)).toContain('picked up where not seen in a 1-2-1-1, traps not seen')
  })

  it('is left open where it has none, and the row can still be saved', () => {
    const line = press(fresh(), '1 2 1 8 0')
    expect(line.draft.outcome).toBeNull()
    expect(isComplete(line)).toBe(true)
  })

  it('keeps the row without a shape free of what only a press has', () => {
    const line = press(fresh(), '1 0 2')
    expect(line.draft.shape).toBeNull()
    expect(PossessionBody.safeParse(bodyOfDraft(line.draft)).success).toBe(true)
    expect(said(line)).toBe('After a made basket, what they did was not seen, and it ended through.')
  })
})

describe('traps', () => {
  it('asks the side of a spot named by key', () => {
    const asked = press(fresh(), '1 2 1 4')
    expect(asked.open).toMatchObject({ field: 'trap', trap: 0, spot: 'just-over-half' })
    expect(press(asked, '2').draft.traps).toEqual([
      { x: 0.56, y: 0.89, t: null, cue: null, trappers: null, result: null },
    ])
    expect(press(asked, '<').open).toEqual({ field: 'trap', trap: 0 })
  })

  it('needs no side for the middle lane', () => {
    expect(press(fresh(), '1 2 1 7').draft.traps).toMatchObject([{ x: 0.355, y: 0.5 }])
  })

  it('takes several in order, by key and by tap', () => {
    let line = press(fresh(), '1 2 1 1 1 8 4 2')
    const act = courtTap(line, { x: 0.9, y: 0.1 })
    expect(act).not.toBeNull()
    if (act !== null) line = applyAct(line, act)
    expect(line.draft.traps).toHaveLength(3)
    expect(line.open?.field).toBe('outcome')
    expect(said(line)).toBe(
      'After a made basket they picked up full court in a 1-2-1-1, trapped in the left deep corner, trapped again on the right sideline just over half, trapped again in the left front corner, and it ended how?',
    )
  })

  it('moves an open trap and takes one of several out', () => {
    const two = press(fresh(), '1 2 1 1 1 8 4 2 2')
    const second = openSlot(two, { field: 'trap', trap: 1 })
    const act = courtTap(second, { x: 0.3, y: 0.5 })
    const moved = act === null ? second : applyAct(second, act)
    expect(moved.draft.traps).toMatchObject([{ x: 0.08 }, { x: 0.3, y: 0.5 }])
    expect(press(openSlot(moved, { field: 'trap', trap: 0 }), 'Delete').draft.traps).toMatchObject([
      { x: 0.3 },
    ])
  })

  it('holds no more than six and needs a press', () => {
    let line = press(fresh(), '1 2 1 1 1')
    for (let count = 0; count < 9; count += 1) {
      const act = courtTap(line, { x: 0.1, y: 0.1 })
      if (act !== null) line = applyAct(line, act)
    }
    expect(line.draft.traps).toHaveLength(6)
    expect(courtTap(press(fresh(), '1 7'), { x: 0.1, y: 0.1 })).toBeNull()
    expect(keysOf(openSlot(line, { field: 'outcome' }))).not.toContain('8')
  })
})

describe('film', () => {
  it('unfolds the kinds of a shape on its second press and by the dot', () => {
    const person = press(fresh(), '1 1')
    expect(press(person, '.').open).toEqual({ field: 'shapeVariant' })
    const again = openSlot(person, { field: 'shape' })
    const kinds = press(again, '1')
    expect(kinds.open).toEqual({ field: 'shapeVariant' })
    const deny = press(kinds, '2')
    expect(deny.draft).toMatchObject({ shape: 'person', shapeVariant: 'deny' })
    expect(deny.open?.field).toBe('pickup')
  })

  it('drops the kind with its shape', () => {
    const line = press(fresh(), '1 1 . 2 1 8 2')
    expect(press(openSlot(line, { field: 'shape' }), '2').draft.shapeVariant).toBeNull()
  })

  it('offers what applies, each on its own key', () => {
    const line = press(fresh(), '1 2 1 1 1 4')
    expect(keysOf(line)).toBe('1 2 3 4 5 6 7 8 9 .')
    expect(keysOf(press(fresh(), '5 2 1 8 2'))).toBe('2 3 4 5 6 9 .')
    expect(keysOf(press(fresh(), '3 7'))).toBe('9 .')
  })

  it('walks cue, result, time and trappers of a trap', () => {
    const cue = press(fresh(), '1 2 1 1 1 4 7')
    expect(cue.open).toEqual({ field: 'trapCue', trap: 0 })
    const time = press(cue, '1 3')
    expect(time.open).toEqual({ field: 'trapTime', trap: 0 })
    const who = applyAct(time, { do: 'set', slot: { field: 'trapTime', trap: 0 }, value: 1.8 })
    expect(who.open).toEqual({ field: 'trappers', trap: 0 })
    const done = applyAct(who, { do: 'set', slot: { field: 'trappers', trap: 0 }, value: [4, 11] })
    expect(done.open).toBeNull()
    expect(said(done)).toContain(
      'trapped in the left deep corner at 1.8 s on the catch by 4 and 11, lost, and it ended lost, live.',
    )
  })

  it('tells nothing seen from not looked for', () => {
    const denied = press(fresh(), '1 2 1 8 2 2')
    expect(denied.draft.denied).toBeNull()
    expect(press(denied, '6').draft.denied).toEqual([])
    expect(press(denied, '0').draft.denied).toBe('not-visible')
    const several = press(denied, '1 3 .')
    expect(several.draft.denied).toEqual(['near', 'middle'])
    expect(said(several)).toContain(' They denied the near receiver and the middle.')
    expect(press(several, '2 1').draft.denied).toEqual(['middle'])
    expect(press(several, '2 Delete').draft.denied).toBeNull()
  })

  it('can be told before the row has ended and comes back to the outcome', () => {
    const line = press(fresh(), '1 2 1 8 . 4 1')
    expect(line.draft.onBall).toBe('pressured')
    expect(line.open).toEqual({ field: 'outcome' })
  })

  it('goes when the shape turns out to be no press', () => {
    const line = press(fresh(), '1 2 1 1 1 4 4 1')
    const dropped = press(openSlot(line, { field: 'shape' }), '7')
    expect(dropped.draft).toMatchObject({ pickup: null, traps: null, onBall: null, outcome: 'lost-live' })
    expect(PossessionBody.safeParse(bodyOfDraft(dropped.draft)).success).toBe(true)
    expect(press(dropped, '<').draft.traps).toHaveLength(1)
  })

  it('drops a place that belonged to another ending', () => {
    const line = press(fresh(), '1 2 1 1 1 4 8 2')
    expect(line.draft.outcomePlace).toBe('backcourt')
    expect(press(openSlot(line, { field: 'outcome' }), '2').draft.outcomePlace).toBeNull()
  })
})

describe('stepping back', () => {
  it('undoes answer after answer', () => {
    const line = press(fresh(), '1 2 1 8 2')
    expect(press(line, '<').open).toEqual({ field: 'outcome' })
    const start = press(line, '< < < < <')
    expect(start.draft).toEqual(fresh().draft)
    expect(start.open).toEqual({ field: 'trigger' })
    expect(stepBack(start)).toEqual(start)
  })

  it('closes a word that was only opened', () => {
    const line = openSlot(press(fresh(), '1 2 1 8'), { field: 'trigger' })
    const back = press(line, '<')
    expect(back.open).toEqual({ field: 'outcome' })
    expect(back.draft.trigger).toBe('made-basket')
  })

  it('walks back through a row that was opened again', () => {
    const line = press(fresh(), '1 2 1 8 2')
    const saved = lineOf(ROW, line.draft, 3)
    expect(saved.open).toBeNull()
    expect(press(saved, '<').open).toEqual({ field: 'outcome' })
    expect(press(saved, '< <').open).toEqual({ field: 'trap', trap: 0 })
  })
})

describe('the next row', () => {
  const last = { number: 13, period: 3, clock: 3200, margin: -2, onFloor: null, tripId: 'a-trip' }

  it('carries over period, clock and margin and says so until they are told', () => {
    const line = newLine(ROW, GAME, [{ ...last, number: 12, clock: 9000 }, last])
    expect(line.draft).toMatchObject({ number: 14, period: 3, clock: 3200, margin: -2 })
    expect(line.carried).toEqual(['period', 'clock', 'margin'])
    const told = applyAct(line, { do: 'set', slot: { field: 'clock' }, value: 3100 })
    expect(told.carried).toEqual(['period', 'margin'])
    expect(told.open).toEqual({ field: 'trigger' })
  })

  it('may be a fresh throw-in of the same trip', () => {
    const line = press(newLine(ROW, GAME, [last]), '3 2 1 8 2 . 7')
    expect(press(line, '1').draft.tripId).toBe('a-trip')
    expect(said(press(line, '1'))).toContain('After a dead ball, still the same trip they')
    expect(press(press(line, '1'), '. 7 2').draft.tripId).toBe(ROW)
  })

  it('does not ask a saved row again for what it left out', () => {
    const draft = press(fresh(), '1 2 1 8 0').draft
    expect(lineOf(ROW, draft, 2).open).toBeNull()
    expect(lineOf(ROW, draft, null).open).toEqual({ field: 'outcome' })
  })
})

describe('answers', () => {
  it('never give one key twice', () => {
    const lines = [
      '1 1',
      '1 2',
      '1 2 1',
      '1 2 1 8',
      '1 2 1 1 1',
      '1 2 1 1 1 4',
      '1 2 1 1 1 4 .',
      '1 2 1 1 1 4 7',
      '1 1 .',
    ]
    for (const keys of lines) {
      const answers = answersOf(press(fresh(), keys), FIBA).map((answer) => answer.key)
      expect(new Set(answers).size, keys).toBe(answers.length)
    }
  })

  it('say the counts of the rule set', () => {
    const outcome = answersOf(press(fresh(), '1 2 1 8'), FIBA).find(
      (answer) => answer.label === 'Count called',
    )
    expect(outcome?.hint).toBe('5 s or 8 s')
  })
})
