import { beforeEach, describe, expect, it } from 'vitest'
import { LIMITS } from '@shared/limits'
import { forget, keep, keyOf, recall, recallAll } from '@/composables/kept'
import {
  halfRowsOf,
  isBegun,
  lineOfHalf,
  nextLine,
  readHalfRows,
  renumbered,
} from '@/views/possessions/halfRow'
import { logRows, unsentWords, type LogRow } from '@/views/possessions/logRows'
import { pictureFault, roomFor } from '@/views/possessions/pictureFaults'
import { stillThere, undoUntil } from '@/views/possessions/thrownAway'
import { fresh, GAME, press, ROW, said } from './walk'

const OF_GAME = { id: GAME, ours: false }
const text = (value: unknown) => (typeof value === 'string' ? value : null)

describe('what the device keeps', () => {
  beforeEach(() => localStorage.clear())

  it('is found again, by key and below a key', () => {
    keep(keyOf('rows', 'a', '1'), 'one')
    keep(keyOf('rows', 'a', '2'), 'two')
    keep(keyOf('rows', 'ab', '3'), 'three')
    expect(recallAll(keyOf('rows', 'a'), text).sort()).toEqual(['one', 'two'])
    forget(keyOf('rows', 'a', '1'))
    expect(recall(keyOf('rows', 'a', '1'), text)).toBeNull()
  })

  it('makes room for what was said by dropping copies, never the other way round', () => {
    const large = 'x'.repeat(3_000_000)
    expect(keep(keyOf('copy', 'a', '1'), large)).toBe(true)
    expect(keep(keyOf('rows', 'a', '1', 'r'), large)).toBe(true)
    expect(recall(keyOf('copy', 'a', '1'), text)).toBeNull()
    expect(keep(keyOf('copy', 'a', '1'), large)).toBe(false)
    expect(recall(keyOf('rows', 'a', '1', 'r'), text)).toBe(large)
  })

  it('is passed over when it cannot be read', () => {
    localStorage.setItem(keyOf('rows', 'a', '1'), '{half')
    keep(keyOf('rows', 'a', '2'), 7)
    expect(recallAll(keyOf('rows', 'a'), text)).toEqual([])
  })
})

describe('half a row', () => {
  it('comes back as it was, with the next slot open', () => {
    const line = press(fresh(), '1 2 0')
    const kept = readHalfRows(JSON.parse(JSON.stringify(halfRowsOf(line, null))))
    if (kept?.fresh == null) throw new Error('not kept')
    const back = lineOfHalf(kept.fresh, OF_GAME, null)
    expect(said(back)).toBe(said(line))
    expect(back.open).toEqual({ field: 'trap', trap: 0 })
    expect(back.id).toBe(ROW)
  })

  it('is not kept when nothing was said', () => {
    expect(isBegun(fresh())).toBe(false)
    expect(halfRowsOf(fresh(), null)).toBeNull()
  })

  it('does not ask again for what was unseen', () => {
    const line = press(fresh(), '1 2 1 8 0')
    const kept = readHalfRows(JSON.parse(JSON.stringify(halfRowsOf(line, null))))
    expect(kept?.fresh == null ? undefined : lineOfHalf(kept.fresh, OF_GAME, null).open).toBeNull()
  })
})

describe('the rows of a game', () => {
  const row = (number: number, id = ROW): LogRow => ({
    id,
    draft: { ...press(fresh(), '1 7').draft, number },
    version: 1,
    state: 'sent',
    why: '',
    stills: [],
  })

  it('give the next number, also when a half-said row had it', () => {
    expect(nextLine('x', OF_GAME, [row(13), row(12)]).draft.number).toBe(14)
    expect(renumbered({ ...press(fresh(), '1'), id: 'y' }, [row(1), row(2)]).draft.number).toBe(3)
    expect(renumbered({ ...press(fresh(), '1'), id: 'y' }, [row(4)]).draft.number).toBe(1)
  })

  it('show what is kept here in place of what the server has', () => {
    const body = press(fresh(), '1 2 1 8 2').draft
    const trigger = body.trigger ?? 'live'
    const rows = logRows(
      [],
      [
        {
          id: ROW,
          body: { ...body, trigger },
          version: null,
          state: 'waiting',
          why: '',
          fields: [],
          current: null,
          stamp: 1,
        },
      ],
      null,
    )
    expect(rows.map(({ state, draft }) => [state, draft.outcome])).toEqual([['waiting', 'through']])
  })

  it('say what is not sent', () => {
    expect(unsentWords(6, true).full).toBe('No signal. 6 kept here, will send later')
    expect(unsentWords(0, false).full).toBe('')
  })
})

describe('pictures', () => {
  it('are refused by kind and size, by name and with a remedy', () => {
    expect(pictureFault({ name: 'a.jpg', type: 'image/jpeg', size: 5 })).toBeNull()
    expect(pictureFault({ name: 'a.gif', type: 'image/gif', size: 5 })).toMatch(
      /^a\.gif is no JPEG, PNG or WebP\./,
    )
    expect(pictureFault({ name: 'a.png', type: 'image/png', size: LIMITS.stillBytes + 1 })).toMatch(
      /has 13 MB, and 12/,
    )
    expect(pictureFault({ name: 'a.png', type: 'image/png', size: LIMITS.stillBytes })).toBeNull()
    expect(pictureFault({ name: '', type: 'image/png', size: 0 })).toMatch(/^This picture is empty/)
  })

  it('stop at 24 a possession', () => {
    expect(roomFor(22, 2)).toEqual({ take: 2, fault: null })
    expect(roomFor(23, 3)).toMatchObject({
      take: 1,
      fault: expect.stringContaining('2 pictures were left out') as string,
    })
    expect(roomFor(24, 1).take).toBe(0)
  })
})

describe('what was thrown away', () => {
  it('can be put back for ten minutes', () => {
    const one = { id: ROW, number: 4, until: undoUntil(1000), kept: null }
    expect(stillThere([one], 1000 + 599_999)).toEqual([one])
    expect(stillThere([one], 1000 + 600_000)).toEqual([])
  })
})
