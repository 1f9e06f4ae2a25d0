import { describe, expect, it } from 'vitest'
import { PossessionBody } from '@shared/possessions/schemas'
import { answersOf } from '@/views/possessions/answers'
import { bodyOfDraft, draftOfRow, emptyDraft, sameBody } from '@/views/possessions/draft'
import { filmWords, readFilm } from '@/views/possessions/filmClock'
import { FILM_PAGES, filmSlots } from '@/views/possessions/filmSlots'
import { applyAct, courtTap, lineOf, newLine, openSlot, type Line } from '@/views/possessions/line'
import { sentenceOf, whenParts } from '@/views/possessions/sentence'
import { textOf } from '@/views/possessions/parts'
import { readCount, readShirts, shirtWords } from '@/views/possessions/shirts'
import type { Slot } from '@/views/possessions/slots'
import { readTyped, typedOf } from '@/views/possessions/typed'
import { FIBA, fresh, GAME, press, ROW, said } from './walk'

/** Types into the slot that is open, as a scout would. */
function type(line: Line, text: string): Line {
  if (line.open === null || typedOf(line.draft, line.open) === null) throw new Error('nothing to type into')
  const read = readTyped(line.open, text, FIBA)
  if ('fault' in read) throw new Error(read.fault)
  return applyAct(line, read)
}
const at = (line: Line, field: Slot['field']) => openSlot(line, { field })
const lost = () => press(fresh(), '1 2 1 1 1 4')

