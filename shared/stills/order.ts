/**
 * The list with one of its members at another place, counted from 1; a place past either end is that end. A member
 * that is not there leaves the list as it is.
 */
export function movedTo<T extends { id: string }>(list: readonly T[], id: string, place: number): T[] {
  const moved = list.find((each) => each.id === id)
  if (moved === undefined) return [...list]
  const rest = list.filter((each) => each.id !== id)
  const at = Math.min(rest.length, Math.max(0, Math.round(place) - 1))
  return [...rest.slice(0, at), moved, ...rest.slice(at)]
}
