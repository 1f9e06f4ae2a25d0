import type { Request, Router } from 'express'
import { ChangePassword, MailChoice } from '@shared/session/account'
import type { Context } from '../../context'
import { SESSION_COOKIE, type SignedIn } from '../../http/passport'
import { NotSignedIn } from '../../http/problem'
import { readBody } from '../../http/readBody'
import { passwordLimits } from '../../http/signInLimits'
import { changePassword, describeAccount, setMailChoice } from './account.service'
import { endSessions } from './endSessions'

function signedIn(req: Request): SignedIn {
  if (!req.user) throw new NotSignedIn()
  return req.user
}

/** Everybody's own account: what is known, the password, sheets by mail, signing out everywhere. */
export function mountAccount(router: Router, context: Context): void {
  router.get('/session/account', async (req, res) => {
    res.json(await describeAccount(context.db, signedIn(req).id))
  })

  router.put('/session/password', ...passwordLimits(), async (req, res) => {
    const { id } = signedIn(req)
    await changePassword(context, { personId: id, session: req.sessionID, ...readBody(ChangePassword, req) })
    res.status(204).end()
  })

  router.put('/session/teams/:team/mail', async (req, res) => {
    const { id } = signedIn(req)
    const { mail } = readBody(MailChoice, req)
    await setMailChoice(context.db, { personId: id, teamId: req.params.team.toLowerCase(), mail })
    res.json(await describeAccount(context.db, id))
  })

  router.delete('/session/everywhere', async (req, res) => {
    await endSessions(context.db.manager, signedIn(req).id)
    req.session.destroy(() => res.clearCookie(SESSION_COOKIE, { path: '/' }).status(204).end())
  })
}
