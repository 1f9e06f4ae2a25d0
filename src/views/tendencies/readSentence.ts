import { spotPhrase } from '@shared/tendencies/habits'
import type { Tendency } from '@shared/tendencies/schemas'
import { DENIED, labelOf, LANES, SHAPES, SHAPE_VARIANTS, TRAP_CUES } from '@shared/vocabulary'
import { isGiven, type Given } from './given'
import { capital, listed, our, plain, their, type Segment } from './segments'

/** Under this many rows nothing is said but that it is too little (RECORD.md section 4: a sighting). */
const ENOUGH = 5
/** Habits named in one sentence; the list has the rest. */
const MOST = 4

const SHAPE_PHRASES: Record<string, string> = {
  person: 'take a player each',
  'other-zone': 'stand in another zone',
}

type Counts = ReadonlyMap<string, Tendency>

/**
 * The read as two or three sentences, written from the strongest claims. It says 'usually' and 'rarely' only
 * where a count is claimed so; where no claim holds it gives the count, and where too little was seen it says
 * that. `lead` names the situation ("After made free throws"); empty for all of them. `given`: what the situation
 * itself asks for and so is no news.
 */
export function readSentence(
  tendencies: readonly Tendency[],
  lead = '',
  given: readonly Given[] = [],
): Segment[] {
  const counts: Counts = new Map(tendencies.map((tendency) => [tendency.key, tendency]))
  if (tendencies.every(({ n }) => n < ENOUGH))
    return [plain(opening(lead, 'not enough seen to say anything.'))]
  const open = tendencies.filter(({ key }) => !isGiven(key, given))
  if (isGiven('press', given)) return [...habits(open, lead), ...room(tendencies)]
  return [...pressed(counts, lead), ...habits(open, null), ...room(tendencies)]
}

const opening = (lead: string, words: string): string => (lead === '' ? capital(words) : `${lead} ${words}`)
const enough = (tendency: Tendency): boolean => tendency.n >= ENOUGH
const usual = (tendency: Tendency): boolean => tendency.claim === 'usually' && enough(tendency)

function pressed(counts: Counts, lead: string): Segment[] {
  const press = counts.get('press')
  if (!press || !enough(press)) return [plain(opening(lead, 'not enough seen to say whether they press.'))]
  const { claim, k, n } = press
  if (claim === 'unclear')
    return [plain(`${opening(lead, 'they')} `), their(`pressed ${k} of ${n}`), plain('.')]
  const start = press.thin ? 'a hint so far: they' : 'they'
  return [plain(`${opening(lead, start)} ${claim} `), their('press'), plain('.')]
}

/** Every habit given pressed that can stand in the sentence, most telling first, as "they …". */
function phrases(tendencies: readonly Tendency[]): { tendency: Tendency; words: string }[] {
  const said = tendencies.flatMap((tendency) => {
    const words = phraseOf(tendency.key)
    return words === null ? [] : [{ tendency, ...words }]
  })
  return said.sort((a, b) => a.place - b.place || (b.tendency.rate ?? 0) - (a.tendency.rate ?? 0))
}

function phraseOf(key: string): { place: number; words: string } | null {
  const [kind = '', value = '', side = ''] = key.split(':')
  switch (kind) {
    case 'pickup':
      return { place: 0, words: 'pick up full court' }
    case 'shape':
      return {
        place: 1,
        words: SHAPE_PHRASES[value] ?? `stand in a ${labelOf(SHAPES, value)}`,
      }
    case 'variant':
      return { place: 2, words: `play it as ${labelOf(SHAPE_VARIANTS, value)}` }
    case 'trap-at':
      // One side of a spot is told under the spot itself.
      return side === 'left' || side === 'right'
        ? null
        : { place: 3, words: `trap ${spotPhrase(value, side)}` }
    case 'trap':
      return { place: 4, words: 'trap' }
    case 'cue':
      return { place: 5, words: `trap ${labelOf(TRAP_CUES, value)}` }
    case 'deny':
      return { place: 6, words: `deny ${labelOf(DENIED, value)}` }
    case 'trap-again':
      return { place: 7, words: 'trap again' }
    case 'mirror':
      return { place: 8, words: 'mirror the thrower' }
    case 'thrower-free':
      return { place: 8, words: 'leave the thrower free' }
    case 'safety-leaves-early':
      return { place: 9, words: 'send the safety early' }
    case 'safety-home':
      return { place: 9, words: 'keep the safety home' }
    case 'all-out':
      return { place: 10, words: 'pressure the ball and deny two' }
    case 'light':
      return { place: 10, words: 'contain and deny nobody' }
    case 'sag':
      return { place: 11, words: 'sag on a weak handler' }
    case 'disguise':
      return { place: 12, words: 'show one shape and play another' }
    default:
      return null
  }
}

/** `lead` opens the first sentence; null when one about pressing stands before. */
function habits(tendencies: readonly Tendency[], lead: string | null): Segment[] {
  const they = lead === null ? 'when they press, they' : 'they'
  const all = phrases(tendencies)
  const claimed = all.filter(({ tendency }) => usual(tendency))
  const steady = claimed.filter(({ tendency }) => !tendency.thin)
  const used = merged(steady.length > 0 ? steady : claimed).slice(0, MOST)
  if (used.length === 0) {
    const unclear = all.some(({ tendency }) => enough(tendency))
    const words = unclear ? 'how they do it is not clear yet.' : 'not enough seen to say how.'
    return [plain(lead === null ? ` ${capital(words)}` : opening(lead, words))]
  }
  const start = steady.length > 0 ? they : `a hint so far: ${they}`
  const opened = lead === null ? ` ${capital(start)}` : opening(lead, start)
  return [plain(`${opened} usually `), their(listed(used)), plain('.')]
}

/** "trap in a deep corner" and "trap on the catch" become one; "trap" alone goes when a place or cue says more. */
function merged(claimed: readonly { tendency: Tendency; words: string }[]): string[] {
  const cue = claimed.find(({ tendency }) => tendency.key.startsWith('cue:'))
  const place = claimed.find(({ tendency }) => tendency.key.startsWith('trap-at:'))
  return claimed.flatMap((one) => {
    if (one.tendency.key === 'trap' && (cue || place)) return []
    if (one === cue && place) return []
    if (one === place && cue) return [`${one.words} ${cue.words.replace(/^trap /, '')}`]
    return [one.words]
  })
}

function room(tendencies: readonly Tendency[]): Segment[] {
  const lanes = tendencies.filter(({ key }) => key.startsWith('leave-open:'))
  const open = lanes.filter(usual).sort((a, b) => (b.rate ?? 0) - (a.rate ?? 0))
  if (open.length > 0) {
    const names = listed(open.map(({ key }) => labelOf(LANES, key.slice('leave-open:'.length))))
    const hint = open.every(({ thin }) => thin) ? 'A hint: they' : 'They'
    return [plain(' '), our(`${hint} usually leave ${names} open on the trap.`)]
  }
  return [
    plain(
      lanes.some(enough)
        ? ' Where they leave room is not clear yet.'
        : ' Not enough seen to say where they leave room.',
    ),
  ]
}
