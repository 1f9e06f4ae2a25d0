import type { Choices } from '@shared/choices/schemas'

/** One counter in the order before and after a rule is changed. `was` and `is` are ranks; null: not in that order. */
export interface OrderLine {
  counterId: string
  name: string
  was: number | null
  is: number | null
  moves: 'stays' | 'rises' | 'falls'
  /** Weights of all its reasons after the change, on the logit scale; against is negative. */
  inFavour: number
  against: number
}

/** Counters shown of an order: as many as a staff weighs up. */
export const SHOWN = 6

const ORDINALS = [
  'first',
  'second',
  'third',
  'fourth',
  'fifth',
  'sixth',
  'seventh',
  'eighth',
  'ninth',
  'tenth',
]
const ordinal = (rank: number): string => ORDINALS[rank - 1] ?? `${rank}th`

const rankIn = (choices: Choices, id: string) =>
  choices.choices.find(({ counterId }) => counterId === id)?.rank ?? null

function movesFrom(was: number | null, is: number | null): OrderLine['moves'] {
  if (was === is) return 'stays'
  return (is ?? Infinity) < (was ?? Infinity) ? 'rises' : 'falls'
}

/** The first of both orders, in the order that the change would give; whoever drops out of sight comes last. */
export function orderLines(before: Choices, after: Choices, nameOf: (id: string) => string): OrderLine[] {
  const ids = [...after.choices.slice(0, SHOWN), ...before.choices.slice(0, SHOWN)].map(
    (one) => one.counterId,
  )
  return [...new Set(ids)].map((counterId) => {
    const [was, is] = [rankIn(before, counterId), rankIn(after, counterId)]
    const weights =
      after.choices.find((one) => one.counterId === counterId)?.reasons.map(({ weight }) => weight) ?? []
    const sum = (sign: 1 | -1) =>
      weights.filter((weight) => weight * sign > 0).reduce((all, one) => all + one, 0)
    return {
      counterId,
      name: nameOf(counterId),
      was,
      is,
      moves: movesFrom(was, is),
      inFavour: sum(1),
      against: sum(-1),
    }
  })
}

const told = ({ name, moves, is }: OrderLine): string => {
  if (is === null) return `${name} drops out`
  return moves === 'rises' ? `${name} comes ${ordinal(is)}` : `${name} drops to ${ordinal(is)}`
}

/** "Middle three comes third and Stack drops to fourth." The leaders are named when they stay. */
export function orderSentence(lines: readonly OrderLine[]): string {
  const moved = lines.filter(({ moves }) => moves !== 'stays')
  if (moved.length === 0) return 'The order stays as it is.'
  const [risen, fallen] = [
    moved.filter(({ moves }) => moves === 'rises'),
    moved.filter(({ moves }) => moves === 'falls'),
  ]
  const few = [...risen.slice(0, 2), ...fallen.slice(0, 2)].map(told)
  const list = few.length < 2 ? few.join('') : `${few.slice(0, -1).join(', ')} and ${few.at(-1)}`
  const first = lines.find(({ is }) => is === 1)
  return `${list}.${first?.moves === 'stays' ? ` ${first.name} stays first.` : ''}`
}
