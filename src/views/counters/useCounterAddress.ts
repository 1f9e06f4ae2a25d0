import { computed, ref, watch } from 'vue'
import { useRoute, useRouter } from 'vue-router'
import { RulePackKey } from '@shared/court/rulePacks'
import { stepOfQuery } from './stepQuery'

/** A court of the team's own in the address, beside the books' keys. */
export const OWN_COURT = 'own'
/** Nobody's traps under the drawing. */
export const NOBODY = 'none'

/** What the page of a counter shows, kept in its address: the step, whose press lies under it, on which court. */
export function useCounterAddress(steps: () => number) {
  const route = useRoute()
  const router = useRouter()
  const text = (name: string) => {
    const value = route.query[name]
    return typeof value === 'string' ? value : ''
  }
  const put = (change: Record<string, string>) => {
    const query = { ...route.query, ...change }
    void router.replace({
      query: Object.fromEntries(Object.entries(query).filter(([, value]) => value !== '')),
    })
  }

  const asked = computed(() => stepOfQuery(route.query['step'], steps()))
  // A walk turns steps faster than addresses change: the page goes ahead, the address follows.
  const ahead = ref(asked.value)
  watch(asked, (to) => (ahead.value = to))
  const step = computed({
    get: () => Math.min(ahead.value, Math.max(0, steps() - 1)),
    set: (index: number) => {
      ahead.value = index
      if (index !== asked.value) put({ step: String(index + 1) })
    },
  })
  const opponent = computed({ get: () => text('opponent'), set: (value) => put({ opponent: value }) })
  const pack = computed({
    get: () => {
      const value = text('court')
      const key = RulePackKey.safeParse(value)
      return key.success ? key.data : value === OWN_COURT ? OWN_COURT : ''
    },
    set: (value: string) => put({ court: value }),
  })
  return { step, opponent, pack }
}
