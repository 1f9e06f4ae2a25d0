import { describe, expect, it } from 'vitest'
import { LIMITS } from '@shared/limits'
import { NewPassword } from '@shared/session/account'
import { emailFault, newPasswordFault, tokenOf } from '@/views/session/passwordWords'

describe('a new password', () => {
  it('is refused in words exactly where the server would refuse it', () => {
    const lengths = [0, 1, LIMITS.passwordShortest - 1, LIMITS.passwordShortest, LIMITS.passwordLongest]
    for (const length of [...lengths, LIMITS.passwordLongest + 1]) {
      const typed = 'x'.repeat(length)
      expect(newPasswordFault(typed) === '', String(length)).toBe(NewPassword.safeParse(typed).success)
    }
    expect(newPasswordFault('x'.repeat(LIMITS.passwordShortest - 1))).toBe('1 more character, please.')
    expect(newPasswordFault('x'.repeat(LIMITS.passwordShortest - 2))).toBe('2 more characters, please.')
  })
})

describe('the secret in an address', () => {
  it('is taken whole or not at all', () => {
    const secret = 'Zm9v_YmFy-'.repeat(4)
    expect(tokenOf(`#${secret}`)).toBe(secret)
    for (const hash of ['', '#', '#short', `#${secret} `, `#${secret}<b>`])
      expect(tokenOf(hash), hash).toBeNull()
  })
})

describe('an address that is refused', () => {
  it('is missing or not whole', () => {
    expect([emailFault('  '), emailFault('maren@')]).toEqual([
      'Write your e-mail address.',
      'This is not a whole e-mail address.',
    ])
  })
})
