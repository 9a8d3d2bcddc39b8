import { randomUUID } from 'node:crypto'
import compression from 'compression'
import cookieParser from 'cookie-parser'
import express, { type Express, type Router } from 'express'
import helmet from 'helmet'
import type { Dependencies } from './dependencies'
import { AppError } from './errors'
import { athletesRoutes } from './features/athletes/routes'
import { auditRoutes } from './features/audit/routes'
import { authRoutes } from './features/auth/routes'
import { exercisesRoutes } from './features/exercises/routes'
import { flagsRoutes } from './features/flags/routes'
import { meRoutes } from './features/me/routes'
import { placesRoutes } from './features/places/routes'
import { sessionsRoutes } from './features/sessions/routes'
import { soreJointsRoutes } from './features/sore-joints/routes'
import { swapsRoutes } from './features/swaps/routes'
import { authenticate } from './middleware/authenticate'
import { readBody } from './middleware/body'
import { serveClient } from './middleware/client'
import { errorHandler, methodNotAllowed } from './middleware/error-handler'
import { healthRoutes } from './middleware/health'
import { logRequests } from './middleware/log-requests'
import { checkOrigin } from './middleware/origin'
import { setScope } from './middleware/scope'
import { openApiRoutes } from './openapi'

/** Every feature's routes; a feature is not served until it is named here. */
const FEATURES: Array<(dependencies: Dependencies) => Router> = [
  authRoutes,
  meRoutes,
  athletesRoutes,
  placesRoutes,
  exercisesRoutes,
  sessionsRoutes,
  soreJointsRoutes,
  swapsRoutes,
  flagsRoutes,
  auditRoutes,
]

const CONTENT_SECURITY_POLICY = {
  useDefaults: false,
  directives: {
    defaultSrc: ["'none'"],
    scriptSrc: ["'self'"],
    // Dialogs and menus place themselves with inline styles; scripts stay strict.
    styleSrc: ["'self'", "'unsafe-inline'"],
    imgSrc: ["'self'", 'data:'],
    fontSrc: ["'self'"],
    connectSrc: ["'self'"],
    manifestSrc: ["'self'"],
    formAction: ["'self'"],
    baseUri: ["'none'"],
    frameAncestors: ["'none'"],
  },
}

/** Builds the app. Never listens: that is for main.ts and for tests. `more` serves further routes under the same roof. */
export function createApp(
  dependencies: Dependencies,
  more: ReadonlyArray<(dependencies: Dependencies) => Router> = [],
): Express {
  const { env, logger } = dependencies
  const app = express()
  app.disable('x-powered-by')
  app.disable('etag')
  app.set('trust proxy', env.TRUST_PROXY)
  app.use((_request, response, next) => {
    response.setHeader('X-Request-Id', randomUUID())
    next()
  })
  app.use(logRequests(logger))
  app.use(
    helmet({
      contentSecurityPolicy: CONTENT_SECURITY_POLICY,
      strictTransportSecurity: env.PUBLIC_URL?.startsWith('https:') === true,
      crossOriginEmbedderPolicy: false,
      referrerPolicy: { policy: 'no-referrer' },
    }),
  )
  // Athletes read this in places with bad reception. No answer holds a secret beside something the caller chose, which
  // compressing could give away.
  app.use(compression())
  app.use('/api', (request, response, next) => {
    // Answers hold health data: no cache may keep them.
    response.setHeader('Cache-Control', 'no-store')
    setScope(response, {
      requestId: String(response.getHeader('X-Request-Id')),
      logger,
      loadActor: () => authenticate(dependencies, request),
      checkAnswers: env.NODE_ENV !== 'production',
    })
    next()
  })
  app.use('/api', checkOrigin(env), cookieParser(), ...readBody)
  app.use(healthRoutes(dependencies), openApiRoutes())
  for (const routes of [...FEATURES, ...more]) app.use(routes(dependencies))
  for (const { path, handler } of methodNotAllowed()) app.all(path, handler)
  app.use('/api', () => {
    throw new AppError('not_found', 'There is nothing at this address.')
  })
  app.use(serveClient(env.CLIENT_DIR))
  app.use(errorHandler(logger))
  return app
}
