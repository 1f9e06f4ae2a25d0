import type { z } from 'zod'
import type { SquadPlayerBody } from '@shared/squad/schemas'
import { localDay } from './days'

export type DemoSquadPlayer = z.input<typeof SquadPlayerBody> & { key: string }

type Levels = readonly [
  handle: number,
  throwIn: number,
  longArm: number,
  decide: number,
  sprint: number,
  screen: number,
]

const player = (jersey: number, firstName: string, lastName: string, levels: Levels): DemoSquadPlayer => ({
  key: firstName.toLowerCase(),
  jersey,
  firstName,
  lastName,
  skills: {
    handle: levels[0],
    'throw-in': levels[1],
    'long-arm': levels[2],
    decide: levels[3],
    sprint: levels[4],
    screen: levels[5],
  },
  outUntil: null,
})

/** Twelve invented players: three who handle under pressure, two long arms, few who decide well in the middle. */
export const DEMO_SQUAD: readonly DemoSquadPlayer[] = [
  player(4, 'Nell', 'Tavish', [3, 1, 1, 2, 2, 1]),
  player(5, 'Wren', 'Castell', [1, 0, 0, 1, 3, 1]),
  player(6, 'Mina', 'Ashgrove', [1, 1, 1, 0, 1, 2]),
  player(7, 'Imara', 'Boyce', [1, 1, 0, 1, 3, 1]),
  player(9, 'Rosa', 'Verran', [2, 1, 0, 1, 2, 1]),
  player(10, 'Bea', 'Quill', [0, 1, 1, 1, 1, 2]),
  player(11, 'Ada', 'Marsh', [2, 2, 1, 3, 2, 2]),
  player(13, 'Cleo', 'Amadi', [1, 1, 0, 1, 2, 2]),
  player(14, 'Juno', 'Pell', [0, 0, 1, 0, 2, 1]),
  player(15, 'Freya', 'Holm', [1, 1, 1, 2, 2, 2]),
  player(18, 'Hanne', 'Solvik', [0, 2, 2, 1, 0, 3]),
  player(22, 'Tess', 'Okonjo', [0, 3, 3, 2, 1, 2]),
]

/** Days that Freya is out: through the game at Choose and a day past it. */
const FREYA_OUT_DAYS = 4

/** The squad as it stands today: Freya is out for the next game. */
export function demoSquad(now: Date, timeZone: string): DemoSquadPlayer[] {
  return DEMO_SQUAD.map((one) =>
    one.key === 'freya' ? { ...one, outUntil: localDay(now, timeZone, FREYA_OUT_DAYS) } : one,
  )
}
