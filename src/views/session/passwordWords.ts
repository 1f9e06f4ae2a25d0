import { LIMITS } from '@shared/limits'

/** Why an address is refused; asked only for one that is. */
export const emailFault = (typed: string): string =>
  typed.trim() === '' ? 'Write your e-mail address.' : 'This is not a whole e-mail address.'

/** What stands under a field for a new password before anything is wrong. */
export const PASSWORD_HINT = `${LIMITS.passwordShortest} characters or more.`

/** Why a new password is refused, or nothing when it will do. */
export function newPasswordFault(typed: string): string {
  if (typed === '') return 'Choose a password.'
  const missing = LIMITS.passwordShortest - typed.length
  if (missing > 0) return `${missing} more ${missing === 1 ? 'character' : 'characters'}, please.`
  if (typed.length > LIMITS.passwordLongest) return `Use at most ${LIMITS.passwordLongest} characters.`
  return ''
}

/** The secret of a link, from the address's fragment; null where the link is not whole. */
export function tokenOf(hash: string): string | null {
  const token = hash.replace(/^#/, '')
  return /^[\w-]{20,200}$/.test(token) ? token : null
}
