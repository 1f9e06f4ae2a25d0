import { seeded } from './random'
import { DEMO_POSSESSIONS } from './scenario'
import type { DemoPossession } from './scenario/types'
import type { StillSpec } from './stills/render'
import { middleScene, trapScene, waitingScene } from './stills/scenes'

export { renderStill } from './stills/render'

export interface DemoStill {
  possessionKey: string
  /** Seconds from the first touch; null before it. */
  t: number | null
  /** At most eight words. */
  caption: string
  spec: StillSpec
}

type Row = DemoPossession
const trapsOf = (row: Row) => (Array.isArray(row.traps) ? row.traps : [])
const inGame = (key: string) => (row: Row) => row.scoutedGameKey === key

/** The first row that fits; a scenario without one is a fault of the scenario. */
function find(...fits: ((row: Row) => boolean)[]): Row {
  const row = DEMO_POSSESSIONS.find((one) => fits.every((fit) => fit(one)))
  if (!row) throw new Error('the scenario has no row for this still')
  return row
}

const cornerTrap = (side: 'left' | 'right') => (row: Row) => {
  const [first] = trapsOf(row)
  return first !== undefined && first.x < 0.16 && (side === 'left' ? first.y < 0.22 : first.y > 0.78)
}
const twice = (row: Row) => trapsOf(row).length === 2
const ended = (outcome: Row['outcome']) => (row: Row) => row.outcome === outcome
const after = (trigger: Row['trigger']) => (row: Row) => row.trigger === trigger
const shown = (shape: Row['shape']) => (row: Row) => row.shape === shape

function stills(): DemoStill[] {
  const list: DemoStill[] = []
  const random = seeded(77)
  const add = (row: Row, t: number | null, caption: string, spec: (seed: number) => StillSpec) =>
    list.push({ possessionKey: row.key, t, caption, spec: spec(700 + list.length * 13) })
  const trapped = (row: Row, index: number, caption: string) => {
    const trap = trapsOf(row)[index]
    if (!trap) throw new Error(`no trap ${index + 1} in ${row.key}`)
    // Room and a way out are marked only where the row says that the middle was left.
    const open = Array.isArray(row.leftOpen) && row.leftOpen.includes('middle')
    add(row, trap.t ?? null, caption, (seed) => {
      const scene = trapScene(trap, seed, random)
      return open ? scene : { ...scene, room: null, pass: null }
    })
  }
  const out = (row: Row, caption: string) => {
    const [first] = trapsOf(row)
    if (!first) throw new Error(`no trap in ${row.key}`)
    const t = row.track?.find(({ kind, x }) => kind === 'catch' && x > 0.2)?.t ?? null
    add(row, t, caption, (seed) => middleScene(first, seed, random))
  }
  const third = inGame('scout-gulls-3')
  const second = inGame('scout-gulls-2')

  const caughtAgain = find(third, after('made-free-throw'), cornerTrap('right'), twice, ended('lost-live'))
  trapped(caughtAgain, 0, 'Trapped, right corner')
  out(caughtAgain, 'Out through the middle')
  trapped(caughtAgain, 1, 'Trapped past half, lost')

  const beaten = find(third, after('made-free-throw'), cornerTrap('right'), ended('through-with-numbers'))
  add(beaten, null, 'How they wait: one on the thrower', (seed) => waitingScene('1-2-1-1', seed, random))
  trapped(beaten, 0, 'Two trap her. The middle is open.')
  out(beaten, 'Middle catch, three against two')

  trapped(find(third, after('break'), cornerTrap('left')), 0, 'Left corner, nobody behind her')
  trapped(find(second, cornerTrap('left'), twice, after('made-free-throw')), 0, 'Trapped, left corner')
  trapped(find(second, cornerTrap('right'), ended('lost-dead')), 0, 'Pass back taken away, thrown out')
  trapped(find(second, shown('2-2-1'), after('break')), 0, 'Caught as she crosses, right side')

  const soft = find(third, shown('2-2-1'), after('made-basket'))
  add(soft, null, 'Two up, two behind, thrower free', (seed) => waitingScene('2-2-1', seed, random))
  trapped(
    find(inGame('scout-lowmoor-1'), (row) => trapsOf(row).length > 0 && (trapsOf(row)[0]?.y ?? 0) > 0.5),
    0,
    'Trap short of half, right side',
  )
  return list
}

/** Twelve stills of the scouted games, each agreeing with the row it hangs on. */
export const DEMO_STILLS: readonly DemoStill[] = stills()
