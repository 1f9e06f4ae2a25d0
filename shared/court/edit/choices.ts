import { Role as RoleSchema, type DefenderId, type Diagram, type Move, type Place } from '../diagram'
import type { Role } from '../../vocabulary'
import { stateAt } from '../diagramWalk'
import { toMetres, toPlace, inMetres } from '../frame'
import { placeWords } from '../placeWords'
import type { RulePack } from '../rulePacks'
import { heldPlace } from './bounds'
import { isRole, moveOf, openSlot, type How, type Sentence, type SlotName, type Verb } from './sentence'

/** One thing that can be said for a slot: the key that says it, the word, and what it stands for. */
export interface Choice {
  key: string
  word: string
  value: Role | DefenderId | Verb | Place | How
}

const VERBS: Record<Verb, Choice> = {
  cuts: { key: 'c', word: 'cuts', value: 'cuts' },
  passes: { key: 'p', word: 'passes', value: 'passes' },
  dribbles: { key: 'd', word: 'dribbles', value: 'dribbles' },
  screens: { key: 's', word: 'screens', value: 'screens' },
  goes: { key: 'g', word: 'goes', value: 'goes' },
}

/** Spots that are offered by name, from our endline on; their keys are letters in this order. */
const NAMED: readonly Place[] = [
  [0.045, 0.06],
  [0.08, 0.337],
  [0.06, 0.5],
  [0.08, 0.663],
  [0.045, 0.94],
  [0.207, 0.337],
  [0.207, 0.5],
  [0.207, 0.663],
  [0.3, 0.06],
  [0.34, 0.27],
  [0.34, 0.5],
  [0.34, 0.73],
  [0.3, 0.94],
  [0.5, 0.28],
  [0.5, 0.5],
  [0.5, 0.72],
  [0.64, 0.27],
  [0.64, 0.5],
  [0.64, 0.73],
  [0.74, 0.08],
  [0.74, 0.92],
  [0.92, 0.5],
].map(([x = 0, y = 0]) => ({ x, y }))

const PLACES: readonly Choice[] = NAMED.map((place, i) => ({
  key: String.fromCharCode(97 + i),
  word: placeWords(place),
  value: place,
}))

/** What can be said for a slot, as the drawing stands at the end of a step. */
export function choicesFor(diagram: Diagram, step: number, sentence: Sentence, slot: SlotName): Choice[] {
  const { after } = stateAt(diagram, step)
  const ours = RoleSchema.options.map((role) => ({ key: role, word: role, value: role }))
  switch (slot) {
    case 'who':
      return [
        ...ours,
        // X and the figure lie together: the letters under the figures of a keyboard's first row.
        ...[...after.theirs.keys()].map((id) => ({ key: DEFENDER_KEYS[id], word: id, value: id })),
      ]
    case 'does':
      return verbsFor(sentence.who, after.ball, after.ours.get(after.ball))
    case 'to':
      return ours.filter(({ value }) => value !== sentence.who)
    case 'where':
      return [...PLACES]
    case 'how':
      return sentence.does === 'screens'
        ? [
            { key: 'o', word: 'not blind', value: 'open' },
            { key: 'b', word: 'blind', value: 'blind' },
          ]
        : [
            { key: 's', word: 'straight', value: 'straight' },
            { key: 'o', word: 'over the top', value: 'lob' },
            { key: 'b', word: 'on the bounce', value: 'bounce' },
          ]
  }
}

const DEFENDER_KEYS: Record<DefenderId, string> = { X1: 'q', X2: 'w', X3: 'e', X4: 'r', X5: 't' }

/** Who has the ball passes or dribbles; out of bounds a walk with it is along the line. */
function verbsFor(who: Sentence['who'], ball: Role, at: Place | undefined): Choice[] {
  if (!isRole(who)) return [VERBS.goes]
  if (who !== ball) return [VERBS.cuts, VERBS.screens]
  const out = at !== undefined && (at.x < 0 || at.y < 0 || at.y > 1)
  return out ? [VERBS.passes, VERBS.cuts] : [VERBS.passes, VERBS.dribbles]
}

/** Whether the ball is still to be thrown in when a step has been played. */
export const toThrowIn = (diagram: Diagram, step: number): boolean =>
  !diagram.steps
    .slice(0, step + 1)
    .some(({ moves }) => moves.some((move) => move.kind === 'pass' && move.throwIn))

/** Metres between a screen and whoever it is for. */
const BESIDE = 0.9

/** Where a screen for somebody stands: beside them, on the side of the nearest of theirs. */
export function besidePlayer(diagram: Diagram, step: number, role: Role, pack: RulePack): Place {
  const { after } = stateAt(diagram, step)
  const at = toMetres(pack, after.ours.get(role) ?? { x: 0.2, y: 0.5 })
  const others = [...after.theirs.values()].map((place) => toMetres(pack, place))
  const near = others.sort((a, b) => gap(a, at) - gap(b, at))[0]
  const length = near ? gap(near, at) : 0
  const along =
    near && length > 0.01 ? { x: (near.x - at.x) / length, y: (near.y - at.y) / length } : { x: 0, y: -1 }
  return heldPlace(toPlace(pack, inMetres(at.x + along.x * BESIDE, at.y + along.y * BESIDE)))
}

const gap = (a: { x: number; y: number }, b: { x: number; y: number }) => Math.hypot(a.x - b.x, a.y - b.y)

/** The move that a whole sentence adds at the end of a step; null while a slot is open. */
export function nextMove(diagram: Diagram, step: number, sentence: Sentence, pack: RulePack): Move | null {
  if (openSlot(sentence) !== null) return null
  const beside = sentence.to ? besidePlayer(diagram, step, sentence.to, pack) : { x: 0.2, y: 0.5 }
  return moveOf({ ...sentence, throwIn: sentence.does === 'passes' && toThrowIn(diagram, step) }, beside)
}
