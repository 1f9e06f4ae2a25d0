import { FORCED_SIDES } from '@shared/filmWords'
import { DENIED, labelOf, LANES, NOT_VISIBLE, SHAPES, type Term } from '@shared/vocabulary'
import { secondsWords } from './clockWords'
import type { Draft } from './draft'
import type { Teller } from './parts'
import { type Ink } from './parts'
import type { Slot, SlotField } from './slots'
import { HANDLER_WORDS, listWords, ON_BALL_WORDS, THROWER_WORDS } from './words'

type Clause = (told: Teller) => void

/** What film added about the press, in short sentences after the first one. Only what is said or open stands there. */
export function filmParts(told: Teller, draft: Draft): void {
  const they = [
    throwerClause(told, draft),
    severalClause(told, draft, 'denied', {
      list: DENIED,
      before: 'denied ',
      after: '',
      nothing: 'nobody',
      ink: 'their',
    }),
    severalClause(told, draft, 'tookAway', {
      list: LANES,
      before: 'took away ',
      after: '',
      nothing: 'nothing',
      ink: 'their',
    }),
    severalClause(told, draft, 'leftOpen', {
      list: LANES,
      before: 'left ',
      after: ' open',
      nothing: 'nothing',
      ink: 'our',
    }),
    onBallClause(told, draft),
    forcedClause(told, draft),
    shownClause(told, draft),
  ].filter((clause): clause is Clause => clause !== null)
  they.forEach((clause, index) => {
    told.text(index === 0 ? ' They ' : index === they.length - 1 ? ' and ' : ', ')
    clause(told)
  })
  if (they.length > 0) told.text('.')
  sentence(told, draft.handler, { field: 'handler' }, '', ' had the ball.', 'plain', (value) =>
    value === NOT_VISIBLE ? 'Who, not seen,' : HANDLER_WORDS[value],
  )
  sentence(told, draft.goalie, { field: 'goalie' }, 'The safety ', '.', 'their', (value) =>
    value === NOT_VISIBLE ? 'was not in sight' : value === 'home' ? 'stayed home' : 'left early',
  )
  sentence(told, draft.crossedAt, { field: 'crossedAt' }, 'Over half at ', '.', 'plain', secondsWords)
}

/** One short sentence with one word in it, where the word is said or open. */
export function sentence<T>(
  told: Teller,
  value: T | null,
  slot: Slot,
  before: string,
  after: string,
  ink: Ink,
  words: (value: T) => string,
): void {
  if (value === null && !told.isOpen(slot)) return
  told.text(` ${before}`)
  if (value === null) told.asked(slot, ink)
  else told.said(slot, words(value), ink)
  told.text(after)
}

function throwerClause(told: Teller, draft: Draft): Clause | null {
  const slot: Slot = { field: 'throwerGuard' }
  const value = draft.throwerGuard
  if (value === NOT_VISIBLE)
    return (to) => void to.text('did ').said(slot, 'what about the thrower, not seen')
  if (value !== null) return (to) => void to.said(slot, THROWER_WORDS[value])
  return told.isOpen(slot) ? (to) => void to.asked(slot) : null
}

function onBallClause(told: Teller, draft: Draft): Clause | null {
  const slot: Slot = { field: 'onBall' }
  const value = draft.onBall
  if (value === NOT_VISIBLE) return (to) => void to.text('played the ball ').said(slot, 'how, not seen')
  if (value !== null) return (to) => void to.said(slot, ON_BALL_WORDS[value])
  return told.isOpen(slot) ? (to) => void to.text('were ').asked(slot) : null
}

function forcedClause(told: Teller, draft: Draft): Clause | null {
  const slot: Slot = { field: 'forcedSide' }
  const value = draft.forcedSide
  if (value === NOT_VISIBLE) return (to) => void to.text('steered it ').said(slot, 'which way, not seen')
  if (value !== null) return (to) => void to.text('steered it ').said(slot, labelOf(FORCED_SIDES, value))
  return told.isOpen(slot) ? (to) => void to.text('steered it ').asked(slot) : null
}

function shownClause(told: Teller, draft: Draft): Clause | null {
  const slot: Slot = { field: 'shownShape' }
  const value = draft.shownShape
  if (value !== null) return (to) => void to.text('first showed ').said(slot, labelOf(SHAPES, value))
  return told.isOpen(slot) ? (to) => void to.text('first showed ').asked(slot) : null
}

interface Several {
  list: readonly Term[]
  before: string
  after: string
  nothing: string
  ink: Ink
}

function severalClause(
  told: Teller,
  draft: Draft,
  field: Extract<SlotField, 'denied' | 'tookAway' | 'leftOpen'>,
  { list, before, after, nothing, ink }: Several,
): Clause | null {
  const slot: Slot = { field }
  const value = draft[field]
  if (value === null)
    return told.isOpen(slot) ? (to) => void to.text(before).asked(slot, ink).text(after) : null
  const words =
    value === NOT_VISIBLE
      ? field === 'denied'
        ? 'whom, not seen'
        : 'what, not seen'
      : value.length === 0
        ? nothing
        : listWords(value.map((each) => labelOf(list, each)))
  return (to) =>
    void to
      .text(before)
      .said(slot, words, ink)
      .text(value === NOT_VISIBLE ? '' : after)
}
