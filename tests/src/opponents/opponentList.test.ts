import { describe, expect, it } from 'vitest'
import type { GameRow } from '@shared/games/schemas'
import type { OpponentRow } from '@shared/opponents/schemas'
import { countedSentence, listed } from '@/views/opponents/opponentList'

const meta = { version: 1, createdAt: '2026-03-01T10:00:00.000Z', updatedAt: '2026-03-01T10:00:00.000Z' }
const NOW = Date.parse('2026-03-17T12:00:00Z')

const opponent = (id: string, next: string | null, possessions = 0, pressed = 0): OpponentRow => ({
  ...meta,
  id,
  name: id,
  shortName: id,
  notes: '',
  counts: {
    scoutedGames: possessions > 0 ? 2 : 0,
    ourGames: 0,
    possessions,
    pressed,
    pressable: possessions,
    mostlyShape: null,
  },
  nextGame: next === null ? null : { id: `${id}-next`, tipOff: next, place: 'home' },
})
const game = (id: string, opponentId: string, tipOff: string): GameRow => ({
  ...meta,
  id,
  opponentId,
  opponentName: opponentId,
  tipOff,
  place: 'away',
  rulePack: 'fiba',
  chooseBy: null,
  due: { scout: null, read: null, teach: null, review: null },
  notes: '',
  holder: null,
  read: null,
  handedOn: null,
  mayHandOn: false,
  station: 'review',
  counts: { possessions: 0, scoutedGames: 0, ourGames: 0 },
  plan: null,
  headCoach: null,
})

describe('the list of opponents', () => {
  const opponents = [
    opponent('later', '2026-03-25T18:45:00.000Z'),
    opponent('old', null),
    opponent('met', null, 41, 29),
    opponent('next', '2026-03-20T19:15:00.000Z', 58, 35),
  ]
  const games = [
    game('next-next', 'next', '2026-03-20T19:15:00.000Z'),
    game('met-1', 'met', '2026-01-10T18:00:00.000Z'),
    game('met-2', 'met', '2026-03-13T18:00:00.000Z'),
  ]
  const { ahead, behind } = listed(opponents, games, NOW)

  it('has the next meeting first and those without one after it, the last met first', () => {
    expect(ahead.map((row) => row.opponent.id)).toEqual(['next', 'later'])
    expect(behind.map((row) => row.opponent.id)).toEqual(['met', 'old'])
  })

  it('ties each row to the game it is about: the next, else the last one played', () => {
    expect(ahead[0]!.game?.id).toBe('next-next')
    expect(ahead[1]!.game).toBeNull()
    expect(behind[0]!.game?.id).toBe('met-2')
    expect(behind[1]!.meeting).toBeNull()
  })

  it('says in one sentence what is counted', () => {
    expect(countedSentence(ahead, behind)).toBe(
      'Two ahead of us, two with none ahead. 99 possessions counted in 4 games, 64 of them pressed.',
    )
    expect(countedSentence(listed([opponent('a', null)], [], NOW).ahead, [])).toBe(
      'No one ahead of us. Nothing counted yet.',
    )
  })
})
