import { LIMITS } from '@shared/limits'
import { Email } from '@shared/session/schemas'
import type { SquadPlayerBody, SquadPlayerRow } from '@shared/squad/schemas'
import { SKILLS, type Skill } from '@shared/counterWords'
import { LEVELS } from '@/components/skillLevels'

/** A player's form as it is typed: the number and the day are text until they are sent. */
export interface PlayerForm {
  jersey: string
  firstName: string
  lastName: string
  skills: Record<Skill, number>
  /** "2026-03-18", or empty while the player is available. */
  outUntil: string
  guardianEmail: string
  pictureConsent: SquadPlayerRow['pictureConsent']
  /** Seconds, "3.41", or empty where nobody measured. */
  sprint20: string
}

export type PlayerField = 'jersey' | 'firstName' | 'lastName' | 'outUntil' | 'guardianEmail' | 'sprint20'

export const FIELD_NAMES: Record<PlayerField, string> = {
  jersey: 'Shirt number',
  firstName: 'First name',
  lastName: 'Last name',
  outUntil: 'Out through',
  guardianEmail: 'Guardian’s mail',
  sprint20: 'Sprint over 20 m, seconds',
}

/** What the guardian said to pictures, as the form asks it. */
export const CONSENTS = [
  { value: 'yes', label: 'said yes', means: 'Stills of her stay inside the team.' },
  { value: 'no', label: 'said no', means: 'Blur her in every still before anybody else sees it.' },
  { value: 'not-asked', label: 'not asked', means: 'Counts as no: blur her until there is an answer.' },
] as const

const consentLabel = (value: SquadPlayerRow['pictureConsent']) =>
  CONSENTS.find((consent) => consent.value === value)?.label ?? ''

const LONGEST_NAME = 40

/** The form of a player, or an empty one for somebody new. */
export function formOf(row: SquadPlayerRow | null): PlayerForm {
  if (row === null) {
    const skills = Object.fromEntries(SKILLS.map((skill) => [skill.value, 0])) as Record<Skill, number>
    return {
      jersey: '',
      firstName: '',
      lastName: '',
      skills,
      outUntil: '',
      guardianEmail: '',
      pictureConsent: 'not-asked',
      sprint20: '',
    }
  }
  return {
    jersey: String(row.jersey),
    firstName: row.firstName,
    lastName: row.lastName,
    skills: { ...row.skills },
    outUntil: row.outUntil ?? '',
    guardianEmail: row.guardianEmail ?? '',
    pictureConsent: row.pictureConsent,
    sprint20: row.sprint20 === null ? '' : String(row.sprint20),
  }
}

/** What is sent; only for a form without faults. */
export function bodyOfForm(form: PlayerForm): SquadPlayerBody {
  const email = form.guardianEmail.trim()
  const sprint = form.sprint20.trim()
  return {
    jersey: Number(form.jersey.trim()),
    firstName: form.firstName.trim(),
    lastName: form.lastName.trim(),
    skills: { ...form.skills },
    outUntil: form.outUntil === '' ? null : form.outUntil,
    guardianEmail: email === '' ? null : email.toLowerCase(),
    pictureConsent: form.pictureConsent,
    sprint20: sprint === '' ? null : secondsIn(sprint),
  }
}

/** A decimal comma is as good as a point. */
const secondsIn = (text: string) => Number(text.trim().replace(',', '.'))

/** What has to be mended before the form can be sent, field by field. `others`: everybody else in the squad. */
export function faultsOf(
  form: PlayerForm,
  others: readonly Pick<SquadPlayerRow, 'jersey' | 'firstName'>[],
): Partial<Record<PlayerField, string>> {
  const faults: Partial<Record<PlayerField, string>> = {}
  const number = form.jersey.trim()
  const wearer = others.find((one) => String(one.jersey) === String(Number(number)))
  if (!/^\d{1,2}$/.test(number)) faults.jersey = `A number from 0 to ${LIMITS.jersey}.`
  else if (wearer) faults.jersey = `Number ${Number(number)} is worn by ${wearer.firstName}.`
  if (form.firstName.trim() === '') faults.firstName = 'Write the first name.'
  if (form.firstName.trim().length > LONGEST_NAME) faults.firstName = `${LONGEST_NAME} letters at most.`
  if (form.lastName.trim().length > LONGEST_NAME) faults.lastName = `${LONGEST_NAME} letters at most.`
  if (form.outUntil !== '' && !isDay(form.outUntil)) faults.outUntil = 'A day such as 2026-03-18.'
  if (form.guardianEmail.trim() !== '' && !Email.safeParse(form.guardianEmail).success)
    faults.guardianEmail = 'This is not a whole e-mail address.'
  const sprint = form.sprint20.trim()
  if (sprint !== '' && !(secondsIn(sprint) >= 2 && secondsIn(sprint) <= 9))
    faults.sprint20 = 'Seconds from 2 to 9, such as 3.4.'
  return faults
}

const isDay = (text: string) =>
  /^\d{4}-\d{2}-\d{2}$/.test(text) && !Number.isNaN(Date.parse(`${text}T00:00:00Z`))

/** Whether anything was typed that is not in the row. */
export function isChanged(form: PlayerForm, row: SquadPlayerRow | null): boolean {
  return JSON.stringify(form) !== JSON.stringify(formOf(row))
}

/** What differs between the form and the row that somebody else saved, named for the coach. */
export function differences(form: PlayerForm, row: SquadPlayerRow): string[] {
  const theirs = formOf(row)
  const fields = (Object.keys(FIELD_NAMES) as PlayerField[])
    .filter((field) => form[field].trim() !== theirs[field])
    .map((field) => `${FIELD_NAMES[field]}: ${theirs[field] === '' ? 'empty' : theirs[field]}`)
  const skills = SKILLS.filter((skill) => form.skills[skill.value] !== theirs.skills[skill.value]).map(
    (skill) => `${skill.label}: ${LEVELS[theirs.skills[skill.value]] ?? ''}`,
  )
  const consent =
    form.pictureConsent === theirs.pictureConsent ? [] : [`Pictures: ${consentLabel(theirs.pictureConsent)}`]
  return [...fields, ...skills, ...consent]
}

const SMALL = [
  'No',
  'One',
  'Two',
  'Three',
  'Four',
  'Five',
  'Six',
  'Seven',
  'Eight',
  'Nine',
  'Ten',
  'Eleven',
  'Twelve',
]

/** "Twelve players. One out today." */
export function squadWords(rows: readonly Pick<SquadPlayerRow, 'available'>[]): string {
  const count = SMALL[rows.length] ?? String(rows.length)
  const out = rows.filter((row) => !row.available).length
  const outWords = out === 0 ? 'All there today.' : `${SMALL[out] ?? String(out)} out today.`
  return `${count} ${rows.length === 1 ? 'player' : 'players'}. ${rows.length === 0 ? '' : outWords}`.trim()
}
