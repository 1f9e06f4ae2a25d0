import { rulePack, type RulePackKey } from '@shared/court/rulePacks'
import { LIMITS } from '@shared/limits'
import type { Coverage, ScoutedGameBody, ScoutedGameRow } from '@shared/scoutedGames/schemas'
import { day } from '@/composables/when'

/** The header of a scouted game while it is being said; numbers as they are typed. */
export interface Header {
  foe: string
  playedOn: string
  seen: ScoutedGameBody['seen'] | ''
  rulePack: RulePackKey
  coverage: Coverage['kind']
  from: string
  to: string
  theirs: string
  foeScore: string
  blowout: boolean
  /** Written elsewhere on the page; the sentence carries them along as they are. */
  notes: string
}

/** The slots of the sentence, in order. */
export const SLOTS = ['foe', 'playedOn', 'seen', 'rulePack', 'coverage', 'score', 'blowout'] as const
export type HeaderSlot = (typeof SLOTS)[number]

export const emptyHeader = (pack: RulePackKey): Header => ({
  foe: '',
  playedOn: '',
  seen: '',
  rulePack: pack,
  coverage: 'all',
  from: '',
  to: '',
  theirs: '',
  foeScore: '',
  blowout: false,
  notes: '',
})

export function headerOf(row: ScoutedGameRow): Header {
  const { coverage, finalScore } = row
  return {
    foe: row.foe,
    playedOn: row.playedOn,
    seen: row.seen,
    rulePack: row.rulePack,
    coverage: coverage.kind,
    from: coverage.kind === 'minutes' ? String(coverage.from) : '',
    to: coverage.kind === 'minutes' ? String(coverage.to) : '',
    theirs: finalScore === null ? '' : String(finalScore.theirs),
    foeScore: finalScore === null ? '' : String(finalScore.foe),
    blowout: row.blowout,
    notes: row.notes,
  }
}

export type HeaderFaults = Partial<Record<HeaderSlot, string>>

/** What is wrong, by slot, with what to do about it. Slots that are only empty are not at fault but open. */
export function faultsOf(header: Header, today: string): HeaderFaults {
  const faults: HeaderFaults = {}
  if (header.foe.trim().length > LIMITS.name) faults.foe = `Use at most ${LIMITS.name} characters.`
  if (header.playedOn > today) faults.playedOn = 'This day is still to come. Say the day they played.'
  if (header.coverage === 'minutes') {
    const [from, to] = [minute(header.from), minute(header.to)]
    if (from === null || to === null) faults.coverage = 'Say both minutes as whole numbers from 0 to 80.'
    else if (from >= to) faults.coverage = 'The end must be later than the start. Change one of them.'
  }
  if ((header.theirs.trim() === '') !== (header.foeScore.trim() === ''))
    faults.score = 'Say both scores, or neither.'
  else if (
    header.theirs.trim() !== '' &&
    (points(header.theirs) === null || points(header.foeScore) === null)
  )
    faults.score = 'Say the points as whole numbers, at most 250.'
  return faults
}

export const isSaid = (header: Header, slot: HeaderSlot): boolean => {
  if (slot === 'foe') return header.foe.trim() !== ''
  if (slot === 'playedOn') return header.playedOn !== ''
  if (slot === 'seen') return header.seen !== ''
  return true
}

/** The first slot still to say; null when the sentence is whole. */
export const nextSlot = (header: Header): HeaderSlot | null =>
  SLOTS.find((slot) => !isSaid(header, slot)) ?? null

/** The body to send; null while something is open or at fault. */
export function bodyOf(header: Header, opponentId: string, today: string): ScoutedGameBody | null {
  const { seen } = header
  if (seen === '' || nextSlot(header) !== null || Object.keys(faultsOf(header, today)).length > 0) return null
  const [theirs, foe] = [points(header.theirs), points(header.foeScore)]
  return {
    opponentId,
    foe: header.foe.trim(),
    playedOn: header.playedOn,
    seen,
    rulePack: header.rulePack,
    coverage:
      header.coverage === 'minutes'
        ? { kind: 'minutes', from: minute(header.from) ?? 0, to: minute(header.to) ?? 0 }
        : { kind: header.coverage },
    blowout: header.blowout,
    finalScore: theirs === null || foe === null ? null : { theirs, foe },
    notes: header.notes,
  }
}

const minute = (text: string): number | null => whole(text, 80)
const points = (text: string): number | null => whole(text, 250)
function whole(text: string, most: number): number | null {
  return /^\d{1,3}$/.test(text.trim()) && Number(text) <= most ? Number(text) : null
}

export const SEEN_WORDS = { film: 'on film', live: 'live' } as const

/** "everything", "throw-ins only", "minutes 8 to 32": what the scout set out to log. */
export function coverageWords(coverage: Coverage): string {
  if (coverage.kind === 'all') return 'everything'
  if (coverage.kind === 'throw-ins') return 'throw-ins only'
  return `minutes ${coverage.from} to ${coverage.to}`
}

export interface SlotWords {
  before: string
  text: string
  after: string
}

/** The sentence, slot by slot, with the words around each. */
export function headerWords(header: Header): Record<HeaderSlot, SlotWords> {
  const { from, to } = header
  const minutes = from !== '' && to !== '' ? `from minute ${from} to ${to}` : 'which minutes?'
  const scored = header.theirs.trim() !== '' && header.foeScore.trim() !== ''
  return {
    foe: { before: 'We watched them against ', text: header.foe.trim() || 'whom?', after: '' },
    playedOn: {
      before: ' on ',
      text: header.playedOn === '' ? 'which day?' : day(header.playedOn),
      after: '',
    },
    seen: {
      before: ', ',
      text: header.seen === '' ? 'live or on film?' : SEEN_WORDS[header.seen],
      after: '',
    },
    rulePack: { before: ', under ', text: rulePack(header.rulePack).label, after: '' },
    coverage: {
      before: ', and logged ',
      text:
        header.coverage === 'all'
          ? 'everything'
          : header.coverage === 'throw-ins'
            ? 'throw-ins only'
            : minutes,
      after: '.',
    },
    score: {
      before: ' It ended ',
      text: scored ? `${header.theirs.trim()} to ${header.foeScore.trim()}` : 'with no score noted',
      after: '',
    },
    blowout: { before: ' and was ', text: header.blowout ? 'decided early' : 'a contest', after: '.' },
  }
}

/** The same as plain words. */
export function headerSentence(header: Header): string {
  const words = headerWords(header)
  return SLOTS.map((slot) => words[slot].before + words[slot].text + words[slot].after).join('')
}
