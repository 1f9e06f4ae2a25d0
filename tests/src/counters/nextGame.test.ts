import { describe, expect, it } from 'vitest'
import type { GameRow } from '@shared/games/schemas'
import { nextGameOf } from '@/views/counters/nextGame'

const game = (id: string, tipOff: string) => ({ id, tipOff }) as GameRow
const now = Date.parse('2026-12-01T12:00:00Z')

describe('the next game', () => {
  it('is the nearest one ahead, in whatever order they come', () => {
    const games = [
      game('later', '2026-12-09T18:00:00Z'),
      game('past', '2026-11-30T18:00:00Z'),
      game('next', '2026-12-04T19:15:00Z'),
    ]
    expect(nextGameOf(games, now)?.id).toBe('next')
  })

  it('is nobody once the season is over', () => {
    expect(nextGameOf([game('past', '2026-11-30T18:00:00Z')], now)).toBeNull()
  })
})
