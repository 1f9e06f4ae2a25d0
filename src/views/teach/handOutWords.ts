import type { CopyRow, OpeningRow } from '@shared/sheets/handOut'
import { listed } from '@shared/practices/script'

export interface Reader {
  squadPlayerId: string
  firstName: string
  jersey: number
}

/** What a player has: this version opened, only an older one, or none yet. */
export type Has = 'this' | 'older' | 'none'

export const HAS_WORDS: Record<Has, string> = {
  this: 'has this version',
  older: 'has an older one open',
  none: 'has not opened any',
}

/** Whether each reader opened this version, else an older one. */
export function hasOf(
  readers: readonly Reader[],
  opened: readonly OpeningRow[],
  before: readonly OpeningRow[],
): { reader: Reader; has: Has }[] {
  const by = (rows: readonly OpeningRow[]) => new Set(rows.map(({ squadPlayerId }) => squadPlayerId))
  const [now, then] = [by(opened), by(before)]
  return readers.map((reader) => ({
    reader,
    has: now.has(reader.squadPlayerId) ? 'this' : then.has(reader.squadPlayerId) ? 'older' : 'none',
  }))
}

/** "7 given out, 5 in the bag, none back yet." */
export function paperWords(copies: readonly CopyRow[]): string {
  const of = (place: CopyRow['place']) => copies.filter((copy) => copy.place === place).length
  const [out, bag, back] = [of('out'), of('bag'), of('back')]
  if (copies.length === 0) return 'No paper yet.'
  return `${out === 0 ? 'None' : out} given out, ${bag === 0 ? 'none' : bag} in the bag, ${
    back === 0 ? 'none back yet' : `${back} back`
  }.`
}

const PLACE_WORDS = { bag: 'in the bag', out: 'given out', back: 'back' } as const

/** "Number 3, Imara’s, given out" */
export function copyWords({ number, name, place }: CopyRow): string {
  const whose = name === null ? 'for anybody' : `${name}’s`
  return `Number ${number}, ${whose}, ${place === null ? '' : PLACE_WORDS[place]}`
}

const NEXT = { bag: 'out', out: 'back', back: 'bag' } as const
const NEXT_WORDS = { bag: 'Give it out', out: 'Take it back', back: 'Put it in the bag again' } as const

/** What a press on a paper does with it. */
export const nextPlace = (place: NonNullable<CopyRow['place']>) => ({
  to: NEXT[place],
  words: NEXT_WORDS[place],
})

/** How the letters fare, in a sentence for each state there is. */
export function letterWords(letters: readonly CopyRow[]): string[] {
  if (letters.length === 0) return ['Nothing sent yet.']
  const own = letters.filter(({ way }) => way === 'mail').length
  const guardians = letters.length - own
  const many = (count: number, word: string) => `${count} ${count === 1 ? word : `${word}s`}`
  const to = [
    own > 0 ? many(own, 'own address').replace('addresss', 'addresses') : '',
    guardians > 0 ? many(guardians, 'guardian') : '',
  ]
    .filter(Boolean)
    .join(' and ')
  const state = (words: string, ...states: string[]) => {
    const count = letters.filter(({ letter }) => letter !== null && states.includes(letter.state)).length
    return count > 0 ? `${count} ${words}` : ''
  }
  return [
    `To ${to}: guardians get numbers, not names.`,
    [
      state('sent', 'sent'),
      state('on the way', 'waiting', 'sending'),
      state('kept here, no mail server is set', 'kept'),
      state('could not be delivered', 'failed'),
      state('stopped', 'withdrawn'),
    ]
      .filter(Boolean)
      .join(', ') + '.',
  ]
}

/** "Freya, Wren and Bea still see version 1." */
export function olderWords(has: readonly { reader: Reader; has: Has }[], older: number): string {
  const names = has.filter((one) => one.has === 'older').map(({ reader }) => reader.firstName)
  if (names.length === 0) return ''
  return `${listed(names)} still ${names.length === 1 ? 'sees' : 'see'} version ${older}.`
}
