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

/** Fanned between two bounds; where they leave no room for all, as far apart as they let them be. */
export function fannedWithin(xs: readonly number[], apart: number, from: number, to: number): number[] {
  const step = xs.length > 1 ? Math.min(apart, Math.max(0, to - from) / (xs.length - 1)) : apart
  const order = fanned(xs, step)
    .map((x, i) => ({ x, i }))
    .sort((a, b) => a.x - b.x || a.i - b.i)
  const result = [...xs]
  let least = from
  order.forEach(({ x, i }, place) => {
    const most = to - (order.length - 1 - place) * step
    const at = Math.max(least, Math.min(x, most))
    result[i] = at
    least = at + step
  })
  return result
}
