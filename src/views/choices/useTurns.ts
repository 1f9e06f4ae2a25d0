import { getTurns } from '@/api/choices'
import { useAsync } from '@/composables/useAsync'
import { turnSentence } from './turnWords'

/** Counters that stand as columns from the start: the ones that a staff compares. */
export const COLUMNS = 3

/** What would turn the order, by counter: a reading that takes a moment, and the page is whole without it. */
export function useTurns(options: {
  teamId: string
  gameId: string
  /** Nothing is known of them: there is no order to turn. */
  unknown: boolean
  nameOf: (id: string) => string
}): { turnOf: (counterId: string, rank: number) => string } {
  const { teamId, gameId, unknown, nameOf } = options
  const turns = useAsync((signal) => getTurns(teamId, gameId, signal), { immediate: !unknown })
  const turnOf = (counterId: string, rank: number): string => {
    if (turns.data === null || rank > COLUMNS) return ''
    const turn = turns.data.rows.find((one) => one.counterId === counterId)
    return turnSentence(turn, rank === 1, nameOf)
  }
  return { turnOf }
}
