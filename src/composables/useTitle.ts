import { toValue, watchEffect, type MaybeRefOrGetter } from 'vue'

/** The window's title while the page is open, e.g. "Read: Gulls"; null leaves the route's own words. */
export function useTitle(title: MaybeRefOrGetter<string | null | undefined>): void {
  watchEffect(() => {
    const words = toValue(title)
    if (words !== null && words !== undefined && words !== '') document.title = `${words} · Overtop`
  })
}
