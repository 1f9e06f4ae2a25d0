/** Numbers that look random and are the same on every machine: the demo must not change between two loads. */
export interface Random {
  /** From 0 up to but not 1. */
  next(): number
  /** From low up to but not high. */
  between(low: number, high: number): number
  /** One of the list; the list must not be empty. */
  pick<T>(list: readonly T[]): T
  /** A new list in another order. */
  shuffle<T>(list: readonly T[]): T[]
}

/** mulberry32: a 32-bit counter through two multiply-and-xor rounds, public domain. Same seed, same numbers. */
export function seeded(seed: number): Random {
  let state = seed >>> 0
  const next = () => {
    state = (state + 0x6d2b79f5) >>> 0
    let mixed = Math.imul(state ^ (state >>> 15), state | 1)
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296
  }
  return {
    next,
    between: (low, high) => low + (high - low) * next(),
    pick(list) {
      const one = list[Math.floor(next() * list.length)]
      if (one === undefined) throw new Error('nothing to pick from')
      return one
    },
    shuffle(list) {
      return list
        .map((value) => ({ value, order: next() }))
        .sort((a, b) => a.order - b.order)
        .map(({ value }) => value)
    },
  }
}
