import type { Choice, Turn } from '@shared/choices/schemas'
import { habitOf } from '@shared/tendencies/habits'
import { chooseCounters, type ChooseInput } from './choose'
import { tendencies, type EngineTendency, type HabitCell } from './tendencies'

/** Rows that are thought on from here: about what one more game holds of a habit. */
const NEXT = 6
/** Counters that it is worked out for, from the top. */
const SHOWN = 3
/** Habits looked at, the heaviest reasons first: each costs a few rankings. */
const LOOKED_AT = 8

/** A habit as it would stand after one more game of theirs in which it came so often. */
function after(
  cells: readonly HabitCell[],
  key: string,
  k: number,
  settings: ChooseInput['settings'],
): EngineTendency | undefined {
  const own = cells.filter((cell) => cell.habitKey === key)
  const trigger = own[0]?.trigger ?? 'made-basket'
  const older = own.map((cell) => ({ ...cell, gameAge: cell.gameAge + 1 }))
  const next = { habitKey: key, gameId: 'next', gameAge: 0, trigger, k, n: NEXT }
  const habit = habitOf(key)
  return habit && tendencies([...older, next], { habits: [habit], settings })[0]
}

/** The habits that speak in the reasons of the counters on top, the heaviest first. */
function speaking(choices: readonly Choice[]): string[] {
  const weights = new Map<string, number>()
  for (const { reasons } of choices.slice(0, SHOWN))
    for (const { facts, weight } of reasons)
      for (const { habitKey } of facts)
        weights.set(habitKey, Math.max(weights.get(habitKey) ?? 0, Math.abs(weight)))
  return [...weights].sort(([, one], [, two]) => two - one).map(([key]) => key)
}

/**
 * For each counter on top the least that their next six rows would have to show of one habit for the order to turn:
 * the leader to be overtaken, another one to lead. A counter that nothing turns is not in the answer. One habit at
 * a time is thought on and everything else stays, so it is a reading of the order, not a forecast.
 */
export async function whatWouldTurn(input: ChooseInput, cells: readonly HabitCell[]): Promise<Turn[]> {
  const now = await chooseCounters(input)
  const [leader] = now.choices
  if (leader === undefined || now.unknown) return []
  const leaderAfter = async (key: string, k: number): Promise<string | null> => {
    const changed = after(cells, key, k, input.settings)
    if (changed === undefined) return null
    const list = input.tendencies.map((tendency) => (tendency.key === key ? changed : tendency))
    return (await chooseCounters({ ...input, tendencies: list })).choices[0]?.counterId ?? null
  }
  const found: Turn[] = []
  for (const habitKey of speaking(now.choices).slice(0, LOOKED_AT))
    for (const is of ['less', 'more'] as const) {
      const kOf = (rows: number) => (is === 'more' ? rows : NEXT - rows)
      // All six say the most; only where they turn it the least is looked for.
      if ((await leaderAfter(habitKey, kOf(NEXT))) === leader.counterId) continue
      for (let rows = Math.ceil(NEXT / 2); rows <= NEXT; rows += 1) {
        const leads = await leaderAfter(habitKey, kOf(rows))
        if (leads === null || leads === leader.counterId) continue
        const turn = { habitKey, is, rows, of: NEXT, leads }
        found.push({ ...turn, counterId: leader.counterId }, { ...turn, counterId: leads })
        break
      }
    }
  const shown = now.choices.slice(0, SHOWN).map(({ counterId }) => counterId)
  return shown.flatMap((id) => {
    const own = found.filter(({ counterId }) => counterId === id).sort((one, two) => one.rows - two.rows)
    return own.slice(0, 1)
  })
}
