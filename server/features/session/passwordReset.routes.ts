import type { Router } from 'express'
import { AskPassword, UsePasswordLink } from '@shared/session/account'
import type { Context } from '../../context'
import { readBody } from '../../http/readBody'
import { askLimits, linkLimits } from '../../http/signInLimits'
import { pokeMail } from '../mail/carrier'
import { mailPasswordLink, usePasswordLink } from './passwordReset.service'

/** POST /password-resets and /password-resets/use: for people who cannot sign in. */
export function mountPasswordResets(router: Router, context: Context): void {
  router.post('/password-resets', ...askLimits(), (req, res) => {
    const { email } = readBody(AskPassword, req)
    // The answer leaves before anybody is looked up: neither its words nor its time tell who has an account.
    res.status(202).json({ mail: context.mail !== null })
    setImmediate(() => {
      mailPasswordLink(context, email)
        .then(() => pokeMail(context))
        .catch((error: unknown) => context.log.error({ err: error }, 'a password link could not be made'))
    })
  })

  router.post('/password-resets/use', ...linkLimits(), async (req, res) => {
    await usePasswordLink(context, readBody(UsePasswordLink, req))
    res.status(204).end()
  })
}
