import type { InvitationRow, MemberRow, PeoplePage } from '@shared/people/schemas'
import { labelOf, TEAM_ROLES, type TeamRole } from '@shared/vocabulary'
import { shortDay } from '@/composables/when'

/** What a role may do, in a line. */
export const MAY: Record<TeamRole, string> = {
  'head-coach': 'picks and signs off, writes the rules, brings people in and erases',
  'assistant-coach': 'logs, reads, draws counters, hands out; does not pick',
  player: 'opens her own sheet, nothing else',
}

const capital = (words: string) => words.charAt(0).toUpperCase() + words.slice(1)
export const roleName = (role: TeamRole): string => capital(labelOf(TEAM_ROLES, role))

const SMALL = 'No One Two Three Four Five Six Seven Eight Nine Ten Eleven Twelve'.split(' ')
const counted = (count: number, one: string, more: string) =>
  `${SMALL[count] ?? String(count)} ${count === 1 ? one : more}`

/** "Four on the staff and ten players, nine with an account. Two invitations are out." */
export function peopleSentence({ members, players, invitations }: PeoplePage): string {
  const staff = members.filter(({ role }) => role !== 'player').length
  const accounts = players.filter(({ memberId }) => memberId !== null).length
  const out = invitations.filter(({ state }) => state === 'out').length
  const squad =
    players.length === 0
      ? 'nobody in the squad'
      : `${counted(players.length, 'player', 'players').toLowerCase()}, ${counted(accounts, 'has', 'have').toLowerCase()} an account`
  return `${SMALL[staff] ?? String(staff)} on the staff and ${squad}. ${counted(out, 'invitation is', 'invitations are')} out.`
}

const LETTERS: Record<NonNullable<InvitationRow['letter']>, string> = {
  waiting: 'The letter is about to leave.',
  sending: 'The letter is leaving.',
  sent: 'The letter has left.',
  failed: 'The letter did not get through.',
  kept: 'The letter is kept under Letters: no mail server is set.',
  withdrawn: '',
}

/** Who it is for: an address, a player, or whoever has the link. */
export const invitedName = (row: InvitationRow): string =>
  row.usedBy ?? row.email ?? (row.playerName === null ? 'A link' : `A link for ${row.playerName}`)

/** "assistant coach, copied Mon 16 Mar. Works once, ends Tue 24 Mar" */
export function invitationWords(row: InvitationRow, timeZone: string): string {
  const on = (instant: string) => shortDay(instant, timeZone)
  const role = labelOf(TEAM_ROLES, row.role)
  const whom = row.role === 'player' && row.playerName !== null ? `${role} ${row.playerName}` : role
  if (row.state === 'used') return `${whom}, used ${on(row.usedAt ?? row.updatedAt)}, cannot be used again`
  if (row.state === 'revoked') return `${whom}, taken back ${on(row.updatedAt)}`
  if (row.state === 'expired') return `${whom}, ended ${on(row.expiresAt)} and was not used`
  const way = row.email === null ? 'copied' : 'by mail'
  const letter = row.letter === null ? '' : ` ${LETTERS[row.letter]}`
  return `${whom}, ${way} ${on(row.createdAt)}. Works once, ends ${on(row.expiresAt)}.${letter}`
}

/** Why a member's role cannot be changed or the person taken out; empty when it can. */
export const heldBy = (row: Pick<MemberRow, 'lastHead'>): string =>
  row.lastHead ? 'the only head coach' : ''

export const DAYS = [
  { value: 1, label: 'a day' },
  { value: 3, label: 'three days' },
  { value: 7, label: 'a week' },
  { value: 30, label: 'a month' },
] as const
