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

type Home = Partial<Pick<DemoSquadPlayer, 'guardianEmail' | 'pictureConsent' | 'sprint20'>>

const player = (
  jersey: number,
  firstName: string,
  lastName: string,
  levels: Levels,
  { guardianEmail = null, pictureConsent = 'not-asked', sprint20 = null }: Home = {},
): DemoSquadPlayer => ({
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
  guardianEmail,
  pictureConsent,
  sprint20,
})

/** What a guardian said, and how fast she ran in February's test; no answer without an address to ask at. */
const home = (
  guardian: string | null,
  pictureConsent: Home['pictureConsent'],
  sprint20: number | null,
): Home => ({
  guardianEmail: guardian === null ? null : `${guardian}@mailbox.example`,
  pictureConsent,
  sprint20,
})

/** Twelve invented players: three who handle under pressure, two long arms, few who decide well in the middle. */
export const DEMO_SQUAD: readonly DemoSquadPlayer[] = [
  player(4, 'Nell', 'Tavish', [3, 1, 1, 2, 2, 1], home('ewa.tavish', 'yes', 3.38)),
  player(5, 'Wren', 'Castell', [1, 0, 0, 1, 3, 1], home('joan.castell', 'not-asked', 3.29)),
  player(6, 'Mina', 'Ashgrove', [1, 1, 1, 0, 1, 2], home(null, 'not-asked', 3.71)),
  player(7, 'Imara', 'Boyce', [1, 1, 0, 1, 3, 1], home('d.boyce', 'no', 3.31)),
  player(9, 'Rosa', 'Verran', [2, 1, 0, 1, 2, 1], home('luis.verran', 'yes', 3.46)),
  player(10, 'Bea', 'Quill', [0, 1, 1, 1, 1, 2], home('odd.quill', 'not-asked', 3.74)),
  player(11, 'Ada', 'Marsh', [2, 2, 1, 3, 2, 2], home('joan.marsh', 'yes', 3.49)),
  player(13, 'Cleo', 'Amadi', [1, 1, 0, 1, 2, 2], home('ada.amadi', 'yes', 3.5)),
  player(14, 'Juno', 'Pell', [0, 0, 1, 0, 2, 1], home(null, 'not-asked', null)),
  player(15, 'Freya', 'Holm', [1, 1, 1, 2, 2, 2], home('nils.holm', 'yes', null)),
  player(18, 'Hanne', 'Solvik', [0, 2, 2, 1, 0, 3], home('odd.solvik', 'yes', 3.92)),
  player(22, 'Tess', 'Okonjo', [0, 3, 3, 2, 1, 2], home('ify.okonjo', 'yes', 3.66)),
]

/** Days that Freya is out: through the game at Choose and a day past it. */
const FREYA_OUT_DAYS = 4

/** The squad as it stands today: Freya is out for the next game. */
export function demoSquad(now: Date, timeZone: string): DemoSquadPlayer[] {
  return DEMO_SQUAD.map((one) =>
    one.key === 'freya' ? { ...one, outUntil: localDay(now, timeZone, FREYA_OUT_DAYS) } : one,
  )
}