describe('what film adds', () => {
  it('is reached on four pages, and comes round again', () => {
    expect(press(lost(), '.').open).toEqual({ field: 'more', page: 2 })
    expect(press(lost(), '. .').open).toEqual({ field: 'more', page: 3 })
    expect(press(lost(), '. . .').open).toEqual({ field: 'more', page: 4 })
    expect(press(lost(), '. . . .').open).toEqual({ field: 'more', page: 1 })
  })

  it('offers every film field of the record on one key of one page', () => {
    const own = { ...lost().draft, scoutedGameId: null, gameId: GAME, trigger: 'dead-ball' as const }
    const fields = Array.from({ length: FILM_PAGES }, (_, index) => filmSlots(own, index + 1))
      .flat()
      .map((each) => each.slot.field)
    expect(new Set(fields).size).toBe(fields.length)
    for (const field of [
      ...['throwerGuard', 'denied', 'tookAway', 'leftOpen', 'onBall', 'handler', 'forcedSide', 'entrySpot'],
      ...['receiver', 'onFloor', 'thief', 'goalie', 'passes', 'reversals', 'crossedAt', 'shownShape'],
      ...['fallback', 'finish', 'points', 'pointsAgainst', 'timeOutBurned', 'filmTime', 'note', 'trapCue'],
      ...['counterId', 'rightCall', 'runWell', 'outcomePlace'],
    ])
      expect(fields).toContain(field)
  })

  it('does not ask on a row what the row cannot have', () => {
    const fields = (draft: Line['draft']) =>
      [1, 2, 3, 4].flatMap((page) => filmSlots(draft, page).map((each) => each.slot.field))
    const live = fields(press(fresh(), '5 2 1 8 2').draft)
    expect(live).not.toContain('entrySpot')
    expect(live).not.toContain('receiver')
    expect(live).not.toContain('thief')
    expect(live).not.toContain('pointsAgainst')
    expect(live).not.toContain('counterId')
    expect(fields(press(fresh(), '3 7').draft)).not.toContain('fallback')
  })

  it('unfolds from its parent on a second press', () => {
    const again = (line: Line, slot: Slot, key: string) => press(openSlot(line, slot), key).open?.field
    expect(again(lost(), { field: 'trigger' }, '1')).toBe('entrySpot')
    expect(again(lost(), { field: 'pickup' }, '1')).toBe('onBall')
    expect(press(openSlot(lost(), { field: 'trap', trap: 0 }), '1 1').open).toEqual({
      field: 'trapCue',
      trap: 0,
    })
    expect(again(lost(), { field: 'outcome' }, '4')).toBe('outcomePlace')
    expect(again(press(fresh(), '1 2 1 8 2'), { field: 'outcome' }, '2')).toBe('finish')
    expect(again(press(fresh(), '5 2 1 8 2'), { field: 'trigger' }, '5')).toBe(undefined)
  })

  it('takes where the throw-in was caught from the court, and then by whom', () => {
    const open = press(lost(), '. . 1')
    const tap = courtTap(open, { x: 0.1, y: 0.9 })
    const caught = tap === null ? open : applyAct(open, tap)
    expect(caught.draft.entrySpot).toEqual({ x: 0.1, y: 0.9 })
    expect(caught.draft.traps).toHaveLength(1)
    expect(caught.open).toEqual({ field: 'receiver' })
    expect(said(type(caught, '12'))).toContain('The throw-in was caught in the right deep corner by no. 12.')
  })

  it('takes the same place by key, and unseen by the zero', () => {
    const open = press(lost(), '. . 1')
    expect(press(open, '2').open).toEqual({ field: 'entrySpot', spot: 'early-sideline' })
    expect(press(open, '2 <').open).toEqual({ field: 'entrySpot' })
    expect(press(open, '2 1').draft.entrySpot).toMatchObject({ y: 0.11 })
    expect(press(open, '0').draft.entrySpot).toBe('not-visible')
  })

  it('takes typed numbers one after the other and says them', () => {
    let line = type(press(lost(), '. . 6'), '4')
    expect(line.open).toEqual({ field: 'reversals' })
    line = type(line, '1')
    line = type(press(line, '. . 4'), '7')
    expect(line.open).toEqual({ field: 'pointsAgainst' })
    line = type(line, '2')
    line = type(press(line, '. . 8 6'), '0')
    line = press(line, '. . . 2 1')
    line = type(press(line, '. 9'), '31:07.4')
    expect(said(line)).toContain(
      ' 4 passes, 1 change of side. It was taken by their 7. They scored 2 off it. It came to no shot, no points. A time-out was burned. On film at 31:07.4.',
    )
    const body = PossessionBody.safeParse(bodyOfDraft(line.draft))
    expect(body.success).toBe(true)
    expect(body.data).toMatchObject({
      passes: 4,
      reversals: 1,
      thief: 7,
      pointsAgainst: 2,
      finish: 'no-shot',
      points: 0,
      timeOutBurned: true,
      filmTime: 1867.4,
    })
  })

  it('goes when the row no longer allows it, so that the server takes the row', () => {
    const line = type(type(press(lost(), '. . 4'), '7'), '2')
    const through = press(openSlot(line, { field: 'outcome' }), '2')
    expect(through.draft).toMatchObject({ thief: null, pointsAgainst: null })
    const caught = type(press(lost(), '. . 2'), '12')
    const live = press(openSlot(caught, { field: 'trigger' }), '5')
    expect(live.draft.receiver).toBeNull()
    for (const each of [through, live])
      expect(PossessionBody.safeParse(bodyOfDraft(each.draft)).success).toBe(true)
  })

  it('carries their five over and says them once they are told', () => {
    const told = type(at(lost(), 'onFloor'), '15 4, 7/11 12')
    expect(told.draft.onFloor).toEqual([4, 7, 11, 12, 15])
    const next = newLine(ROW, GAME, [{ ...told.draft }])
    expect(next.draft.onFloor).toEqual([4, 7, 11, 12, 15])
    const words = (line: Line) => whenParts(line, FIBA).map((part) => part.text)
    expect(words(next)).toContain('their 4, 7, 11, 12 and 15 on the floor')
    expect(words(fresh())).toHaveLength(3)
    expect(next.open).toEqual({ field: 'trigger' })
  })

  it('says of our own games what we called', () => {
    const own = lineOf(ROW, { ...lost().draft, scoutedGameId: null, gameId: GAME }, 1)
    const calls = Array.from({ length: 11 }, (_, index) => ({
      id: `6f1f7c9e-3f53-4a9e-9a53-0d1f6f0b7f${10 + index}`,
      name: `Set ${index + 1}`,
    }))
    const open = at(own, 'counterId')
    const keys = (line: Line) => answersOf(line, FIBA, calls).map((each) => each.key)
    expect(keys(open)).toEqual(['1', '2', '3', '4', '5', '6', '7', '8', '9', '.'])
    const more = answersOf(open, FIBA, calls).at(-1)
    const second = more === undefined ? open : applyAct(open, more.act)
    expect(answersOf(second, FIBA, calls).map((each) => each.label)).toEqual([
      'Set 10',
      'Set 11',
      'the others',
    ])
    const pick = answersOf(second, FIBA, calls)[1]
    const called = pick === undefined ? second : applyAct(second, pick.act)
    expect(called.open).toEqual({ field: 'rightCall' })
    const whole = press(called, '1 2')
    expect(textOf(sentenceOf(whole, calls))).toContain(
      ' We called Set 11. It was the right call. It was not run well.',
    )
    expect(PossessionBody.safeParse(bodyOfDraft(whole.draft)).success).toBe(true)
  })
})

