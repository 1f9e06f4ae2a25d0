import { computed } from 'vue'
import { rulePack } from '@shared/court/rulePacks'
import { listGames } from '@/api/games'
import { getOpponent } from '@/api/opponents'
import { railOf } from '@/composables/prepRail'
import { useAsync } from '@/composables/useAsync'
import { useTeam } from '@/composables/useTeam'

/** The opponent's name, the game with them that is next, and where its preparation stands. */
export function useOpponentHead(teamId: string, opponent: () => string) {
  const { team } = useTeam()
  const about = useAsync(
    async (signal) => {
      const [row, games] = await Promise.all([
        getOpponent(teamId, opponent(), signal),
        listGames(teamId, signal),
      ])
      return {
        opponent: row,
        next: games.rows.find(({ id }) => id === row.nextGame?.id) ?? null,
        played: games.rows
          .filter((game) => game.opponentId === row.id && Date.parse(game.tipOff) < Date.now())
          .sort((a, b) => b.tipOff.localeCompare(a.tipOff)),
      }
    },
    { watch: opponent },
  )
  const next = computed(() => about.data?.next ?? null)
  const zone = computed(() => team.value.timeZone)
  return {
    about,
    next,
    zone,
    name: computed(() => about.data?.opponent.name ?? ''),
    /** Our games against them that are over, newest first. */
    played: computed(() => about.data?.played ?? []),
    shortName: computed(() => about.data?.opponent.shortName ?? ''),
    rail: computed(() => next.value && railOf(next.value, zone.value, teamId)),
    pack: computed(() => rulePack(next.value?.rulePack ?? team.value.rulePack)),
  }
}
export type OpponentHead = ReturnType<typeof useOpponentHead>
