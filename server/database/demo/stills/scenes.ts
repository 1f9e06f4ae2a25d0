import type { Random } from '../random'
import type { StillPlayer, StillSpec } from './render'
import type { Kit, Pose } from './figures'

/** Fractions of the court to a metre, up and across (FIBA). */
const UP = 1 / 28
const ACROSS = 1 / 15
interface At {
  x: number
  y: number
}

/** One of ten, moved by metres from a place. */
const stand = (kit: Kit, pose: Pose, at: At, up = 0, across = 0): StillPlayer => ({
  kit,
  pose,
  x: at.x + up * UP,
  y: Math.min(1, Math.max(0, at.y + across * ACROSS)),
})

/** Nobody stands on a grid: everyone is moved by up to a third of a metre. */
function loosened(players: StillPlayer[], random: Random): StillPlayer[] {
  return players.map((player) => ({
    ...player,
    x: player.x + random.between(-0.3, 0.3) * UP,
    y: player.y + random.between(-0.3, 0.3) * ACROSS,
  }))
}

/** The far side needs a longer lens: the camera stands behind the right sideline. */
const zoomFor = (at: At) => 0.98 + (1 - at.y) * 0.7

/** Two on the ball at a place; the rest as a press stands behind a trap, the middle empty. */
export function trapScene(at: At, seed: number, random: Random): StillSpec {
  const inwards = at.y < 0.5 ? 1 : -1
  const early = at.x < 0.3
  const rest = loosened(
    [
      stand('white', 'call', { x: early ? 0.03 : at.x - 0.16, y: at.y < 0.5 ? 0.36 : 0.64 }),
      stand('dark', 'arms-wide', { x: early ? 0.07 : at.x - 0.12, y: at.y < 0.5 ? 0.42 : 0.58 }),
      stand('white', 'call', { x: at.x + 0.15, y: at.y < 0.5 ? 0.36 : 0.54 }),
      stand('dark', 'ready', { x: at.x + 0.17, y: at.y < 0.5 ? 0.24 : 0.76 }),
      stand('white', 'run', { x: at.x + 0.26, y: at.y < 0.5 ? 0.1 : 0.9 }),
      stand('white', 'run', { x: at.x + 0.2, y: at.y < 0.5 ? 0.86 : 0.14 }),
      stand('dark', 'ready', { x: at.x + 0.42, y: 0.5 }),
    ],
    random,
  )
  return {
    seed,
    look: { x: at.x + 0.03, y: at.y + inwards * 0.06 },
    zoom: zoomFor(at),
    players: [
      stand('white', 'hold-high', at),
      stand('dark', 'arms-up', at, 0.95, inwards * 0.25),
      stand('dark', 'arms-up', at, -0.8, inwards * 0.75),
      ...rest,
    ],
    ring: { x: at.x + 0.1 * UP, y: at.y + inwards * 0.4 * ACROSS },
    // The one who calls in the middle: nobody is within three metres of her.
    room: rest[2] ?? null,
    pass: rest[2] ? { from: at, to: rest[2] } : null,
  }
}

/** The ball has come out of a corner to the middle; the trappers are behind it. */
export function middleScene(at: At, seed: number, random: Random): StillSpec {
  const caught = { x: 0.34, y: 0.5 }
  const rest = loosened(
    [
      stand('white', 'ready', at),
      stand('dark', 'run', at, 1.1, at.y < 0.5 ? 0.7 : -0.7),
      stand('dark', 'ready', at, -0.6, at.y < 0.5 ? 1 : -1),
      stand('dark', 'run', caught, 1.4, at.y < 0.5 ? -2 : 2),
      stand('white', 'run', caught, 4.5, 4.4),
      stand('white', 'run', caught, 4.2, -4.6),
      stand('dark', 'arms-wide', caught, 7.5, 0),
    ],
    random,
  )
  return {
    seed,
    look: { x: 0.33, y: 0.64 },
    zoom: 1.1,
    players: [stand('white', 'hold', caught), ...rest],
    ring: caught,
    room: null,
    pass: { from: at, to: caught },
  }
}

/** Before the throw-in: where the five of a press wait. */
export function waitingScene(shape: '1-2-1-1' | '2-2-1', seed: number, random: Random): StillSpec {
  const spots: At[] =
    shape === '1-2-1-1'
      ? [
          { x: 0.025, y: 0.62 },
          { x: 0.2, y: 0.32 },
          { x: 0.19, y: 0.74 },
          { x: 0.4, y: 0.5 },
          { x: 0.62, y: 0.5 },
        ]
      : [
          { x: 0.22, y: 0.36 },
          { x: 0.22, y: 0.66 },
          { x: 0.45, y: 0.24 },
          { x: 0.45, y: 0.8 },
          { x: 0.7, y: 0.5 },
        ]
  const first = spots[0] ?? { x: 0, y: 0.5 }
  const thrower = { x: -0.025, y: 0.69 }
  return {
    seed,
    look: { x: 0.16, y: 0.6 },
    zoom: 0.92,
    players: [
      stand('white', 'hold', thrower),
      stand('dark', shape === '1-2-1-1' ? 'arms-up' : 'arms-wide', first),
      ...loosened(
        [
          ...spots.slice(1).map((at) => stand('dark', 'arms-wide', at)),
          stand('white', 'call', { x: 0.13, y: 0.7 }),
          stand('white', 'ready', { x: 0.17, y: 0.42 }),
          stand('white', 'run', { x: 0.38, y: 0.86 }),
          stand('white', 'run', { x: 0.38, y: 0.14 }),
        ],
        random,
      ),
    ],
    ring: thrower,
    room: null,
    pass: null,
  }
}
