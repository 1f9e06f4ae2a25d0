import { describe, expect, it } from 'vitest'
import type { ChangeRow } from '@shared/history/schemas'
import { TableFilter, TableQuery } from '@shared/possessions/table'
import {
  batchFields,
  changedRows,
  heldValues,
  isWhole,
  newValues,
  nextPart,
  readValue,
  resultWords,
} from '@/views/possessionTable/batch'
import { cellOf, COLUMNS, correctionWords } from '@/views/possessionTable/columns'
import { valueWords } from '@/views/possessionTable/fieldWords'
import {
  choicesOf,
  FILTER_SLOTS,
  narrowest,
  orWords,
  slotWords,
  sortWords,
} from '@/views/possessionTable/filterSlots'
import { historyLines, lineWords } from '@/views/possessionTable/historyLines'
import { elsewhereWords, pageOf, rulerOf } from '@/views/possessionTable/ruler'
import { FILTER_KEYS, queryOf, viewOf, withPart } from '@/views/possessionTable/tableAddress'
import { FIBA, GAME, idOf, rowOf, tableRow } from './rows'

const column = (key: string) => COLUMNS.find((each) => each.key === key)!

describe('the address', () => {
  it('holds filter, order, page and row, and reads them back', () => {
    const query = {
      trigger: 'made-basket,live',
      period: '3,4',
      pressed: 'yes',
      trap: 'coffin-corner,none',
      jersey: '4,11',
      text: 'skip pass',
      sort: 'outcome',
      direction: 'desc',
      page: '3',
      row: idOf(8),
    }
    const view = viewOf(query)
    expect(view.filter).toEqual({
      trigger: ['made-basket', 'live'],
      period: [3, 4],
      pressed: 'yes',
      trap: ['coffin-corner', 'none'],
      jersey: [4, 11],
      text: 'skip pass',
    })
    expect(view).toMatchObject({ sort: 'outcome', direction: 'desc', page: 3, row: idOf(8) })
    expect(queryOf(view)).toEqual(query)
  })

  it('leaves out what it does not know and keeps the rest', () => {
    const view = viewOf({ trigger: 'kick-off', shape: '2-2-1', sort: 'fame', page: '-2', extra: 'x' })
    expect(view).toEqual({
      filter: { shape: ['2-2-1'] },
      sort: 'played',
      direction: 'asc',
      page: 1,
      row: null,
    })
  })

  it('is short when everything is as usual', () => {
    expect(queryOf(viewOf({}))).toEqual({})
    expect(withPart({ shape: ['2-2-1'], pressed: 'yes' }, 'shape', [])).toEqual({ pressed: 'yes' })
  })

  it('asks only what the server takes', () => {
    for (const slot of FILTER_SLOTS.filter(({ how, key }) => how !== 'typed' && key !== 'game'))
      for (const { value } of choicesOf(slot.key, [])) {
        const read = TableFilter.shape[slot.key].safeParse(value)
        expect(read.success, `${slot.key} ${value}`).toBe(true)
      }
    expect(FILTER_KEYS.every((key) => key in TableQuery.shape)).toBe(true)
  })
})

describe('the sentence', () => {
  const games = [{ id: GAME, kind: 'scouted' as const, label: 'v Tarn Valley', playedOn: '2026-03-14' }]
  const slot = (key: string) => FILTER_SLOTS.find((each) => each.key === key)!

  it('says what is chosen, or that it may be anything', () => {
    expect(slotWords(slot('game'), {}, games)).toBe('anybody')
    expect(slotWords(slot('game'), { game: [GAME] }, games)).toBe('Tarn Valley, 14 Mar')
    expect(slotWords(slot('tookAway'), { tookAway: ['middle', 'long'] }, games)).toBe(
      'middle or long pass taken away',
    )
    expect(slotWords(slot('game'), { game: [idOf(1)] }, games)).toBe('another game')
    expect(orWords(['a', 'b', 'c'])).toBe('a, b or c')
    expect(orWords(['a', 'b', 'c', 'd', 'e'])).toBe('5 of them')
    expect(sortWords('clock', 'desc')).toBe('of the clock, last first')
  })

  it('names the part without which most would be left, and none where nothing helps', () => {
    expect(narrowest([{ total: 2 }, { total: 14 }, { total: 0 }])).toEqual({ total: 14 })
    expect(narrowest([{ total: 0 }])).toBeNull()
    expect(narrowest([])).toBeNull()
  })
})

