import type { Request, Router } from 'express'
import { LookBody, NewAccount, NewTeam } from '@shared/people/schemas'
import { FirstCoachBySelf } from '@shared/session/firstCoach'
import type { Context } from '../../context'
import type { SignedIn } from '../../http/passport'
import { NotSignedIn } from '../../http/problem'
import { readBody } from '../../http/readBody'
import { linkLimits } from '../../http/signInLimits'
import { addFirstCoach, checkToken } from './firstCoach.service'
import { joinAsMe, joinAsNew, lookAtInvitation } from './join.service'
import { addTeam } from './teams.service'

/** A new session id for somebody who has just proved who they are. */
const signIn = (req: Request, person: SignedIn): Promise<void> =>
  new Promise((resolve, reject) => {
    req.logIn(person as Express.User, (failed: unknown) =>
      failed === null || failed === undefined ? resolve() : reject(failed as Error),
    )
  })

/** Ways in that stand outside any team: an invitation's link, a head coach's next team, the very first one. */
export function mountJoin(router: Router, { db, clock, firstRunToken = null }: Context): void {
  const limits = linkLimits()
  router.post('/invitations/look', ...limits, async (req, res) => {
    res.json(await lookAtInvitation(db, readBody(LookBody, req).secret, clock()))
  })

  router.post('/invitations/accept', ...limits, async (req, res) => {
    const { person, teamId } = req.user
      ? await joinAsMe(db, readBody(LookBody, req).secret, req.user, clock())
      : await joinAsNew(db, readBody(NewAccount, req), clock())
    if (!req.user) await signIn(req, person)
    res.status(201).json({ teamId })
  })

  router.post('/teams', async (req, res) => {
    if (!req.user) throw new NotSignedIn()
    res.status(201).json({ id: await addTeam(db, readBody(NewTeam, req), req.user.id, clock()) })
  })

  router.post('/first-coach', ...limits, async (req, res) => {
    const { token, ...coach } = readBody(FirstCoachBySelf, req)
    checkToken(firstRunToken, token)
    await signIn(req, await addFirstCoach(db, coach, clock()))
    res.status(201).end()
  })
}
