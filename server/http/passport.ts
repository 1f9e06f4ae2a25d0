import session from 'express-session'
import type { RequestHandler } from 'express'
import { Passport } from 'passport'
import { Strategy as LocalStrategy } from 'passport-local'
import { nobodysHash, passwordFits } from '../adapters/passwords'
import type { Context } from '../context'
import { Person } from '../database/entities/Person'
import { SessionStore } from './sessionStore'

declare module 'express-serve-static-core' {
  interface Request {
    user?: SignedIn
  }
}

/** The person behind a request; what a role allows is asked per team. */
export interface SignedIn {
  id: string
  name: string
}

/** How long a session lives after its last use. */
export const SESSION_MS = 14 * 24 * 60 * 60 * 1000
export const SESSION_COOKIE = 'overtop'

/** The session and sign-in middleware of one app, and its store. */
export function signInWith(context: Context): {
  passport: InstanceType<typeof Passport>
  store: SessionStore
  middleware: RequestHandler[]
} {
  const { db, clock, config } = context
  const store = new SessionStore(db, clock, SESSION_MS)
  const passport = new Passport()
  const people = () => db.getRepository(Person)

  passport.use(
    new LocalStrategy({ usernameField: 'email' }, (email, password, done) => {
      people()
        .findOneBy({ email })
        .then(async (person) => {
          const fits = await passwordFits(person?.passwordHash ?? (await nobodysHash), password)
          done(null, person && fits ? { id: person.id, name: person.name } : false)
        })
        .catch(done)
    }),
  )
  passport.serializeUser((user, done) => done(null, (user as SignedIn).id))
  passport.deserializeUser((id: string, done) => {
    people()
      .findOne({ where: { id }, select: { id: true, name: true } })
      .then((person) => done(null, person ? { id: person.id, name: person.name } : false))
      .catch(done)
  })

  const https = config.publicUrl?.startsWith('https:') ?? false
  const middleware: RequestHandler[] = [
    session({
      name: SESSION_COOKIE,
      secret: context.sessionSecret,
      store,
      resave: false,
      saveUninitialized: false,
      // The cookie slides with the session: signed out two weeks after the last use, not after the first.
      rolling: true,
      cookie: { httpOnly: true, sameSite: 'lax', secure: https, maxAge: SESSION_MS, path: '/' },
    }),
    passport.session() as RequestHandler,
  ]
  return { passport, store, middleware }
}
