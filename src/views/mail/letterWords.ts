import type { MailRow } from '@shared/mail/schemas'
import { dayAndTime } from '@/composables/when'

export type MailState = MailRow['state']

/** What a letter is, as a coach says it. */
export const KIND_WORDS: Record<MailRow['kind'], string> = {
  invitation: 'Invitation',
  'new-password': 'New password',
  sheet: 'Sheet',
  'sheet-recalled': 'Sheet taken back',
}

/** States in the order of the filter. */
export const STATE_WORDS: Record<MailState, string> = {
  waiting: 'Waits',
  sending: 'Leaving now',
  sent: 'Sent',
  failed: 'Did not arrive',
  kept: 'Kept here',
  withdrawn: 'Stopped',
}

/** Where a letter stands, when, and whether somebody has to look at it. */
export interface LetterState {
  label: string
  detail: string
  /** Needs a hand. */
  flag: boolean
}

const triesWords = (tries: number): string => (tries === 1 ? 'Tried once.' : `Tried ${tries} times.`)

/** @param server whether a mail server is set */
export function stateOf(row: MailRow, timeZone: string, server: boolean): LetterState {
  const at = (instant: string | null) => (instant === null ? '' : dayAndTime(instant, timeZone))
  const label = STATE_WORDS[row.state]
  switch (row.state) {
    case 'waiting':
      return row.trouble === null
        ? { label, detail: 'It leaves within a minute.', flag: false }
        : {
            label,
            detail: `${row.trouble} ${triesWords(row.tries)} Next on ${at(row.nextTryAt)}.`,
            flag: false,
          }
    case 'sent':
      return { label, detail: at(row.sentAt), flag: false }
    case 'failed':
      return { label, detail: [row.trouble ?? '', triesWords(row.tries)].join(' ').trim(), flag: true }
    case 'kept':
      return {
        label,
        detail: server
          ? 'It was written before there was a mail server. Send it, or stop it.'
          : 'Copy the words and send them yourself.',
        flag: true,
      }
    case 'sending':
    case 'withdrawn':
      return { label, detail: '', flag: false }
  }
}

/** What can be done with a letter as it stands; null where there is nothing. */
export function againWord(row: MailRow, server: boolean): string | null {
  if (!server) return null
  if (row.state === 'kept') return 'Send it'
  return row.state === 'failed' || (row.state === 'waiting' && row.tries > 0) ? 'Try again' : null
}

export const canStop = ({ state }: MailRow): boolean =>
  state === 'waiting' || state === 'failed' || state === 'kept'

/** The sentence under the page's name. */
export function totalWords(total: number, state: MailState | null): string {
  const letters = total === 1 ? '1 letter' : `${total} letters`
  return state === null ? `${letters}, newest first.` : `${letters}: ${STATE_WORDS[state].toLowerCase()}.`
}

/** The state of an address's query, or null for all. */
export const stateInQuery = (value: unknown): MailState | null =>
  typeof value === 'string' && Object.hasOwn(STATE_WORDS, value) ? (value as MailState) : null

/** The page of an address's query, from 1. */
export function pageInQuery(value: unknown): number {
  const page = Number(value)
  return Number.isInteger(page) && page > 0 ? page : 1
}
