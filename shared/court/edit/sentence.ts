import { Role as RoleSchema, type DefenderId, type Move, type Place } from '../diagram'
import type { Role } from '../../vocabulary'
import { placeWords } from '../placeWords'

/** A slot of a move's sentence, in the order they are said. */
export type SlotName = 'who' | 'does' | 'to' | 'where' | 'how'

export type Verb = 'cuts' | 'passes' | 'dribbles' | 'screens' | 'goes'

export type How = 'straight' | 'lob' | 'bounce' | 'open' | 'blind'

/** A move as it is being said. What is not said yet is null. */
export interface Sentence {
  who: Role | DefenderId | null
  does: Verb | null
  /** Whom a pass or a screen is for. */
  to: Role | null
  /** Where a walk or a screen ends; null for a screen: beside whoever it is for. */
  where: Place | null
  how: How | null
  throwIn: boolean
}

export const NOTHING_SAID: Sentence = {
  who: null,
  does: null,
  to: null,
  where: null,
  how: null,
  throwIn: false,
}

/** One word of a sentence: fixed, or a slot; an open slot has no word yet. */
export type Part =
  { kind: 'word'; text: string } | { kind: 'slot'; slot: SlotName; text: string | null; ask: string }

const HOW_WORDS: Record<How, string> = {
  straight: '',
  open: '',
  lob: 'over the top',
  bounce: 'on the bounce',
  blind: 'blind',
}

export const isRole = (who: Role | DefenderId | null): who is Role =>
  RoleSchema.options.some((role) => role === who)

/** A sentence in its words and slots, said in the same words as a drawn move (moveWords). */
export function partsOf(sentence: Sentence): Part[] {
  const { who, does, to, where, how, throwIn } = sentence
  const slot = (name: SlotName, text: string | null, ask: string): Part => ({
    kind: 'slot',
    slot: name,
    text,
    ask,
  })
  const word = (text: string): Part => ({ kind: 'word', text })
  const parts = [slot('who', who, 'who?')]
  if (who === null) return parts
  parts.push(slot('does', throwIn && does === 'passes' ? 'throws in' : does, 'does what?'))
  const manner = (name: How | null): Part[] =>
    name && HOW_WORDS[name] ? [slot('how', HOW_WORDS[name], 'how?')] : []
  if (does === 'passes') parts.push(word('to'), slot('to', to, 'whom?'), ...manner(how))
  else if (does === 'screens') parts.push(...manner(how), word('for'), slot('to', to, 'whom?'))
  else if (does !== null) parts.push(word('to'), slot('where', where && placeWords(where), 'where?'))
  return parts
}

/** The sentence as plain text; an open slot asks. */
export const textOf = (sentence: Sentence): string =>
  partsOf(sentence)
    .map((part) => (part.kind === 'word' ? part.text : (part.text ?? part.ask)))
    .join(' ')

/** The next slot that has to be said; null when the sentence can be drawn. */
export function openSlot(sentence: Sentence): SlotName | null {
  const open = partsOf(sentence).find((part) => part.kind === 'slot' && part.text === null)
  return open?.kind === 'slot' ? open.slot : null
}

/** A drawn move as the sentence that would draw it. */
export function sentenceOf(move: Move): Sentence {
  switch (move.kind) {
    case 'pass':
      return {
        who: move.from,
        does: 'passes',
        to: move.to,
        where: null,
        how: move.flight,
        throwIn: move.throwIn,
      }
    case 'screen':
      return {
        who: move.who,
        does: 'screens',
        to: move.for,
        where: move.to,
        how: move.blind ? 'blind' : 'open',
        throwIn: false,
      }
    case 'theirs':
      return { ...NOTHING_SAID, who: move.who, does: 'goes', where: move.to }
    default:
      return {
        ...NOTHING_SAID,
        who: move.who,
        does: move.kind === 'cut' ? 'cuts' : 'dribbles',
        where: move.to,
      }
  }
}

/**
 * The move that a sentence draws; null while a slot is open. A screen without a place stands at `beside`. The bend of
 * the move it was before is kept.
 */
export function moveOf(sentence: Sentence, beside: Place, before?: Move): Move | null {
  const { who, does, to, where, how, throwIn } = sentence
  const beat = before?.beat ?? 0
  const bend = before && 'bend' in before ? before.bend : 0
  if (who === null || does === null) return null
  if (does === 'goes') return !isRole(who) && where ? { kind: 'theirs', who, to: where, bend, beat } : null
  if (!isRole(who)) return null
  if (does === 'passes') {
    const flight = how === 'lob' || how === 'bounce' ? how : 'straight'
    return to && { kind: 'pass', from: who, to, flight, throwIn, beat }
  }
  if (does === 'screens')
    return to && { kind: 'screen', who, to: where ?? beside, for: to, blind: how === 'blind', beat }
  return where && { kind: does === 'cuts' ? 'cut' : 'dribble', who, to: where, bend, beat }
}

/** A word said for a slot. What no longer fits after it is open again. */
export function say(sentence: Sentence, slot: SlotName, value: unknown): Sentence {
  const next = { ...sentence, [slot]: value } as Sentence
  if (slot === 'who') {
    const verb = next.who !== null && !isRole(next.who) ? 'goes' : next.does === 'goes' ? null : next.does
    return verb === sentence.does ? next : { ...NOTHING_SAID, who: next.who, does: verb }
  }
  if (slot !== 'does' || next.does === sentence.does) return next
  const walks = (verb: Verb | null) => verb === 'cuts' || verb === 'dribbles'
  return {
    ...NOTHING_SAID,
    who: next.who,
    does: next.does,
    where: walks(next.does) && walks(sentence.does) ? next.where : null,
  }
}
