import { onMounted, watch, type Ref } from 'vue'
import { useRoute, useRouter } from 'vue-router'
import type { LogRow } from './logRows'

export interface AddressedRowOptions {
  list: Ref<readonly LogRow[]>
  open: (row: LogRow) => void
  openId: () => string | null
}

/** Another page may point at one row, "?row=<id>"; once another row or none is open, the address no longer says it. */
export function useAddressedRow({ list, open, openId }: AddressedRowOptions): void {
  const route = useRoute()
  const router = useRouter()
  const wanted = () => (typeof route.query.row === 'string' ? route.query.row : null)

  function look(): void {
    const id = wanted()
    const row = id === null || id === openId() ? undefined : list.value.find((each) => each.id === id)
    if (row !== undefined) open(row)
  }
  onMounted(look)
  watch(wanted, look)
  watch(openId, (id) => {
    if (wanted() === null || wanted() === id) return
    const query = Object.fromEntries(Object.entries(route.query).filter(([key]) => key !== 'row'))
    void router.replace({ query })
  })
}
