/** Moves numbers apart until neighbours are `apart` from each other, keeping their order and their middle. */
export function fanned(xs: readonly number[], apart: number): number[] {
  const order = xs.map((x, i) => ({ x, i })).sort((a, b) => a.x - b.x || a.i - b.i)
  let groups = order.map(({ x, i }) => ({ middle: x, members: [i] }))
  for (let merged = true; merged;) {
    merged = false
    for (let g = 0; g + 1 < groups.length; g += 1) {
      const [a, b] = [groups[g], groups[g + 1]]
      if (!a || !b) continue
      const reach = ((a.members.length + b.members.length) / 2) * apart
      if (b.middle - a.middle >= reach - 1e-9) continue
      const members = [...a.members, ...b.members]
      const middle = (a.middle * a.members.length + b.middle * b.members.length) / members.length
      groups = [...groups.slice(0, g), { middle, members }, ...groups.slice(g + 2)]
      merged = true
      break
    }
  }
  const result = [...xs]
  for (const { middle, members } of groups)
    members.forEach((i, place) => {
      result[i] = middle + (place - (members.length - 1) / 2) * apart
    })
  return result
}

/** Fanned between two bounds, in the order given; those that the bounds leave no room for, from the last, are null. */
export function fannedWithin(
  xs: readonly number[],
  apart: number,
  from: number,
  to: number,
): (number | null)[] {
  const fit = to < from ? 0 : Math.floor((to - from) / apart + 1e-9) + 1
  const kept = xs.slice(0, fit)
  const order = fanned(kept, apart)
    .map((x, i) => ({ x, i }))
    .sort((a, b) => a.x - b.x || a.i - b.i)
  const result: (number | null)[] = xs.map(() => null)
  let least = from
  order.forEach(({ x, i }, place) => {
    const at = Math.max(least, Math.min(x, to - (order.length - 1 - place) * apart))
    result[i] = at
    least = at + apart
  })
  return result
}
