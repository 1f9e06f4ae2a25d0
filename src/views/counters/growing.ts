import { onScopeDispose, ref, watch } from 'vue'

/** Rows in the first paint: more than the tallest window shows. */
const FIRST = 24
const MORE = 24

/**
 * How many rows of a long list are there yet: the first ones at once, the others a few with every frame, so that a
 * long list is seen as soon as a short one. Once grown it never shrinks back.
 */
export function useGrowing(total: () => number) {
  const there = ref(FIRST)
  let frame = 0
  const grow = () => {
    there.value += MORE
    frame = there.value < total() ? requestAnimationFrame(grow) : 0
  }
  watch(
    total,
    (now) => {
      if (frame === 0 && there.value < now) frame = requestAnimationFrame(grow)
    },
    { immediate: true },
  )
  onScopeDispose(() => cancelAnimationFrame(frame))
  return there
}
