import type { MarkPoint } from '@shared/stills/marks'
import { isMark, type Tool } from './markMoves'

export interface DeskHand {
  tool: () => Tool | null
  take: (tool: Tool | null) => void
  nudge: (by: MarkPoint, other: boolean) => void
  size: (by: number) => void
  stepBack: () => void
  takeOff: () => void
  putDown: () => void
}

const TOOLS: Readonly<Record<string, Tool>> = { r: 'ring', h: 'shade', p: 'pass', w: 'words', b: 'blur' }
const ARROWS: Readonly<Record<string, MarkPoint>> = {
  ArrowLeft: { x: -1, y: 0 },
  ArrowRight: { x: 1, y: 0 },
  ArrowUp: { x: 0, y: -1 },
  ArrowDown: { x: 0, y: 1 },
}
const STEP = 0.01
const LARGER = 1.1

const isField = (target: EventTarget | null) =>
  target instanceof Element && target.closest('input, textarea, select, dialog, .el-popper') !== null

/** The keys of the marking board. Returns whether the key was one of them. */
export function useDeskKeys(hand: DeskHand): (event: KeyboardEvent) => boolean {
  function act({ key, shiftKey, target }: KeyboardEvent): boolean {
    const tool = hand.tool()
    const draws = isMark(tool) || tool === 'blur'
    const chosen = TOOLS[key.toLowerCase()]
    const arrow = ARROWS[key]
    if (chosen !== undefined && key.length === 1) hand.take(chosen)
    else if (arrow !== undefined && draws) hand.nudge({ x: arrow.x * STEP, y: arrow.y * STEP }, shiftKey)
    else if ((key === '+' || key === '=') && draws) hand.size(LARGER)
    else if (key === '-' && draws) hand.size(1 / LARGER)
    else if (key === 'Backspace') hand.stepBack()
    else if (key === 'Delete' && draws) hand.takeOff()
    else if (key === 'Escape' && tool !== null) hand.take(null)
    else if (key === 'Enter' && draws && target instanceof Element && target.matches('.stage')) hand.putDown()
    else return false
    return true
  }

  return (event) => {
    if (event.ctrlKey || event.metaKey || event.altKey || isField(event.target)) return false
    if (!act(event)) return false
    event.preventDefault()
    event.stopPropagation()
    return true
  }
}
