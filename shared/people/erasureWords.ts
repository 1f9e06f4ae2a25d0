/**
 * The two lists of an erasure, in the order they are read. What is not listed is not touched: the product does not
 * look into pictures or into words that the staff wrote.
 */
export const GOES = {
  name: 'name and shirt number',
  skills: 'levels and the sprint',
  guardian: 'guardian’s address',
  consent: 'answer to pictures',
  account: 'account, with its address and password',
  membership: 'place in this team; the account stays, it has another team',
  sessions: 'sign-ins',
  history: 'lines of the history of that row',
  invitations: 'invitations',
  letters: 'letters to that address',
  openings: 'notes of which sheet was opened',
  copies: 'copies of sheets: whose they were',
  drafts: 'places in plans not signed off',
} as const

export const STAYS = {
  plans: 'signed plans: a gap where the number stood',
  possessions: 'possessions, which name nobody',
  scouted: 'games watched, without the scout',
  signed: 'plans signed off, without by whom',
  changes: 'lines of history, without who made them',
  handOns: 'hand-ons, without from or to whom',
} as const

export type GoesKey = keyof typeof GOES
export type StaysKey = keyof typeof STAYS

/** What nobody can count: said beside the lists. */
export const NOT_KNOWN =
  'Overtop does not know who stands in a still, nor whom a note is about. Look through both yourself; blur or throw away.'