describe('a cell', () => {
  it('says what they did, and only that they dropped back where they did', () => {
    const row = rowOf(8, { period: 2, clock: 4040, tookAway: ['pass-back'] })
    expect(cellOf(column('clock'), tableRow(row), FIBA).words).toBe('Q2 6:44')
    expect(cellOf(column('tookAway'), tableRow(row), FIBA).words).toBe('pass back')
    const back = rowOf(9, { shape: 'dropped-back', pickup: null, pressed: false })
    expect(cellOf(column('pickup'), tableRow(back), FIBA).words).toBe('Dropped back')
    expect(cellOf(column('shape'), tableRow(back), FIBA).words).toBe('')
  })

  it('tells no trap, one not seen and one not logged apart', () => {
    const words = (traps: never) => cellOf(column('firstTrap'), tableRow(rowOf(8, { traps })), FIBA).words
    expect(words([] as never)).toBe('No trap')
    expect(words('not-visible' as never)).toBe('not seen')
    expect(words(null as never)).toBe('')
  })

  it('strikes what it was and initials who changed it', () => {
    const fix = {
      changeId: idOf(1),
      field: 'tookAway',
      from: null,
      at: '2026-03-15T19:33:00Z',
      initials: 'TR',
    }
    const cell = cellOf(column('tookAway'), tableRow(rowOf(8, { tookAway: ['pass-back'] }), [fix]), FIBA)
    expect(cell.fix).toEqual({ was: 'nothing', now: 'pass back', initials: 'TR' })
    expect(correctionWords(cell.fix!)).toBe('was nothing, now pass back, TR')
  })

  it('marks only the trap that was moved', () => {
    const trap = (x: number, t: number) =>
      ({
        x,
        y: 0.9,
        t,
        cue: null,
        trappers: null,
        result: null,
        spot: 'coffin-corner',
        side: 'right',
      }) as const
    const row = rowOf(8, { traps: [trap(0.1, 2), trap(0.55, 7)] })
    const fix = {
      changeId: idOf(1),
      field: 'traps',
      from: [trap(0.1, 2.2), trap(0.55, 7)],
      at: '2026-03-15T19:32:00Z',
      initials: 'TR',
    }
    expect(cellOf(column('firstTrap'), tableRow(row, [fix]), FIBA).fix).toMatchObject({
      was: 'Right deep corner 2.2',
      now: 'Right deep corner 2.0',
    })
    expect(cellOf(column('secondTrap'), tableRow(row, [fix]), FIBA).fix).toBeNull()
  })

  it('says every kind of value in words', () => {
    expect(valueWords('denied', [])).toBe('nobody')
    expect(valueWords('tookAway', [])).toBe('nothing')
    expect(valueWords('leftOpen', ['middle', 'long'])).toBe('middle and long pass')
    expect(valueWords('timeOutBurned', false)).toBe('no')
    expect(valueWords('margin', -3)).toBe('down 3')
    expect(valueWords('note', { long: 120 })).toBe('120 characters')
    expect(valueWords('thief', 'not-visible')).toBe('not seen')
    expect(valueWords('shape', 'a-shape-of-old')).toBe('a-shape-of-old')
  })
})

describe('the row ruler', () => {
  const bars = {
    games: [
      { id: GAME, kind: 'scouted' as const, label: 'v Tarn Valley', playedOn: '2026-02-28', rows: 3 },
      { id: idOf(90), kind: 'ours' as const, label: 'against us', playedOn: '2026-03-07', rows: 2 },
    ],
    ids: [1, 2, 3, 4, 5].map(idOf),
    numbers: [1, 2, 3, 1, 2],
    pressed: [1, 0, 1, 1, 1] as (0 | 1)[],
    shown: [1, 1, 0, 0, 1] as (0 | 1)[],
  }

  it('has a bar a possession, and knows where each stands in the filter', () => {
    const games = rulerOf(bars)
    expect(games.map((game) => game.bars.length)).toEqual([3, 2])
    expect(games.flatMap((game) => game.bars).map((bar) => [bar.pressed, bar.shown, bar.at])).toEqual([
      [1, true, 0],
      [0, true, 1],
      [1, false, 2],
      [1, false, 2],
      [1, true, 2],
    ])
    expect(games[0]!.day).toBe('28 Feb')
    expect([0, 49, 50].map((at) => pageOf(at, 50))).toEqual([1, 1, 2])
  })

  it('puts many into bins that never cross a game', () => {
    const games = rulerOf(bars, 3)
    expect(games.map((game) => game.bars.map((bar) => bar.rows))).toEqual([[2, 1], [2]])
    expect(games[0]!.bars[0]!.pressed).toBe(0.5)
  })

  it('says which marked rows stand elsewhere', () => {
    const marked = [4, 10, 21].map((number) => ({ id: idOf(number), number }))
    expect(elsewhereWords(marked, [idOf(4), idOf(10)])).toBe('2 are on the screen, no. 21 is elsewhere.')
    expect(
      elsewhereWords(
        marked,
        marked.map(({ id }) => id),
      ),
    ).toBe('')
    expect(elsewhereWords(marked, [])).toBe('None is on the screen, no. 4, no. 10 and no. 21 are elsewhere.')
  })
})

