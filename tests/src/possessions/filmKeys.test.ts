import { ref } from 'vue'
import { describe, expect, it } from 'vitest'
import { countAt, FILM_KEYS, trapSlot } from '@/views/possessions/filmKeys'
import { applyAct, courtTap, type Line } from '@/views/possessions/line'
import { useFilm } from '@/views/possessions/useFilm'
import type { Pictures } from '@/views/possessions/usePictures'
import { fresh, press } from './walk'

describe('the film beside the log', () => {
  it('counts from the first touch, and not before it nor long after', () => {
    expect(countAt(1867.4, 1869.2)).toBe(1.8)
    expect(countAt(1867.4, 1867.4)).toBe(0)
    expect(countAt(1867.4, 1860)).toBeNull()
    expect(countAt(1867.4, 2000)).toBeNull()
    expect(countAt(null, 12)).toBeNull()
  })

  it('has keys that no answer and no other key of the log has', () => {
    const keys = FILM_KEYS.map(({ key }) => key)
    expect(new Set(keys).size).toBe(keys.length)
    for (const key of keys) expect('0123456789.c').not.toContain(key)
  })

  it('times the newest trap that has no time, else asks where', () => {
    expect(trapSlot(press(fresh(), '1 2 1').draft)).toEqual({ field: 'trap', trap: 0 })
    expect(trapSlot(press(fresh(), '1 2 1 1 1').draft)).toEqual({ field: 'trapTime', trap: 0 })
  })

  const at = (start: Line) => {
    const line = ref(start)
    const said: [string, string | undefined][] = []
    const pictures = {
      of: () => said.map(([id]) => ({ id })),
      say: (id: string, words: { seconds?: string }) => {
        const there = said.find(([each]) => each === id)
        if (there !== undefined) there[1] = words.seconds
      },
    } as unknown as Pictures
    const film = useFilm({
      line,
      act: (act) => (line.value = applyAct(line.value, act)),
      addPictures: (files) => said.push(...files.map(({ name }): [string, undefined] => [name, undefined])),
      pictures,
    })
    return { line, film, said }
  }

  it('gives a trap that was called its time once the court has said where', () => {
    const { line, film } = at(press(fresh(), '1 2 1'))
    film.touch(1867.4)
    expect(line.value.draft.filmTime).toBe(1867.4)
    film.trap(1.8)
    expect(line.value.open).toEqual({ field: 'trap', trap: 0 })
    const tap = courtTap(line.value, { x: 0.1, y: 0.1 })
    line.value = tap === null ? line.value : applyAct(line.value, tap)
    film.placed()
    expect(line.value.draft.traps).toMatchObject([{ x: 0.1, t: 1.8 }])
    expect(line.value.open).toEqual({ field: 'outcome' })
    film.placed()
    expect(line.value.draft.traps).toHaveLength(1)
  })

  it('says when the ball was over half, and a kept frame carries its count', () => {
    const { line, film, said } = at(press(fresh(), '1 2 1 8 2'))
    film.over(5.8)
    expect(line.value.draft.crossedAt).toBe(5.8)
    film.still(new File(['x'], 'film-31-07.4.jpg'), 2)
    expect(said).toEqual([['film-31-07.4.jpg', '2.0']])
  })
})
