import express, { Router, type Express } from 'express'
import { pinoHttp } from 'pino-http'
import { REQUEST_SERIALIZERS } from './adapters/log'
import type { Context } from './context'
import { bookRoutes } from './features/book/book.routes'
import { choiceRoutes } from './features/choices/choices.routes'
import { counterRoutes } from './features/counters/counters.routes'
import { deletionRoutes } from './features/deletion/deletion.routes'
import { gameRoutes } from './features/games/games.routes'
import { historyRoutes } from './features/history/history.routes'
import { mailRoutes } from './features/mail/mail.routes'
import { opponentPlayerRoutes } from './features/opponents/opponentPlayers.routes'
import { opponentRoutes } from './features/opponents/opponents.routes'
import { erasureRoutes } from './features/people/erasures.routes'
import { invitationRoutes } from './features/people/invitations.routes'
import { mountJoin } from './features/people/join.routes'
import { peopleRoutes } from './features/people/people.routes'
import { stripRoutes } from './features/opponents/strips.routes'
import { planRoutes } from './features/plans/plans.routes'
import { possessionRoutes } from './features/possessions/possessions.routes'
import { possessionTableRoutes } from './features/possessions/table.routes'
import { practiceRoutes } from './features/practices/practices.routes'
import { ruleRoutes } from './features/rules/rules.routes'
import { scoutedGameRoutes } from './features/scoutedGames/scoutedGames.routes'
import { mountAccount } from './features/session/account.routes'
import { passwordLinkRoutes } from './features/session/passwordLink.routes'
import { mountPasswordResets } from './features/session/passwordReset.routes'
import { mountSession } from './features/session/session.routes'
import { callerIn } from './features/session/session.service'
import { handOutRoutes } from './features/sheets/handOut.routes'
import { sheetRoutes } from './features/sheets/sheets.routes'
import { squadRoutes } from './features/squad/squad.routes'
import { editStillRoutes } from './features/stills/editStill.routes'
import { stillRoutes } from './features/stills/stills.routes'
import { teamRoutes } from './features/team/team.routes'
import { tendencyRoutes } from './features/tendencies/tendencies.routes'
import { weekRoutes } from './features/week/week.routes'
import { notTooDeep } from './http/depth'
import { mount, type Endpoint } from './http/endpoint'
import { health } from './http/health'
import { describeApi } from './http/openapi'
import { ownOriginOnly } from './http/origin'
import { signInWith } from './http/passport'
import { noSuchAddress, problemHandler } from './http/problem'
import { securityHeaders } from './http/security'
import { LIMITS } from '@shared/limits'

/** Every team endpoint of the API; mounted and described from this one list. */
export const endpointsOf = (context: Context): Endpoint[] => [
  ...opponentRoutes(context),
  ...stripRoutes(context),
  ...scoutedGameRoutes(context),
  ...possessionRoutes(context),
  ...stillRoutes(context),
  ...editStillRoutes(context),
  ...tendencyRoutes(context),
  ...counterRoutes(context),
  ...bookRoutes(context),
  ...ruleRoutes(context),
  ...teamRoutes(context),
  ...squadRoutes(context),
  ...gameRoutes(context),
  ...weekRoutes(context),
  ...choiceRoutes(context),
  ...planRoutes(context),
  ...practiceRoutes(context),
  ...sheetRoutes(context),
  ...handOutRoutes(context),
  ...mailRoutes(context),
  ...peopleRoutes(context),
  ...invitationRoutes(context),
  ...erasureRoutes(context),
  ...passwordLinkRoutes(context),
  ...historyRoutes(context),
  ...possessionTableRoutes(context),
  ...deletionRoutes(context),
  ...opponentPlayerRoutes(context),
]

/** The whole HTTP side but the client's files; the same for tests and for production. */
export function createApp(context: Context): Express {
  const app = express()
  app.disable('x-powered-by')
  if (context.config.publicUrl) app.set('trust proxy', 1)
  app.use(securityHeaders(context.config))
  app.get('/healthz', health(context.db))

  const { passport, middleware } = signInWith(context)
  const api = Router()
  api.use(
    pinoHttp({
      logger: context.log,
      quietReqLogger: true,
      serializers: REQUEST_SERIALIZERS,
      customLogLevel: (_req, res, error) => (error || res.statusCode >= 500 ? 'error' : 'debug'),
    }),
  )
  api.use(ownOriginOnly(context.config.publicUrl))
  api.use((_req, res, next) => {
    res.set('Cache-Control', 'private, no-store')
    next()
  })
  api.use(express.json({ limit: LIMITS.jsonBytes }), notTooDeep)
  const endpoints = endpointsOf(context)
  const description = describeApi(endpoints)
  api.get('/openapi.json', (_req, res) => void res.json(description))
  api.use(middleware)
  mountSession(api, context, passport)
  mountAccount(api, context)
  mountPasswordResets(api, context)
  mountJoin(api, context)
  for (const spec of endpoints)
    mount(api, spec, (req, teamId) =>
      req.user ? callerIn(context.db, req.user, teamId) : Promise.resolve(null),
    )
  api.use(noSuchAddress)
  app.use('/api', api)
  app.use('/api', problemHandler(context.log))
  return app
}
