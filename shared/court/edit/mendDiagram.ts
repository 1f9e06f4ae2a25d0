import { Diagram, DefenderId, Role, type Move, type Place, type Step, type Word } from '../diagram'
import { clamped, fieldsOf, listOf, numberOf, oneOf, Reading, type Fields } from './reading'
import { BEND, LEAST_PLACE, MOST_PLACE, STEPS, MOVES, LAST_BEAT, TITLE, WORD, WORDS } from './bounds'

/** Further off the court than this a place is a mistake and not a slip of the hand; fractions. */
const NEAR = 0.5

const FLIGHTS = ['straight', 'lob', 'bounce'] as const

/**
 * A drawing out of anything. What is safe is mended and said: numbers a little out of bounds, missing titles and
 * order, a flight that we do not know. Whatever would change what the drawing means is refused with its place.
 */
export function mendDiagram(raw: unknown, reading: Reading, at = 'diagram'): Diagram | null {
  const fields = fieldsOf(raw)
  if (!fields) {
    reading.refuse(at, 'There is no drawing in it.')
    return null
  }
  if (fields['version'] !== 1 || (fields['frame'] ?? 1) !== 1) {
    reading.refuse(
      `${at}.version`,
      'This drawing is of a version that is not known here. Bring the newest one.',
    )
    return null
  }
  const before = reading.refused.length
  const start = mendStart(fields['start'], reading, `${at}.start`)
  const steps = mendSteps(fields['steps'], reading, `${at}.steps`)
  if (!start || !steps || reading.refused.length > before) return null
  return Diagram.parse({ version: 1, frame: 1, start, steps })
}

function mendStart(raw: unknown, reading: Reading, at: string): Diagram['start'] | null {
  const fields = fieldsOf(raw)
  const ours = listOf(fields?.['ours'])
  if (!fields || !ours) {
    reading.refuse(at, 'It does not say where our five stand.')
    return null
  }
  const five = standing(ours, 'role', Role.options, reading, `${at}.ours`).map(({ id, at: place }) => ({
    role: id,
    at: place,
  }))
  if (five.length !== 5) {
    reading.refuse(`${at}.ours`, `There must be five of ours, 1 to 5; it has ${five.length}.`)
    return null
  }
  const theirs = standing(listOf(fields['theirs']) ?? [], 'id', DefenderId.options, reading, `${at}.theirs`)
  const ball = oneOf(Role.options, fields['ball'])
  if (!ball) {
    reading.refuse(`${at}.ball`, 'It does not say who of ours, 1 to 5, starts with the ball.')
    return null
  }
  return { ours: five, theirs, ball }
}

/** Who stands where; a second entry for somebody who already stands is left out. */
function standing<T extends string>(
  list: readonly unknown[],
  name: string,
  ids: readonly T[],
  reading: Reading,
  at: string,
): { id: T; at: Place }[] {
  const found = new Map<T, { id: T; at: Place }>()
  list.forEach((raw, i) => {
    const fields = fieldsOf(raw)
    const id = oneOf(ids, fields?.[name])
    if (!id) return reading.refuse(`${at}.${i}`, `Nobody is called that. Choose one of: ${ids.join(', ')}.`)
    if (found.has(id)) return reading.mend(`${id} stood in the drawing twice; the first place is kept.`)
    const place = mendPlace(fields?.['at'], reading, `${at}.${i}.at`, id)
    if (place) found.set(id, { id, at: place })
  })
  return [...found.values()]
}

function mendPlace(raw: unknown, reading: Reading, at: string, who: string): Place | null {
  const fields = fieldsOf(raw)
  const [x, y] = [numberOf(fields?.['x']), numberOf(fields?.['y'])]
  if (x === null || y === null) {
    reading.refuse(at, `The place of ${who} is missing: x and y, 0 to 1.`)
    return null
  }
  const place = {
    x: clamped(x, LEAST_PLACE.x, MOST_PLACE.x),
    y: clamped(y, LEAST_PLACE.y, MOST_PLACE.y),
  }
  if (Math.abs(place.x - x) > NEAR || Math.abs(place.y - y) > NEAR) {
    reading.refuse(at, `The place of ${who} is far off the court. Places are shares of the court, 0 to 1.`)
    return null
  }
  if (place.x !== x || place.y !== y) reading.mend(`${who} stood too far off the court and was moved in.`)
  return place
}

function mendSteps(raw: unknown, reading: Reading, at: string): Step[] | null {
  const list = listOf(raw)
  if (!list || list.length === 0) {
    reading.refuse(at, 'It has no steps.')
    return null
  }
  if (list.length > STEPS) {
    reading.refuse(at, `It has ${list.length} steps; a counter has at most ${STEPS}.`)
    return null
  }
  return list.map((one, i) => mendStep(one, i, reading, `${at}.${i}`))
}

