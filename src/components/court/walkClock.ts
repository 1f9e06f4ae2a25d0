import { computed, onScopeDispose, reactive, ref } from 'vue'
import { usePreferredReducedMotion, useRafFn } from '@vueuse/core'

/** How fast a walk goes against the real count: 1 s is 1 s, or half of that. */
export const PACES = [
  { value: 1, label: 'Real pace' },
  { value: 0.5, label: 'Half speed' },
] as const

/** A tab that was hidden goes on where it was, not where it would have come to; ms. */
const LONGEST_FRAME = 250

export interface WalkClockOptions {
  /** When everything has ended, seconds. */
  duration: () => number
  /** Where each step begins, seconds, in order. */
  starts: () => readonly number[]
  /** A walk has come to its end. */
  ended?: () => void
}

/**
 * The clock that a counter is walked by. Where a person asks for little motion it never runs by itself: every start
 * is one more still, at the next step.
 */
export function useWalkClock({ duration, starts, ended }: WalkClockOptions) {
  const seconds = ref(0)
  const playing = ref(false)
  const pace = ref<number>(1)
  const motion = usePreferredReducedMotion()
  const stills = computed(() => motion.value === 'reduce')

  const held = (at: number) => Math.min(Math.max(0, at), duration())
  const frames = useRafFn(
    ({ delta }) => {
      if (!playing.value) return
      seconds.value = held(seconds.value + (Math.min(delta, LONGEST_FRAME) / 1000) * pace.value)
      if (seconds.value < duration()) return
      pause()
      ended?.()
    },
    { immediate: false },
  )

  function pause(): void {
    playing.value = false
    frames.pause()
  }

  function seek(at: number): void {
    pause()
    seconds.value = held(at)
  }

  /** From the start again once it has come to its end. */
  function play(): void {
    if (stills.value) {
      nextStill()
      return
    }
    if (seconds.value >= duration()) seconds.value = 0
    playing.value = true
    frames.resume()
  }

  function nextStill(): void {
    const next = starts().find((start) => start > seconds.value + 1e-6)
    if (next !== undefined) seek(next)
    else if (seconds.value < duration()) {
      seek(duration())
      ended?.()
    } else seek(0)
  }

  const toggle = () => (playing.value ? pause() : play())
  const setPace = (to: number) => void (pace.value = to)
  onScopeDispose(pause)
  return reactive({ seconds, playing, pace, stills, play, pause, toggle, seek, setPace })
}
export type WalkClock = ReturnType<typeof useWalkClock>

/** The step that is walked at a moment: the last one that has begun. */
export function stepAt(starts: readonly number[], seconds: number): number {
  const next = starts.findIndex((start) => start > seconds + 1e-6)
  return next < 0 ? Math.max(0, starts.length - 1) : Math.max(0, next - 1)
}
