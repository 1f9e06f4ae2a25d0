import { nextTick, watch, type Ref } from 'vue'
import { usePreferredReducedMotion } from '@vueuse/core'

/** How long a ball rolls from one station to the next, ms. */
const ROLL_MS = 400

/**
 * Lets the ball of a rail roll when it goes to another station or another hand; where motion is not wanted it is
 * there at once.
 * @param root the rail, whose ball is its `.is-here .disc`
 * @param where changes when the ball goes on
 */
export function useRollingBall(root: Readonly<Ref<HTMLElement | null>>, where: () => string): void {
  const motion = usePreferredReducedMotion()
  const ball = () => root.value?.querySelector<HTMLElement>('.is-here .disc') ?? null
  watch(
    where,
    async () => {
      const before = ball()?.getBoundingClientRect()
      await nextTick()
      const now = ball()
      if (before === undefined || now === null || motion.value === 'reduce') return
      // Off screen, or without the browser's animations, there is nothing to show.
      if (typeof now.animate !== 'function' || before.width === 0) return
      const by = before.left - now.getBoundingClientRect().left
      const turn = by > 0 ? 360 : -360
      now.animate(
        [
          { transform: `translateX(${by}px) rotate(${turn}deg)`, zIndex: 1 },
          { transform: 'none', zIndex: 1 },
        ],
        { duration: ROLL_MS, easing: 'ease-in-out' },
      )
    },
    { flush: 'pre' },
  )
}
