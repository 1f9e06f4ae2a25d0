import type { StillRow } from '@shared/possessions/schemas'
import { day } from '@/composables/when'

/** What the guardians of our own players have said to pictures of them. */
export interface Consent {
  yes: number
  no: number
  notAsked: number
}

const NUMBERS = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten']
/** A small number as a word. */
export const numberWord = (n: number): string => NUMBERS[n] ?? String(n)
const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1)

/** Whose players a still shows, and whose consent there is. */
export function whoseWords(ours: boolean, opponent: string, consent: Consent | null): [string, string] {
  if (!ours)
    return [
      opponent === '' ? 'Minors of other clubs.' : `Minors of two other clubs, one of them ${opponent}.`,
      'We hold no consent for them.',
    ]
  const theirs = `Minors of ours and of ${opponent === '' ? 'another club' : opponent}.`
  if (consent === null) return [theirs, 'We hold no consent for theirs; look up ours in the squad.']
  const { no, notAsked } = consent
  if (no + notAsked === 0) return [theirs, 'No consent for theirs; all guardians of ours have said yes.']
  const parts = [
    no > 0 ? `${numberWord(no)} said no` : '',
    notAsked > 0 ? `${numberWord(notAsked)} ${notAsked === 1 ? 'has' : 'have'} not answered` : '',
  ].filter(Boolean)
  return [theirs, `No consent for theirs; of our guardians ${parts.join(' and ')}. Blur theirs and those.`]
}

/** Who may see it, and how many faces can be made out. */
export function facesWords({ facesLeft, blurred }: Pick<StillRow, 'facesLeft' | 'blurred'>): string {
  if (facesLeft === null) return 'Only staff see this picture. Nobody has counted the faces on it yet.'
  if (facesLeft === 0)
    return blurred > 0
      ? `No face is left on it; ${numberWord(blurred)} ${blurred === 1 ? 'is' : 'are'} blurred. It may go into the staff’s report, and still goes by no mail.`
      : 'No face can be made out on it. It may go into the staff’s report, and still goes by no mail.'
  const all = facesLeft + blurred
  const until = all === 1 ? 'its one face is blurred' : `all ${numberWord(all)} faces are blurred`
  const done =
    blurred === 0 ? 'None is done' : `${capital(numberWord(blurred))} ${blurred === 1 ? 'is' : 'are'} done`
  return `Only staff see this picture until ${until}. ${done}.`
}

/** When it goes, e.g. "It goes for good after Wed 30 June 2027." */
export const goesWords = (expiresOn: string | null): string =>
  expiresOn === null
    ? 'It goes for good when the season ends.'
    : `It goes for good after ${day(expiresOn)} ${expiresOn.slice(0, 4)}.`
