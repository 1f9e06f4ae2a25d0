import { trapsOf, type Draft } from './draft'

/** A possession flattened to one row: how far the ball came, where two met it, how it ended. x: fractions of the court. */
export interface Strip {
  /** Where the thick line ends. */
  reached: number
  traps: number[]
  end: { x: number; kind: 'kept' | 'numbers' | 'lost' | 'count' | 'stopped' } | null
  words: string
}

/** Where a ball that got through is drawn: past half, and past their free-throw line. */
const THROUGH_X = 0.72
const NUMBERS_X = 0.93
/** Where it is drawn when only the part of the court is known. */
const PLACE_X: Record<string, number> = { entry: 0.02, backcourt: 0.3, 'past-half': 0.58 }

/** The strip of a row. Only what was logged is drawn; the middle of a stretch stands for the stretch. */
export function stripOf(draft: Draft): Strip {
  const traps = trapsOf(draft).map((trap) => trap.x)
  const last = draft.track?.at(-1)?.x ?? traps.at(-1)
  const stuck = draft.outcomePlace === null ? (last ?? 0.3) : (PLACE_X[draft.outcomePlace] ?? last ?? 0.3)
  const at = (kind: NonNullable<Strip['end']>['kind'], x: number, words: string): Strip => {
    const reached = Math.max(x, ...traps)
    return { reached, traps, end: { x, kind }, words: `${trapCount(traps.length)}${words}` }
  }
  switch (draft.outcome) {
    case 'through':
      return at('kept', Math.max(THROUGH_X, Math.min(0.95, (traps.at(-1) ?? 0) + 0.1)), 'got through')
    case 'through-with-numbers':
      return at('numbers', NUMBERS_X, 'got through with numbers')
    case 'lost-live':
    case 'lost-dead':
      return at(
        'lost',
        Math.min(0.97, stuck + (draft.outcomePlace === null && last !== undefined ? 0.09 : 0)),
        'lost',
      )
    case 'count':
      return at('count', draft.outcomePlace === null ? (last ?? 0.45) : stuck, 'count called')
    case 'foul-drawn':
      return at(
        'stopped',
        draft.outcomePlace === null ? Math.min(last ?? 0.3, 0.48) : stuck,
        'fouled before half',
      )
    case 'stopped':
      return at('stopped', stuck, 'stopped')
    case null:
      return {
        reached: Math.max(0, ...traps),
        traps,
        end: null,
        words: `${trapCount(traps.length)}end not logged`,
      }
  }
}

const trapCount = (count: number): string =>
  count === 0 ? '' : `${count === 1 ? 'one trap' : `${count} traps`}, `
