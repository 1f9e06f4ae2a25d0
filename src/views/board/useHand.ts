import { nextTick, onBeforeUnmount, shallowRef } from 'vue'
import type { Edit } from '@shared/court/edit/edits'
import { pullBall } from '@shared/court/edit/gestures'
import { inMetres } from '@shared/court/frame'
import { ROLES } from '@shared/vocabulary'
import { pointInView } from '@/components/court/pointInView'
import type { BoardFit } from './boardFit'
import type { Board, MoveMark, Token } from './boardMarks'
import { editOfHand, handAt, handByKey, takenUp, type Hand, type Held } from './hand'

/** Milliseconds that a player is held for a screen, and px that a finger may stir meanwhile. */
const LONG_PRESS = 450
const STIR = 6

/** The hand on the board: takes up by pointer, finger or key, carries, and draws on letting go. */
export function useHand(o: {
  svg: () => SVGSVGElement | null
  view: () => BoardFit['view']
  board: () => Board
  tokens: () => readonly Token[]
  marks: () => readonly MoveMark[]
  edit: (edit: Edit) => void
  /** A player was tapped. */
  name: (who: string) => void
  /** A drawn move was tapped. */
  pick: (index: number) => void
}) {
  const hand = shallowRef<Hand | null>(null)
  let pointer: number | null = null
  let press: ReturnType<typeof setTimeout> | undefined
  let began = { x: 0, y: 0 }
  let asked = 0
  let next: (() => void) | null = null

  /** At most one change of the hand a frame, however often the pointer tells. */
  function perFrame(change: () => void): void {
    next = change
    if (asked) return
    asked = requestAnimationFrame(() => {
      asked = 0
      next?.()
    })
  }

  function letGo(): void {
    hand.value = null
    pointer = null
    next = null
    clearTimeout(press)
  }

  /** Where tokens lie over each other, the one whose middle is nearest is meant. */
  function takeNearest(event: PointerEvent, token: Token): void {
    // A word is taken anywhere along it, also where a player's middle is nearer.
    if (token.held.kind === 'word') return take(event, token.held, token.at)
    const at = pointOf(event)
    const off = (one: Token) => (at ? Math.hypot(one.at.x - at.x, one.at.y - at.y) : 0)
    const near = o.tokens().reduce((best, one) => (off(one) < off(best) ? one : best), token)
    take(event, near.held, near.at)
  }

  function take(event: PointerEvent, held: Held, at: Token['at']): void {
    if (event.button !== 0 || pointer !== null) return
    pointer = event.pointerId
    began = { x: event.clientX, y: event.clientY }
    o.svg()?.setPointerCapture(event.pointerId)
    hand.value = takenUp(held, at, o.board().pack)
    if (held.kind !== 'player' || held.who.startsWith('X') || o.board().station === 'start') return
    press = setTimeout(() => {
      if (hand.value && !hand.value.moved) hand.value = { ...hand.value, screen: true }
    }, LONG_PRESS)
  }

  const pointOf = (event: PointerEvent) => {
    const box = o.svg()?.getBoundingClientRect()
    if (!box) return null
    const { x, y } = pointInView(o.view(), box, event.clientX, event.clientY)
    return inMetres(x, y)
  }

  function pull(event: PointerEvent): void {
    if (event.pointerId !== pointer) return
    const at = pointOf(event)
    // Whoever pulls does not hold: a slow start is no screen.
    if (Math.hypot(event.clientX - began.x, event.clientY - began.y) > STIR) clearTimeout(press)
    perFrame(() => move(at, event.shiftKey))
  }

  function move(at: ReturnType<typeof pointOf>, shift: boolean): void {
    const now = hand.value
    if (!now || !at) return
    const player = now.held.kind === 'player' && !now.held.who.startsWith('X')
    hand.value = handAt(now, at, o.board().pack, now.screen || (shift && player))
  }

  function drop(event: PointerEvent): void {
    if (event.pointerId !== pointer) return
    move(pointOf(event), event.shiftKey)
    const now = hand.value
    letGo()
    if (!now) return
    if (now.moved) commit(now)
    else if (now.held.kind === 'player' && o.board().station !== 'start') o.name(now.held.who)
  }

  function commit(now: Hand): void {
    const edit = editOfHand(now, o.board().diagram, o.board().station, o.board().pack)
    if (edit) o.edit(edit)
  }

  function keyOn(event: KeyboardEvent, held: Held, at: Token['at']): void {
    if (event.altKey || event.ctrlKey || event.metaKey) return
    const own = hand.value && JSON.stringify(hand.value.held) === JSON.stringify(held) ? hand.value : null
    const step = o.board().station
    if (held.kind === 'word' && event.key === 'Delete' && step !== 'start') {
      letGo()
      o.edit({ do: 'remove-word', step, index: held.index })
      // The word in hand is gone: the keyboard goes on at what can be taken up first.
      void nextTick(() => o.svg()?.querySelector<SVGElement>('[data-token]')?.focus())
      event.preventDefault()
      return event.stopPropagation()
    }
    const moved = handByKey(own ?? takenUp(held, at, o.board().pack), event.key, o.board().pack)
    if (moved) hand.value = moved
    else if (event.key === 'Escape' && own) letGo()
    else if (event.key === 'Enter' && own) {
      letGo()
      commit(own)
    } else if (event.key === 'Enter' && held.kind === 'player' && o.board().station !== 'start')
      o.name(held.who)
    else if (own && held.kind === 'player' && event.key === 's' && !held.who.startsWith('X'))
      hand.value = { ...own, screen: !own.screen }
    else if (held.kind === 'ball' && ROLES.some((role) => role === event.key)) {
      letGo()
      const role = ROLES.find((one) => one === event.key)
      const edit = role ? pullBall(o.board().diagram, o.board().station, role) : null
      if (edit) o.edit(edit)
    } else if (!own) return
    event.preventDefault()
    event.stopPropagation()
  }

  function keyOnMove(event: KeyboardEvent, index: number): void {
    const mark = o.marks().find((one) => one.index === index)
    const step = o.board().station
    if (step === 'start' || !mark) return
    const kept = o.board().diagram.steps[step]?.moves[index]
    if (event.key === 'Enter' && !hand.value) o.pick(index)
    else if (event.key === 'Delete') o.edit({ do: 'remove-move', step, index })
    else if ((event.key === '[' || event.key === ']') && kept && 'bend' in kept)
      o.edit({ do: 'bend', step, index, bend: kept.bend + (event.key === ']' ? 0.05 : -0.05) })
    else if (mark.end) return keyOn(event, { kind: 'aim', index }, mark.end)
    else return
    event.preventDefault()
    event.stopPropagation()
  }

  onBeforeUnmount(() => {
    letGo()
    cancelAnimationFrame(asked)
  })

  return { hand, letGo, take, takeNearest, pull, drop, keyOn, keyOnMove, pulling: () => pointer !== null }
}
