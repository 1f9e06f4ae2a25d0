import { computed } from 'vue'
import { useRoute, useRouter } from 'vue-router'
import type { TendencyFilter } from '@shared/tendencies/schemas'
import { FILTER_KEYS, filterOf, queryOf } from './readFilter'

/**
 * What the page shows, kept in its address: the situation, the habit in hand and the possession of it. A link
 * opens the same view; Back undoes one choice at a time. Only stepping from possession to possession leaves no
 * trace behind.
 */
export function useReadAddress() {
  const route = useRoute()
  const router = useRouter()

  const filterText = computed(() => JSON.stringify(queryOf(filterOf(route.query))))
  // Made from the text so that an address that asks for the same thing keeps the same filter.
  const filter = computed<TendencyFilter>(() =>
    filterOf(JSON.parse(filterText.value) as Record<string, string>),
  )
  const one = (name: string) =>
    computed(() => {
      const value = route.query[name]
      return typeof value === 'string' && value !== '' ? value : null
    })
  const habit = one('habit')
  const possession = one('possession')
  const shown = computed(() => (route.query['habits'] === 'all' ? 'all' : 'short'))

  function others(without: readonly string[]) {
    return Object.fromEntries(Object.entries(route.query).filter(([name]) => !without.includes(name)))
  }

  const setFilter = (next: TendencyFilter) =>
    router.push({ query: { ...others([...FILTER_KEYS, 'possession']), ...queryOf(next) } })
  const setHabit = (key: string | null) =>
    router.push({ query: { ...others(['habit', 'possession']), ...(key === null ? {} : { habit: key }) } })
  const setPossession = (id: string) => router.replace({ query: { ...route.query, possession: id } })
  const setShown = (how: 'all' | 'short') =>
    router.replace({ query: { ...others(['habits']), ...(how === 'all' ? { habits: 'all' } : {}) } })

  return { filter, filterText, habit, possession, shown, setFilter, setHabit, setPossession, setShown }
}
