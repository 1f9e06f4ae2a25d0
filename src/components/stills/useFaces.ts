import { ref } from 'vue'
import type { MarkPoint, Region } from '@shared/stills/marks'
import { faceAt, faceBetween, movedRegion, sizedRegion } from './markMoves'

/** As many as one request takes. */
const MOST = 24

/** Faces that are marked and not burned away yet; the last one is in hand. */
export function useFaces(ratio: number) {
  const faces = ref<Region[]>([])
  let stroke: number | null = null

  function add(at: MarkPoint): void {
    if (faces.value.length < MOST) faces.value = [...faces.value, faceAt(at, ratio)]
  }

  function draw(from: MarkPoint, to: MarkPoint, id: number): void {
    const region = faceBetween(from, to)
    if (stroke === id) faces.value = [...faces.value.slice(0, -1), region]
    else if (faces.value.length < MOST) faces.value = [...faces.value, region]
    stroke = id
  }

  /** Changes the one in hand; without one, puts the first in the middle. */
  function inHand(change: (face: Region) => Region): void {
    const last = faces.value.at(-1)
    if (last === undefined) add({ x: 0.5, y: 0.4 })
    else faces.value = [...faces.value.slice(0, -1), change(last)]
  }

  const nudge = (by: MarkPoint) => inHand((face) => movedRegion(face, by))
  const size = (by: number) => inHand((face) => sizedRegion(face, by))
  /** Puts the one in hand down and takes up another beside it. */
  function another(): void {
    const last = faces.value.at(-1)
    const at = last ? { x: last.x + last.w * 2, y: last.y + last.h / 2 } : { x: 0.5, y: 0.4 }
    add({ x: Math.min(1, at.x), y: at.y })
  }
  const dropLast = () => (faces.value = faces.value.slice(0, -1))
  const clear = () => (faces.value = [])

  return { faces, add, draw, nudge, size, another, dropLast, clear }
}
