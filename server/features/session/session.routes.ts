import type { Router } from 'express'
import type { PassportStatic } from 'passport'
import { SignIn } from '@shared/session/schemas'
import type { Context } from '../../context'
import { SESSION_COOKIE, type SignedIn } from '../../http/passport'
import { NotSignedIn } from '../../http/problem'
import { readBody } from '../../http/readBody'
import { signInLimits } from '../../http/signInLimits'
import { describeSession } from './session.service'

type Passport = Pick<PassportStatic, 'authenticate'>

/** GET, POST and DELETE /session: who I am, sign in (a new session id each time), sign out. */
export function mountSession(router: Router, context: Context, passport: Passport): void {
  router.get('/session', async (req, res) => {
    if (!req.user) throw new NotSignedIn()
    res.json(await describeSession(context.db, req.user))
  })

  router.post('/session', ...signInLimits(), (req, res, next) => {
    req.body = readBody(SignIn, req)
    const authenticate = passport.authenticate('local', (error: unknown, person: SignedIn | false) => {
      if (error) return next(error)
      if (!person) return next(new NotSignedIn('Mail address and password do not fit. Check both.'))
      req.logIn(person as Express.User, (failed: unknown) => {
        if (failed) return next(failed)
        describeSession(context.db, person)
          .then((session) => res.status(201).json(session))
          .catch(next)
      })
    }) as (...args: unknown[]) => void
    authenticate(req, res, next)
  })

  router.delete('/session', (req, res, next) => {
    req.session.destroy((error: unknown) => {
      if (error) return next(error)
      res.clearCookie(SESSION_COOKIE, { path: '/' }).status(204).end()
    })
  })
}