function mendStep(raw: unknown, index: number, reading: Reading, at: string): Step {
  const fields = fieldsOf(raw) ?? {}
  const given = typeof fields['title'] === 'string' ? fields['title'].trim() : ''
  if (given === '') reading.mend(`Step ${index + 1} had no title.`)
  if (given.length > TITLE) reading.mend(`The title of step ${index + 1} was cut to ${TITLE} characters.`)
  const title = given.slice(0, TITLE).trim() || `Step ${index + 1}`
  const list = listOf(fields['moves'])
  if (!list) reading.refuse(at, `Step ${index + 1} has no list of moves.`)
  if (list && list.length > MOVES)
    reading.refuse(at, `Step ${index + 1} has ${list.length} moves; a step has at most ${MOVES}.`)
  const moves = (list ?? []).slice(0, MOVES).flatMap((one, i) => {
    const move = mendMove(one, reading, `${at}.moves.${i}`, `Step ${index + 1}, move ${i + 1}`)
    return move ? [move] : []
  })
  const words = mendWords(fields['words'], `Step ${index + 1}`, reading)
  return words.length > 0 ? { title, moves, words } : { title, moves }
}

/** What is written on the court changes nothing of the play: what is no word is left out, and said. */
function mendWords(raw: unknown, name: string, reading: Reading): Word[] {
  if (raw === undefined) return []
  const words = (listOf(raw) ?? [raw]).flatMap((one): Word[] => {
    const fields = fieldsOf(one)
    const text = typeof fields?.['text'] === 'string' ? fields['text'].replace(/\s+/g, ' ').trim() : ''
    const placed = new Reading()
    const at = mendPlace(fields?.['at'], placed, '', name)
    if (text === '' || !at) {
      reading.mend(`${name}: something written on the court could not be read and was left out.`)
      return []
    }
    if (text.length > WORD) reading.mend(`${name}: a word on the court was cut to ${WORD} characters.`)
    if (placed.mended.length > 0)
      reading.mend(`${name}: a word was written too far off the court and was moved in.`)
    return [{ text: text.slice(0, WORD).trim(), at }]
  })
  if (words.length > WORDS) reading.mend(`${name}: of the words on the court the first ${WORDS} are kept.`)
  return words.slice(0, WORDS)
}

function mendMove(raw: unknown, reading: Reading, at: string, name: string): Move | null {
  const fields = fieldsOf(raw)
  const kind = oneOf(['cut', 'dribble', 'pass', 'screen', 'theirs'] as const, fields?.['kind'])
  if (!fields || !kind) {
    reading.refuse(at, `${name}: no such kind of move. Choose one of: cut, dribble, pass, screen, theirs.`)
    return null
  }
  const role = (field: string) => named(Role.options, fields, field, reading, at, name)
  const beat = within(fields, 'beat', 0, LAST_BEAT, reading, name, Math.round)
  if (kind === 'pass') {
    const [from, to] = [role('from'), role('to')]
    const flight = fields['flight'] === undefined ? 'straight' : oneOf(FLIGHTS, fields['flight'])
    if (!flight) reading.mend(`${name}: a pass of a flight we do not know; it is straight now.`)
    if (!from || !to) return null
    return { kind, from, to, flight: flight ?? 'straight', throwIn: fields['throwIn'] === true, beat }
  }
  const to = mendPlace(fields['to'], reading, `${at}.to`, name)
  if (kind === 'screen') {
    const [who, free] = [role('who'), role('for')]
    return who && free && to ? { kind, who, to, for: free, blind: fields['blind'] === true, beat } : null
  }
  const bend = within(fields, 'bend', -BEND, BEND, reading, name)
  if (kind === 'theirs') {
    const who = named(DefenderId.options, fields, 'who', reading, at, name)
    return who && to ? { kind, who, to, bend, beat } : null
  }
  const who = role('who')
  return who && to ? { kind, who, to, bend, beat } : null
}

function named<T extends string>(
  ids: readonly T[],
  fields: Fields,
  field: string,
  reading: Reading,
  at: string,
  name: string,
): T | null {
  const id = oneOf(ids, fields[field])
  if (!id)
    reading.refuse(`${at}.${field}`, `${name}: nobody is called that. Choose one of: ${ids.join(', ')}.`)
  return id
}

/** A number that may be missing (0), brought into its bounds. */
function within(
  fields: Fields,
  field: string,
  least: number,
  most: number,
  reading: Reading,
  name: string,
  round: (value: number) => number = (value) => value,
): number {
  if (fields[field] === undefined) return 0
  const value = numberOf(fields[field]) ?? 0
  const taken = clamped(round(value), least, most) + 0
  if (taken !== fields[field]) reading.mend(`${name}: its ${field} was out of bounds and is ${taken} now.`)
  return taken
}