describe('the batch', () => {
  const rows = [rowOf(4), rowOf(8), rowOf(10, { tookAway: ['middle'] }), rowOf(17, { tookAway: [] })]

  it('asks column, old value and new value in turn', () => {
    expect(nextPart({ field: null })).toBe('field')
    expect(nextPart({ field: 'tookAway' })).toBe('from')
    expect(nextPart({ field: 'tookAway', from: null })).toBe('to')
    expect(nextPart({ field: 'tookAway', from: null, to: [] })).toBeNull()
    expect(isWhole({ field: 'tookAway', from: null, to: null })).toBe(false)
  })

  it('offers as old values what the rows hold, with how many', () => {
    expect(heldValues(rows, 'tookAway', FIBA).map(({ label, rows: count }) => [label, count])).toEqual([
      ['not logged', 2],
      ['middle', 1],
      ['nothing', 1],
    ])
  })

  it('changes only rows that hold the old value', () => {
    expect(changedRows(rows, { field: 'tookAway', from: null }).map(({ number }) => number)).toEqual([4, 8])
    expect(changedRows(rows, { field: 'tookAway', from: [] }).map(({ number }) => number)).toEqual([17])
    expect(changedRows(rows, { field: null })).toEqual([])
  })

  it('does not offer the old value again, nor to take a trigger out', () => {
    expect(newValues('pickup', 'full').map(({ label }) => label)).toEqual([
      'three-quarter',
      'half court',
      'not seen',
      'not logged',
    ])
    expect(newValues('trigger', 'live').some(({ value }) => value === null)).toBe(false)
    expect(newValues('passes', null)).toEqual([])
    expect(readValue('passes', '31')).toEqual({ fault: 'Write a whole number from 0 to 30.' })
    expect(readValue('onFloor', '15 4')).toEqual({ value: [4, 15] })
    expect(readValue('margin', '-3')).toEqual({ value: -3 })
  })

  it('offers what only our own games have on their rows alone', () => {
    expect(batchFields(rows)).not.toContain('rightCall')
    expect(batchFields([...rows, rowOf(1, { gameId: GAME, scoutedGameId: null })])).toContain('rightCall')
  })

  it('says what came of it', () => {
    const result = {
      batchId: idOf(1),
      changed: [{ id: idOf(4), version: 2 }],
      already: [],
      leftOut: [{ id: idOf(8), number: 8, why: 'changed-since' as const }],
    }
    expect(resultWords(result)).toBe('1 row changed. No. 8 was changed meanwhile and stays.')
  })
})

describe('the history of a row', () => {
  const who = { id: idOf(60), name: 'Tomas Reinholt', initials: 'TR' }
  const change = (id: number, more: Partial<ChangeRow>): ChangeRow => ({
    id: idOf(id),
    kind: 'possession',
    rowId: idOf(8),
    action: 'changed',
    who,
    at: '2026-03-15T19:32:00.000Z',
    batchId: null,
    fields: [],
    ...more,
  })

  it('is a line a field, each of which can be put back', () => {
    const lines = historyLines(
      [
        change(1, { action: 'made' }),
        change(2, {
          fields: [
            { field: 'tookAway', from: null, to: ['pass-back'] },
            { field: 'passes', from: 3, to: 4 },
          ],
        }),
      ],
      FIBA,
    )
    expect(lines.map((line) => lineWords(line))).toEqual([
      'Tomas logged it',
      'took away: was not logged, now pass back, Tomas',
      'passes: was 3, now 4, Tomas',
    ])
    expect(lines.map((line) => line.canPutBack)).toEqual([false, true, true])
  })

  it('names nobody who was erased, and puts back no text whose words are not kept', () => {
    const lines = historyLines(
      [change(1, { who: null, fields: [{ field: 'note', from: { long: 130 }, to: { long: 90 } }] })],
      FIBA,
    )
    expect(lines[0]).toMatchObject({ who: 'Somebody who has left', canPutBack: false })
  })
})