describe('a row and its draft', () => {
  it('keeps trappers, and tells a row that only lists shirts in another order as the same', () => {
    const draft = {
      ...emptyDraft(GAME, 3),
      traps: [{ x: 0.1, y: 0.1, t: 1, cue: null, trappers: [11, 4], result: null }],
      onFloor: [9, 5],
      entrySpot: { x: 0.1, y: 0.2 },
    }
    const sorted = {
      ...draft,
      onFloor: [5, 9],
      entrySpot: { y: 0.2, x: 0.1 },
      traps: draft.traps.map((trap) => ({ ...trap, trappers: [4, 11] })),
    }
    expect(sameBody(draft, sorted)).toBe(true)
    expect(sameBody(draft, { ...sorted, entrySpot: { x: 0.1, y: 0.3 } })).toBe(false)
    expect(sameBody(draft, { ...sorted, onFloor: [5] })).toBe(false)
    expect(sameBody(draft, { ...sorted, filmTime: 3 })).toBe(false)
  })

  it('drops what the server derives and nothing else', () => {
    const body = PossessionBody.parse({
      scoutedGameId: GAME,
      number: 4,
      trigger: 'made-basket',
      traps: [{ x: 0.1, y: 0.1, trappers: [4] }],
      shape: '2-2-1',
    })
    const row = {
      ...body,
      id: ROW,
      version: 2,
      createdAt: '2026-03-14T14:41:00.000Z',
      updatedAt: '2026-03-14T14:41:00.000Z',
      pressed: true,
      stills: [],
      traps: [
        { ...(body.traps as object[])[0], spot: 'coffin-corner' as const, side: 'left' as const },
      ] as never,
    }
    expect(draftOfRow(row)).toEqual(body)
  })
})

describe('shirts, counts and film time', () => {
  it('reads shirts however they are parted, each once', () => {
    expect(readShirts('11 4, 4/0', 5)).toEqual([0, 4, 11])
    expect(readShirts('4', 1)).toEqual([4])
    for (const bad of ['', 'four', '4 five', '100', '-4']) expect(readShirts(bad, 5), bad).toBeNull()
    expect(readShirts('1 2 3 4', 3)).toBeNull()
    expect(shirtWords([4, 7, 11])).toBe('4, 7 and 11')
  })

  it('reads whole numbers up to the most', () => {
    expect(readCount(' 6 ', 6)).toBe(6)
    for (const bad of ['7', '1.5', '-1', 'x', '']) expect(readCount(bad, 6), bad).toBeNull()
  })

  it('reads and says a time on film', () => {
    for (const [text, seconds] of [
      ['31:07.4', 1867.4],
      ['1:02:03', 3723],
      ['1867.4', 1867.4],
      ['0:05', 5],
      ['75:00', 4500],
    ] as const)
      expect(readFilm(text, 36_000), text).toBe(seconds)
    for (const bad of ['', 'now', '1:60', '1:60:00', '11:00:00'])
      expect(readFilm(bad, 36_000), bad).toBeNull()
    for (const seconds of [0, 5, 59.9, 60, 1867.4, 3723, 35_999.9])
      expect(readFilm(filmWords(seconds), 36_000)).toBe(seconds)
    expect(filmWords(3723)).toBe('1:02:03')
    expect(filmWords(1867.4)).toBe('31:07.4')
  })

  it('says what to type instead, and takes a question mark for unseen', () => {
    const fault = (field: Slot['field'], text: string) => {
      const read = readTyped({ field }, text, FIBA)
      return 'fault' in read ? read.fault : ''
    }
    expect(fault('onFloor', '1 2 3 4 5 6')).toContain('up to 5 shirt numbers')
    expect(fault('points', '7')).toContain('at most 6')
    expect(fault('filmTime', 'late')).toContain('31:07')
    expect(fault('thief', '4 5')).toContain('one shirt number')
    expect(readTyped({ field: 'thief' }, '?', FIBA)).toMatchObject({ value: 'not-visible' })
    expect(readTyped({ field: 'points' }, '', FIBA)).toMatchObject({ value: null })
  })
})
