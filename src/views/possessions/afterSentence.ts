import { FALLBACKS, FINISHES } from '@shared/filmWords'
import { labelOf, NOT_VISIBLE } from '@shared/vocabulary'
import type { Call } from './answer'
import type { Draft } from './draft'
import { filmWords } from './filmClock'
import { sentence } from './filmSentence'
import type { Teller } from './parts'
import type { Slot } from './slots'
import { capital, trapWords } from './words'

/** The rest of what film added: the throw-in, the way up, what came of it, our own call, where it is on film. */
export function afterParts(told: Teller, draft: Draft, calls: readonly Call[]): void {
  entryParts(told, draft)
  countParts(told, draft)
  sentence(told, draft.thief, { field: 'thief' }, 'It was taken by ', '.', 'their', (shirt) =>
    shirt === NOT_VISIBLE ? 'somebody not seen' : `their ${shirt}`,
  )
  sentence(told, draft.pointsAgainst, { field: 'pointsAgainst' }, 'They scored ', ' off it.', 'their', String)
  sentence(told, draft.fallback, { field: 'fallback' }, 'Then they played ', '.', 'their', (value) =>
    value === NOT_VISIBLE ? 'what, not seen' : labelOf(FALLBACKS, value),
  )
  finishParts(told, draft)
  sentence(told, draft.timeOutBurned, { field: 'timeOutBurned' }, '', '.', 'plain', (burned) =>
    burned ? 'A time-out was burned' : 'No time-out was burned',
  )
  callParts(told, draft, calls)
  sentence(told, draft.filmTime, { field: 'filmTime' }, 'On film at ', '.', 'plain', filmWords)
  const note = draft.note === '' ? null : draft.note
  sentence(told, note, { field: 'note' }, 'Note: ', '', 'plain', (text) => text)
}

function entryParts(told: Teller, draft: Draft): void {
  const where: Slot = { field: 'entrySpot' }
  const who: Slot = { field: 'receiver' }
  const place = draft.entrySpot
  if (place === null && draft.receiver === null && !told.isOpen(where) && !told.isOpen(who)) return
  told.text(' The throw-in was caught')
  if (place === NOT_VISIBLE) told.text(' ').said(where, 'where, not seen', 'plain')
  else if (place !== null) {
    const { lead, word } = trapWords(place)
    told.text(lead).said(where, word, 'plain')
  } else if (told.isOpen(where)) told.text(' ').asked(where, 'plain')
  if (draft.receiver !== null)
    told
      .text(' by ')
      .said(who, draft.receiver === NOT_VISIBLE ? 'somebody not seen' : `no. ${draft.receiver}`, 'plain')
  else if (told.isOpen(who)) told.text(' by ').asked(who, 'plain')
  told.text('.')
}

function countParts(told: Teller, draft: Draft): void {
  const passes: Slot = { field: 'passes' }
  const turns: Slot = { field: 'reversals' }
  const hasPasses = draft.passes !== null || told.isOpen(passes)
  const hasTurns = draft.reversals !== null || told.isOpen(turns)
  if (!hasPasses && !hasTurns) return
  told.text(' ')
  if (draft.passes !== null) told.said(passes, capital(many(draft.passes, 'pass', 'passes')), 'plain')
  else if (hasPasses) told.asked(passes, 'plain')
  if (hasPasses && hasTurns) told.text(', ')
  if (draft.reversals !== null) {
    const words = many(draft.reversals, 'change of side', 'changes of side')
    told.said(turns, hasPasses ? words : capital(words), 'plain')
  } else if (hasTurns) told.asked(turns, 'plain')
  told.text('.')
}

function finishParts(told: Teller, draft: Draft): void {
  const finish: Slot = { field: 'finish' }
  const points: Slot = { field: 'points' }
  const hasFinish = draft.finish !== null || told.isOpen(finish)
  const hasPoints = draft.points !== null || told.isOpen(points)
  if (!hasFinish && !hasPoints) return
  told.text(hasFinish ? ' It came to ' : ' It brought ')
  if (draft.finish === NOT_VISIBLE) told.said(finish, 'what, not seen', 'plain')
  else if (draft.finish !== null) told.said(finish, labelOf(FINISHES, draft.finish), 'plain')
  else if (hasFinish) told.asked(finish, 'plain')
  if (hasFinish && hasPoints) told.text(', ')
  if (draft.points !== null) told.said(points, many(draft.points, 'point', 'points'), 'plain')
  else if (hasPoints) told.asked(points, 'plain')
  told.text('.')
}

/** Only a row of one of our own games says what we called. */
function callParts(told: Teller, draft: Draft, calls: readonly Call[]): void {
  sentence(
    told,
    draft.counterId,
    { field: 'counterId' },
    'We called ',
    '.',
    'our',
    (id) => calls.find((call) => call.id === id)?.name ?? 'a counter of ours',
  )
  sentence(told, draft.rightCall, { field: 'rightCall' }, 'It was ', '.', 'our', (right) =>
    right ? 'the right call' : 'the wrong call',
  )
  sentence(told, draft.runWell, { field: 'runWell' }, 'It was ', '.', 'our', (well) =>
    well ? 'run well' : 'not run well',
  )
}

const many = (count: number, one: string, more: string): string =>
  `${count === 0 ? 'no' : count} ${count === 1 ? one : more}`
