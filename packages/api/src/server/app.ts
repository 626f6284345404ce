import { join } from 'node:path'
import express, { type Express, type Request, type RequestHandler } from 'express'
import helmet from 'helmet'
import { ipKeyGenerator, rateLimit } from 'express-rate-limit'
import type { Side } from '../contract/access'
import type { Database } from './db/database'
import { mount } from './http/mount'
import type { Route } from './http/route'
import { problemHandler, tooMany, unknownRoute } from './middleware/problem'
import { sameOrigin } from './middleware/same-origin'
import type { Services } from './services'

export interface AppDependencies {
  side: Side
  origin: string
  /** Folder of the built app; absent in tests of the interface alone. */
  dist?: string
  database: Database
  services: Services
  /** Puts `request.session` in place. */
  session: RequestHandler
  routes: readonly Route[]
  /** Requests per minute and address for sign-in, uploads and heavy computation; 0 for none. */
  rateLimitPerMinute?: number
}

/** Builds one side's Express app: its own interface below `/api/v1`, and the built pages for everything else. */
export function createApp(dependencies: AppDependencies): Express {
  const { side, origin, services } = dependencies
  const app = express()
  app.disable('x-powered-by')
  app.set('query parser', 'simple')
  app.use(securityHeaders(origin))

  const api = express.Router()
  api.use((_request, response, next) => {
    response.setHeader('Cache-Control', 'no-store')
    next()
  })
  api.use(dependencies.session)
  api.use(sameOrigin(origin))
  api.use(express.json({ limit: '4mb' }))
  const limited = limiter(dependencies.rateLimitPerMinute ?? 120)
  const guarded = limiter(Math.min(dependencies.rateLimitPerMinute ?? 120, tokensPerMinute), personOrAddress)
  for (const route of dependencies.routes) {
    if (takesToken(route)) api[route.endpoint.method](route.endpoint.path, guarded)
    if (isCostly(route)) api[route.endpoint.method](route.endpoint.path, limited)
    mount(api, route, { side, database: dependencies.database, services })
  }
  api.use(unknownRoute)
  app.use('/api/v1', api)

  if (dependencies.dist) servePages(app, dependencies.dist)
  app.use(problemHandler(services.logger))
  return app
}

const isCostly = ({ endpoint }: Route): boolean =>
  Boolean(endpoint.upload) || /^\/(sign-in|evaluate)/.test(endpoint.path)

/** Where a person shows the secret of a link: nobody may try many. */
const takesToken = ({ endpoint }: Route): boolean => endpoint.path.startsWith('/invitations/')
/** Links that one person may look up or use in a minute. */
const tokensPerMinute = 30

/** Who is signed in counts by themselves: a whole company may sit behind one address. */
const personOrAddress = (request: Request): string =>
  request.session?.person?.userId ?? ipKeyGenerator(request.ip ?? '')

const limiter = (perMinute: number, keyGenerator?: (request: Request) => string): RequestHandler =>
  perMinute === 0
    ? (_request, _response, next) => next()
    : rateLimit({
        windowMs: 60_000,
        limit: perMinute,
        ...(keyGenerator ? { keyGenerator } : {}),
        standardHeaders: 'draft-8',
        legacyHeaders: false,
        handler: tooMany,
      })

function securityHeaders(origin: string): RequestHandler {
  const secure = origin.startsWith('https:')
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'none'"],
        scriptSrc: ["'self'"],
        // Vuetify writes its theme and components set positions as inline styles; scripts stay strict.
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'data:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        baseUri: ["'none'"],
        ...(secure ? { upgradeInsecureRequests: [] } : {}),
      },
    },
    strictTransportSecurity: secure,
    crossOriginOpenerPolicy: { policy: 'same-origin' },
    referrerPolicy: { policy: 'same-origin' },
  })
}

function servePages(app: Express, dist: string): void {
  app.use(
    '/assets',
    express.static(join(dist, 'assets'), { immutable: true, maxAge: '1y', fallthrough: false }),
  )
  app.use(express.static(dist, { index: false, maxAge: '1h' }))
  app.get('/{*page}', (_request, response) => {
    response.setHeader('Cache-Control', 'no-cache')
    // By its root: the folder itself may lie under a name with a dot, such as `.data`.
    response.sendFile('index.html', { root: dist })
  })
}
