import { webcrypto } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { Id } from '@shared/http/common'
import { newId } from '@/composables/newId'

describe('a new id', () => {
  const plainHttp = {
    getRandomValues: <T extends ArrayBufferView | null>(array: T) =>
      webcrypto.getRandomValues(array as never) as T,
  }

  it('is a UUID that the server takes, also where the browser makes none itself', () => {
    for (let round = 0; round < 200; round++) {
      const id = newId(plainHttp as never)
      expect(Id.parse(id)).toBe(id)
      expect(id[14]).toBe('4')
      expect('89ab').toContain(id[19])
    }
  })

  it('is another one each time', () => {
    expect(new Set(Array.from({ length: 500 }, () => newId(plainHttp as never))).size).toBe(500)
  })
})
